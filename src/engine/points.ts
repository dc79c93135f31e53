import type { Anchor, Points } from '../model/points.js'

/** A point measured from an anchor, or an absolute frequency (anchor −1). */
export interface Point {
  readonly anchor: number
  /** In Hz. */
  readonly offset: number
}

/** Points ascending in frequency from a list in any order, equal ones as often as they stand in it. */
export function makePoints(anchors: readonly Anchor[], list: readonly Point[]): Points {
  const frequencyOf = ({ anchor, offset }: Point): number => (anchor < 0 ? offset : anchors[anchor].frequency + offset)
  const sorted = [...list].sort(
    (a, b) => frequencyOf(a) - frequencyOf(b) || (a.anchor === b.anchor ? a.offset - b.offset : 0),
  )
  return {
    anchors,
    frequency: Float64Array.from(sorted, frequencyOf),
    anchor: Int32Array.from(sorted, p => p.anchor),
    offset: Float64Array.from(sorted, p => p.offset),
  }
}

/** Absolute frequencies in Hz as points, in the order given. */
export function absolutePoints(frequencies: ArrayLike<number>): Points {
  const frequency = Float64Array.from(frequencies)
  return { anchors: [], frequency, anchor: new Int32Array(frequency.length).fill(-1), offset: frequency.slice() }
}
