import { add, complex } from './complex.js'
import { eigenvalues } from './eigenvalues.js'
import type { Dense } from './solve-dense.js'
import { columnOf, columns, couplingsOf, fieldSteps, linewidthOf, motionSteps, type TwoPumpCavity } from './two-pump.js'

/** A way in which the periodically driven system moves: e^{(growth − i·offset)t} in the frame of the pumps' centre, in rad/s. */
export interface TwoPumpExponent {
  readonly growth: number
  readonly offset: number
}

/**
 * Drift of dz/dt = A z of all harmonics, over Ω; a copy at the shift s turns with +is. Motion has two states, q and its velocity over Ω, the second
 * behind all columns of the harmonic matrix.
 */
function drift(cavity: TwoPumpCavity): Dense {
  const { omega, gamma, detuning, halfSpacing } = cavity
  const states = columns + motionSteps.length
  const matrix: Dense = Array.from({ length: states }, () => Array.from({ length: states }, () => complex(0)))
  const put = (row: number, column: number, re: number, im: number): void => {
    matrix[row][column] = add(matrix[row][column], complex(re / omega, im / omega))
  }
  const velocity = (l: number): number => columns + motionSteps.indexOf(l)
  for (const k of fieldSteps) {
    const [a, c] = [columnOf.field(k), columnOf.conjugate(k)]
    const shift = 2 * k * halfSpacing
    put(a, a, -linewidthOf(cavity) / 2, detuning + shift)
    put(c, c, -linewidthOf(cavity) / 2, -detuning + shift)
    for (const { l, toField, toConjugate } of couplingsOf(cavity, k)) {
      const q = columnOf.motion(l)
      put(a, q, 0, toField)
      put(c, q, 0, -toConjugate)
      put(velocity(l), a, 2 * toField, 0)
      put(velocity(l), c, 2 * toConjugate, 0)
    }
  }
  for (const l of motionSteps) {
    const [q, v] = [columnOf.motion(l), velocity(l)]
    const shift = (2 * l + 1) * halfSpacing
    put(q, q, 0, shift)
    put(q, v, omega, 0)
    put(v, q, -omega, 0)
    put(v, v, -gamma, shift)
  }
  return matrix
}

/**
 * The four exponents of a two-pump cavity within half the pumps' distance from the centre, the fastest growing first, from the truncated harmonic
 * matrix. Every exponent comes back at each harmonic; those at the edge of the truncation lack neighbours, those around the centre have them.
 * A working point is stable where none grows. Limit used in tests: without pumps −Γ/2 and −κ/2.
 */
export function twoPumpExponents(cavity: TwoPumpCavity): TwoPumpExponent[] {
  return eigenvalues(drift(cavity))
    .map(({ re, im }) => ({ growth: re * cavity.omega, offset: -im * cavity.omega }))
    .filter(({ offset }) => Math.abs(offset) < cavity.halfSpacing)
    .sort((a, b) => b.growth - a.growth)
}
