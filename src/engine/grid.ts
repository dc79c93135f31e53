import type { Evaluation } from '../model/evaluation.js'
import type { Anchor, Points } from '../model/points.js'
import type { Band } from './anchors.js'
import { Arena } from './arena.js'
import type { Evaluator } from './evaluate.js'
import { makePoints, type Point } from './points.js'

/** Log–log interpolation between neighbouring points is at most this far off, relative in amplitude. */
export const gridTolerance = 1e-3

/** Curves below this share of the total power are only followed to the same fraction of this floor. */
export const gridFloor = 1e-6

/** An interval counts as straight when its probes are off by less than this part of the tolerance: they are not quite the worst places. */
const safety = 0.85

/** Where an interval is probed: its middle first, and where a curve with an inflection, which meets its chord near the middle, is farthest. */
const probed = [0.5, 0.21, 0.79] as const

/** A curve that falls by more than this over an interval heads for zero, and its relative error may be large beyond the last probe. */
const steepest = 4

/** Far more than any budget needs; a curve that never becomes straight stops here. */
const mostPoints = 50_000

/**
 * Points that the engine starts from, in steps of this size in asinh(offset/half width) around each anchor. An eighth of it is just
 * small enough for the wings of a resonance, where an amplitude goes as the offset and its chord over a step h is off by h²/8.
 */
const firstStep = 0.64

const firstPerDecade = 24

/** The anchor that a frequency is measured from: the nearest one; −1 without anchors. */
function nearestAnchor(anchors: readonly Anchor[], frequency: number): number {
  let best = -1
  for (const [i, anchor] of anchors.entries()) {
    const distance = Math.abs(anchor.frequency - frequency)
    if (best < 0 || distance < Math.abs(anchors[best].frequency - frequency)) best = i
  }
  return best
}

export function pointAt(anchors: readonly Anchor[], frequency: number): Point {
  const anchor = nearestAnchor(anchors, frequency)
  return { anchor, offset: anchor < 0 ? frequency : frequency - anchors[anchor].frequency }
}

/** A regular start: evenly in log f over the band, and in asinh steps from each anchor to half-way to its neighbours. */
export function firstPoints(anchors: readonly Anchor[], { low, high }: Band, extra: readonly number[]): Points {
  const list: Point[] = []
  const steps = Math.max(64, Math.ceil(firstPerDecade * Math.log10(high / low)))
  for (let i = 0; i <= steps; i++) {
    const frequency = i === steps ? high : low * (high / low) ** (i / steps)
    list.push(pointAt(anchors, frequency))
  }
  for (const frequency of extra) if (frequency > low && frequency < high) list.push(pointAt(anchors, frequency))
  for (const [anchor, { frequency, halfWidth }] of anchors.entries()) {
    list.push({ anchor, offset: 0 })
    const left = anchor === 0 ? low : (anchors[anchor - 1].frequency + frequency) / 2
    const right = anchor === anchors.length - 1 ? high : (anchors[anchor + 1].frequency + frequency) / 2
    for (const [sign, reach] of [
      [-1, frequency - left],
      [1, right - frequency],
    ] as const) {
      for (let u = firstStep; halfWidth * Math.sinh(u) < reach; u += firstStep) {
        list.push({ anchor, offset: sign * halfWidth * Math.sinh(u) })
      }
    }
  }
  return distinct(anchors, list)
}

/** Points ascending without repetition of a frequency. */
function distinct(anchors: readonly Anchor[], list: readonly Point[]): Points {
  const all = makePoints(anchors, list)
  const keep = [...all.frequency.keys()].filter(i => i === 0 || separation(all, i - 1, i) > 0)
  return makePoints(
    anchors,
    keep.map(i => ({ anchor: all.anchor[i], offset: all.offset[i] })),
  )
}

/** Distance in Hz between two points, exact where they share an anchor. */
function separation(points: Points, i: number, j: number): number {
  return points.anchor[i] === points.anchor[j]
    ? points.offset[j] - points.offset[i]
    : points.frequency[j] - points.frequency[i]
}

/** A part of the way through an interval: in asinh(offset/half width) next to an anchor, in log f without one. */
function within(points: Points, i: number, part: number): Point {
  const anchor = points.anchor[i]
  if (anchor >= 0 && points.anchor[i + 1] === anchor) {
    const { halfWidth } = points.anchors[anchor]
    const from = Math.asinh(points.offset[i] / halfWidth)
    const to = Math.asinh(points.offset[i + 1] / halfWidth)
    return { anchor, offset: halfWidth * Math.sinh(from + (to - from) * part) }
  }
  const [from, to] = [points.frequency[i], points.frequency[i + 1]]
  if (anchor < 0) return { anchor, offset: from * (to / from) ** part }
  return pointAt(points.anchors, from + (to - from) * part)
}

/** All curves that must be straight between points. */
function followed(evaluation: Evaluation): Float64Array[] {
  const { total, added, lines, limits } = evaluation
  return [total, added, ...lines.map(line => line.psd), ...limits.map(limit => limit.psd)]
}

/** log(f_probe/f_left)/log(f_right/f_left) from hertz differences, exact next to a resonance. */
function fraction(points: Points, i: number, probes: Points, k: number): number {
  const left = points.frequency[i]
  const anchor = points.anchor[i]
  const toProbe = probes.anchor[k] === anchor ? probes.offset[k] - points.offset[i] : probes.frequency[k] - left
  return Math.log1p(toProbe / left) / Math.log1p(separation(points, i, i + 1) / left)
}

/** What log–log interpolation makes of a curve; straight interpolation where a signed curve changes sign. */
function interpolate(left: number, right: number, part: number): number {
  if (left > 0 && right > 0) return left * (right / left) ** part
  if (left < 0 && right < 0) return left * (right / left) ** part
  return left + (right - left) * part
}

/**
 * Refines the points until log–log interpolation of the amplitude density of the total, the lines and the limits is within
 * `gridTolerance`, and of curves below `gridFloor` of the total within that part of the floor. Intervals that fail at their
 * middle or beside it are halved, a generation at a time.
 */
export function refine(evaluator: Evaluator, start: Points): Points {
  const arenas = probed.map(() => new Arena())
  let points = start
  let curves = followed(evaluator.at(points))
  let open = [...points.frequency.keys()].slice(0, -1)
  while (open.length > 0 && points.frequency.length < mostPoints) {
    const probe = (intervals: readonly number[], p: number): Probes => {
      const at = probesOf(points, intervals, probed[p])
      return { at, there: followed(evaluator.at(at, arenas[p])) }
    }
    const isBent = (probes: Probes) => (i: number, k: number) => !straight({ points, curves, i }, probes, k)
    const middles = probe(open, 0)
    const bent = new Set(open.filter(isBent(middles)))
    // Beside the middle only those are probed that the middle leaves in doubt.
    for (let p = 1; p < probed.length; p++) {
      const rest = open.filter(i => !bent.has(i))
      if (rest.length > 0) for (const i of rest.filter(isBent(probe(rest, p)))) bent.add(i)
    }
    if (bent.size === 0) break
    const grown = insert({ points, curves, open, bent }, middles)
    points = grown.points
    curves = grown.curves
    open = grown.open
  }
  return points
}

/** One point in each of some intervals, with the curves there. */
interface Probes {
  readonly at: Points
  readonly there: readonly Float64Array[]
}

/** A point in each interval, in the order of the intervals, which is that of frequency. */
function probesOf(points: Points, open: readonly number[], part: number): Points {
  const list = open.map(i => within(points, i, part))
  const frequencyOf = ({ anchor, offset }: Point): number =>
    anchor < 0 ? offset : points.anchors[anchor].frequency + offset
  return {
    anchors: points.anchors,
    frequency: Float64Array.from(list, frequencyOf),
    anchor: Int32Array.from(list, p => p.anchor),
    offset: Float64Array.from(list, p => p.offset),
  }
}

function straight(
  { points, curves, i }: { points: Points; curves: readonly Float64Array[]; i: number },
  { at, there }: Probes,
  k: number,
): boolean {
  // Neighbours that double precision cannot halve are as close as can be.
  if (separation(points, i, i + 1) <= 4e-16 * points.frequency[i]) return true
  const part = fraction(points, i, at, k)
  if (!(part > 0 && part < 1)) return true
  const floor = gridFloor * there[0][k]
  for (let c = 0; c < curves.length; c++) {
    if (!straightCurve(curves[c][i], curves[c][i + 1], there[c][k], { part, floor })) return false
  }
  return true
}

function straightCurve(
  left: number,
  right: number,
  actual: number,
  { part, floor }: { part: number; floor: number },
): boolean {
  const crosses = left * right < 0
  const [a, b] = [Math.abs(left), Math.abs(right)]
  if (!crosses && Math.max(a, b) > steepest * Math.max(Math.min(a, b), floor)) return false
  // Where a curve passes zero its relative error is largest there and not at the probe: all of the interval is held to the floor.
  const scale = crosses ? floor : Math.max(Math.abs(actual), floor)
  return Math.abs(interpolate(left, right, part) - actual) <= 2 * gridTolerance * safety * scale
}

/** Puts the middles of bent intervals among the points; both halves are open for the next generation. */
function insert(
  {
    points,
    curves,
    open,
    bent,
  }: { points: Points; curves: readonly Float64Array[]; open: readonly number[]; bent: ReadonlySet<number> },
  { at: middles, there }: Probes,
): { points: Points; curves: Float64Array[]; open: number[] } {
  const size = points.frequency.length + bent.size
  const next = {
    anchors: points.anchors,
    frequency: new Float64Array(size),
    anchor: new Int32Array(size),
    offset: new Float64Array(size),
  }
  const grown = curves.map(() => new Float64Array(size))
  const place = new Map(open.map((i, k) => [i, k]))
  const halves: number[] = []
  let at = 0
  const put = (from: Points, values: readonly Float64Array[], index: number): void => {
    next.frequency[at] = from.frequency[index]
    next.anchor[at] = from.anchor[index]
    next.offset[at] = from.offset[index]
    for (let c = 0; c < values.length; c++) grown[c][at] = values[c][index]
    at++
  }
  for (let i = 0; i < points.frequency.length; i++) {
    put(points, curves, i)
    if (bent.has(i)) {
      halves.push(at - 1, at)
      put(middles, there, place.get(i)!)
    }
  }
  return { points: next, curves: grown, open: halves }
}
