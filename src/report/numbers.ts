import { withUnit } from '../figure/prefix.js'

/** Three significant digits with the prefix that fits: `8.31 aN/√Hz`. */
export function densityText(asd: number, unit: string): string {
  return withUnit(asd, unit, 3)
}

/** `1.2435 MHz`: up to seven significant digits, without trailing zeros. */
export function frequencyText(hertz: number, significant = 6): string {
  return withUnit(hertz, 'Hz', significant)
    .replace(/(\.\d*?)0+ /, '$1 ')
    .replace('. ', ' ')
}

/** `4.1 dB`, with a true minus sign. */
export function decibelText(value: number): string {
  return `${value
    .toFixed(1)
    .replace(/^-0\.0$/, '0.0')
    .replace('-', '−')} dB`
}

/** `4.1 dB above`, `0.3 dB below`, `at`: where something stands relative to a limit. */
export function marginText(value: number): string {
  const rounded = Math.round(value * 10) / 10
  if (rounded === 0) return 'at'
  return `${Math.abs(rounded).toFixed(1)} dB ${rounded > 0 ? 'above' : 'below'}`
}

/** `62 %`, `0.4 %`, `< 0.01 %`; a negative share keeps its sign. */
export function percentText(share: number): string {
  const percent = Math.abs(share) * 100
  if (percent === 0) return '0 %'
  if (percent < 0.01) return share < 0 ? '> −0.01 %' : '< 0.01 %'
  const text = percent >= 99.95 ? percent.toFixed(0) : percent >= 10 ? percent.toFixed(1) : percent.toPrecision(2)
  return `${share < 0 ? '−' : ''}${text} %`
}

/** A plain number of at most four significant digits; powers of ten outside 10⁻³ … 10⁵. */
export function numberText(value: number, significant = 4): string {
  return withUnit(value, '', significant)
    .trim()
    .replace(/(\.\d*?)0+($| )/, '$1$2')
    .replace(/\.($| )/, '$1')
}

/** `1.20 MHz to 1.30 MHz`, in one unit where both ends share it. */
export function rangeText(from: number, to: number): string {
  const [low, high] = [frequencyText(from, 5), frequencyText(to, 5)]
  const [lowNumber, lowUnit] = low.split(' ')
  return lowUnit === high.split(' ')[1] ? `${lowNumber} – ${high}` : `${low} – ${high}`
}

/** A quantity's printed form as TeX: `3.1\,\mathrm{ng}`, `2\,\mathrm{aN}/\sqrt{\mathrm{Hz}}`, `1.2\times10^{5}`. */
export function texOf(text: string): string {
  const [number, ...unit] = text.split(' × ').length > 1 ? splitPower(text) : text.split(' ')
  return `${texNumber(number)}${unit.length > 0 ? `\\,${texUnit(unit.join(' '))}` : ''}`
}

function splitPower(text: string): string[] {
  const [, number, unit] = /^(\S+ × 10\S+)(?: (.*))?$/.exec(text) ?? [text, text]
  return unit === undefined ? [number] : [number, unit]
}

function texNumber(number: string): string {
  const [mantissa, power] = number.replace('−', '-').split(' × 10')
  return power === undefined ? mantissa : `${mantissa}\\times10^{${plainDigits(power)}}`
}

function plainDigits(superscript: string): string {
  return [...superscript].map(c => (c === '⁻' ? '-' : String('⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(c)))).join('')
}

/** Products, quotients, powers and roots of unit symbols. */
export function texUnit(unit: string): string {
  return unit
    .replace(/√([A-Za-z]+)/g, (_, symbol: string) => `\\sqrt{\\mathrm{${symbol}}}`)
    .replace(/(?<![\\A-Za-z{])([µΩ°%]?[A-Za-zΩ]+|[°%])(?![A-Za-z]*[{}])/g, '\\mathrm{$1}')
    .replace(/[⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+/g, power => `^{${plainDigits(power)}}`)
    .replace(/µ/g, '\\mu ')
    .replace(/·/g, '\\cdot ')
    .replace(/Ω/g, '\\Omega ')
    .replace(/°/g, '^\\circ ')
    .replace(/%/g, '\\%')
}
