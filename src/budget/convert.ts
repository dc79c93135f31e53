import { baseUnitText, equalDimensions, dimensionOf } from '../quantity/dimension.js'
import { QuantityError } from '../quantity/error.js'
import type { ValueKind } from '../quantity/expression/value-kind.js'
import type { Quantity } from '../quantity/parse.js'
import { equal, one, rational, zero } from '../quantity/rational.js'
import type { Outcome } from './formula.js'
import { useAs, type Converted, type Use } from './use.js'

const turn = 2 * Math.PI

/** Factor from one dimension's canonical unit to another's; null where the two do not mean proportional numbers. */
export function factorBetween(from: string, to: string): number | null {
  if (from === to) return 1
  if (from === 'frequency' && to === 'rate') return turn
  if (from === 'rate' && to === 'frequency') return 1 / turn
  return null
}

/**
 * Factor from a root's canonical unit to the coherent SI unit, hertz as cycles, which expressions reckon in; null for a
 * level that is kept as a ratio of powers.
 */
export function factorToCoherent({ cycles, dimension }: ValueKind, root: string): number | null {
  const cyclic = equal(cycles, one)
  if (root === 'rate' || root === 'rate-per-length') return cyclic ? 1 / turn : 1
  if (root === 'frequency') return cyclic ? 1 : turn
  return root === 'power-ratio' && equalDimensions(dimension, level) ? null : 1
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
  const { value, dimension, power } = useUnit(kind, text, use)
  const toRatio = dimension === 'power-ratio' && equalDimensions(kind.dimension, level)
  return { outcome: toRatio ? { level: true } : { factor: value }, dimension, power }
}

/**
 * A formula such as 4kTmΓ gives a density per hertz without naming one, as Γ is in radians per second: where no cycles are
 * left, those of a density are supposed.
 */
function useUnit(kind: ValueKind, text: string, use: Use): Converted {
  const guesses = equal(kind.cycles, zero) ? [zero, rational(-1, 2), rational(-1)] : [kind.cycles]
  let first: QuantityError | null = null
  for (const cycles of guesses) {
    try {
      return use({ ...unitOf(kind, text), cycles })
    } catch (error) {
      if (!(error instanceof QuantityError)) throw error
      first ??= error
    }
  }
  throw first ?? new QuantityError('this is no quantity', 0, text.length)
}

/** One coherent unit of a kind, as a quantity that was written like this. */
function unitOf({ dimension, cycles }: ValueKind, text: string): Quantity {
  return { value: 1, uncertainty: 0, dimension, cycles, text, unitText: '', unitFactor: 1 }
}

const natural = [
  ...['mass', 'frequency', 'rate', 'rate-per-length', 'temperature', 'number', 'angle', 'power', 'length'],
  ...['force', 'acceleration', 'decibel'],
]

/** The declared dimension whose canonical unit a value of this kind has already; its base units where there is none. */
export function naturalUse(kind: ValueKind): Use {
  const text = '='
  for (const name of natural) {
    const use = useAs(name)
    try {
      if (use(unitOf(kind, text)).value === 1) return use
    } catch (error) {
      if (!(error instanceof QuantityError)) throw error
    }
  }
  return ({ value, uncertainty }) => ({ value, uncertainty, dimension: baseUnitText(kind.dimension), power: false })
}
