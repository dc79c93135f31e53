import type { Points } from '../model/points.js'

/**
 * Distances of all points from one frequency in Hz, for an axis that reads zero there. The distance of a point is its
 * offset plus that of its anchor, so that points of a resonance keep their shape where the frequency is its own.
 */
export function offsetPoints({ anchors, anchor, offset, frequency }: Points, origin: number): Float64Array {
  if (origin === 0) return frequency
  const shifts = anchors.map(each => each.frequency - origin)
  return offset.map((value, k) => (anchor[k] < 0 ? value - origin : value + shifts[anchor[k]]))
}
