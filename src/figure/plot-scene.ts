import { amplitudeDomain } from './amplitude-domain.js'
import { axisMarks } from './axis-marks.js'
import { linearAxis, logAxis } from './axis-plan.js'
import { beyondMark } from './beyond.js'
import { compactLabels, labelMargin, wideLabels } from './curve-labels.js'
import { type Curve, curveMark, drawCurves, type Window } from './curves.js'
import type { FigureInput } from './input.js'
import { keyRows } from './key-rows.js'
import { Occupancy } from './occupancy.js'
import { bestMarks, referenceMarks } from './point-marks.js'
import { axisScale } from './scales.js'
import type { Box, Mark, Scene, Size } from './scene.js'
import { isCompact, typeSizes, type TypeSizes } from './type-sizes.js'

/** What a plot of amplitude densities shows along its horizontal axis. */
export interface Abscissa {
  readonly kind: 'linear' | 'log'
  /** Of the evaluation's points, in Hz from `origin`. */
  readonly x: Float64Array
  readonly domain: readonly [number, number]
  /** Frequency at which the axis reads zero. */
  readonly origin: number
  readonly name: string
}

export interface Plot {
  readonly title: string
  readonly description: string
  readonly abscissa: Abscissa
  /** The most curves that are named inside a compact figure. */
  readonly named?: number
}

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
  const shown = compact ? curves.filter(curve => isWorthSpace(curve)) : curves
  const occupancy = occupied(frame, shown)
  const points = pointMarks(view, window, plot.abscissa, occupancy)
  const names = compact
    ? compactNames(shown, window, occupancy, { type, named: plot.named ?? NAMED, size })
    : { marks: wideLabels(shown, frame, occupancy, type.label), height: 0 }
  const standard = shown.find(curve => curve.ink.as === 'limit')
  const beyond = standard === undefined ? null : beyondMark(standard, window)
  return {
    width: size.width,
    height: Math.ceil(size.height + names.height),
    title: plot.title,
    description: plot.description,
    marks: [...(beyond === null ? [] : [beyond]), ...axes, ...points.behind, ...shown.map(curveMark), ...names.marks, ...points.front],
  }
}

function layOut(view: FigureInput, size: Size, { abscissa }: Plot) {
  const type = typeSizes(size.width)
  const compact = isCompact(size.width)
  const titles = [...view.lines, ...view.limits].map(({ title }) => ({ title, ink: { as: 'line', family: 'stray', tone: 0 } as const }))
  const frame: Box = {
    left: type.axis * (compact ? 4 : 5),
    top: type.note * 2.4,
    right: size.width - (compact ? 12 : labelMargin(titles, type.label)),
    bottom: size.height - type.tick - type.axis - (compact ? 26 : 32),
  }
  const [low, high] = abscissa.domain
  const amplitudes = amplitudeDomain(view, k => abscissa.x[k] >= low && abscissa.x[k] <= high)
  const xScale = axisScale(abscissa.kind, abscissa.domain, [frame.left, frame.right])
  const yScale = axisScale('log', amplitudes, [frame.bottom, frame.top])
  const window: Window = { x: abscissa.x, xScale, yScale, frame }
  const xMost = compact ? 5 : 9
  const plan = abscissa.kind === 'log' ? logAxis : linearAxis
  const x = { plan: plan(abscissa.name, 'Hz', abscissa.domain, xMost), scale: xScale }
  const name = view.quantity.charAt(0).toUpperCase() + view.quantity.slice(1)
  const y = { plan: logAxis(name, view.unit, amplitudes, 8), scale: yScale }
  return { window, curves: drawCurves(view, window), axes: axisMarks(frame, x, y, type) }
}

function isWorthSpace(curve: Curve): boolean {
  return curve.pieces.length > 0 && (curve.ink.as !== 'line' || curve.weight >= LEAST_COMPACT_SHARE)
}

function occupied(frame: Box, curves: readonly Curve[]): Occupancy {
  const occupancy = new Occupancy(frame)
  for (const curve of curves) for (const piece of curve.pieces) occupancy.addLine(piece)
  return occupancy
}

function pointMarks(view: FigureInput, window: Window, abscissa: Abscissa, occupancy: Occupancy): { behind: Mark[]; front: Mark[] } {
  const { xScale, yScale, frame } = window
  const type = typeSizes(frame.right)
  const { best, reference, unit } = view
  const behind = reference === null ? [] : referenceMarks(reference, abscissa.origin, xScale, { frame, type })
  if (best === null) return { behind, front: [] }
  const x = xScale.at(best.frequency - abscissa.origin)
  const y = yScale.at(best.asd)
  const inside = x >= frame.left && x <= frame.right && y >= frame.top && y <= frame.bottom
  return { behind, front: bestMarks(best, inside ? { x, y } : null, occupancy, { unit, type }) }
}

interface CompactLook {
  readonly type: TypeSizes
  readonly named: number
  readonly size: Size
}

function compactNames(curves: readonly Curve[], { frame }: Window, occupancy: Occupancy, look: CompactLook): { marks: Mark[]; height: number } {
  const { marks, left } = compactLabels(curves, frame, occupancy, { size: look.type.label, most: look.named })
  const rows = keyRows(left, { left: 14, right: frame.right, top: look.size.height + 4 }, look.type.label)
  return { marks: [...marks, ...rows.marks], height: rows.height === 0 ? 0 : rows.height + 8 }
}
