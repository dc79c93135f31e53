import type { Label } from './label.js'
import type { Box, Mark } from './scene.js'
import { spread } from './spread.js'
import { ASCENT } from './type-sizes.js'

const TICK = 4
const TEXT = 22
/** Height of the point that a hairline meets, below a label's top, over the size of the text. */
const AIM = ASCENT - 0.3
/** Space between two labels. */
const GAP = 3

/** From the frame to a label's text, and what is left free behind it. */
export const MARGIN_BEFORE = TEXT + 1
export const MARGIN_AFTER = 6

/** A label and the height at which its curve meets the frame's right edge. */
export interface Ending {
  readonly label: Label
  readonly y: number
  /** No hairline: the curve does not meet the edge. */
  readonly loose?: true
}

/**
 * Labels in the right margin, each as near to the end of its curve as the others allow, joined to it by a hairline.
 * Those of least weight are left out where not all have room; they come back in `left`.
 */
export function marginLabels(endings: readonly Ending[], frame: Box, size: number): { marks: Mark[]; left: Label[] } {
  const { kept, left } = fitting(endings, frame.bottom - frame.top)
  const centres = centresOf(kept, frame, size)
  return { marks: kept.flatMap((ending, k) => labelMarks(ending, centres[k], frame, size)), left }
}

/** How far each label of the margin would stand from the height of its curve's end, in pixels. */
export function displacements(endings: readonly Ending[], frame: Box, size: number): ReadonlyMap<Ending, number> {
  const { kept } = fitting(endings, frame.bottom - frame.top)
  const centres = centresOf(kept, frame, size)
  return new Map(kept.map((ending, k) => [ending, Math.abs(centres[k] - targetOf(ending, size))]))
}

function centresOf(kept: readonly Ending[], frame: Box, size: number): number[] {
  const targets = kept.map(ending => targetOf(ending, size))
  const heights = kept.map(ending => ending.label.height + GAP)
  return spread(targets, heights, frame.top, frame.bottom)
}

/** The centre of a label whose hairline is level. */
function targetOf({ label, y }: Ending, size: number): number {
  return y + label.height / 2 - size * AIM
}

function fitting(endings: readonly Ending[], room: number): { kept: Ending[]; left: Label[] } {
  const kept: Ending[] = []
  const left: Label[] = []
  let used = 0
  for (const ending of [...endings].sort((a, b) => b.label.curve.weight - a.label.curve.weight)) {
    const height = ending.label.height + GAP
    if (used + height > room) left.push(ending.label)
    else {
      used += height
      kept.push(ending)
    }
  }
  return { kept, left }
}

function labelMarks({ label, y, loose }: Ending, centre: number, frame: Box, size: number): Mark[] {
  const { curve, lines, width, height } = label
  const top = centre - height / 2
  const x = frame.right + TEXT
  const aim = top + size * AIM
  const hairline: Mark = {
    mark: 'path',
    ink: { as: 'leader' },
    pieces: [[frame.right + 2, y, frame.right + TICK, y, x - TICK, aim, x - 2, aim]],
  }
  return [
    ...(loose ? [] : [hairline]),
    {
      mark: 'text',
      ink: curve.ink,
      role: 'label',
      of: curve.id,
      x,
      y: top + size * ASCENT,
      anchor: 'start',
      lines,
      box: { left: x, right: x + width, top, bottom: top + height },
    },
  ]
}
