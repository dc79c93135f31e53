import { add, equal, multiply, rational, toText, zero, type Rational } from './rational.js'

/** The seven base quantities of the SI, and the level in decibel, which adds where quantities multiply. */
export const baseQuantities = [
  'length',
  'mass',
  'time',
  'current',
  'temperature',
  'amount',
  'intensity',
  'level',
] as const

export type BaseQuantity = (typeof baseQuantities)[number]

/** One exact exponent for each of `baseQuantities`, in that order. */
export type Dimension = readonly Rational[]

const baseUnits = ['m', 'kg', 's', 'A', 'K', 'mol', 'cd', 'dB'] as const

/** `dimensionOf({ mass: 1, length: 1, time: -2 })` is that of a force. */
export function dimensionOf(exponents: { readonly [base in BaseQuantity]?: number | Rational }): Dimension {
  return baseQuantities.map(base => {
    const exponent = exponents[base] ?? 0
    return typeof exponent === 'number' ? rational(exponent) : exponent
  })
}

export const dimensionless: Dimension = dimensionOf({})

export function multiplyDimensions(a: Dimension, b: Dimension): Dimension {
  return a.map((exponent, index) => add(exponent, b[index]))
}

export function raiseDimension(a: Dimension, power: Rational): Dimension {
  return a.map(exponent => multiply(exponent, power))
}

export function equalDimensions(a: Dimension, b: Dimension): boolean {
  return a.every((exponent, index) => equal(exponent, b[index]))
}

export function isDimensionless(a: Dimension): boolean {
  return equalDimensions(a, dimensionless)
}

export function exponentOf(a: Dimension, base: BaseQuantity): Rational {
  return a[baseQuantities.indexOf(base)] ?? zero
}

/** In base units, as this project reads them back: `kg m s^-2`, `1`. */
export function baseUnitText(a: Dimension): string {
  const factors = a.flatMap((exponent, index) => {
    if (exponent.numerator === 0) return []
    const text = toText(exponent)
    if (text === '1') return [baseUnits[index]]
    return [`${baseUnits[index]}^${exponent.denominator === 1 ? text : `(${text})`}`]
  })
  return factors.length === 0 ? '1' : factors.join(' ')
}
