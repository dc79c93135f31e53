import type { Complex, Entry, Injection, Network } from '../model/network.js'
import { add, complex, multiply, scale, subtract } from '../physics/complex.js'
import type { Dense } from '../physics/solve-dense.js'

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

export const transpose = (a: Dense): Dense => a.map((_, i) => a.map(row => row[i]))

/** A right-hand side over all unknowns. */
export function injectionColumn(network: Network, injection: Injection): Complex[] {
  const column = network.unknowns.map(() => complex(0))
  for (const { row, value } of injection.rows) column[row] = add(column[row], value)
  return column
}
