import type { Complex, Entry, Injection, Network } from '../model/network.js'
import { add, complex, divide, magnitude, multiply, scale, subtract } from '../physics/complex.js'

/** ω = 2π·anchor + shift, anchor in Hz and shift complex in rad/s, so that a pole next to a mode keeps its digits. */
export interface ComplexFrequency {
  readonly anchor: number
  readonly shift: Complex
}

export const omegaOf = ({ anchor, shift }: ComplexFrequency): Complex => add(complex(2 * Math.PI * anchor), shift)

/** An entry and its derivative by ω at a complex frequency; structural loss as continued from ω > 0. */
function entryAt(entry: Entry, at: ComplexFrequency): { value: Complex; slope: Complex } {
  const omega = omegaOf(at)
  if (entry.form === 'constant') return { value: entry.value, slope: complex(0) }
  if (entry.form === 'decay') {
    return { value: complex(entry.half + omega.im, -(entry.detuning + omega.re)), slope: complex(0, -1) }
  }
  const { mass, frequency, gamma, phi } = entry
  const omega0 = 2 * Math.PI * frequency
  const difference = subtract(complex(2 * Math.PI * (frequency - at.anchor)), at.shift)
  const sign = omega.re < 0 ? -1 : 1
  const loss = complex(omega.im * gamma, -omega.re * gamma - sign * omega0 * omega0 * phi)
  return {
    value: scale(add(multiply(difference, add(complex(omega0), omega)), loss), mass),
    slope: scale(complex(-2 * omega.re, -2 * omega.im - gamma), mass),
  }
}

export type Dense = Complex[][]

/** M(ω) and dM/dω. */
export function denseAt(network: Network, at: ComplexFrequency): { matrix: Dense; slope: Dense } {
  const n = network.unknowns.length
  const empty = (): Dense => Array.from({ length: n }, () => Array.from({ length: n }, () => complex(0)))
  const matrix = empty()
  const slope = empty()
  for (const { row, column, entry } of network.entries) {
    const here = entryAt(entry, at)
    matrix[row][column] = add(matrix[row][column], here.value)
    slope[row][column] = add(slope[row][column], here.slope)
  }
  return { matrix, slope }
}

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

export const transpose = (a: Dense): Dense => a.map((_, i) => a.map(row => row[i]))

/** A right-hand side over all unknowns. */
export function injectionColumn(network: Network, injection: Injection): Complex[] {
  const column = network.unknowns.map(() => complex(0))
  for (const { row, value } of injection.rows) column[row] = add(column[row], value)
  return column
}
