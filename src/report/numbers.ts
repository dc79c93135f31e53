import { fitPrefix, LEAST_TOLD, withUncertainty } from '../figure/prefix.js'
import type { Spread } from '../model/assessment.js'
import { plainDecimal, toSignificant } from '../quantity/digits.js'
import { formatQuantity, formatTex } from '../quantity/format.js'

const space = '\u00a0'

/**
 * Three significant digits with the prefix that fits, `8.31 aN/√Hz`; with a standard uncertainty the digits that it
 * leaves honest, `8.3(2) aN/√Hz`.
 */
export function densityText(asd: number, unit: string, uncertainty = 0): string {
  return withUncertainty(asd, unit, uncertainty)
}

/** `0.15 aN/√Hz statistical, 0.14 aN/√Hz systematic`, in the unit of the value; empty where it has not both. */
export function partsText(value: number, unit: string, { statistical, systematic }: Spread): string {
  const told = (part: number): boolean => part > 0 && part >= LEAST_TOLD * Math.abs(value)
  if (!told(statistical) || !told(systematic)) return ''
  return `${besideText(statistical, value, unit)} statistical, ${besideText(systematic, value, unit)} systematic`
}

/** An uncertainty in two digits and with the prefix that its value has: `0.15 aN/√Hz` beside 9.45 aN/√Hz. */
export function besideText(uncertainty: number, value: number, unit: string): string {
  if (unit === '' || unit === 'dB') return withUnit(plainText(uncertainty), unit)
  const fitted = fitPrefix(value, unit)
  return withUnit(plainText(uncertainty / fitted.factor), fitted.unit)
}

/** Two significant digits without an exponent where that is short. */
function plainText(value: number): string {
  if (!(value > 0)) return '0'
  return value < 1e-4 || value >= 1e4
    ? formatQuantity(value, '', { digits: 2 })
    : plainDecimal(toSignificant(value, 2), 0)
}

function withUnit(number: string, unit: string): string {
  return unit === '' ? number : `${number}${space}${unit}`
}

/** `1.2435 MHz`: at most so many significant digits, without trailing zeros. */
export function frequencyText(hertz: number, digits = 6): string {
  return trimZeros(formatQuantity(hertz, 'Hz', { digits }))
}

export function frequencyTex(hertz: number, digits = 6): string {
  return trimZeros(formatTex(hertz, 'Hz', { digits }))
}

/** Digits that a frequency deserves when it is known to a hundredth or so of a width in Hz: three to twelve. */
export function frequencyDigits(hertz: number, width: number): number {
  if (!(width > 0)) return 12
  return Math.min(12, Math.max(3, Math.ceil(Math.log10(hertz / width)) + 2))
}

/** A plain number; powers of ten where it is very small or large: `6.87 × 10⁴`. */
export function numberText(value: number, digits = 4): string {
  return trimZeros(formatQuantity(value, '', { digits }))
}

export function numberTex(value: number, digits = 4): string {
  return trimZeros(formatTex(value, '', { digits }))
}

/** Zeros at the end of the first decimal fraction say nothing about a number that carries no uncertainty. */
function trimZeros(text: string): string {
  return text.replace(/\.(\d*?)0+(?=\D|$)/, (_, kept: string) => (kept === '' ? '' : `.${kept}`))
}

/** `62 %`, `0.4 %`, `< 0.01 %`; a negative share keeps its sign. */
export function percentText(share: number): string {
  const percent = Math.abs(share) * 100
  if (percent === 0) return `0${space}%`
  if (percent < 0.01) return `${share < 0 ? '> −' : '< '}0.01${space}%`
  const text = percent >= 99.95 ? percent.toFixed(0) : percent >= 10 ? percent.toFixed(1) : percent.toPrecision(2)
  return `${share < 0 ? '−' : ''}${text}${space}%`
}

/** Digits that tell two frequencies apart to a hundredth or so of their distance. */
export function rangeDigits(from: number, to: number): number {
  return frequencyDigits(to, to - from)
}

/** `1.2000 to 1.2413 MHz`, in one unit and with equal decimals where both ends share the unit. */
export function rangeText(from: number, to: number, digits = rangeDigits(from, to)): string {
  const [low, high] = [frequencyText(from, digits), frequencyText(to, digits)]
  const [lowNumber, lowUnit] = low.split(space)
  const [highNumber, highUnit] = high.split(space)
  const between = `${space}to${space}`
  if (lowUnit !== highUnit) return `${low}${between}${high}`
  const decimals = Math.max(decimalsOf(lowNumber), decimalsOf(highNumber))
  return `${padded(lowNumber, decimals)}${between}${padded(highNumber, decimals)}${space}${highUnit}`
}

function decimalsOf(number: string): number {
  return (number.split('.')[1] ?? '').length
}

function padded(number: string, decimals: number): string {
  const missing = decimals - decimalsOf(number)
  return missing === 0 ? number : `${number}${number.includes('.') ? '' : '.'}${'0'.repeat(missing)}`
}
