import { toText } from '../quantity/rational.js'
import { computedQuantity } from '../quantity/computed.js'
import { baseUnitText, equalDimensions, dimensionOf } from '../quantity/dimension.js'
import { declaredNames, type DeclaredName } from '../quantity/declared.js'
import { QuantityError } from '../quantity/error.js'
import type { ValueKind } from '../quantity/expression/value-kind.js'
import type { Quantity } from '../quantity/parse.js'
import type { Outcome } from './formula.js'
import { useAs, type Use } from './use.js'

const turn = 2 * Math.PI

/** Factor from one dimension's canonical unit to another's; null where the two do not mean proportional numbers. */
export function factorBetween(from: string, to: string): number | null {
  if (from === to) return 1
  if (from === 'frequency' && to === 'rate') return turn
  if (from === 'rate' && to === 'frequency') return 1 / turn
  return null
}

/**
 * Factor from the canonical unit of one use of a quantity to the coherent SI unit, hertz as cycles, which expressions
 * reckon in; null where the two are not proportional, as with a level that is used as a ratio of powers.
 */
export function factorToCoherent(quantity: Quantity, use: Use): number | null {
  try {
    const factor = 1 / use({ ...quantity, value: 1, difference: 1 }).value
    const back = use(quantity).value * factor
    return Math.abs(back - quantity.value) <= 1e-12 * Math.abs(quantity.value) ? factor : null
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error
    return null
  }
}

const level = dimensionOf({ level: 1 })

/** How the value of an expression, in the coherent SI unit, is turned into the canonical unit of its field. */
export interface Fitted {
  readonly outcome: Outcome
  readonly dimension: string
  readonly power: boolean
}

/** Fits an expression's kind to a field. Throws a QuantityError where it is of another kind. */
export function fit(kind: ValueKind, text: string, use: Use): Fitted {
  const { value, dimension, power } = use(computedQuantity(text, kind, 1))
  const toRatio = dimension === 'power-ratio' && equalDimensions(kind.dimension, level)
  return { outcome: toRatio ? { level: true } : { factor: value }, dimension, power }
}

/** Those that a number without further words is first taken for. */
const common: readonly DeclaredName[] = ['frequency', 'rate', 'number', 'temperature', 'energy', 'pressure', 'decibel']
const natural: readonly DeclaredName[] = [...common, ...declaredNames]

const naturalUses = new Map<string, Use>()

/** Use as the declared dimension whose canonical unit a value of this kind has already; in base units where there is none. */
export function naturalUse(kind: ValueKind): Use {
  const key = `${baseUnitText(kind.dimension)} ${toText(kind.cycles)}`
  const use = naturalUses.get(key) ?? findNaturalUse(kind)
  naturalUses.set(key, use)
  return use
}

function findNaturalUse(kind: ValueKind): Use {
  for (const name of natural) {
    const use = useAs(name)
    try {
      if (use(computedQuantity('=', kind, 1)).value === 1) return use
    } catch (error) {
      if (!(error instanceof QuantityError)) throw error
    }
  }
  return ({ value, uncertainty }) => ({ value, uncertainty, dimension: baseUnitText(kind.dimension), power: false })
}
