import type { Box } from './scene.js'

/** The parts of a polyline inside a box, edges included; each segment by Liang and Barsky [1984]. */
export function clip(line: readonly number[], box: Box): number[][] {
  const pieces: number[][] = []
  let piece: number[] = []
  const end = () => {
    if (piece.length >= 4) pieces.push(piece)
    piece = []
  }
  for (let k = 0; k + 3 < line.length; k += 2) {
    const inside = clipSegment(line, k, box)
    if (inside === null) {
      end()
      continue
    }
    const [enters, leaves] = inside
    if (enters > 0) end()
    if (piece.length === 0) piece.push(...pointAt(line, k, enters))
    piece.push(...pointAt(line, k, leaves))
    if (leaves < 1) end()
  }
  end()
  return pieces
}

function pointAt(line: readonly number[], k: number, t: number): [number, number] {
  if (t === 1) return [line[k + 2], line[k + 3]]
  return [line[k] + t * (line[k + 2] - line[k]), line[k + 1] + t * (line[k + 3] - line[k + 1])]
}

/** The stretch [t₀, t₁] of the segment from point k to the next that lies inside, or null. */
function clipSegment(line: readonly number[], k: number, box: Box): [number, number] | null {
  const dx = line[k + 2] - line[k]
  const dy = line[k + 3] - line[k + 1]
  let t0 = 0
  let t1 = 1
  const edges: [number, number][] = [
    [-dx, line[k] - box.left],
    [dx, box.right - line[k]],
    [-dy, line[k + 1] - box.top],
    [dy, box.bottom - line[k + 1]],
  ]
  for (const [slope, distance] of edges) {
    if (slope === 0 && distance < 0) return null
    if (slope < 0) t0 = Math.max(t0, distance / slope)
    else if (slope > 0) t1 = Math.min(t1, distance / slope)
  }
  return t0 <= t1 ? [t0, t1] : null
}
