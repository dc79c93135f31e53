import { Matrix } from 'ml-matrix'
import { reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { occupancy } from '../../src/physics/quanta.js'
import { bignumber, eliminate } from './forty-digits.js'
import type { ReadoutOf } from './readout-of.js'

/** Mode and light as dz/dt = A z + noise over (q₁, p₁, q₂, p₂ …, X, Y), quadratures with the vacuum variance ½. */
export interface Drift {
  readonly drift: Matrix
  readonly diffusion: Matrix
}

/**
 * The same physics as the engine's network, written down anew in the time domain for viscous modes: q̇ = Ωp, ṗ = −Ωq − Γp + 2gX,
 * Ẋ = −κX/2 − ΔY, Ẏ = ΔX − κY/2 + 2Σgq; diffusion 2Γ(n+½) and Σκ_jV_j.
 */
export function driftOf({ modes, coupling, ports, quanta, detuning = 0 }: ReadoutOf): Drift {
  const list = Object.values(modes)
  const size = 2 * list.length + 2
  const [X, Y] = [size - 2, size - 1]
  const drift = Matrix.zeros(size, size)
  const diffusion = Matrix.zeros(size, size)
  for (const [k, { mass, frequency, quality = 1e6, temperature = 0, weight = 1 }] of list.entries()) {
    const [q, p] = [2 * k, 2 * k + 1]
    const omega = 2 * Math.PI * frequency
    const g = coupling * weight * Math.sqrt(quanta) * Math.sqrt(hbar / (2 * mass * omega))
    drift.set(q, p, omega)
    drift.set(p, q, -omega)
    drift.set(p, p, -omega / quality)
    drift.set(p, X, 2 * g)
    drift.set(Y, q, 2 * g)
    diffusion.set(p, p, (2 * omega * (occupancy(omega, temperature) + 0.5)) / quality)
  }
  const kappa = Object.values(ports).reduce((sum, port) => sum + port.rate, 0)
  drift.set(X, X, -kappa / 2)
  drift.set(Y, Y, -kappa / 2)
  drift.set(X, Y, -detuning)
  drift.set(Y, X, detuning)
  for (const { rate, occupancy: n = 0, squeezing = [0, 0] } of Object.values(ports)) {
    const [level, angle] = squeezing
    const phi = angle + Math.atan2(-detuning, kappa / 2)
    const squeezed = Matrix.columnVector([Math.cos(phi), Math.sin(phi)])
    const other = Matrix.columnVector([-Math.sin(phi), Math.cos(phi)])
    const ratio = 10 ** (level / 10)
    const block = Matrix.add(
      squeezed.mmul(squeezed.transpose()).mul(1 / ratio),
      other.mmul(other.transpose()).mul(ratio),
    ).mul(rate * (n + 0.5))
    for (const i of [0, 1]) {
      for (const j of [0, 1]) diffusion.set(X + i, X + j, diffusion.get(X + i, X + j) + block.get(i, j))
    }
  }
  return { drift, diffusion }
}

/**
 * Covariance P of A P + P Aᵀ = −D, as one linear system for the elements on and above the diagonal in 40 digits: its condition is the
 * ratio of the fastest and the slowest rate squared, which leaves too few of sixteen.
 */
export function covarianceOf({ drift, diffusion }: Drift): Matrix {
  const size = drift.rows
  const pairs = Array.from({ length: size }, (_, i) => Array.from({ length: size - i }, (__, k) => [i, i + k])).flat()
  const place = (i: number, j: number): number =>
    pairs.findIndex(([a, b]) => a === Math.min(i, j) && b === Math.max(i, j))
  const rows = pairs.map(([i, j]) => {
    const row = pairs.map(() => bignumber(0))
    for (let k = 0; k < size; k++) {
      const [first, second] = [place(k, j), place(i, k)]
      row[first] = row[first].plus(drift.get(i, k))
      row[second] = row[second].plus(drift.get(j, k))
    }
    return [...row, bignumber(-diffusion.get(i, j))]
  })
  const solution = eliminate(rows).map(row => row[0])
  const covariance = Matrix.zeros(size, size)
  for (const [n, [i, j]] of pairs.entries()) {
    covariance.set(i, j, solution[n].toNumber())
    covariance.set(j, i, solution[n].toNumber())
  }
  return covariance
}

/** n_f = (⟨q²⟩ + ⟨p²⟩)/2 − ½ of each mode. */
export function occupanciesOf(readout: ReadoutOf): number[] {
  const covariance = covarianceOf(driftOf(readout))
  return Object.keys(readout.modes).map(
    (_, k) => (covariance.get(2 * k, 2 * k) + covariance.get(2 * k + 1, 2 * k + 1)) / 2 - 0.5,
  )
}
