/**
 * Fewer points with the same picture: Ramer–Douglas–Peucker on a polyline in pixels. No point that is left out lies
 * farther than `tolerance` from the line that is kept, so that every peak keeps its height within it.
 * [Ramer 1972; Douglas and Peucker 1973]
 *
 * @param line x₀, y₀, x₁, y₁, … in pixels, x ascending
 * @param tolerance in pixels, > 0
 */
export function thin(line: readonly number[], tolerance: number): number[] {
  const significance = significances(line, tolerance)
  return line.filter((_, k) => significance[k >> 1] > tolerance)
}

/** The same with the least tolerance above `tolerance` that leaves at most `most` points, ends included. */
export function thinTo(line: readonly number[], tolerance: number, most: number): number[] {
  const significance = significances(line, tolerance)
  const ranked = significance.filter(s => s > tolerance).sort((a, b) => b - a)
  const threshold = ranked.length > most ? ranked[Math.max(1, most)] : tolerance
  return line.filter((_, k) => significance[k >> 1] > threshold)
}

/**
 * The tolerance up to which each point would be kept: infinite for the ends, 0 where it is not above `tolerance`. It never
 * grows from a split to the splits below it, so that any threshold cuts the tree of splits at one level.
 */
function significances(line: readonly number[], tolerance: number): Float64Array {
  const count = line.length / 2
  const significance = new Float64Array(count)
  if (count === 0) return significance
  significance[0] = significance[count - 1] = Infinity
  // A stack instead of recursion: a spiky curve would nest thousands of calls.
  const stack: [number, number, number][] = [[0, count - 1, Infinity]]
  while (stack.length > 0) {
    const [first, last, above] = stack.pop()!
    const { index, distance } = farthest(line, first, last)
    if (distance <= tolerance) continue
    significance[index] = Math.min(distance, above)
    stack.push([first, index, significance[index]], [index, last, significance[index]])
  }
  return significance
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
