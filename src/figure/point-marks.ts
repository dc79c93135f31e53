import type { Occupancy } from './occupancy.js'
import { frequencyName, withUncertainty } from './prefix.js'
import type { AxisScale } from './scales.js'
import type { Box, Mark } from './scene.js'
import { overlaps, textMark } from './text-box.js'
import type { TypeSizes } from './type-sizes.js'

const RING = 4.5

/** A vertical hairline at the reference frequency and its name above the frame. */
export function referenceMarks(
  frequency: number,
  origin: number,
  x: AxisScale,
  { frame, type }: { frame: Box; type: TypeSizes },
): Mark[] {
  const value = frequency - origin
  if (!(value >= x.low && value <= x.high)) return []
  const at = x.at(value)
  const ink = { as: 'reference' } as const
  const name = (anchor: 'start' | 'middle' | 'end', shift: number) =>
    textMark(
      { ink, role: 'note', x: at + shift, y: frame.top - 8, anchor, lines: [`reference ${frequencyName(frequency)}`] },
      type.note,
    )
  const centred = name('middle', 0)
  const text =
    centred.box.left < frame.left ? name('start', 0) : centred.box.right > frame.right ? name('end', 0) : centred
  return [{ mark: 'path', ink, dash: [1, 3], pieces: [[at, frame.top, at, frame.bottom]] }, text]
}

/**
 * A ring at the least total and its value beside it; where there is no room, above the frame behind a ring of the same
 * look. `look.taken` are boxes above the frame that are not free.
 */
export function bestMarks(
  { asd, uncertainty }: { readonly asd: number; readonly uncertainty: number },
  at: Spot,
  occupancy: Occupancy,
  look: BestLook,
): Mark[] {
  const { type, unit } = look
  const lines = [`best ${withUncertainty(asd, unit, uncertainty)}`]
  for (const [dx, dy, anchor] of AROUND) {
    const place = { x: at.x + dx, y: at.y + dy + type.note * 0.35, anchor }
    const text = textMark({ ink: INK, role: 'note', ...place, lines }, type.note)
    if (!occupancy.isFree(text.box)) continue
    occupancy.addBox(text.box)
    return [ring(at), text]
  }
  return [ring(at), ...above(lines, occupancy.frame, look)]
}

interface Spot {
  readonly x: number
  readonly y: number
}

interface BestLook {
  readonly unit: string
  readonly type: TypeSizes
  readonly taken: readonly Box[]
}

const INK = { as: 'best' } as const

function ring({ x, y }: Spot): Mark {
  return { mark: 'ring', ink: INK, x, y, radius: RING }
}

function above(lines: readonly string[], frame: Box, { type, taken }: BestLook): Mark[] {
  const y = frame.top - 8
  const note = (x: number) => textMark({ ink: INK, role: 'note', x, y, anchor: 'start', lines }, type.note)
  const left = note(frame.left + 4 * RING)
  // Starts where its generous width allows, so that the ring stands close to the words.
  const right = note(frame.right - (left.box.right - left.box.left))
  const text = [right, left].find(t => !taken.some(box => overlaps(withRing(t.box), box)))
  if (text === undefined) return []
  return [ring({ x: text.box.left - 2 * RING, y: y - type.note * 0.35 }), text]
}

function withRing(box: Box): Box {
  return { ...box, left: box.left - 4 * RING, right: box.right + RING }
}

/** Places of the text around the ring, the preferred ones first. */
const AROUND = [20, 34, 50, 70].flatMap(
  d =>
    [
      [0, d, 'middle'],
      [d * 0.8, d * 0.7, 'start'],
      [-d * 0.8, d * 0.7, 'end'],
      [d, 0, 'start'],
      [-d, 0, 'end'],
      [0, -d, 'middle'],
      [d * 0.8, -d * 0.7, 'start'],
      [-d * 0.8, -d * 0.7, 'end'],
    ] as const,
)
