import { bisectCenter, quantileSorted } from 'd3-array'
import type { FigureInput } from './input.js'
import { indicesBetween } from './indices-between.js'
import { offsetPoints } from './offset-points.js'

/** The total's least value over this is the lowest amplitude shown, however small the contributions are. */
const BELOW_TOTAL = 60
/** Free space above and below, as a part of the decades shown and at least as a factor. */
const PAD_DECADES = 0.05
const PAD_FACTOR = 1.35
/** No axis is shorter than this factor, nor longer than that one (a zero of the response sends the total to infinity). */
const SHORTEST = 30
const LONGEST = 1e14
/** Curves are judged at so many even steps along the axis, because points crowd at resonances. */
const COLUMNS = 200
/** Of these columns a limit may leave the frame through the bottom in this part, a contribution in half. */
const LIMIT_PART = 0.02
const LINE_PART = 0.5
/** A peak of the total that is narrower than this part of the axis is cut this far above the rest, or it would press the rest flat. */
const PEAK_PART = 0.02
const PEAK_ABOVE = 100

/** What a figure shows along its horizontal axis. */
export interface Shown {
  readonly x: Float64Array
  readonly kind: 'linear' | 'log'
  readonly domain: readonly [number, number]
  /** Frequency at which the axis reads zero, in Hz. */
  readonly origin: number
}

/**
 * Amplitudes from the lowest to the highest that a figure shows: all of the total, and of the standard quantum limit and
 * the contributions what a reader would miss, down to a factor 60 below the total's least value.
 */
export function amplitudeDomain(input: FigureInput, shown: Shown): [number, number] {
  const total = extent(input.total, shown)
  if (total === null) return [0.1, 10]
  const columns = columnIndices(shown)
  const variants = variantExtents(input, shown)
  const lowest = Math.min(total[0], ...variants.map(variant => variant.least))
  const lows = [
    ...input.limits.filter(limit => limit.prominent).map(limit => quantile(limit.psd, columns, LIMIT_PART)),
    ...input.lines.map(line => quantile(line.psd, columns, LINE_PART)),
  ]
  const least = Math.max(Math.min(lowest, ...lows), lowest / BELOW_TOTAL)
  const highest = Math.min(total[1], crestOf(input.total, columns))
  const most = Math.min(Math.max(highest, ...variants.map(variant => variant.most)), least * LONGEST)
  const pad = Math.max(PAD_FACTOR, (most / least) ** PAD_DECADES)
  // A name may stand above the total.
  return widened(least / pad, most * pad * pad)
}

/** As high as a curve is followed. */
function crestOf(psd: Float64Array, columns: readonly number[]): number {
  return quantile(psd, columns, 1 - PEAK_PART) * PEAK_ABOVE
}

/** Totals of the variants are shown like the total itself, each on its own points. */
function variantExtents({ variants }: FigureInput, shown: Shown): { least: number; most: number }[] {
  return variants.flatMap(({ points, total }) => {
    const own = { ...shown, x: offsetPoints(points, shown.origin) }
    const range = extent(total, own)
    if (range === null) return []
    return [{ least: range[0], most: Math.min(range[1], crestOf(total, columnIndices(own))) }]
  })
}

function widened(low: number, high: number): [number, number] {
  const missing = Math.sqrt(Math.max(1, SHORTEST / (high / low)))
  return [low / missing, high * missing]
}

/** Least and greatest amplitude inside the window; null where it is nowhere above zero. */
function extent(psd: Float64Array, { x, domain }: Shown): [number, number] | null {
  let least = Infinity
  let most = 0
  for (const k of indicesBetween(x, domain[0], domain[1])) {
    if (!(psd[k] > 0) || !Number.isFinite(psd[k])) continue
    least = Math.min(least, psd[k])
    most = Math.max(most, psd[k])
  }
  return most > 0 ? [Math.sqrt(least), Math.sqrt(most)] : null
}

/** Points nearest to even steps of the axis. */
function columnIndices({ x, kind, domain: [low, high] }: Shown): number[] {
  return Array.from({ length: COLUMNS }, (_, n) => {
    const t = (n + 0.5) / COLUMNS
    return bisectCenter(x, kind === 'log' ? low * (high / low) ** t : low + t * (high - low))
  })
}

/** Amplitude below which a curve is in a part of the columns; infinite for a curve that is nowhere drawn. */
function quantile(psd: Float64Array, columns: readonly number[], part: number): number {
  const drawn = columns.map(k => Math.sqrt(Math.abs(psd[k]))).filter(v => v > 0 && Number.isFinite(v))
  return (
    quantileSorted(
      drawn.sort((a, b) => a - b),
      part,
    ) ?? Infinity
  )
}
