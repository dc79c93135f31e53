import type { Complex } from '../model/network.js'
import { add, complex, conjugate, divide, magnitude, multiply, scale, subtract } from './complex.js'
import type { Dense } from './solve-dense.js'

/** A unitary turn of two rows, [[c*, s*], [−s, c]]. */
interface Turn {
  readonly c: Complex
  readonly s: Complex
}

/** The turn that takes (x, y) to (r, 0). */
function turnOf(x: Complex, y: Complex): Turn {
  const r = Math.hypot(magnitude(x), magnitude(y))
  return r === 0 ? { c: complex(1), s: complex(0) } : { c: scale(x, 1 / r), s: scale(y, 1 / r) }
}

/** Turns rows i and j from column `from` on. */
function turnRows(a: Dense, { c, s }: Turn, [i, j]: readonly [number, number], from: number): void {
  for (let k = from; k < a.length; k++) {
    const [x, y] = [a[i][k], a[j][k]]
    a[i][k] = add(multiply(conjugate(c), x), multiply(conjugate(s), y))
    a[j][k] = subtract(multiply(c, y), multiply(s, x))
  }
}

/** Turns columns i and j the other way in rows 0 to `to`, which makes both turns together a similarity. */
function turnColumns(a: Dense, { c, s }: Turn, [i, j]: readonly [number, number], to: number): void {
  for (let k = 0; k <= to; k++) {
    const [x, y] = [a[k][i], a[k][j]]
    a[k][i] = add(multiply(x, c), multiply(y, s))
    a[k][j] = subtract(multiply(y, conjugate(c)), multiply(x, conjugate(s)))
  }
}

/** Makes everything below the first subdiagonal vanish. */
function toHessenberg(a: Dense): void {
  for (let k = 0; k < a.length - 2; k++) {
    for (let i = k + 2; i < a.length; i++) {
      const turn = turnOf(a[k + 1][k], a[i][k])
      turnRows(a, turn, [k + 1, i], k)
      turnColumns(a, turn, [k + 1, i], a.length - 1)
    }
  }
}

function squareRoot(z: Complex): Complex {
  const size = magnitude(z)
  const re = Math.sqrt((size + Math.abs(z.re)) / 2)
  if (re === 0) return complex(0)
  const other = z.im / (2 * re)
  return z.re >= 0 ? complex(re, other) : complex(Math.abs(other), z.im < 0 ? -re : re)
}

/** The eigenvalue of the last two rows up to `end` that is nearer to the corner. */
function shiftAt(a: Dense, end: number): Complex {
  const [p, q, r, s] = [a[end - 1][end - 1], a[end - 1][end], a[end][end - 1], a[end][end]]
  const half = scale(subtract(p, s), 0.5)
  const root = squareRoot(add(multiply(half, half), multiply(q, r)))
  const away = half.re * root.re + half.im * root.im >= 0 ? add(half, root) : subtract(half, root)
  return magnitude(away) === 0 ? s : subtract(s, divide(multiply(q, r), away))
}

/** One step of the shifted QR method on rows `start` to `end`. */
function step(a: Dense, start: number, end: number, shift: Complex): void {
  for (let i = start; i <= end; i++) a[i][i] = subtract(a[i][i], shift)
  const turns: Turn[] = []
  for (let i = start; i < end; i++) {
    const turn = turnOf(a[i][i], a[i + 1][i])
    turnRows(a, turn, [i, i + 1], i)
    turns.push(turn)
  }
  for (const [k, turn] of turns.entries()) turnColumns(a, turn, [start + k, start + k + 1], start + k + 1)
  for (let i = start; i <= end; i++) a[i][i] = add(a[i][i], shift)
}

/** First row of the block that ends at `end`: above it the subdiagonal has vanished to rounding. */
function blockStart(a: Dense, end: number): number {
  let start = end
  while (start > 0) {
    const beside = magnitude(a[start][start]) + magnitude(a[start - 1][start - 1])
    if (magnitude(a[start][start - 1]) <= Number.EPSILON * beside) break
    start--
  }
  return start
}

/**
 * Eigenvalues of a small complex matrix in no particular order, by the shifted QR method on its Hessenberg form [Francis, Comput. J. 4, 265 (1961);
 * Wilkinson, The Algebraic Eigenvalue Problem (Oxford, 1965)], both cited from memory. Good to rounding of the largest entry where the matrix is balanced.
 * The input stays as it is. Throws where it does not settle, which entries that are no numbers bring about.
 */
export function eigenvalues(matrix: Dense): Complex[] {
  const a = matrix.map(row => [...row])
  toHessenberg(a)
  let passes = 0
  for (let end = a.length - 1; end > 0;) {
    const start = blockStart(a, end)
    if (start === end) {
      end--
      passes = 0
      continue
    }
    if (++passes > 60) throw new Error('the eigenvalues of a matrix do not settle')
    // A shift from elsewhere now and then leads out of a cycle.
    const shift = passes % 15 === 0 ? complex(magnitude(a[end][end - 1])) : shiftAt(a, end)
    step(a, start, end, shift)
  }
  return a.map((row, i) => row[i])
}
