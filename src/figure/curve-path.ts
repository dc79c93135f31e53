import type { Box, Polyline } from './scene.js'
import type { AxisScale } from './scales.js'
import { clip } from './clip.js'
import { thinTo } from './thin.js'

/** Tolerance of thinning in pixels, and the most points that one piece of a curve keeps. */
const TOLERANCE = 0.1
const MOST = 800

export interface CurvePath {
  /** Abscissae in the unit of the x scale, ascending. */
  readonly x: Float64Array
  /** Power densities. */
  readonly psd: Float64Array
  /** Draws √psd where psd > 0 (1) or √−psd where psd < 0 (−1). */
  readonly sign: 1 | -1
  /** A change of sign between two points is drawn down to the frame: the density passes through zero there. */
  readonly signed: boolean
}

/**
 * The visible pieces of an amplitude density √psd, clipped to the frame and thinned. A value that is zero, of the other
 * sign or not finite is no point of the path: the path breaks there.
 */
export function curvePath(curve: CurvePath, x: AxisScale, y: AxisScale, frame: Box): Polyline[] {
  return unbroken(curve, x, y, frame)
    .flatMap(piece => clip(piece, frame))
    .map(piece => thinTo(piece, TOLERANCE, MOST))
}

function unbroken(curve: CurvePath, x: AxisScale, y: AxisScale, frame: Box): number[][] {
  const { psd, sign } = curve
  const pieces: number[][] = []
  let piece: number[] = []
  const end = () => {
    if (piece.length >= 4) pieces.push(piece)
    piece = []
  }
  for (let k = 0; k < psd.length; k++) {
    const value = sign * psd[k]
    const drawn = value > 0 && Number.isFinite(value)
    const zero = curve.signed && k > 0 ? crossing(curve, k) : null
    if (zero !== null) piece.push(x.at(zero), frame.bottom + 1)
    if (drawn) piece.push(x.at(curve.x[k]), y.at(Math.sqrt(value)))
    else end()
  }
  end()
  return pieces
}

/** Where the density passes through zero between points k − 1 and k, by a straight line; null where it does not. */
function crossing({ x, psd }: CurvePath, k: number): number | null {
  const before = psd[k - 1]
  const after = psd[k]
  if (!(before * after < 0) || !Number.isFinite(before * after)) return null
  return x[k - 1] + ((x[k] - x[k - 1]) * before) / (before - after)
}
