/** SI prefixes from quecto to quetta (SI brochure, 9th edition, as amended 2022). */
const PREFIXES = [
  'q',
  'r',
  'y',
  'z',
  'a',
  'f',
  'p',
  'n',
  'µ',
  'm',
  '',
  'k',
  'M',
  'G',
  'T',
  'P',
  'E',
  'Z',
  'Y',
  'R',
  'Q',
]
const NONE = PREFIXES.indexOf('')

/** A unit with a prefix and the number of unprefixed units in it: `aN/√Hz`, 1e-18. */
export interface Prefixed {
  readonly unit: string
  readonly factor: number
}

/** Units whose first symbol takes a prefix; `1/√Hz` and words such as `quanta` do not. */
const TAKES_PREFIX = /^(N|m|Hz|rad|g|W|V|A)(?![a-z])/

export function takesPrefix(unit: string): boolean {
  return TAKES_PREFIX.test(unit)
}

/** The unit with the prefix that puts `value` between 1 and 1000; the unit itself where none fits. */
export function fitPrefix(value: number, unit: string): Prefixed {
  if (!(Math.abs(value) > 0) || !Number.isFinite(value) || !takesPrefix(unit)) return { unit, factor: 1 }
  const step = Math.floor(Math.log10(Math.abs(value)) / 3 + 1e-9)
  const prefix = PREFIXES[NONE + step]
  // Powers of ten are exact as literals but not as 10 ** n in every engine.
  return prefix === undefined ? { unit, factor: 1 } : { unit: prefix + unit, factor: Number(`1e${3 * step}`) }
}

/** Digits without an exponent, three or so significant ones, a true minus sign: `8.31`, `0.0204`, `−3.1`. */
export function plainNumber(value: number, significant = 3): string {
  const text = value === 0 ? '0' : trimmed(value, significant)
  return text.replace('-', '−')
}

function trimmed(value: number, significant: number): string {
  const decimals = Math.min(20, Math.max(0, significant - 1 - Math.floor(Math.log10(Math.abs(value)))))
  return value.toFixed(decimals)
}

/** `8.31 aN/√Hz`; powers of ten where no prefix fits: `2.4 × 10⁻²³ 1/√Hz`. */
export function withUnit(value: number, unit: string, significant = 3): string {
  const { unit: fitted, factor } = fitPrefix(value, unit)
  const scaled = value / factor
  const size = Math.abs(scaled)
  if (scaled === 0 || (size >= 0.01 && size < 1e4)) return `${plainNumber(scaled, significant)} ${fitted}`
  const [mantissa, power] = scaled.toExponential(significant - 1).split('e')
  return `${mantissa.replace('-', '−')} × 10${superscript(Number(power))} ${fitted}`
}

/** `⁻¹⁸`. */
export function superscript(power: number): string {
  return [...String(power)].map(c => (c === '-' ? '⁻' : '⁰¹²³⁴⁵⁶⁷⁸⁹'[Number(c)])).join('')
}

/** A frequency as it is spoken of: no more digits than it needs, at most ten. */
export function frequencyName(frequency: number): string {
  const { unit, factor } = fitPrefix(frequency, 'Hz')
  return `${String(Number((frequency / factor).toPrecision(10))).replace('-', '−')} ${unit}`
}
