import { boltzmannConstant, reducedPlanckConstant } from '../physics/constants.js'
import type { Split } from './arrays.js'
import type { GridArrays } from './grid-arrays.js'

const twoPi = 2 * Math.PI

/**
 * m[Ω² − ω² − i(ωΓ + Ω²φ)] on a block. Ω² − ω² is (Ω − ω)(Ω + ω), and Ω − ω is formed in hertz from the point's anchor
 * and offset, so that nothing cancels next to a resonance of any quality.
 */
export function fillOscillator(
  out: Split,
  grid: GridArrays,
  range: { start: number; n: number },
  { mass, frequency, gamma, phi }: { mass: number; frequency: number; gamma: number; phi: number },
): void {
  const { re, im } = out
  const { omega, base, offset, frequency: f } = grid
  const { start, n } = range
  const constant = -mass * (twoPi * frequency) ** 2 * phi
  const slope = -mass * gamma
  const stiffness = mass * twoPi * twoPi
  for (let i = 0; i < n; i++) {
    const k = start + i
    re[i] = stiffness * (frequency - base[k] - offset[k]) * (frequency + f[k])
    im[i] = slope * omega[k] + constant
  }
}

/** 1/[κ/2 − i(Δ + ω)] on a block. */
export function fillDecayReciprocal(
  out: Split,
  grid: GridArrays,
  range: { start: number; n: number },
  { half, detuning }: { half: number; detuning: number },
): void {
  const { re, im } = out
  const { omega } = grid
  const { start, n } = range
  const square = half * half
  for (let i = 0; i < n; i++) {
    const shift = detuning + omega[start + i]
    const r = 1 / (square + shift * shift)
    re[i] = half * r
    im[i] = shift * r
  }
}

/** x coth x by its Taylor series while x² < 0.01, to double precision. */
function hyperbolic(square: number): number {
  if (square > 0.01) {
    const x = Math.sqrt(square)
    return x / Math.tanh(x)
  }
  return 1 + square * (1 / 3 + square * (-1 / 45 + square * (2 / 945 + square * (-1 / 4725 + (square * 2) / 93555))))
}

/**
 * 4ħω(n(ω,T) + ½) = 4k_BT·x coth x, x = ħω/2k_BT, in J on a block, one-sided; times mΓ the force density of a viscous bath
 * [Callen, Welton 1951]. At T = 0 it is 2ħω.
 */
export function fillBath(
  out: Float64Array,
  grid: GridArrays,
  range: { start: number; n: number },
  temperature: number,
): void {
  const { omega } = grid
  const { start, n } = range
  if (temperature === 0) {
    for (let i = 0; i < n; i++) out[i] = 2 * reducedPlanckConstant * omega[start + i]
    return
  }
  const classical = 4 * boltzmannConstant * temperature
  const ratio = reducedPlanckConstant / (2 * boltzmannConstant * temperature)
  for (let i = 0; i < n; i++) {
    const x = ratio * omega[start + i]
    out[i] = classical * hyperbolic(x * x)
  }
}

/** The same over ω, for a structural bath. */
export function fillBathOverOmega(
  out: Float64Array,
  grid: GridArrays,
  range: { start: number; n: number },
  temperature: number,
): void {
  fillBath(out, grid, range, temperature)
  const { omega } = grid
  for (let i = 0; i < range.n; i++) out[i] /= omega[range.start + i]
}
