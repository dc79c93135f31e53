import { describeDimension } from '../describe.js'
import { equalDimensions, exponentOf, type Dimension } from '../dimension.js'
import { equal, zero, type Rational } from '../rational.js'

/** What a number is: its dimension, and how many cycles it carries: 1 in hertz, 0 in rad/s, −1 of 2π. */
export interface ValueKind {
  readonly dimension: Dimension
  readonly cycles: Rational
}

/** A named value without time in its dimension counts nothing: the tag is dropped. */
export function settled({ dimension, cycles }: ValueKind): ValueKind {
  return { dimension, cycles: isTimeless({ dimension, cycles }) ? zero : cycles }
}

export function isTimeless({ dimension }: ValueKind): boolean {
  return exponentOf(dimension, 'time').numerator === 0
}

/** Values that may be added or compared; numbers without time differ in their tags for no reason. */
export function alike(a: ValueKind, b: ValueKind): boolean {
  return equalDimensions(a.dimension, b.dimension) && (isTimeless(a) || equal(a.cycles, b.cycles))
}

/** With its article: `a mass`. */
export function phraseOf(kind: ValueKind): string {
  return describeDimension(kind.dimension, settled(kind).cycles)
}
