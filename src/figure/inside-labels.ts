import type { Label } from './label.js'
import { Occupancy } from './occupancy.js'
import type { Box, Polyline, TextMark } from './scene.js'
import { ASCENT } from './type-sizes.js'

/** Distances of a label from its curve that are tried, in pixels. */
const DISTANCES = [4, 7, 11, 16, 22]
/** By so many pixels other curves must be farther from a label than its own. */
const CLEARER = 3
/** Distance of tried places along a curve. */
const STEP = 9

/** Around a label so much is searched for ink of other curves, and what each cell of it costs in pixels of distance. */
const NEIGHBOURHOOD = 14
const NEIGHBOUR_COST = 0.35
const MOST_NEIGHBOUR_COST = 40

/**
 * A place for a label next to its curve where no ink is, or null. Near the curve and far from other curves is better,
 * then near `preferred` (a horizontal position). The label's box is marked in the occupancy.
 */
export function placeInside(label: Label, occupancy: Occupancy, preferred: number, size: number): TextMark | null {
  const own = new Occupancy(occupancy.frame)
  own.addCurve(label.curve.pieces)
  // The total is drawn over all others and named in bold: a curve that hides behind it is no rival for its name.
  const isTotal = label.curve.ink.as === 'total'
  const rivals = (box: Box, distance: number) => !isTotal && others(box, distance + CLEARER, occupancy, own) > 0
  let best: { box: Box; cost: number } | null = null
  for (const piece of label.curve.pieces)
    for (const [x, y] of along(piece)) {
      for (const { box, distance } of boxesAt(x, y, label)) {
        if (!occupancy.isFree(inflated(box, 2)) || rivals(box, distance)) continue
        const cost = distance * 1.5 + Math.abs(x - preferred) * 0.05 + neighbourCost(box, occupancy, own)
        if (best === null || cost < best.cost) best = { box, cost }
      }
    }
  if (best === null) return null
  occupancy.addBox(inflated(best.box, 2))
  const { box } = best
  const { curve, lines } = label
  return {
    mark: 'text',
    ink: curve.ink,
    role: 'label',
    of: curve.id,
    x: box.left,
    y: box.top + ASCENT * size,
    anchor: 'start',
    lines,
    box,
  }
}

/** Ink of other curves within a distance of a box; theirs must be farther away than the label's own. */
function others(box: Box, distance: number, all: Occupancy, own: Occupancy): number {
  const around = inflated(box, distance)
  return all.count(around) - own.count(around)
}

function neighbourCost(box: Box, all: Occupancy, own: Occupancy): number {
  return Math.min(MOST_NEIGHBOUR_COST, others(box, NEIGHBOURHOOD, all, own) * NEIGHBOUR_COST)
}

function inflated(box: Box, by: number): Box {
  return { left: box.left - by, right: box.right + by, top: box.top - by, bottom: box.bottom + by }
}

/** Points every `STEP` pixels along a polyline. */
function* along(line: Polyline): Generator<[number, number]> {
  let next = 0
  for (let k = 0; k + 3 < line.length; k += 2) {
    const dx = line[k + 2] - line[k]
    const dy = line[k + 3] - line[k + 1]
    const length = Math.hypot(dx, dy)
    if (length === 0) continue
    for (; next <= length; next += STEP) yield [line[k] + (dx * next) / length, line[k + 1] + (dy * next) / length]
    next -= length
  }
}

/** Boxes above and below a point of the curve, and to its sides where the curve is steep. */
function* boxesAt(x: number, y: number, { width, height }: Label): Generator<{ box: Box; distance: number }> {
  for (const d of DISTANCES) {
    for (const left of [x - width / 2, x - width + 8, x - 8]) {
      yield { distance: d, box: { left, right: left + width, top: y - d - height, bottom: y - d } }
      yield { distance: d, box: { left, right: left + width, top: y + d, bottom: y + d + height } }
    }
    yield { distance: d, box: { left: x + d, right: x + d + width, top: y - height / 2, bottom: y + height / 2 } }
    yield { distance: d, box: { left: x - d - width, right: x - d, top: y - height / 2, bottom: y + height / 2 } }
  }
}
