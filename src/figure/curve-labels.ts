import type { Curve } from './curves.js'
import { placeInside } from './inside-labels.js'
import { makeLabel, type Label } from './label.js'
import { displacements, MARGIN_AFTER, MARGIN_BEFORE, marginLabels, type Ending } from './margin-labels.js'
import type { Occupancy } from './occupancy.js'
import type { Box, Mark } from './scene.js'
import { textSize } from './text-box.js'
import { wrapText } from './text-width.js'

/** The widest text of a label in pixels. */
const WIDEST = 168
const LINES = 2
/** Room for "total". */
const NARROWEST = 44

/** The width of the margin that labels need at the right of a frame. */
export function labelMargin(titles: readonly string[], size: number, wider = 1): number {
  const widths = titles.map(title => textSize(wrapText(title, size, WIDEST, LINES), size).width * wider)
  return MARGIN_BEFORE + MARGIN_AFTER + Math.max(NARROWEST, ...widths)
}

/** A label of the form that `labelMargin` leaves room for. */
export function marginLabel(curve: Curve, size: number): Label {
  return makeLabel(curve, size, WIDEST, LINES)
}

/** A name farther than this from the end of its curve is better placed inside the frame, in pixels. */
const FAR = 30

/**
 * A label for every curve: in the right margin where the curve ends there and the label can stand near its end, else
 * inside the frame where there is room, else in the margin, with an arrow towards the edge that the curve has left the
 * frame through.
 */
export function wideLabels(curves: readonly Curve[], frame: Box, occupancy: Occupancy, size: number): Mark[] {
  const marks: Mark[] = []
  const inside = (label: Label): boolean => {
    const mark = placeInside(label, occupancy, middleOf(label.curve), size)
    if (mark !== null) marks.push(mark)
    return mark !== null
  }
  const endings: Ending[] = []
  for (const curve of byWeight(curves)) {
    const label = marginLabel(curve, size)
    const y = endAt(curve, frame.right)
    if (y !== null) endings.push({ label, y })
    else if (!inside(label)) endings.push(leaving(curve, frame, size))
  }
  const near = withoutFar(endings, frame, size, inside)
  return [...marks, ...marginLabels(near, frame, size).marks]
}

/** Takes the labels that others have moved far from their curves out of the margin, the farthest first, where `inside` finds room for them. */
function withoutFar(
  endings: readonly Ending[],
  frame: Box,
  size: number,
  inside: (label: Label) => boolean,
): readonly Ending[] {
  const tried = new Set<Ending>()
  let left = endings
  for (;;) {
    const moved = displacements(left, frame, size)
    const far = left.filter(e => !e.loose && !tried.has(e) && (moved.get(e) ?? 0) > FAR)
    if (far.length === 0) return left
    const worst = far.reduce((a, b) => (moved.get(b)! > moved.get(a)! ? b : a))
    tried.add(worst)
    if (inside(worst.label)) left = left.filter(e => e !== worst)
  }
}

export function byWeight(curves: readonly Curve[]): Curve[] {
  return [...curves].sort((a, b) => b.weight - a.weight)
}

/** Height at which a curve meets the right edge, or null. */
function endAt({ pieces }: Curve, right: number): number | null {
  const last = pieces.at(-1)
  return last !== undefined && last[last.length - 2] >= right - 1 ? last[last.length - 1] : null
}

/** Horizontal middle of the widest visible piece. */
function middleOf({ pieces }: Curve): number {
  const widths = pieces.map(piece => piece[piece.length - 2] - piece[0])
  const widest = pieces[widths.indexOf(Math.max(...widths))]
  return widest === undefined ? 0 : (widest[0] + widest[widest.length - 2]) / 2
}

function leaving(curve: Curve, frame: Box, size: number): Ending {
  const up = curve.pieces.length > 0 && curve.pieces.at(-1)!.at(-1)! < (frame.top + frame.bottom) / 2
  const label = marginLabel({ ...curve, title: `${curve.title} ${up ? '↑' : '↓'}` }, size)
  return { label, y: up ? frame.top : frame.bottom, loose: true }
}

/** In a narrow frame the standard quantum limit goes by its initials, as it does in speech. */
function shortened(curve: Curve): Curve {
  return curve.ink.as === 'limit' ? { ...curve, title: 'SQL' } : curve
}

/** Labels inside the frame for the curves of most weight, at most `most`; the others come back in `left`. */
export function compactLabels(
  curves: readonly Curve[],
  frame: Box,
  occupancy: Occupancy,
  { size, most }: { size: number; most: number },
): { marks: Mark[]; left: Curve[] } {
  const marks: Mark[] = []
  const left: Curve[] = []
  for (const curve of byWeight(curves)) {
    const label = makeLabel(shortened(curve), size, (frame.right - frame.left) * 0.5, 1)
    const mark = marks.length < most ? placeInside(label, occupancy, frame.right - label.width / 2, size) : null
    if (mark === null) left.push(curve)
    else marks.push(mark)
  }
  return { marks, left }
}
