import { tickStep, ticks } from 'd3-array'

export interface Tick {
  readonly value: number
  /** Null for a minor tick. */
  readonly text: string | null
  /** A superscript behind the text. */
  readonly raised?: string
}

/**
 * Ticks of a log axis. A label stands at every decade, at every second (third …) one when more than `most` would stand,
 * at 1, 2 and 5 where fewer than three decades fall into the axis, and at even steps where fewer than three of those do.
 *
 * @param factor unprefixed units in one labelled unit; 0 labels by powers of ten
 */
export function logTicks(low: number, high: number, most: number, factor: number): Tick[] {
  const labelled = labelledValues(low, high, most)
  const isLabelled = new Set(labelled)
  const minors = minorValues(low, high, most).filter(value => !isLabelled.has(value))
  const text = (value: number) => (factor === 0 ? powerText(value) : { text: scaledText(value, factor) })
  return [...labelled.map(value => ({ value, ...text(value) })), ...minors.map(value => ({ value, text: null }))].sort(
    (a, b) => a.value - b.value,
  )
}

/** The values that are labelled on a log axis, ascending. */
export function labelledValues(low: number, high: number, most: number): number[] {
  const decades = multiples(low, high, [1])
  if (decades.length >= 3) return everyNth(decades, Math.ceil(decades.length / most))
  const few = multiples(low, high, [1, 2, 5])
  if (few.length >= 3 && few.length <= most) return few
  return few.length > most ? decades : ticks(low, high, Math.min(5, most)).filter(v => v > 0)
}

function everyNth(decades: readonly number[], stride: number): number[] {
  return decades.filter(value => Math.round(Math.log10(value)) % stride === 0)
}

function minorValues(low: number, high: number, most: number): number[] {
  const decades = Math.log10(high / low)
  return decades > most ? multiples(low, high, [1]) : multiples(low, high, [1, 2, 3, 4, 5, 6, 7, 8, 9])
}

/** m · 10ᵏ within the axis, ends included up to rounding. */
function multiples(low: number, high: number, mantissas: readonly number[]): number[] {
  const values: number[] = []
  for (let power = Math.floor(Math.log10(low)) - 1; power <= Math.log10(high) + 1; power++)
    for (const m of mantissas) {
      const value = Number(`${m}e${power}`)
      if (value >= low * (1 - 1e-9) && value <= high * (1 + 1e-9)) values.push(value)
    }
  return values
}

/** Decimal logarithm of the label that is best to read in the middle of an axis. */
const PREFERRED_MIDDLE = 0.7

/**
 * Number of unprefixed units in the labelled one: of the prefixes that keep all labels within 0.01 and 10 000 the one that
 * puts their geometric middle nearest to about 5; 0 if there is none.
 */
export function labelFactor(values: readonly number[], takesPrefix: boolean): number {
  const least = Math.floor(Math.log10(values[0]) + 1e-9)
  const greatest = Math.floor(Math.log10(values[values.length - 1]) + 1e-9)
  const first = Math.floor(least / 3) * 3
  const fitting = (takesPrefix ? [first + 3, first] : [0]).filter(
    power => least - power >= -2 && greatest - power <= 3 && Math.abs(power) <= 30,
  )
  const middle = Math.log10(values[0] * values[values.length - 1]) / 2
  const distance = (power: number) => Math.abs(middle - power - PREFERRED_MIDDLE)
  const nearest = fitting.reduce<number | null>((a, b) => (a === null || distance(b) < distance(a) ? b : a), null)
  return nearest === null ? 0 : Number(`1e${nearest}`)
}

function scaledText(value: number, factor: number): string {
  return String(Number((value / factor).toPrecision(6))).replace('-', '−')
}

function powerText(value: number): { text: string; raised: string } {
  const [mantissa, power] = Number(value.toPrecision(6)).toExponential().split('e')
  return { text: mantissa === '1' ? '10' : `${mantissa}×10`, raised: String(Number(power)).replace('-', '−') }
}

/** Ticks of a linear axis at 1, 2 or 5 times a power of ten, with minor ticks between. */
export function linearTicks(low: number, high: number, most: number, factor: number): Tick[] {
  const step = tickStep(low / factor, high / factor, most)
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9))
  const text = (value: number) => (Math.abs(value) < step / 1e6 ? 0 : value).toFixed(decimals).replace('-', '−')
  const majors = ticks(low / factor, high / factor, most).map(v => ({ value: v * factor, text: text(v) }))
  const near = (value: number) => majors.some(major => Math.abs(major.value - value) < (step * factor) / 1e3)
  const minors = ticks(low / factor, high / factor, most * 5)
    .map(v => ({ value: v * factor, text: null }))
    .filter(tick => !near(tick.value))
  return [...majors, ...minors].sort((a, b) => a.value - b.value)
}
