/** An exact fraction in lowest terms with a positive denominator: the exponent of a unit. */
export interface Rational {
  readonly numerator: number
  readonly denominator: number
}

/** Throws a RangeError where the fraction leaves the integers that a double holds exactly. */
export function rational(numerator: number, denominator = 1): Rational {
  if (!Number.isSafeInteger(numerator) || !Number.isSafeInteger(denominator) || denominator === 0) {
    throw new RangeError(`${numerator}/${denominator} is no exact fraction`)
  }
  const divisor = greatestCommonDivisor(numerator, denominator) * Math.sign(denominator)
  // Adding zero turns −0 into 0, so that equal fractions are alike in every comparison.
  return { numerator: numerator / divisor + 0, denominator: denominator / divisor }
}

export const zero = rational(0)
export const one = rational(1)

export function add(a: Rational, b: Rational): Rational {
  return rational(a.numerator * b.denominator + b.numerator * a.denominator, a.denominator * b.denominator)
}

export function multiply(a: Rational, b: Rational): Rational {
  return rational(a.numerator * b.numerator, a.denominator * b.denominator)
}

export function negate(a: Rational): Rational {
  return rational(-a.numerator, a.denominator)
}

export function equal(a: Rational, b: Rational): boolean {
  return a.numerator === b.numerator && a.denominator === b.denominator
}

export function toNumber(a: Rational): number {
  return a.numerator / a.denominator
}

/** `2`, `-1/2`. */
export function toText(a: Rational): string {
  return a.denominator === 1 ? String(a.numerator) : `${a.numerator}/${a.denominator}`
}

function greatestCommonDivisor(a: number, b: number): number {
  let [large, small] = [Math.abs(a), Math.abs(b)]
  while (small !== 0) [large, small] = [small, large % small]
  return large
}
