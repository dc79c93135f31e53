import type { Complex } from '../model/network.js'
import { add, complex, norm, polar, scale } from './complex.js'
import { boltzmannConstant, reducedPlanckConstant } from './constants.js'
import { zeroPointAmplitude, xCothX } from './quanta.js'
import { solveDense, type Dense } from './solve-dense.js'

/** A port of the cavity: κ_j in rad/s and the quanta n_j of its bath. */
export interface TwoPumpPort {
  readonly id: string
  readonly rate: number
  readonly occupancy: number
}

/** One viscous mode in a cavity with two pumps around it; rates in rad/s. */
export interface TwoPumpCavity {
  /** In kg. */
  readonly mass: number
  /** Ω. */
  readonly omega: number
  /** Γ, energy decay rate. */
  readonly gamma: number
  /** Of the mechanical bath, in K. */
  readonly temperature: number
  /** g₀. */
  readonly coupling: number
  readonly ports: readonly TwoPumpPort[]
  /** n₋ and n₊: mean intracavity quanta of the pump below and of the pump above the centre. */
  readonly red: number
  readonly blue: number
  /** Ω_p, half the distance of the pumps. */
  readonly halfSpacing: number
  /** Ω − Ω_p, stated by itself because the difference of the two numbers above has lost its digits. */
  readonly spacingError: number
  /** δ, the pumps' centre minus the cavity. */
  readonly detuning: number
}

/** A row over the unknowns: what is recorded of them, with what the ports put into the record by themselves. */
export interface HarmonicRow {
  readonly terms: readonly { readonly column: number; readonly value: Complex }[]
  /** Of a port's a and a† at the centre, by the port's place in the list. */
  readonly direct?: { readonly port: number; readonly u: Complex; readonly v: Complex }
}

/** Number of harmonics on each side: with two the rest is below rounding for every sideband-resolved cavity. */
const harmonics = 2

/** Fields at W + 2kΩ_p. */
export const fieldSteps = Array.from({ length: 2 * harmonics + 1 }, (_, i) => i - harmonics)

/** Motion at W + (2l+1)Ω_p. */
export const motionSteps = Array.from({ length: 2 * harmonics + 2 }, (_, i) => i - harmonics - 1)

/** Columns of a and a† at W + 2kΩ_p, and of q at W + (2l+1)Ω_p. */
export const columnOf = {
  field: (k: number): number => 2 * (k + harmonics),
  conjugate: (k: number): number => 2 * (k + harmonics) + 1,
  motion: (l: number): number => 2 * fieldSteps.length + l + harmonics + 1,
}

export const columns = 2 * fieldSteps.length + motionSteps.length

/** κ = Σκ_j in rad/s. */
export const linewidthOf = ({ ports }: TwoPumpCavity): number => ports.reduce((sum, port) => sum + port.rate, 0)

/** Motion one Ω_p above and one below the field at step k, with the couplings g₀√n̄ that join it to a and to a†. */
export function couplingsOf(
  { coupling, red, blue }: TwoPumpCavity,
  k: number,
): { l: number; toField: number; toConjugate: number }[] {
  const [below, above] = [coupling * Math.sqrt(red), coupling * Math.sqrt(blue)]
  return [
    { l: k, toField: below, toConjugate: above },
    { l: k - 1, toField: above, toConjugate: below },
  ]
}

/** [Ω² − ω² − iωΓ]/2Ω at ω = W + (2l+1)Ω_p; next to ±Ω the difference of frequencies is formed without cancellation. */
function oscillator({ omega, gamma, halfSpacing, spacingError }: TwoPumpCavity, l: number, offset: number): Complex {
  const frequency = offset + (2 * l + 1) * halfSpacing
  const below = l === 0 ? spacingError - offset : omega - frequency
  const above = l === -1 ? spacingError + offset : omega + frequency
  return complex((below * above) / (2 * omega), (-frequency * gamma) / (2 * omega))
}

/**
 * The harmonic matrix at the offset W (rad/s) from the pumps' centre, all entries in rad/s. With ā(t) = √n₋e^{iΩ_pt} + √n₊e^{−iΩ_pt} and q = x/x_zp:
 * [κ/2 − i(δ+ν)]a(ν) − ig₀[√n₋q(ν+Ω_p) + √n₊q(ν−Ω_p)] = Σ√κ_j a_j at ν = W + 2kΩ_p, its conjugate, and
 * [Ω²−ω²−iωΓ]/2Ω·q(ω) − g₀[√n₋a(ω−Ω_p) + √n₊a(ω+Ω_p) + √n₋a†(ω+Ω_p) + √n₊a†(ω−Ω_p)] = F x_zp/ħ at ω = W + (2l+1)Ω_p.
 */
export function harmonicMatrix(cavity: TwoPumpCavity, offset: number): Dense {
  const matrix: Dense = Array.from({ length: columns }, () => Array.from({ length: columns }, () => complex(0)))
  const half = linewidthOf(cavity) / 2
  const { detuning, halfSpacing } = cavity
  for (const k of fieldSteps) {
    const [a, c] = [columnOf.field(k), columnOf.conjugate(k)]
    const frequency = offset + 2 * k * halfSpacing
    matrix[a][a] = complex(half, -(detuning + frequency))
    matrix[c][c] = complex(half, detuning - frequency)
    for (const { l, toField, toConjugate } of couplingsOf(cavity, k)) {
      const q = columnOf.motion(l)
      matrix[a][q] = complex(0, -toField)
      matrix[c][q] = complex(0, toConjugate)
      matrix[q][a] = complex(-toField)
      matrix[q][c] = complex(-toConjugate)
    }
  }
  for (const l of motionSteps) {
    const q = columnOf.motion(l)
    matrix[q][q] = oscillator(cavity, l, offset)
  }
  return matrix
}

/** w of Mᵀw = row: by column, what an input of that equation does to the record. */
function adjointOf(cavity: TwoPumpCavity, offset: number, row: HarmonicRow): Complex[] {
  const matrix = harmonicMatrix(cavity, offset)
  const right = matrix.map(() => [complex(0)])
  for (const { column, value } of row.terms) right[column] = [add(right[column][0], value)]
  const transposed = matrix.map((_, i) => matrix.map(line => line[i]))
  return solveDense(transposed, right).map(([value]) => value)
}

/** Symmetrised force density 2ħω(n + ½)mΓ·(x_zp/ħ)² of the viscous bath at ω of either sign, two-sided, in the unit of q's equation. */
function bathDensity({ omega, gamma, temperature }: TwoPumpCavity, frequency: number): number {
  const magnitude = Math.abs(frequency)
  const quantum = (reducedPlanckConstant * magnitude) / 2
  const thermal = boltzmannConstant * temperature
  const energy = temperature === 0 ? quantum : thermal * xCothX(quantum / thermal)
  return ((energy / reducedPlanckConstant) * gamma) / omega
}

/** Two-sided symmetrised densities of a row at an offset, by cause, and the squared response to a force at the two motional frequencies. */
export interface HarmonicDensities {
  readonly ports: readonly number[]
  readonly bath: number
  /** |R₊|² + |R₋|², per N². */
  readonly response: number
}

/**
 * Stationary part of the density of a row at the offset W in rad/s: copies of a bath at different harmonics are independent, so that they add
 * as powers.
 */
export function harmonicDensities(cavity: TwoPumpCavity, offset: number, row: HarmonicRow): HarmonicDensities {
  const w = adjointOf(cavity, offset, row)
  const ports = cavity.ports.map(({ rate, occupancy }, j) => {
    const direct = row.direct?.port === j ? row.direct : null
    const through = (column: number, own: Complex | undefined): number =>
      norm(add(scale(w[column], Math.sqrt(rate)), own ?? complex(0)))
    const power = fieldSteps.reduce((sum, k) => {
      const [u, v] = k === 0 ? [direct?.u, direct?.v] : []
      return sum + through(columnOf.field(k), u) + through(columnOf.conjugate(k), v)
    }, 0)
    return power * (occupancy + 0.5)
  })
  const bath = motionSteps.reduce((sum, l) => {
    const frequency = offset + (2 * l + 1) * cavity.halfSpacing
    return sum + norm(w[columnOf.motion(l)]) * bathDensity(cavity, frequency)
  }, 0)
  const unit = zeroPointAmplitude(cavity.mass, cavity.omega) / reducedPlanckConstant
  const response = (norm(w[columnOf.motion(0)]) + norm(w[columnOf.motion(-1)])) * unit * unit
  return { ports, bath, response }
}

/** How the field of a port becomes a record. */
export interface TwoPumpReadout {
  /** Place of the read port in the list. */
  readonly port: number
  /** θ of e^{−iθ}a_out + e^{iθ}a_out† from the common phase of the pumps, in rad; π/2 evades the back-action. */
  readonly angle: number
  readonly efficiency: number
  /** n_add of an amplifier behind the efficiency, on each sideband. */
  readonly added: number
}

/** One-sided force densities in N²/Hz at an offset from the pumps' centre. */
export interface TwoPumpForce {
  /** By port, in the order of the cavity. */
  readonly ports: readonly number[]
  readonly detectionLoss: number
  readonly amplifier: number
  readonly bath: number
  readonly total: number
}

/**
 * Force noise of a two-pump readout by harmonic balance with all counter-rotating terms: S_F = 2S̄_y/(|R₊|² + |R₋|²), R± the responses of the record at
 * W to a force at Ω_p + W and at W − Ω_p. One-sided, N²/Hz; W in rad/s from the centre of the pumps, |W| ≪ Ω_p. One mode, viscous loss, stable
 * working points. Limit used in tests: equal pumps at Ω_p = Ω, where the back-action is known in closed form.
 * [Clerk, Marquardt, Jacobs, New J. Phys. 10, 095010 (2008); Hertzberg et al., Nature Phys. 6, 213 (2010)]
 */
export function twoPumpForce(cavity: TwoPumpCavity, readout: TwoPumpReadout, offset: number): TwoPumpForce {
  const { port, angle, efficiency, added } = readout
  const [u, v] = [polar(Math.sqrt(efficiency), -angle), polar(Math.sqrt(efficiency), angle)]
  const outward = Math.sqrt(cavity.ports[port].rate)
  const densities = harmonicDensities(cavity, offset, {
    terms: [
      { column: columnOf.field(0), value: scale(u, outward) },
      { column: columnOf.conjugate(0), value: scale(v, outward) },
    ],
    direct: { port, u: scale(u, -1), v: scale(v, -1) },
  })
  const refer = (density: number): number => (2 * density) / densities.response
  const ports = densities.ports.map(refer)
  const detectionLoss = refer(1 - efficiency)
  const amplifier = refer(2 * added)
  const bath = refer(densities.bath)
  return { ports, detectionLoss, amplifier, bath, total: [...ports, detectionLoss, amplifier, bath].reduce(sum) }
}

const sum = (a: number, b: number): number => a + b

/**
 * The row of a quadrature of the motion about the pumps, cos φ X₁ + sin φ X₂ with X₁ = (β + β†)/√2, X₂ = −i(β − β†)/√2, β = b e^{iΩ_pt}; b = (q + iq̇/Ω)/2,
 * which at the frequency ω is q(1 + ω/Ω)/2. X₁ is the measured quadrature, X₂ the one that takes the back-action.
 */
export function quadratureRow({ omega, halfSpacing }: TwoPumpCavity, phase: number, offset: number): HarmonicRow {
  const rotating = (1 + (halfSpacing + offset) / omega) / 2
  const counter = (1 + (halfSpacing - offset) / omega) / 2
  return {
    terms: [
      { column: columnOf.motion(0), value: scale(polar(Math.SQRT1_2, -phase), rotating) },
      { column: columnOf.motion(-1), value: scale(polar(Math.SQRT1_2, phase), counter) },
    ],
  }
}
