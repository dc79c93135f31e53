import { amplitudeDomain } from './amplitude-domain.js'
import { axisMarks } from './axis-marks.js'
import { linearAxis, logAxis } from './axis-plan.js'
import type { Abscissa } from './band-abscissa.js'
import { beyondMark } from './beyond.js'
import { compactLabels, labelMargin, wideLabels } from './curve-labels.js'
import { type Curve, curveMark, drawCurves, type Window } from './curves.js'
import type { FigureInput } from './input.js'
import { keyRows } from './key-rows.js'
import { BOLD } from './label.js'
import { makeFrame } from './make-frame.js'
import { Occupancy } from './occupancy.js'
import { bestMarks, referenceMarks } from './point-marks.js'
import { axisScale } from './scales.js'
import type { Box, Mark, Scene, Size } from './scene.js'
import { isSpreadSeen, spreadMark } from './spread-mark.js'
import { isCompact, typeSizes, type TypeSizes } from './type-sizes.js'

export interface Plot {
  readonly title: string
  readonly description: string
  readonly abscissa: Abscissa
  /** The most curves that are named inside a compact figure. */
  readonly named?: number
  /** False: curves that are nowhere in the frame are not named beside it. */
  readonly nameHidden?: boolean
}

/** The most labels of the amplitude axis. */
const MOST_LABELS_UP = 8
/** Curves of which a compact figure names so many in the frame. */
const NAMED = 6
/** Lines that never reach this share of the power in the window are not drawn in a compact figure. */
const LEAST_COMPACT_SHARE = 1e-4

/** Amplitude densities on a log axis against any abscissa, with axes, names and marks. */
export function plotScene(view: FigureInput, size: Size, plot: Plot): Scene {
  const type = typeSizes(size.width)
  const compact = isCompact(size.width)
  const { window, curves, axes } = layOut(view, size, plot)
  const { frame } = window
  const named = compact || !isSpreadSeen(view, window) ? curves : curves.map(withSpreadNamed)
  const shown = named.filter(compact ? isWorthSpace : curve => isNamed(curve, plot.nameHidden ?? true))
  const occupancy = occupied(frame, shown)
  addReference(view, window, plot.abscissa, occupancy)
  const points = pointMarks(view, window, plot.abscissa, { occupancy, type })
  const names = compact
    ? compactNames(shown, window, occupancy, { type, named: plot.named ?? NAMED, size })
    : { marks: wideLabels(shown, frame, occupancy, type.label), height: 0 }
  const standard = shown.find(curve => curve.ink.as === 'limit')
  const beyond = standard === undefined ? null : beyondMark(standard, window)
  const spread = spreadMark(view, window)
  return {
    width: size.width,
    height: Math.ceil(size.height + names.height),
    title: plot.title,
    description: plot.description,
    marks: [
      ...(beyond === null ? [] : [beyond]),
      ...axes,
      ...(spread === null ? [] : [spread]),
      ...points.behind,
      ...shown.filter(curve => curve.pieces.length > 0).map(curveMark),
      ...names.marks,
      ...points.front,
    ],
  }
}

function layOut(view: FigureInput, size: Size, { abscissa }: Plot) {
  const type = typeSizes(size.width)
  const compact = isCompact(size.width)
  const { kind, domain, x, origin } = abscissa
  const amplitudes = amplitudeDomain(view, { x, kind, domain, origin })
  const name = view.quantity.charAt(0).toUpperCase() + view.quantity.slice(1)
  const yPlan = logAxis(name, view.unit, amplitudes, MOST_LABELS_UP)
  const xPlan = (kind === 'log' ? logAxis : linearAxis)(abscissa.name, 'Hz', domain, compact ? 5 : 9)
  const frame = makeFrame(size, { x: xPlan, y: yPlan }, type.note * 2.4, nameMargin(view, type.label))
  const xScale = axisScale(kind, domain, [frame.left, frame.right])
  const yScale = axisScale('log', amplitudes, [frame.bottom, frame.top])
  const window: Window = { x, origin, xScale, yScale, frame }
  const axes = axisMarks(frame, { plan: xPlan, scale: xScale }, { plan: yPlan, scale: yScale }, type)
  return { window, curves: drawCurves(view, window), axes }
}

/** The name of the total is bold. */
function nameMargin(view: FigureInput, size: number): number {
  const total = view.uncertainty === null ? 'Total' : TOTAL_WITH_SPREAD
  return Math.max(labelMargin(longNames(view), size), labelMargin([total, `${total} ↓`], size, BOLD))
}

/** Every name in every form: with a sign, and with the arrow of a curve that has left the frame. */
function longNames({ lines, limits, variants }: FigureInput): string[] {
  const titles = [...lines, ...limits, ...variants].map(curve => curve.title)
  const signed = lines.filter(line => line.signed).map(line => `− ${line.title}`)
  return [...titles, ...signed].flatMap(title => [title, `${title} ↓`])
}

const TOTAL_WITH_SPREAD = 'Total (shaded: ± standard uncertainty)'

/** The name of the total says what its band is. */
function withSpreadNamed(curve: Curve): Curve {
  return curve.ink.as === 'total' ? { ...curve, title: TOTAL_WITH_SPREAD } : curve
}

/** Limits that are not in the frame have no name beside it. */
function isNamed(curve: Curve, nameHidden: boolean): boolean {
  return curve.pieces.length > 0 || (nameHidden && curve.ink.as === 'line')
}

/** A compact figure keeps the standard quantum limit of the limits, and the lines that matter. */
function isWorthSpace({ ink, pieces, weight }: Curve): boolean {
  return pieces.length > 0 && ink.as !== 'bound' && (ink.as !== 'line' || weight >= LEAST_COMPACT_SHARE)
}

function occupied(frame: Box, curves: readonly Curve[]): Occupancy {
  const occupancy = new Occupancy(frame)
  for (const curve of curves) occupancy.addCurve(curve.pieces)
  return occupancy
}

/** Names keep off the hairline of the reference frequency. */
function addReference(
  { reference }: FigureInput,
  { xScale, frame }: Window,
  { origin }: Abscissa,
  occupancy: Occupancy,
): void {
  if (reference === null) return
  const x = xScale.at(reference - origin)
  if (x >= frame.left && x <= frame.right) occupancy.addCurve([[x, frame.top, x, frame.bottom]])
}

function pointMarks(
  { best, reference, unit }: FigureInput,
  { xScale, yScale, frame }: Window,
  { origin }: Abscissa,
  { occupancy, type }: { occupancy: Occupancy; type: TypeSizes },
): { behind: Mark[]; front: Mark[] } {
  const behind = reference === null ? [] : referenceMarks(reference, origin, xScale, { frame, type })
  if (best === null) return { behind, front: [] }
  const x = xScale.at(best.frequency - origin)
  const y = yScale.at(best.asd)
  const inside = x >= frame.left && x <= frame.right && y >= frame.top && y <= frame.bottom
  return {
    behind,
    front: inside ? bestMarks(best, { x, y }, occupancy, { unit, type, taken: textsIn(behind) }) : [],
  }
}

function textsIn(marks: readonly Mark[]): Box[] {
  return marks.flatMap(mark => (mark.mark === 'text' ? [mark.box] : []))
}

interface CompactLook {
  readonly type: TypeSizes
  readonly named: number
  readonly size: Size
}

function compactNames(
  curves: readonly Curve[],
  { frame }: Window,
  occupancy: Occupancy,
  look: CompactLook,
): { marks: Mark[]; height: number } {
  const { marks, left } = compactLabels(curves, frame, occupancy, { size: look.type.label, most: look.named })
  const rows = keyRows(left, { left: 14, right: frame.right, top: look.size.height + 4 }, look.type.label)
  return { marks: [...marks, ...rows.marks], height: rows.height === 0 ? 0 : rows.height + 8 }
}
