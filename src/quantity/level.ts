import { multiplyDimensions, type Dimension } from './dimension.js'
import { concise, scaled, smallestNormal } from './decimal.js'
import { QuantityError, refusePiece, sliceOf } from './error.js'
import { levelMeaning } from './level-table.js'
import { equal, rational, toText, type Rational } from './rational.js'
import type { QuantityNode, UnitNode } from './tree.js'
import { factorOf, meaningOfUnit, unity } from './unit-meaning.js'

/** A unit that counts a logarithm: `dBm`, `dBV/√Hz`, `dBc/Hz`. */
export interface LevelUnit {
  /** The level's own symbol: `dBc` of `dBc/Hz`. */
  readonly symbol: string
  /** The value at 0, in the coherent SI unit. */
  readonly reference: number
  /** 10 for a power, 20 for an amplitude. */
  readonly perDecade: 10 | 20
  readonly dimension: Dimension
  readonly cycles: Rational
}

const perHertz = rational(-1)
const perRootHertz = rational(-1, 2)

/**
 * The level that a unit counts; null where it counts none. The value at level L is
 * reference · 10^(L/10) of a power or its density (W, W/Hz, V²/Hz, 1, 1/Hz), reference · 10^(L/20) of an amplitude or
 * its density (V, V/√Hz; root mean square). Throws a QuantityError for `dBV/Hz` and `dBm/√Hz`, which mix both.
 */
export function levelUnit(node: UnitNode, text: string): LevelUnit | null {
  const { head } = node
  const level = !node.slash && head.type === 'symbol' ? levelMeaning(head.symbol) : null
  if (level === null || head.type !== 'symbol') return null
  const rest = meaningOfUnit({ ...node, head: { type: 'one', start: head.start, end: head.end } }, text)
  if (head.symbol === 'dB' && (head.power !== null || !isPerHertz(rest.dimension, rest.cycles))) return null
  const squared = head.power !== null && /^(?:\^|\*\*)?\s*(?:2|²)$/.test(sliceOf(head.power, text))
  if (head.power !== null && !(squared && level.perDecade === 20)) {
    throw refusePiece(node, text, `is no level that is read; write it like \`${head.symbol}\` or \`${head.symbol}/Hz\``)
  }
  const amplitude = level.perDecade === 20 && !squared
  checkDensity(node, text, { amplitude, cycles: rest.cycles, symbol: head.symbol })
  return {
    symbol: head.symbol,
    reference: level.reference ** (squared ? 2 : 1) * factorOf(rest),
    perDecade: amplitude ? 20 : 10,
    dimension: multiplyDimensions(
      squared ? multiplyDimensions(level.dimension, level.dimension) : level.dimension,
      rest.dimension,
    ),
    cycles: rest.cycles,
  }
}

function isPerHertz(dimension: Dimension, cycles: Rational): boolean {
  return equal(cycles, perHertz) && dimension.map(toText).join(' ') === '0 0 1 0 0 0 0 0'
}

interface Written {
  readonly amplitude: boolean
  readonly cycles: Rational
  readonly symbol: string
}

function checkDensity(node: UnitNode, text: string, { amplitude, cycles, symbol }: Written): void {
  if (amplitude && equal(cycles, perHertz)) {
    const remedy = `mixes an amplitude with a power density; write \`${symbol}/√Hz\` or \`${symbol}²/Hz\`, which have the same number`
    throw refusePiece(node, text, remedy)
  }
  if (!amplitude && equal(cycles, perRootHertz)) {
    throw refusePiece(node, text, `mixes a power with an amplitude density; write \`${symbol}/Hz\``)
  }
}

export interface LevelValue {
  /** In the coherent SI unit. */
  readonly value: number
  readonly uncertainty: number
}

/** The value at a level with its uncertainty, to first order. */
export function atLevel(unit: LevelUnit, level: number, uncertainty: number): LevelValue {
  const value = unit.reference * 10 ** (level / unit.perDecade)
  return { value, uncertainty: ((value * Math.LN10) / unit.perDecade) * uncertainty }
}

/** Reads `-60(1) dBm`, `-60 dBm ± 1 dB`, `(-60 ± 1) dBm`. Throws a QuantityError. */
export function readLevel(tree: QuantityNode, unit: LevelUnit, text: string): LevelValue {
  const whole = { start: 0, end: text.length }
  if (tree.pi !== null || tree.number === null) {
    throw refusePiece(
      whole,
      text,
      `has a factor π, which a level cannot have; write its number, such as \`-60 ${unit.symbol}\``,
    )
  }
  const shift = tree.ten?.power ?? 0
  const level = scaled(tree.number, unity, shift, text)
  const result = atLevel(unit, level, levelSpread(tree, shift, text))
  if (Number.isFinite(result.value) && Number.isFinite(result.uncertainty) && result.value >= smallestNormal)
    return result
  throw new QuantityError(
    `\`${text.trim()}\` is beyond the numbers that are read; write a level such as \`-60 ${unit.symbol}\``,
    0,
    text.length,
  )
}

function levelSpread(tree: QuantityNode, shift: number, text: string): number {
  const { number, deviation, unit } = tree
  if (number === null) return 0
  if (deviation === null) return concise(number, unity, text)
  const own = deviation.unit === null ? null : sliceOf(deviation.unit, text)
  const fits = tree.bracketed || unit === null ? true : own === 'dB' || own === sliceOf(unit, text)
  if (!fits)
    throw refusePiece(
      deviation.number,
      text,
      `is the uncertainty of a level; write \`± ${sliceOf(deviation.number, text)} dB\``,
    )
  for (const twice of [number, deviation.number]) {
    if (twice.bracket !== null) throw refusePiece(twice, text, 'states a second uncertainty; keep one of the two')
  }
  return Math.abs(scaled(deviation.number, unity, shift, text))
}
