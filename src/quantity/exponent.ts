import { rational, type Rational } from './rational.js'

/** Exponents that a person may write: bounded, so that products of many stay exact. */
const largestExponent = { numerator: 99, denominator: 12 } as const

/** Exact value of a written exponent (`0.5`, `1` over `2`); null where it is out of bounds. */
export function readExponent(sign: string, over: string, under: string): Rational | null {
  const [whole, decimals = ''] = over.split('.')
  const [underWhole, underDecimals = ''] = under.split('.')
  if (over.length > 8 || under.length > 8) return null
  const numerator = Number(whole + decimals) * 10 ** underDecimals.length
  const denominator = Number(underWhole + underDecimals) * 10 ** decimals.length
  if (denominator === 0) return null
  const exponent = rational(sign === '-' ? -numerator : numerator, denominator)
  const inside =
    Math.abs(exponent.numerator) <= largestExponent.numerator && exponent.denominator <= largestExponent.denominator
  return inside ? exponent : null
}
