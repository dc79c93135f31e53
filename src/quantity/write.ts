import { baseUnitText, dimensionOf, multiplyDimensions } from './dimension.js'
import { parseQuantity, type Quantity } from './parse.js'
import { toText, type Rational } from './rational.js'

/**
 * The shortest text in base units that `parseQuantity` reads as the same quantity to the last bit: value, uncertainty,
 * dimension, cycles and angle: `(3.1e-12 ± 2e-13) kg`, `2e-18 Hz^(-1/2) m kg s^-2`. A Celsius temperature stays one, and so
 * does a level over a carrier, whose meaning depends on its use.
 */
export function writeQuantity(quantity: Quantity): string {
  const { value, uncertainty, difference } = quantity
  if (quantity.level === 'dBc') return writeRatio(quantity)
  if (difference !== value) return withUnit(difference, uncertainty, '°C')
  return withUnit(value, uncertainty, unitOf(quantity))
}

function withUnit(value: number, uncertainty: number, unit: string): string {
  const number = uncertainty === 0 ? String(value) : `(${value} ± ${uncertainty})`
  return unit === '' ? number : `${number} ${unit}`
}

/** Hertz first, since a decibel in front of them would be a level per hertz. */
function unitOf({ dimension, cycles, angle }: Quantity): string {
  const hertz = dimensionOf({ time: cycles })
  const rest = baseUnitText(multiplyDimensions(dimension, hertz))
  return [powerOf('Hz', cycles), powerOf('rad', angle), rest === '1' ? '' : rest].filter(text => text !== '').join(' ')
}

function powerOf(symbol: string, power: Rational): string {
  if (power.numerator === 0) return ''
  const text = toText(power)
  if (text === '1') return symbol
  return `${symbol}^${power.denominator === 1 ? text : `(${text})`}`
}

/** The level is sought among the doubles around its logarithm, since 10^x need not meet a value at the nearest. */
function writeRatio(quantity: Quantity): string {
  const { value, uncertainty, unitText, unitFactor } = quantity
  const level = 10 * Math.log10(value / unitFactor)
  const spread = (10 * uncertainty) / (Math.LN10 * value)
  const found = nearby(level).find(each => parseQuantity(`${each} ${unitText}`).value === value) ?? level
  const read = (each: number): number => parseQuantity(withUnit(found, each, unitText)).uncertainty
  return withUnit(found, nearby(spread).find(each => read(each) === uncertainty) ?? spread, unitText)
}

/** The number itself and the doubles around it, the nearest first. */
function nearby(number: number): number[] {
  const step = Math.abs(number) * 2 ** -53
  return [0, ...Array.from({ length: 24 }, (_, index) => index + 1).flatMap(each => [each, -each])].map(
    each => number + each * step,
  )
}
