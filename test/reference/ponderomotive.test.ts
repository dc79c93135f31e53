import { describe, expect, test } from 'vitest'
import { evaluateAtFrequencies } from '../../src/engine/assess.js'
import { boltzmannConstant, reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { readoutOf, type ReadoutOf } from '../engine/readout-of.js'

/*
 * Road: closed form, derived by hand from input-output theory, against the engine's total times response.
 *
 * A tuned cavity of one port: the amplitude of the reflected light keeps its vacuum, the phase takes up the motion that the amplitude
 * drives. Up to a common phase, X_out = X_in and Y_out = Y_in + 𝒦 X_in + thermal motion, 𝒦(ω) = 2ħG²n̄κχ(ω)/(κ²/4 + ω²). The quadrature
 * at θ has, over the vacuum, S_θ = cos²θ + sin²θ (1 + |𝒦|² + thermal) + sin 2θ Re 𝒦, which is below 1 where the last term is negative
 * enough [Fabre et al., Phys. Rev. A 49, 1337 (1994); Mancini, Tombesi, Phys. Rev. A 49, 4055 (1994); Purdy et al., Phys. Rev. X 3,
 * 031012 (2013); Aspelmeyer, Kippenberg, Marquardt, Rev. Mod. Phys. 86, 1391 (2014)].
 */
const turn = 2 * Math.PI
const mass = 1e-12
const omega0 = turn * 1e6
const quanta = 1e6
const zeroPoint = Math.sqrt(hbar / (2 * mass * omega0))

interface Case {
  readonly name: string
  /** κ/2π and g/2π in Hz. */
  readonly kappa: number
  readonly g: number
  readonly quality: number
  readonly temperature: number
  readonly efficiency: number
}

const cases: readonly Case[] = [
  { name: 'broad cavity, cold', kappa: 2e7, g: 3e5, quality: 1e6, temperature: 1e-3, efficiency: 1 },
  {
    name: 'sidebands comparable with the linewidth',
    kappa: 1.5e6,
    g: 5e4,
    quality: 1e6,
    temperature: 1e-3,
    efficiency: 1,
  },
  { name: 'warm, light lost', kappa: 5e6, g: 2e5, quality: 1e5, temperature: 0.5, efficiency: 0.6 },
]

/** Offsets of the frequencies from the mode, in Hz: both sides, where the response is real with either sign. */
const offsets = [-3e5, -3e4, -2e3, 1.5e3, 2e4, 2.5e5, 4e6]
const angles = [0, 0.15, 0.6, Math.PI / 4, Math.PI / 2, 2, 2.7, 3.05]

/** Thermal force of a viscous bath, two-sided and symmetrised: 2·½ħω coth(ħω/2k_BT)·mΓ [Callen, Welton 1951]. */
function thermalForce({ quality, temperature }: Case, omega: number): number {
  const half = (hbar * omega) / (2 * boltzmannConstant * temperature)
  return ((hbar * omega) / Math.tanh(half)) * mass * (omega0 / quality)
}

/** S_θ(ω) in real arithmetic, then the loss of light. */
function closedForm(c: Case, omega: number, theta: number): number {
  const kappa = turn * c.kappa
  const push = (turn * c.g) / zeroPoint
  const lorentz = kappa / ((kappa * kappa) / 4 + omega * omega)
  const real = mass * (omega0 * omega0 - omega * omega)
  const imaginary = (mass * omega0 * omega) / c.quality
  const size = real * real + imaginary * imaginary
  const strength = 2 * hbar * push * push * lorentz
  const cross = (strength * real) / size
  const driven = (strength * strength) / size
  const thermal = (4 * push * push * lorentz * thermalForce(c, omega)) / size
  const [cos, sin] = [Math.cos(theta), Math.sin(theta)]
  const lossless = cos * cos + sin * sin * (1 + driven + thermal) + 2 * sin * cos * cross
  return c.efficiency * lossless + 1 - c.efficiency
}

/** The angle whose noise is least, tan 2θ = −2 Re⟨XY⟩/(⟨YY⟩ − ⟨XX⟩), from the moments at three angles of the closed form. */
function bestAngle(c: Case, omega: number): number {
  const [amplitude, phase] = [closedForm(c, omega, 0), closedForm(c, omega, Math.PI / 2)]
  const cross = closedForm(c, omega, Math.PI / 4) - (amplitude + phase) / 2
  return Math.atan2(-2 * cross, phase - amplitude) / 2
}

/** The same by the engine: record over the vacuum, whose one-sided density in the record is 2. */
function byEngine(c: Case, frequencies: readonly number[], theta: number): number[] {
  const readout: ReadoutOf = {
    modes: { drum: { mass, frequency: omega0 / turn, quality: c.quality, temperature: c.temperature } },
    coupling: (turn * c.g) / zeroPoint / Math.sqrt(quanta),
    ports: { front: { rate: turn * c.kappa } },
    quanta,
    record: theta,
    efficiency: c.efficiency,
  }
  const { total, response } = evaluateAtFrequencies(readoutOf(readout), frequencies)
  return Array.from(total, (value, i) => (value * response[i]) / 2)
}

const frequencies = offsets.map(offset => omega0 / turn + offset)

describe.each(cases)('ponderomotive squeezing: $name', c => {
  // The pure amplitude carries no force signal: the total referred to the force is infinite there, and so left out.
  test.each(angles.filter(theta => theta > 0))('spectrum of the quadrature at %f rad', theta => {
    byEngine(c, frequencies, theta).forEach((value, i) => {
      const exact = closedForm(c, turn * frequencies[i], theta)
      // Squeezing is a difference of large terms: what is lost is counted against the largest of them.
      const scale = closedForm(c, turn * frequencies[i], Math.PI / 2)
      expect(Math.abs(value - exact)).toBeLessThan(1e-10 * scale)
      expect(Math.abs(value / exact - 1)).toBeLessThan(1e-6)
    })
  })

  test('the quadrature predicted is the quietest, and quieter than the vacuum', () => {
    for (const frequency of frequencies) {
      const theta = bestAngle(c, turn * frequency)
      const [here] = byEngine(c, [frequency], theta)
      const beside = [-1e-3, 1e-3].map(step => byEngine(c, [frequency], theta + step)[0])
      expect(here).toBeLessThan(Math.min(...beside))
      expect(here).toBeLessThan(1)
      expect(Math.abs(here / closedForm(c, turn * frequency, theta) - 1)).toBeLessThan(1e-6)
    }
  })

  test('the amplitude of the light alone keeps its vacuum', () => {
    for (const value of byEngine(c, frequencies, 1e-7)) expect(Math.abs(value - 1)).toBeLessThan(1e-2)
  })
})
