import { formatQuantity } from '../quantity/format.js'

const NO_BREAK = '\u00a0'

/** A unit with a prefix and the number of unprefixed units in it: `aN/√Hz`, 1e-18. */
export interface Prefixed {
  readonly unit: string
  readonly factor: number
}

/** False for units without a symbol that takes a prefix, such as `1/√Hz`. */
export function takesPrefix(unit: string): boolean {
  return unitOf(1e-18, unit) !== null
}

/** The unit with the prefix that puts `value` between 1 and 1000; the unit itself where none fits. */
export function fitPrefix(value: number, unit: string): Prefixed {
  if (!(Math.abs(value) > 0) || !Number.isFinite(value)) return { unit, factor: 1 }
  const power = 3 * Math.floor(Math.log10(Math.abs(value)) / 3 + 1e-9)
  const factor = Number(`1e${power}`)
  const fitted = unitOf(factor, unit)
  return fitted === null ? { unit, factor: 1 } : { unit: fitted, factor }
}

/** The unit that a report would give to a value of 1, 1000 …; null where it would write a power of ten. */
function unitOf(factor: number, unit: string): string | null {
  const [number, ...rest] = formatQuantity(factor, unit, { digits: 1 }).split(NO_BREAK)
  return number === '1' && !rest.includes('×') ? rest.join(NO_BREAK) : null
}

/** `8.31 aN/√Hz`, in words of a report. */
export function withUnit(value: number, unit: string, digits = 3): string {
  return formatQuantity(value, unit, { digits })
}

/** An uncertainty below this part of its value hides in the rounding to three digits, and would bring more of them for nothing. */
export const LEAST_TOLD = 5e-4

/** The same with a standard uncertainty where there is one: `8.3(2) aN/√Hz`. */
export function withUncertainty(value: number, unit: string, uncertainty: number): string {
  return formatQuantity(value, unit, { uncertainty: uncertainty >= LEAST_TOLD * Math.abs(value) ? uncertainty : 0 })
}

/** A frequency as it is spoken of: no more digits than it needs, at most ten. */
export function frequencyName(frequency: number): string {
  const { unit, factor } = fitPrefix(frequency, 'Hz')
  return `${String(Number((frequency / factor).toPrecision(10))).replace('-', '−')}${NO_BREAK}${unit}`
}
