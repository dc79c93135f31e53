import {
  dimensionOf,
  equalDimensions,
  exponentOf,
  isDimensionless,
  multiplyDimensions,
  raiseDimension,
  type Dimension,
} from '../dimension.js'
import { add, multiply, negate, one, zero, type Rational } from '../rational.js'
import type { Span } from '../tree.js'
import { settled, type ValueKind } from './value-kind.js'

/** The kind of a part of an expression, with where its cycles come from. */
export interface Traced {
  readonly dimension: Dimension
  /** Cycles of what is written in hertz, and of the factor `cycle`. */
  readonly hertz: Rational
  /** Power of 2π, which turns cycles into radians. */
  readonly turns: Rational
  /** Power of a π without its 2, which may be of a circle as well. */
  readonly pi: Rational
  /** A factor that has said what the number counts: with `cycle` a bare π is a plain factor, with `radian` 2π as well. */
  readonly said: 'cycle' | 'radian' | null
  readonly pieces: {
    /** The first π without its 2. */
    readonly pi: Span | null
    /** A speed over a length, which is the frequency of a wave or a plain rate. */
    readonly ratio: Span | null
  }
}

export const noPieces: Traced['pieces'] = { pi: null, ratio: null }

const speed = dimensionOf({ length: 1, time: -1 })
const length = dimensionOf({ length: 1 })

export function traced({ dimension, cycles }: ValueKind): Traced {
  return { dimension, hertz: cycles, turns: zero, pi: zero, said: null, pieces: noPieces }
}

/** Products and powers add, but for a π that `cycle` or `radian` has made a plain factor. */
export function kindOfTraced({ dimension, hertz, turns, pi, said }: Traced): ValueKind {
  const counted = said === null ? add(turns, pi) : said === 'cycle' ? turns : zero
  return { dimension, cycles: add(hertz, negate(counted)) }
}

export function product(a: Traced, b: Traced): Traced {
  return {
    dimension: multiplyDimensions(a.dimension, b.dimension),
    hertz: add(a.hertz, b.hertz),
    turns: add(a.turns, b.turns),
    pi: add(a.pi, b.pi),
    said: a.said ?? b.said,
    pieces: { pi: a.pieces.pi ?? b.pieces.pi, ratio: a.pieces.ratio ?? b.pieces.ratio },
  }
}

export function quotient(a: Traced, b: Traced, span: Span): Traced {
  const result = product(a, power(b, negate(one)))
  const open = equalDimensions(a.dimension, speed) && equalDimensions(b.dimension, length)
  return open ? { ...result, pieces: { ...result.pieces, ratio: span } } : result
}

/** Throws a RangeError where exponents leave what is exact. */
export function power(a: Traced, exponent: Rational): Traced {
  return {
    ...a,
    dimension: raiseDimension(a.dimension, exponent),
    hertz: multiply(a.hertz, exponent),
    turns: multiply(a.turns, exponent),
    pi: multiply(a.pi, exponent),
  }
}

/** The kind of a sum, whose parts are alike: where its cycles came from is forgotten. */
export function sumOf(parts: readonly Traced[]): Traced {
  return {
    ...traced(settled(kindOfTraced(parts[0]))),
    said: parts.find(({ said }) => said !== null)?.said ?? null,
    pieces: ratiosOf(parts),
  }
}

function ratiosOf(parts: readonly Traced[]): Traced['pieces'] {
  return { pi: null, ratio: parts.find(({ pieces }) => pieces.ratio !== null)?.pieces.ratio ?? null }
}

/**
 * The piece that leaves open whether a rate counts cycles or radians; null where nothing does: the number is no rate,
 * hertz or 2π stand in it, or a factor says it.
 */
export function doubtOf(a: Traced): { readonly span: Span; readonly piece: 'pi' | 'ratio' } | null {
  if (a.said !== null || a.hertz.numerator !== 0 || a.turns.numerator !== 0 || !isRate(a.dimension)) return null
  if (a.pi.numerator !== 0 && a.pieces.pi !== null) return { span: a.pieces.pi, piece: 'pi' }
  return a.pieces.ratio === null ? null : { span: a.pieces.ratio, piece: 'ratio' }
}

/** Per time and any power of length. */
function isRate(dimension: Dimension): boolean {
  const time = exponentOf(dimension, 'time')
  if (time.numerator !== -1 || time.denominator !== 1) return false
  const rest = multiplyDimensions(dimension, dimensionOf({ time: 1 }))
  return isDimensionless(multiplyDimensions(rest, dimensionOf({ length: negate(exponentOf(dimension, 'length')) })))
}

/** Without mass, charge, heat and the like: only length and time. */
function isMotion(dimension: Dimension): boolean {
  const rest = { length: negate(exponentOf(dimension, 'length')), time: negate(exponentOf(dimension, 'time')) }
  return isDimensionless(multiplyDimensions(dimension, dimensionOf(rest)))
}

/** What an expression as a whole is; π in a force or an energy is geometry where nothing is in hertz. */
export function resultOf(a: Traced): ValueKind {
  const geometry = a.hertz.numerator === 0 && !isMotion(a.dimension)
  return geometry ? { dimension: a.dimension, cycles: zero } : settled(kindOfTraced(a))
}
