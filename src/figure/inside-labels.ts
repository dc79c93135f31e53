import type { Label } from './label.js'
import type { Occupancy } from './occupancy.js'
import type { Box, Polyline, TextMark } from './scene.js'
import { ASCENT } from './type-sizes.js'

/** Distances of a label from its curve that are tried, in pixels. */
const DISTANCES = [4, 7, 11, 16, 22]
/** Distance of tried places along a curve. */
const STEP = 9

/**
 * A place for a label next to its curve where no ink is, or null. Near the curve is better, then near `preferred`
 * (a horizontal position). The label's box is marked in the occupancy.
 */
export function placeInside(label: Label, occupancy: Occupancy, preferred: number, size: number): TextMark | null {
  let best: { box: Box; cost: number } | null = null
  for (const piece of label.curve.pieces)
    for (const [x, y] of along(piece)) {
      for (const box of boxesAt(x, y, label)) {
        const cost = distanceCost(box, y) + Math.abs(x - preferred) * 0.03
        if ((best === null || cost < best.cost) && occupancy.isFree(inflated(box))) best = { box, cost }
      }
    }
  if (best === null) return null
  occupancy.addBox(inflated(best.box))
  const { box } = best
  const { curve, lines } = label
  return { mark: 'text', ink: curve.ink, role: 'label', of: curve.id, x: box.left, y: box.top + ASCENT * size, anchor: 'start', lines, box }
}

function distanceCost(box: Box, y: number): number {
  return Math.max(box.top - y, y - box.bottom, 0) * 1.5
}

function inflated(box: Box): Box {
  return { left: box.left - 2, right: box.right + 2, top: box.top - 1, bottom: box.bottom + 1 }
}

/** Points every `STEP` pixels along a polyline. */
function* along(line: Polyline): Generator<[number, number]> {
  let left = 0
  for (let k = 0; k + 3 < line.length; k += 2) {
    const dx = line[k + 2] - line[k]
    const dy = line[k + 3] - line[k + 1]
    const length = Math.hypot(dx, dy)
    for (; left <= length && length > 0; left += STEP) yield [line[k] + (dx * left) / length, line[k + 1] + (dy * left) / length]
    left -= length
  }
}

/** Boxes above and below a point of the curve, and to its sides where the curve is steep. */
function* boxesAt(x: number, y: number, { width, height }: Label): Generator<Box> {
  for (const d of DISTANCES) {
    for (const left of [x - width / 2, x - width + 8, x - 8]) {
      yield { left, right: left + width, top: y - d - height, bottom: y - d }
      yield { left, right: left + width, top: y + d, bottom: y + d + height }
    }
    yield { left: x + d, right: x + d + width, top: y - height / 2, bottom: y + height / 2 }
    yield { left: x - d - width, right: x - d, top: y - height / 2, bottom: y + height / 2 }
  }
}
