import type { FigureInput, FigureVariant } from './input.js'
import { offsetPoints } from './offset-points.js'
import type { Box, Ink, PathMark, Polyline } from './scene.js'
import type { AxisScale } from './scales.js'
import { curvePath, type CurvePath } from './curve-path.js'
import { dashOf, negativeDash, variantDash } from './dashes.js'

/** A curve as it is drawn and labelled. */
export interface Curve {
  readonly id: string
  readonly title: string
  readonly ink: Ink
  readonly dash?: readonly number[]
  /** Visible pieces in pixels; empty when the curve leaves the frame or is nowhere above zero. */
  readonly pieces: readonly Polyline[]
  /** Labels are placed in falling order of it: a line's largest share of the total power in the window. */
  readonly weight: number
  readonly psd: Float64Array
}

/** Where curves are drawn: abscissae of the evaluation's points, scales and frame. */
export interface Window {
  /** Frequency at which the axis reads zero, in Hz. */
  readonly origin: number
  readonly x: Float64Array
  readonly xScale: AxisScale
  readonly yScale: AxisScale
  readonly frame: Box
}

const TOTAL_WEIGHT = 1e6
const VARIANT_WEIGHT = 1e4
const STANDARD_WEIGHT = 1e5
const LIMIT_WEIGHT = 1e-3

/** Every curve of the input in the order of drawing: limits, lines (smallest share first), totals of variants, total. */
export function drawCurves(input: FigureInput, window: Window): Curve[] {
  const limits = input.limits.map(({ id, title, prominent, psd }) =>
    draw({ id: `limit-${id}`, title, psd }, POSITIVE, limitStyle(prominent), window),
  )
  const lines = input.lines.flatMap(line => {
    const weight = largestShare(line.psd, input.total, window)
    const ink: Ink = { as: 'line', family: line.family, tone: line.tone }
    const dash = dashOf(line.family, line.tone)
    const curve = { id: `line-${line.id}`, title: line.title, psd: line.psd }
    const positive = draw(curve, { sign: 1, signed: line.signed }, { ink, weight, ...(dash && { dash }) }, window)
    if (!line.signed) return [positive]
    const negative = { ...curve, id: `${curve.id}-negative`, title: `− ${line.title}` }
    return [positive, draw(negative, { sign: -1, signed: true }, { ink, weight, dash: negativeDash() }, window)].filter(
      isSomewhere,
    )
  })
  lines.sort((a, b) => a.weight - b.weight)
  const total = { id: 'total', title: 'Total', psd: input.total }
  const variants = input.variants.map((variant, index) => drawVariant(variant, index, window))
  return [
    ...limits,
    ...lines,
    ...variants,
    draw(total, POSITIVE, { ink: { as: 'total' }, weight: TOTAL_WEIGHT }, window),
  ]
}

/** The first variant is named first. */
function drawVariant({ id, title, points, total }: FigureVariant, index: number, window: Window): Curve {
  const curve = { id: `variant-${id}`, title, psd: total }
  const style: Style = { ink: { as: 'variant' }, weight: VARIANT_WEIGHT - index, dash: variantDash(index) }
  return draw(curve, POSITIVE, style, { ...window, x: offsetPoints(points, window.origin) })
}

type Style = Pick<Curve, 'ink' | 'dash' | 'weight'>

function limitStyle(prominent: boolean): Style {
  return prominent
    ? { ink: { as: 'limit' }, weight: STANDARD_WEIGHT }
    : { ink: { as: 'bound' }, weight: LIMIT_WEIGHT, dash: [1.5, 3.5] }
}

type Signs = Pick<CurvePath, 'sign' | 'signed'>
const POSITIVE: Signs = { sign: 1, signed: false }

function draw(curve: Pick<Curve, 'id' | 'title' | 'psd'>, signs: Signs, style: Style, window: Window): Curve {
  const { x, xScale, yScale, frame } = window
  return { ...curve, ...style, pieces: curvePath({ x, psd: curve.psd, ...signs }, xScale, yScale, frame) }
}

/** A signed line that never has one of its signs has no curve and no label for it. */
function isSomewhere(curve: Curve): boolean {
  return curve.pieces.length > 0
}

function largestShare(psd: Float64Array, total: Float64Array, { x, xScale }: Window): number {
  let most = 0
  for (let k = 0; k < psd.length; k++) {
    if (x[k] < xScale.low || x[k] > xScale.high || !(total[k] > 0)) continue
    const share = Math.abs(psd[k]) / total[k]
    if (share > most && Number.isFinite(share)) most = share
  }
  return most
}

export function curveMark({ id, ink, dash, pieces }: Curve): PathMark {
  return { mark: 'path', ink, of: id, pieces, ...(dash && { dash }) }
}
