/**
 * Fewer points with the same picture: Ramer–Douglas–Peucker on a polyline in pixels. No point that is left out lies
 * farther than `tolerance` from the line that is kept, so that every peak keeps its height within it.
 * [Ramer 1972; Douglas and Peucker 1973]
 *
 * @param line x₀, y₀, x₁, y₁, … in pixels, x ascending
 * @param tolerance in pixels, > 0
 */
export function thin(line: readonly number[], tolerance: number): number[] {
  const count = line.length / 2
  if (count <= 2) return line.slice()
  const keep = new Uint8Array(count)
  keep[0] = keep[count - 1] = 1
  // A stack instead of recursion: a spiky curve would nest thousands of calls.
  const stack = [0, count - 1]
  while (stack.length > 0) {
    const last = stack.pop()!
    const first = stack.pop()!
    const far = farthest(line, first, last)
    if (far.distance <= tolerance) continue
    keep[far.index] = 1
    stack.push(first, far.index, far.index, last)
  }
  return line.filter((_, k) => keep[k >> 1] === 1)
}

/** The same with a tolerance that doubles until at most `most` points are left. */
export function thinTo(line: readonly number[], tolerance: number, most: number): number[] {
  let allowed = tolerance
  let thinned = thin(line, allowed)
  while (thinned.length / 2 > Math.max(2, most)) {
    allowed *= 2
    thinned = thin(line, allowed)
  }
  return thinned
}

function farthest(line: readonly number[], first: number, last: number): { index: number; distance: number } {
  let index = first
  let distance = 0
  for (let k = first + 1; k < last; k++) {
    const d = distanceToSegment(line, k, first, last)
    if (d > distance) {
      distance = d
      index = k
    }
  }
  return { index, distance }
}

/** Distance of point k from the segment between two others, ends included. */
function distanceToSegment(line: readonly number[], k: number, first: number, last: number): number {
  const x = line[2 * k] - line[2 * first]
  const y = line[2 * k + 1] - line[2 * first + 1]
  const dx = line[2 * last] - line[2 * first]
  const dy = line[2 * last + 1] - line[2 * first + 1]
  const length = dx * dx + dy * dy
  const along = length > 0 ? Math.min(1, Math.max(0, (x * dx + y * dy) / length)) : 0
  return Math.hypot(x - along * dx, y - along * dy)
}
