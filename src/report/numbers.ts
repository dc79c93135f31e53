import { formatQuantity, formatTex } from '../quantity/format.js'

const space = '\u00a0'

/** Three significant digits with the prefix that fits: `8.31 aN/√Hz`. */
export function densityText(asd: number, unit: string): string {
  return formatQuantity(asd, unit)
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

/** `4.1 dB`, with a true minus sign. */
export function decibelText(value: number): string {
  return `${value
    .toFixed(1)
    .replace(/^-0\.0$/, '0.0')
    .replace('-', '−')}${space}dB`
}

/** `4.1 dB above`, `0.3 dB below`, `at`: where something stands relative to a limit. */
export function marginText(value: number): string {
  const rounded = Math.round(value * 10) / 10
  if (rounded === 0) return 'at'
  return `${Math.abs(rounded).toFixed(1)}${space}dB ${rounded > 0 ? 'above' : 'below'}`
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
