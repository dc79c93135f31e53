import { exponential, product, transpose, triangle, zeros, type Matrix } from './matrix.js'

/** ds = A s dt + B dW, and what is recorded: dz = C s dt + D dW; the columns of B and D are the same independent unit noises. */
export interface Langevin {
  readonly A: Matrix
  readonly B: Matrix
  readonly C: Matrix
  readonly D: Matrix
}

/** One step of s together with the mean of the record over the step: (s, y) ← step·s + lower·(unit normal numbers). */
export interface Step {
  readonly states: number
  readonly records: number
  readonly step: Matrix
  readonly lower: Matrix
}

/** (s, z) a time later: propagator·(s, z) + a Gaussian vector of this covariance. */
interface Passage {
  readonly propagator: Matrix
  readonly covariance: Matrix
}

/**
 * The linear system over a time, without error of discretisation: with z in the state, e^{A dt} and the covariance
 * ∫e^{At} B Bᵀ e^{Aᵀt} dt come from one exponential of a matrix twice the size [Van Loan, IEEE Trans. Autom. Control 23,
 * 395 (1978)].
 */
function passage({ A, B, C, D }: Langevin, dt: number): Passage {
  const all = A.length + C.length
  const drift = [...A, ...C].map(row => [...row, ...new Array<number>(C.length).fill(0)])
  const noise = [...B, ...D]
  const diffusion = product(noise, transpose(noise))
  const double = zeros(2 * all, 2 * all)
  for (let i = 0; i < all; i++) {
    for (let j = 0; j < all; j++) {
      double[i][j] = -drift[i][j] * dt
      double[i][all + j] = diffusion[i][j] * dt
      double[all + i][all + j] = drift[j][i] * dt
    }
  }
  const power = exponential(double)
  const propagator = transpose(power.slice(all).map(row => row.slice(all)))
  const corner = power.slice(0, all).map(row => row.slice(all))
  return { propagator, covariance: product(propagator, corner) }
}

/** The record is averaged over the sample, so that white noise needs no cut-off. */
function sampled({ propagator, covariance }: Passage, { A, C }: Langevin, dt: number): Step {
  const states = A.length
  const mean = (rows: Matrix): number[][] => rows.map((row, i) => row.map(value => (i < states ? value : value / dt)))
  const step = mean(propagator.map(row => row.slice(0, states)))
  return { states, records: C.length, step, lower: mean(triangle(covariance)) }
}

/** One sample of a system with constant coefficients, exact. */
export function discretise(system: Langevin, dt: number): Step {
  return sampled(passage(system, dt), system, dt)
}

/** One sample of a system whose coefficients repeat with the sample: exact steps through its parts, one after the other, all of equal length. */
export function discretisePeriodic(parts: readonly Langevin[], period: number): Step {
  const whole = parts
    .map(part => passage(part, period / parts.length))
    .reduce((before, { propagator, covariance }) => {
      const carried = product(product(propagator, before.covariance), transpose(propagator))
      return {
        propagator: product(propagator, before.propagator),
        covariance: carried.map((row, i) => row.map((value, j) => value + covariance[i][j])),
      }
    })
  return sampled(whole, parts[0], period)
}
