import type { FigureInput } from './input.js'

/** The total's least value over this is the lowest amplitude shown, however small the contributions are. */
const BELOW_TOTAL = 60
/** Free space above and below, as a part of the decades shown and at least as a factor. */
const PAD_DECADES = 0.05
const PAD_FACTOR = 1.35
/** No axis is shorter than this factor, nor longer than that one (a zero of the response sends the total to infinity). */
const SHORTEST = 30
const LONGEST = 1e14

/**
 * Amplitudes from the lowest to the highest that a figure of the window shows: all of the total, and of the standard
 * quantum limit and the contributions what lies within a factor 60 below the total's least value.
 *
 * @param inWindow tells which points of the evaluation are shown
 */
export function amplitudeDomain(input: FigureInput, inWindow: (k: number) => boolean): [number, number] {
  const total = extent(input.total, inWindow)
  if (total === null) return [0.1, 10]
  const others = [...input.limits.filter(limit => limit.prominent), ...input.lines]
  const lows = others.map(curve => middle(curve.psd, inWindow)).filter(v => v !== null)
  const low = Math.max(Math.min(total[0], ...lows), total[0] / BELOW_TOTAL)
  const high = Math.min(total[1], low * LONGEST)
  const pad = Math.max(PAD_FACTOR, (high / low) ** PAD_DECADES)
  return widened(low / pad, high * pad)
}

function widened(low: number, high: number): [number, number] {
  const missing = Math.sqrt(Math.max(1, SHORTEST / (high / low)))
  return [low / missing, high * missing]
}

/** Least and greatest amplitude. */
function extent(psd: Float64Array, inWindow: (k: number) => boolean): [number, number] | null {
  let low = Infinity
  let high = 0
  for (let k = 0; k < psd.length; k++) {
    if (!inWindow(k) || !(psd[k] > 0) || !Number.isFinite(psd[k])) continue
    low = Math.min(low, psd[k])
    high = Math.max(high, psd[k])
  }
  return high > 0 ? [Math.sqrt(low), Math.sqrt(high)] : null
}

/** Geometric middle of a curve's extent. */
function middle(psd: Float64Array, inWindow: (k: number) => boolean): number | null {
  const ends = extent(psd, inWindow)
  return ends === null ? null : Math.sqrt(ends[0] * ends[1])
}
