import type { Complex, Network } from '../model/network.js'
import { add, complex, magnitude, multiply, scale } from '../physics/complex.js'
import { reducedPlanckConstant } from '../physics/constants.js'
import { eigenvalues } from '../physics/eigenvalues.js'
import { isolate } from '../physics/isolate.js'
import type { Dense } from '../physics/solve-dense.js'

/** Amplitudes of a state in terms of the unknowns: a mode has displacement and velocity, a field its amplitude. */
interface State {
  readonly unknown: number
  readonly derivative: boolean
}

/** Scales of a mechanical unknown: length in m and rate in rad/s, so that its states are of the size of field quanta. */
function scalesOf(network: Network, unknown: number, fastest: number): { length: number; rate: number } {
  const mode = network.modes.find(m => m.unknown === unknown)!
  const rate = mode.frequency > 0 ? 2 * Math.PI * mode.frequency : fastest
  return { length: Math.sqrt(reducedPlanckConstant / (2 * mode.mass * rate)), rate }
}

/**
 * Drift matrix of dz/dt = A z over displacements, velocities and fields, in units of `fastest`. Structural loss stands in as
 * viscous damping Ωφ: good enough for a first guess at its poles.
 */
function driftMatrix(network: Network, fastest: number): Dense {
  const states: State[] = network.unknowns.flatMap(({ nature }, unknown) =>
    nature === 'mechanical'
      ? [
          { unknown, derivative: false },
          { unknown, derivative: true },
        ]
      : [{ unknown, derivative: false }],
  )
  const a: Complex[][] = states.map(() => states.map(() => complex(0)))
  const indexOf = (unknown: number, derivative: boolean): number =>
    states.findIndex(s => s.unknown === unknown && s.derivative === derivative)
  const scaleOf = (unknown: number): number =>
    network.unknowns[unknown].nature === 'field' ? 1 : scalesOf(network, unknown, fastest).length
  for (const { row, column, entry } of network.entries) {
    if (entry.form === 'decay') {
      const i = indexOf(row, false)
      a[i][i] = add(a[i][i], complex(-entry.half, entry.detuning))
    } else if (entry.form === 'oscillator') {
      const { rate } = scalesOf(network, row, fastest)
      const omega0 = 2 * Math.PI * entry.frequency
      const [x, v] = [indexOf(row, false), indexOf(row, true)]
      a[x][v] = add(a[x][v], complex(rate))
      a[v][x] = add(a[v][x], complex((-omega0 * omega0) / rate))
      a[v][v] = add(a[v][v], complex(-entry.gamma - omega0 * entry.phi))
    } else {
      const mode = network.modes.find(m => m.unknown === row)
      const unit = mode === undefined ? 1 : mode.mass * scalesOf(network, row, fastest).rate * scaleOf(row)
      const i = indexOf(row, mode !== undefined)
      const j = indexOf(column, false)
      a[i][j] = add(a[i][j], scale(entry.value, -scaleOf(column) / unit))
    }
  }
  return realDrift(network, states, a, fastest)
}

/** Changes fields (a, a†) to quadratures, in which A is real. */
function realDrift(network: Network, states: readonly State[], a: Complex[][], fastest: number): Dense {
  const root = Math.SQRT1_2
  const u: Complex[][] = states.map((_, i) => states.map((__, j) => complex(i === j ? 1 : 0)))
  const inverse = u.map(row => [...row])
  for (const [i, { unknown }] of states.entries()) {
    const partner = network.unknowns[unknown].conjugate
    if (partner === null || partner < unknown) continue
    const j = states.findIndex(s => s.unknown === partner)
    u[i][i] = u[j][i] = inverse[i][i] = inverse[i][j] = complex(root)
    u[i][j] = complex(0, root)
    u[j][j] = complex(0, -root)
    inverse[j][i] = complex(0, -root)
    inverse[j][j] = complex(0, root)
  }
  const product = (p: Complex[][], q: Complex[][]): Complex[][] =>
    p.map(row => states.map((_, j) => row.reduce((sum, value, k) => add(sum, multiply(value, q[k][j])), complex(0))))
  const drift = product(inverse, product(a, u))
  // What is left of terms that cancel in the change of basis would hide that a row or a column stands alone.
  const sizes = product(modulusOf(inverse), product(modulusOf(a), modulusOf(u)))
  return drift.map((row, i) =>
    row.map((value, j) => complex(Math.abs(value.re) < 1e-15 * sizes[i][j].re ? 0 : value.re / fastest)),
  )
}

const modulusOf = (matrix: Complex[][]): Complex[][] => matrix.map(row => row.map(value => complex(magnitude(value))))

/** The largest rate of a network in rad/s. */
export function fastestRate(network: Network): number {
  const rates = network.entries.map(({ entry }) => {
    if (entry.form === 'decay') return Math.hypot(entry.half, entry.detuning)
    return entry.form === 'oscillator' ? 2 * Math.PI * entry.frequency : 0
  })
  return Math.max(...rates, 1e-3)
}

/** First guesses of all poles as complex angular frequencies, e^{−iωt}: Im ω < 0 decays. Good to rounding of the fastest rate. */
export function poleGuesses(network: Network): Complex[] {
  const fastest = fastestRate(network)
  const { values, rest } = isolate(driftMatrix(network, fastest))
  return [...values, ...(rest.length === 0 ? [] : eigenvalues(rest))].map(s => complex(-s.im * fastest, s.re * fastest))
}
