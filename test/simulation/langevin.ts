import { boltzmannConstant, reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import type { ModeOf, PortOf, ReadoutOf } from '../engine/readout-of.js'
import type { Langevin } from './discretise.js'

/** White noise of one origin: two-sided density, and what a unit of it does to states and records. */
interface Noise {
  readonly id: string
  readonly density: number
  readonly state: readonly number[]
  readonly record: readonly number[]
}

type Pair = readonly [number, number]

const unit = (length: number, index: number, value = 1): number[] =>
  Array.from({ length }, (_, i) => (i === index ? value : 0))

/** Quadrature cos θ X + sin θ Y. */
const along = (theta: number): Pair => [Math.cos(theta), Math.sin(theta)]

const omegaOf = (mode: ModeOf): number => 2 * Math.PI * mode.frequency

/** Γ of a viscous mode. */
const dampingOf = (mode: ModeOf): number => omegaOf(mode) / (mode.quality ?? 1e6)

/** Force of a warm viscous bath, k_BT ≫ ħΩ, two-sided 2k_BTmΓ, on the momentum in units of √(ħmΩ). */
function bath([id, mode]: [string, ModeOf], index: number, states: number): Noise {
  const density = (2 * boltzmannConstant * (mode.temperature ?? 0) * dampingOf(mode)) / (hbar * omegaOf(mode))
  return { id: `${id}.bath`, density, state: unit(states, 2 * index + 1), record: [] }
}

/** Directions of the two quadratures of a port's input with their densities, vacuum ½. */
function inputs(port: PortOf, alpha: number): { direction: Pair; density: number }[] {
  const [level, angle] = port.squeezing ?? [0, 0]
  const quanta = (port.occupancy ?? 0) + 0.5
  const theta = angle + alpha
  return [
    { direction: along(theta), density: quanta * 10 ** (-level / 10) },
    { direction: along(theta + Math.PI / 2), density: quanta * 10 ** (level / 10) },
  ]
}

/** Rows of the record over the output quadratures (X, Y): √2·X_θ of a homodyne, or real and imaginary part of the conjugate amplitude. */
function recordRows(readout: ReadoutOf, carrier: number): Pair[] {
  const { record = Math.PI / 2 } = readout
  if (typeof record === 'number') {
    const [x, y] = along(record + carrier)
    return [[Math.SQRT2 * x, Math.SQRT2 * y]]
  }
  // The conjugate turns e^{−iωt} of the equations into e^{+iωt} of the discrete transform: the upper sideband is at positive bins.
  return [
    [Math.SQRT1_2, 0],
    [0, -Math.SQRT1_2],
  ]
}

/** Drift of (q_k, p_k …, X, Y): q in √(ħ/mΩ), p in √(ħmΩ), a = (X + iY)/√2 in the frame of the mean field. */
function drift(readout: ReadoutOf, kappa: number): number[][] {
  const modes = Object.values(readout.modes)
  const detuning = readout.detuning ?? 0
  const x = 2 * modes.length
  const A = Array.from({ length: x + 2 }, () => new Array<number>(x + 2).fill(0))
  modes.forEach((mode, k) => {
    const [q, p, omega] = [2 * k, 2 * k + 1, omegaOf(mode)]
    const zeroPoint = Math.sqrt(hbar / (2 * mode.mass * omega))
    const g = readout.coupling * (mode.weight ?? 1) * zeroPoint * Math.sqrt(readout.quanta)
    A[q][p] = omega
    A[p][q] = -omega
    A[p][p] = -dampingOf(mode)
    A[p][x] = 2 * g
    A[x + 1][q] = 2 * g
  })
  A[x][x] = A[x + 1][x + 1] = -kappa / 2
  A[x][x + 1] = -detuning
  A[x + 1][x] = detuning
  return A
}

interface Output {
  readonly rows: readonly Pair[]
  readonly efficiency: number
}

function portNoises(readout: ReadoutOf, kappa: number, { rows, efficiency }: Output): Noise[] {
  const x = 2 * Object.keys(readout.modes).length
  const read = readout.reads ?? Object.keys(readout.ports)[0]
  const alpha = Math.atan2(-(readout.detuning ?? 0), kappa / 2)
  return Object.entries(readout.ports).flatMap(([id, port]) =>
    inputs(port, alpha).map(({ direction, density }) => ({
      id: `cavity.${id}`,
      density,
      state: [...new Array<number>(x).fill(0), ...direction.map(value => Math.sqrt(port.rate) * value)],
      record: rows.map(row =>
        id === read ? -Math.sqrt(efficiency) * (row[0] * direction[0] + row[1] * direction[1]) : 0,
      ),
    })),
  )
}

/** Vacuum of the lost light, or quanta that an amplifier adds, straight into the record. */
function recordNoise(id: string, density: number, rows: readonly Pair[]): Noise[] {
  return [0, 1].map(k => ({ id, density, state: [], record: rows.map(row => row[k]) }))
}

function noisesOf(readout: ReadoutOf, kappa: number, output: Output): Noise[] {
  const { modes, added = 0 } = readout
  const states = 2 * Object.keys(modes).length + 2
  return [
    ...Object.entries(modes).map((entry, k) => bath(entry, k, states)),
    ...portNoises(readout, kappa, output),
    ...recordNoise('detector.loss', (1 - output.efficiency) / 2, output.rows),
    ...recordNoise('amplifier.added', added, output.rows),
  ]
}

/** Phase of the mean field that leaves the port that is read, ā real: by reflection of the pump, or from inside alone. */
function carrierPhase(readout: ReadoutOf, kappa: number): number {
  const pumped = Object.keys(readout.ports)[0]
  const read = readout.reads ?? pumped
  return read === pumped ? Math.atan2(readout.detuning ?? 0, readout.ports[read].rate - kappa / 2) : 0
}

/**
 * The same readout in the time domain: a linear system driven by classical Gaussian noise whose correlations are the symmetrised
 * ones of the quantum inputs reproduces every symmetrised spectrum. ȧ = −(κ/2 − iΔ)a + iGāx + Σ√κ_j a_j, ṗ = −mΩ²x − Γp + ħGā(a + a†)
 * [Aspelmeyer, Kippenberg, Marquardt, Rev. Mod. Phys. 86, 1391 (2014), linearised]. The densities of `wrong` are doubled.
 */
export function langevin(readout: ReadoutOf, wrong: string | null = null): Langevin {
  const kappa = Object.values(readout.ports).reduce((sum, port) => sum + port.rate, 0)
  const rate = readout.ports[readout.reads ?? Object.keys(readout.ports)[0]].rate
  const efficiency = readout.efficiency ?? 1
  const rows = recordRows(readout, carrierPhase(readout, kappa))
  const A = drift(readout, kappa)
  const noises = noisesOf(readout, kappa, { rows, efficiency })
  const amplitude = ({ id, density }: Noise): number => Math.sqrt(density * (id === wrong ? 2 : 1))
  const x = A.length - 2
  return {
    A,
    B: A.map((_, i) => noises.map(noise => amplitude(noise) * (noise.state[i] ?? 0))),
    C: rows.map(row => A.map((_, i) => (i < x ? 0 : Math.sqrt(efficiency * rate) * row[i - x]))),
    D: rows.map((_, i) => noises.map(noise => amplitude(noise) * (noise.record[i] ?? 0))),
  }
}
