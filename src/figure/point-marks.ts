import type { FigureInput } from './input.js'
import type { Occupancy } from './occupancy.js'
import { frequencyName, withUnit } from './prefix.js'
import type { AxisScale } from './scales.js'
import type { Box, Mark } from './scene.js'
import { textMark } from './text-box.js'
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

/** A ring at the least total and its value beside it where there is room. */
export function bestMarks(
  best: FigureInput['best'],
  at: { x: number; y: number } | null,
  occupancy: Occupancy,
  look: BestLook,
): Mark[] {
  if (best === null || at === null) return []
  const ink = { as: 'best' } as const
  const ring: Mark = { mark: 'ring', ink, x: at.x, y: at.y, radius: RING }
  const lines = [`best ${withUnit(best.asd, look.unit)}`]
  for (const [dx, dy, anchor] of AROUND) {
    const text = textMark(
      { ink, role: 'note', x: at.x + dx, y: at.y + dy + look.type.note * 0.35, anchor, lines },
      look.type.note,
    )
    if (!occupancy.isFree(text.box)) continue
    occupancy.addBox(text.box)
    return [ring, text]
  }
  return [ring]
}

interface BestLook {
  readonly unit: string
  readonly type: TypeSizes
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
