import { curvePath } from './curve-path.js'
import type { Window } from './curves.js'
import type { FigureInput } from './input.js'
import type { PathMark } from './scene.js'

/** The lower edge of the band, where the uncertainty is the total itself or more, in parts of the total. */
const LEAST_EDGE = 1e-6

/** One standard uncertainty to each side of the total, as a calm surface clipped to the frame. */
export function spreadMark({ total, uncertainty }: FigureInput, window: Window): PathMark | null {
  if (uncertainty === null) return null
  const { x, xScale, yScale, frame } = window
  // Held inside the frame instead of cut at it: both edges then have the same pieces.
  const held = { ...yScale, at: (value: number) => Math.min(frame.bottom, Math.max(frame.top, yScale.at(value))) }
  const edge = (sign: 1 | -1) => {
    const psd = total.map((value, k) => edgeOf(Math.sqrt(value), sign * uncertainty[k]) ** 2)
    return curvePath({ x, psd, sign: 1, signed: false }, xScale, held, frame)
  }
  const [upper, lower] = [edge(1), edge(-1)]
  if (upper.length === 0 || upper.length !== lower.length) return null
  const pieces = upper.map((piece, n) => [...piece, ...backwards(lower[n])])
  return { mark: 'path', ink: { as: 'spread' }, of: 'spread', filled: true, pieces }
}

function edgeOf(asd: number, change: number): number {
  return Math.max(asd + change, asd * LEAST_EDGE)
}

function backwards(piece: readonly number[]): number[] {
  const reversed: number[] = []
  for (let k = piece.length - 2; k >= 0; k -= 2) reversed.push(piece[k], piece[k + 1])
  return reversed
}

/** So many pixels an edge must lie from the total to be seen beside its stroke. */
const SEEN = 2

/** Whether the band can be told from the stroke of the total anywhere in the window. */
export function isSpreadSeen({ total, uncertainty }: FigureInput, { x, xScale, yScale, frame }: Window): boolean {
  if (uncertainty === null) return false
  return total.some((value, k) => {
    if (!(value > 0) || !Number.isFinite(value) || x[k] < xScale.low || x[k] > xScale.high) return false
    const asd = Math.sqrt(value)
    const y = yScale.at(asd)
    return y >= frame.top && y <= frame.bottom && y - yScale.at(asd + uncertainty[k]) > SEEN
  })
}
