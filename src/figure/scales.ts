import { scaleLinear, scaleLog } from 'd3-scale'

/** A mapping of values to pixels. */
export interface AxisScale {
  readonly kind: 'linear' | 'log'
  readonly low: number
  readonly high: number
  /** Finite for finite values (and, on a log axis, values above zero). */
  at(value: number): number
}

/** An axis from `low` to `high` on the pixels `from` to `to`; a log axis needs 0 < low < high. */
export function axisScale(
  kind: 'linear' | 'log',
  domain: readonly [number, number],
  range: readonly [number, number],
): AxisScale {
  const scale = kind === 'log' ? scaleLog(domain, range) : scaleLinear(domain, range)
  return { kind, low: domain[0], high: domain[1], at: value => scale(value) }
}

/** A band is drawn on a log axis when it spans more than this factor. */
const LOG_ABOVE = 3

export function frequencyKind(band: { readonly low: number; readonly high: number }): 'linear' | 'log' {
  return band.low > 0 && band.high / band.low > LOG_ABOVE ? 'log' : 'linear'
}
