import type { Curve } from './curves.js'
import { makeLabel } from './label.js'
import type { Mark } from './scene.js'
import { ASCENT } from './type-sizes.js'

const SAMPLE = 20
const SPACE = 6
const BETWEEN = 14
const ROW = 1.55

/** Where rows may stand: from `left` to `right`, the first one's top at `top`. */
export interface KeyPlace {
  readonly left: number
  readonly right: number
  readonly top: number
}

/** Names of curves that found no room in the frame, in rows below it, each behind a sample of its stroke. */
export function keyRows(curves: readonly Curve[], place: KeyPlace, size: number): { marks: Mark[]; height: number } {
  const marks: Mark[] = []
  let x = place.left
  let row = 0
  for (const curve of curves) {
    const { lines, width, height } = makeLabel(curve, size, place.right - place.left - SAMPLE - SPACE, 1)
    if (x > place.left && x + SAMPLE + SPACE + width > place.right) {
      x = place.left
      row++
    }
    const top = place.top + row * size * ROW
    marks.push(...entry(curve, lines, { x, top, size }, { width, height }))
    x += SAMPLE + SPACE + width + BETWEEN
  }
  return { marks, height: curves.length === 0 ? 0 : (row + 1) * size * ROW }
}

function entry(
  curve: Curve,
  lines: readonly string[],
  { x, top, size }: { x: number; top: number; size: number },
  { width, height }: { width: number; height: number },
): Mark[] {
  const { ink, id, dash } = curve
  const y = top + size * (ASCENT - 0.3)
  const left = x + SAMPLE + SPACE
  const box = { left, right: left + width, top, bottom: top + height }
  return [
    { mark: 'path', ink, pieces: [[x, y, x + SAMPLE, y]], ...(dash && { dash }) },
    { mark: 'text', ink, role: 'label', of: id, x: left, y: top + ASCENT * size, anchor: 'start', lines, box },
  ]
}
