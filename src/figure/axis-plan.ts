import { tickStep } from 'd3-array'
import { fitPrefix, takesPrefix } from './prefix.js'
import { labelFactor, labelledValues, linearTicks, logTicks, type Tick } from './ticks.js'

/** What stands along an axis. */
export interface AxisPlan {
  readonly ticks: readonly Tick[]
  readonly title: string
}

/** A log axis; its unit takes the prefix that makes plain numbers of the labels, else the labels are powers of ten. */
export function logAxis(name: string, unit: string, domain: readonly [number, number], most: number): AxisPlan {
  const [low, high] = domain
  const values = labelledValues(low, high, most)
  const factor = values.length > 0 ? labelFactor(values, takesPrefix(unit)) : 0
  return {
    ticks: logTicks(low, high, most, factor),
    title: axisTitle(name, factor === 0 ? unit : fitPrefix(factor, unit).unit),
  }
}

/** A linear axis in the unit that fits its larger end. */
export function linearAxis(name: string, unit: string, domain: readonly [number, number], most: number): AxisPlan {
  const [low, high] = domain
  const { unit: fitted, factor } = fitPrefix(Math.max(Math.abs(low), Math.abs(high)), unit)
  return { ticks: linearTicks(low, high, most, factor), title: axisTitle(name, fitted) }
}

/** Digits of a tick label beyond which a narrow band is better read from an origin. */
const MOST_DIGITS = 6

/**
 * The value that a narrow linear axis is counted from, so that its labels stay short; 0 when they are short anyway.
 * It is `near` rounded to a few steps of the axis.
 */
export function axisOrigin(low: number, high: number, near: number): number {
  const step = tickStep(low, high, 5)
  if (Math.log10(high / step) < MOST_DIGITS) return 0
  const digits = Math.ceil(Math.log10(near / (high - low))) + 2
  return Number(near.toPrecision(Math.min(17, Math.max(1, digits))))
}

function axisTitle(name: string, unit: string): string {
  return unit === '' || unit === '1' ? name : `${name} (${unit})`
}
