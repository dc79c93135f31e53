import type { Complex } from '../model/network.js'
import { complex, divide, magnitude, multiply, subtract } from './complex.js'

/** Rows of a complex matrix. */
export type Dense = Complex[][]

/**
 * Solves A X = B for small complex matrices by elimination with row exchanges; rows are weighed by their largest entry, since
 * mechanical and field rows have different units. A pivot that vanishes is replaced by rounding noise, as inverse iteration wants.
 */
export function solveDense(a: Dense, b: Dense): Dense {
  const n = a.length
  const weights = a.map(row => 1 / Math.max(...row.map(magnitude), Number.MIN_VALUE))
  const rows = a.map((row, i) => ({ left: [...row], right: [...b[i]], weight: weights[i] }))
  for (let k = 0; k < n; k++) {
    let best = k
    for (let i = k + 1; i < n; i++) {
      if (magnitude(rows[i].left[k]) * rows[i].weight > magnitude(rows[best].left[k]) * rows[best].weight) best = i
    }
    ;[rows[k], rows[best]] = [rows[best], rows[k]]
    const { left, right, weight } = rows[k]
    if (magnitude(left[k]) === 0) left[k] = complex(Number.EPSILON / weight)
    for (let i = k + 1; i < n; i++) {
      const factor = divide(rows[i].left[k], left[k])
      for (let j = k; j < n; j++) rows[i].left[j] = subtract(rows[i].left[j], multiply(factor, left[j]))
      rows[i].right = rows[i].right.map((value, j) => subtract(value, multiply(factor, right[j])))
    }
  }
  for (let k = n - 1; k >= 0; k--) {
    const { left, right } = rows[k]
    rows[k].right = right.map((value, j) => {
      let sum = value
      for (let i = k + 1; i < n; i++) sum = subtract(sum, multiply(left[i], rows[i].right[j]))
      return divide(sum, left[k])
    })
  }
  return rows.map(row => row.right)
}
