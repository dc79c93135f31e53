import { curvePath } from './curve-path.js'
import type { Curve, Window } from './curves.js'
import type { PathMark } from './scene.js'

/** The region below the standard quantum limit, as a faint surface from the limit down to the frame. */
export function beyondMark(limit: Curve, { x, xScale, yScale, frame }: Window): PathMark | null {
  // Held inside the frame instead of cut at it, so that the surface goes on where the limit is above the frame.
  const held = { ...yScale, at: (value: number) => Math.min(frame.bottom, Math.max(frame.top, yScale.at(value))) }
  const pieces = curvePath({ x, psd: limit.psd, sign: 1, signed: false }, xScale, held, frame).map(piece => [
    piece[0],
    frame.bottom,
    ...piece,
    piece[piece.length - 2],
    frame.bottom,
  ])
  return pieces.length === 0 ? null : { mark: 'path', ink: { as: 'beyond' }, filled: true, pieces }
}
