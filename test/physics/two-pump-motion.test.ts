import { describe, expect, test } from 'vitest'
import { boltzmannConstant, reducedPlanckConstant } from '../../src/physics/constants.js'
import { quadratureOccupancies } from '../../src/physics/two-pump-occupancy.js'
import { linewidthOf, type TwoPumpCavity } from '../../src/physics/two-pump.js'

/*
 * A second road in time: the covariance C of (q, p, X, Y) obeys dC/dt = A(t)C + CA(t)ᵀ + D with A of the period 2π/Ω_p, and is followed by
 * Runge and Kutta's fourth-order rule until it is periodic. No harmonic is left out, nothing is integrated over frequency.
 */

type Square = number[][]

const twoPi = 2 * Math.PI
const states = [0, 1, 2, 3]

function driftAt(cavity: TwoPumpCavity, time: number): Square {
  const { omega, gamma, detuning, coupling, red, blue, halfSpacing } = cavity
  const strength = Math.SQRT2 * coupling
  const real = strength * (Math.sqrt(red) + Math.sqrt(blue)) * Math.cos(halfSpacing * time)
  const imaginary = strength * (Math.sqrt(red) - Math.sqrt(blue)) * Math.sin(halfSpacing * time)
  const half = linewidthOf(cavity) / 2
  return [
    [0, omega, 0, 0],
    [-omega, -gamma, 2 * real, 2 * imaginary],
    [-imaginary, 0, -half, -detuning],
    [real, 0, detuning, -half],
  ]
}

/** Diagonal of D: white noise of the bath at high temperature, and of the field. */
function diffusion({ gamma, temperature, omega, ports }: TwoPumpCavity): number[] {
  const field = ports.reduce((sum, { rate, occupancy }) => sum + rate * (occupancy + 0.5), 0)
  return [0, (4 * gamma * boltzmannConstant * temperature) / (reducedPlanckConstant * omega), field, field]
}

function slope(a: Square, c: Square, d: readonly number[]): Square {
  const product = states.map(i => states.map(j => states.reduce((sum, k) => sum + a[i][k] * c[k][j], 0)))
  return states.map(i => states.map(j => product[i][j] + product[j][i] + (i === j ? d[i] : 0)))
}

const moved = (c: Square, by: Square, factor: number): Square =>
  c.map((row, i) => row.map((value, j) => value + factor * by[i][j]))

/** Variances of X₁ = (q cos Ω_pt − p sin Ω_pt)/√2 and X₂ = (q sin Ω_pt + p cos Ω_pt)/√2, averaged over the last period. */
function followed(cavity: TwoPumpCavity, periods: number, steps: number): { measured: number; conjugate: number } {
  const d = diffusion(cavity)
  const step = twoPi / cavity.halfSpacing / steps
  const drifts = Array.from({ length: 2 * steps + 1 }, (_, i) => driftAt(cavity, (i * step) / 2))
  const bath = d[1] / (2 * cavity.gamma)
  let c: Square = states.map(i => states.map(j => (i !== j ? 0 : i < 2 ? bath : 0.5)))
  let [measured, conjugate] = [0, 0]
  for (let period = 0; period < periods; period++) {
    ;[measured, conjugate] = [0, 0]
    for (let i = 0; i < steps; i++) {
      const [cos, sin] = [Math.cos((twoPi * i) / steps), Math.sin((twoPi * i) / steps)]
      measured += (c[0][0] * cos * cos - 2 * c[0][1] * cos * sin + c[1][1] * sin * sin) / (2 * steps)
      conjugate += (c[0][0] * sin * sin + 2 * c[0][1] * cos * sin + c[1][1] * cos * cos) / (2 * steps)
      const first = slope(drifts[2 * i], c, d)
      const second = slope(drifts[2 * i + 1], moved(c, first, step / 2), d)
      const third = slope(drifts[2 * i + 1], moved(c, second, step / 2), d)
      const fourth = slope(drifts[2 * i + 2], moved(c, third, step), d)
      const sum = moved(moved(moved(first, second, 2), third, 2), fourth, 1)
      c = moved(c, sum, step / 6)
    }
  }
  return { measured: measured - 0.5, conjugate: conjugate - 0.5 }
}

const omega = twoPi * 5e6

function cavityWith(red: number, blue: number, changes: Partial<TwoPumpCavity> = {}): TwoPumpCavity {
  return {
    mass: 5e-14,
    omega,
    gamma: omega / 2000,
    temperature: 0.05,
    coupling: twoPi * 1e3,
    ports: [{ id: 'front', rate: 0.3 * omega, occupancy: 0.2 }],
    red,
    blue,
    halfSpacing: omega,
    spacingError: 0,
    detuning: 0,
    ...changes,
  }
}

const spaced = 3e-4 * omega

/** What the bath shakes outside of ±Ω_p, where the spectra are not integrated: ∫Γ(n+½)/W² dW/2π on both sides. */
const outside = ({ gamma, temperature, omega: at, halfSpacing }: TwoPumpCavity): number =>
  (gamma * boltzmannConstant * temperature) / (reducedPlanckConstant * at * Math.PI * halfSpacing)

describe('variances of the quadratures, against the covariance followed in time', () => {
  // The phase of the rule's steps is off by a part in 10⁴ to 10³ of the result.
  test.each([
    ['equal pumps', cavityWith(2e4, 2e4, { gamma: omega / 500 }), 600, 80],
    ['imbalanced pumps', cavityWith(2e4, 1.2e4), 600, 120],
    ['imbalanced pumps off the cavity', cavityWith(2e4, 1.2e4, { detuning: 0.05 * omega }), 600, 120],
    ['a wrong spacing', cavityWith(2e4, 1.5e4, { spacingError: spaced, halfSpacing: omega - spaced }), 600, 120],
  ])('%s', (_, cavity, periods, steps) => {
    const expected = followed(cavity, periods, steps)
    const { measured, conjugate } = quadratureOccupancies(cavity)
    const rest = outside(cavity)
    expect(Math.abs((measured + rest) / expected.measured - 1)).toBeLessThan(1e-3)
    expect(Math.abs((conjugate + rest) / expected.conjugate - 1)).toBeLessThan(1e-3)
  })
})
