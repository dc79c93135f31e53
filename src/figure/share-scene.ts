import { type Axis, axisMarks } from './axis-marks.js'
import { linearAxis, logAxis } from './axis-plan.js'
import { type Abscissa, bandAbscissa } from './band-abscissa.js'
import { bandSpan, describe } from './describe.js'
import type { FigureInput, FigureLine } from './input.js'
import { indicesBetween } from './indices-between.js'
import { keyRows } from './key-rows.js'
import { labelMargin, marginLabel } from './curve-labels.js'
import { makeFrame } from './make-frame.js'
import { marginLabels, type Ending } from './margin-labels.js'
import { axisScale, type AxisScale } from './scales.js'
import type { Curve } from './curves.js'
import type { Box, Mark, Scene, Size } from './scene.js'
import { stackShares, type ShareBand } from './stack-shares.js'
import { thinTo } from './thin.js'
import { isCompact, typeSizes } from './type-sizes.js'

const TOLERANCE = 0.1
const MOST = 800
/** A band that ends thinner than this gets no hairline. */
const THINNEST = 1.5
/** Lines that never have this share of the power are not drawn. */
const LEAST = 0.005

/**
 * Shares of the total noise power against frequency, stacked, the largest at the bottom. Negative correlations stand
 * below zero, so that everything adds up to one.
 */
export function shareScene(view: FigureInput, size: Size): Scene {
  const type = typeSizes(size.width)
  const compact = isCompact(size.width)
  const bands = stackShares(view).filter(band => band.greatest >= LEAST)
  const abscissa = bandAbscissa(view)
  const { x, y, frame } = layOut(bands, abscissa, size)
  const shapes = bands.map((band): Mark => ({
    mark: 'path',
    ink: { as: 'share', family: band.line.family, tone: band.line.tone },
    of: `share-${band.line.id}`,
    filled: true,
    pieces: [outline(abscissa.x, band, x.scale, y.scale)],
  }))
  const names = nameBands(bands, y.scale, { frame, size, compact })
  return {
    width: size.width,
    height: Math.ceil(size.height + names.height),
    title: `${view.title}: shares of the noise power`,
    description: describe(view, bandSpan(view)),
    marks: [...shapes, ...axisMarks(frame, x, y, type), ...names.marks],
  }
}

function layOut(bands: readonly ShareBand[], abscissa: Abscissa, size: Size): { x: Axis; y: Axis; frame: Box } {
  const compact = isCompact(size.width)
  const { kind, name, domain } = abscissa
  const lowest = Math.max(-1, Math.min(0, ...bands.map(band => band.lowest)))
  const highest = Math.min(2, Math.max(1, ...bands.map(band => band.highest)))
  const shares = [Math.floor(lowest * 10) / 10, Math.ceil(highest * 10) / 10] as const
  const yPlan = linearAxis('Share of power', '', shares, 5)
  const names = bands.map(band => band.line.title)
  const xPlan = (kind === 'log' ? logAxis : linearAxis)(name, 'Hz', domain, compact ? 5 : 9)
  const frame = makeFrame(size, { x: xPlan, y: yPlan }, 12, labelMargin(names, typeSizes(size.width).label))
  return {
    x: { plan: xPlan, scale: axisScale(kind, domain, [frame.left, frame.right]) },
    y: { plan: yPlan, scale: axisScale('linear', shares, [frame.bottom, frame.top]) },
    frame,
  }
}

/** Height of a share, kept inside the axis. */
function heldAt(y: AxisScale, share: number): number {
  return y.at(Math.min(y.high, Math.max(y.low, share)))
}

/** The closed outline of a band: its upper edge forwards, its lower edge backwards. */
function outline(values: Float64Array, band: ShareBand, x: AxisScale, y: AxisScale): number[] {
  const inside = indicesBetween(values, x.low, x.high)
  const edge = (shares: Float64Array) =>
    thinTo(
      inside.flatMap(k => [x.at(values[k]), heldAt(y, shares[k])]),
      TOLERANCE,
      MOST,
    )
  const lower = edge(band.lower)
  const back: number[] = []
  for (let k = lower.length - 2; k >= 0; k -= 2) back.push(lower[k], lower[k + 1])
  return [...edge(band.upper), ...back]
}

interface NamePlace {
  readonly frame: Box
  readonly size: Size
  readonly compact: boolean
}

function nameBands(
  bands: readonly ShareBand[],
  y: AxisScale,
  { frame, size, compact }: NamePlace,
): { marks: Mark[]; height: number } {
  const type = typeSizes(size.width)
  if (compact) {
    const rows = keyRows(bands.map(shareCurve), { left: 14, right: frame.right, top: size.height + 4 }, type.label)
    return { marks: rows.marks, height: rows.height + 8 }
  }
  const endings = bands.map((band): Ending => {
    const label = marginLabel(shareCurve(band), type.label)
    const bottom = heldAt(y, band.lower.at(-1)!)
    const top = heldAt(y, band.upper.at(-1)!)
    return { label, y: (bottom + top) / 2, ...(bottom - top < THINNEST && { loose: true }) }
  })
  return { marks: marginLabels(endings, frame, type.label).marks, height: 0 }
}

function shareCurve({ line, greatest }: { line: FigureLine; greatest: number }): Curve {
  const ink = { as: 'line', family: line.family, tone: line.tone } as const
  return { id: `share-${line.id}`, title: line.title, ink, pieces: [], weight: greatest, psd: line.psd }
}
