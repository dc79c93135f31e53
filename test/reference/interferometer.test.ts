import { describe, expect, test } from 'vitest'
import { evaluateAtFrequencies } from '../../src/engine/assess.js'
import type { Evaluation } from '../../src/model/evaluation.js'
import { reducedPlanckConstant as hbar, speedOfLight as c } from '../../src/physics/constants.js'
import { readoutOf } from '../engine/readout-of.js'

/*
 * Road: published formulas. A tuned Fabry–Perot Michelson interferometer is one cavity with a free mass m/4, G = ω₀/2L, κ = 2γ,
 * n̄ = 4P L/(ħω₀c) at arm power P, pushed by F = (m/4)Lω²h [Kimble, Levin, Matsko, Thorne, Vyatchanin, Phys. Rev. D 65, 022002 (2001)].
 * The formulas are exact for this model, so that 1e-10 leaves rounding alone: the response of a free mass over the band of a factor 1e4
 * loses about three digits.
 */

const turn = 2 * Math.PI
const wavelength = 1.064e-6
const omega0 = (turn * c) / wavelength
const [m, L, gamma, power] = [40, 4000, turn * 100, 2e5]

interface Light {
  readonly record?: number
  readonly squeezing?: readonly [number, number]
  readonly armPower?: number
}

/** √S_h at a frequency in Hz, with both forms of K: [strain PSD over h_SQL²/2, K]. */
function reduced(
  frequency: number,
  { record = Math.PI / 2, squeezing, armPower = power }: Light = {},
): [number, number] {
  const evaluation = evaluateAtFrequencies(
    readoutOf({
      modes: { mirror: { mass: m / 4, frequency: 0 } },
      cavityFrequency: omega0 / turn,
      coupling: omega0 / (2 * L),
      ports: { front: { rate: 2 * gamma, ...(squeezing !== undefined && { squeezing }) } },
      quanta: (4 * armPower * L) / (hbar * omega0 * c),
      record,
    }),
    [frequency],
  )
  const omega = turn * frequency
  const strain = evaluation.total[0] / ((m / 4) * L * omega ** 2) ** 2
  const sql = (8 * hbar) / (m * omega ** 2 * L ** 2)
  const K = (16 * omega0 * armPower * gamma) / (m * L * c * omega ** 2 * (gamma ** 2 + omega ** 2))
  return [strain / (sql / 2), K]
}

const frequencies = [1, 7, 31, 100, 180, 1e3, 9e3]

describe('tuned Fabry–Perot Michelson interferometer', () => {
  test.each(frequencies)('S_h = (h_SQL²/2)(K + 1/K) at %s Hz', frequency => {
    const [strain, K] = reduced(frequency)
    expect(Math.abs(strain / (K + 1 / K) - 1)).toBeLessThan(1e-10)
  })

  // Squeezed vacuum of a fixed angle; phase-squeezed light lowers shot noise and raises radiation pressure.
  test.each(frequencies)('10 dB of phase squeezing, (h_SQL²/2)(K e^{2r} + e^{−2r}/K) at %s Hz', frequency => {
    const [strain, K] = reduced(frequency, { squeezing: [10, Math.PI / 2] })
    expect(Math.abs(strain / (10 * K + 0.1 / K) - 1)).toBeLessThan(1e-10)
  })

  test.each(frequencies)('squeezing along the measured quadrature gains e^{−2r} at %s Hz', frequency => {
    const [, K] = reduced(frequency)
    const [strain] = reduced(frequency, { squeezing: [10, Math.atan2(1, -K)] })
    // The antisqueezed quadrature, a hundred times as loud in power, must cancel here: two digits less.
    expect(Math.abs(strain / (0.1 * (K + 1 / K)) - 1)).toBeLessThan(1e-8)
  })

  // Variational output: homodyne angle ζ with cot ζ = K removes radiation pressure and leaves shot noise.
  test.each(frequencies)('variational angle, (h_SQL²/2)[1 + (cot ζ − K)²]/K at %s Hz', frequency => {
    const [, K] = reduced(frequency)
    for (const cotangent of [K, 0.5 * K, 2, -1]) {
      const [strain] = reduced(frequency, { record: Math.atan2(1, cotangent) })
      const scale = (1 + K ** 2) / K
      expect(Math.abs(strain - (1 + (cotangent - K) ** 2) / K) / scale).toBeLessThan(1e-10)
    }
  })

  // I_SQL = mL²γ⁴/4ω₀ is the input power at which K(γ) = 1; checks D18, D19, D20 with 30 kg.
  test('input power of the standard quantum limit', () => {
    const atLimit = (m * L ** 2 * gamma ** 4) / (4 * omega0)
    // Arm power of a lossless interferometer: half of the input enters each arm and is built up by 4/T = c/(Lγ).
    const armPower = (atLimit * c) / (2 * L * gamma)
    const [strain, K] = reduced(100, { armPower })
    expect(K).toBeCloseTo(1, 12)
    expect(strain / 2).toBeCloseTo(1, 10)
    const [twice] = reduced(200, { armPower })
    expect(Math.sqrt(twice / 2) / 2.247220505424423).toBeCloseTo(1, 9)
    // Printed as 1.0e4 W and 2e-24/√Hz for 30 kg (from memory): two digits and one.
    expect(Math.abs((30 * L ** 2 * gamma ** 4) / (4 * omega0) / 1e4 - 1)).toBeLessThan(0.07)
  })

  test('standard quantum limit as a strain: 2e-24 for 30 kg at 100 Hz (from memory), √(8ħ/mω²L²)', () => {
    const heavy = limitAsStrain(30 / 4, 100)
    expect(Math.abs(heavy / 2e-24 - 1)).toBeLessThan(0.06)
    expect(heavy / Math.sqrt((8 * hbar) / (30 * (turn * 100) ** 2 * L ** 2))).toBeCloseTo(1, 12)
    // Two free end mirrors, reduced mass m/2: 1/√2 of it; check D22.
    expect(limitAsStrain(30 / 2, 100) / heavy).toBeCloseTo(Math.SQRT1_2, 12)
  })
})

/** The engine's standard quantum limit of a free mass as a strain amplitude density. */
function limitAsStrain(mass: number, frequency: number): number {
  const evaluation = evaluateAtFrequencies(
    readoutOf({
      modes: { mirror: { mass, frequency: 0 } },
      coupling: 1e18,
      ports: { front: { rate: 1e3 } },
      quanta: 1e10,
    }),
    [frequency],
  )
  const sql = evaluation.limits.find(limit => limit.id === 'sql')!.psd[0]
  return Math.sqrt(sql) / (mass * L * (turn * frequency) ** 2)
}

/*
 * Road: limit. A Michelson interferometer without arm cavities, dark port, two free end mirrors, is a cavity of any κ ≫ ω whose G = kκ/4
 * gives its reflected light the phase k(x₁ − x₂), with the reduced mass m/2. 1e-8: (ω/κ)² = 4e-19 and four digits that the published form
 * does not share with the engine's constants.
 */
describe('Michelson interferometer without cavities: 10 W, 10 kg, 4 km, 1064 nm', () => {
  const kappa = 1e12
  const michelson = (watts: number, frequency: number): { shot: number; pressure: number; total: number } => {
    const evaluation: Evaluation = evaluateAtFrequencies(
      readoutOf({
        modes: { difference: { mass: 10 / 2, frequency: 0 } },
        cavityFrequency: omega0 / turn,
        coupling: ((turn / wavelength) * kappa) / 4,
        ports: { front: { rate: kappa } },
        quanta: (4 * watts) / (hbar * omega0 * kappa),
      }),
      [frequency],
    )
    const force = (10 / 2) * L * (turn * frequency) ** 2
    const { imprecision, backAction } = evaluation.sources.find(s => s.id === 'cavity.front')!.vacuum!
    const strain = (psd: number): number => Math.sqrt(psd) / force
    return { shot: strain(imprecision[0]), pressure: strain(backAction[0]), total: strain(evaluation.total[0]) }
  }

  test('shot noise (1/L)√(ħcλ/4πP)', () => {
    // Saulson's textbook form, mid-fringe with one port, is √2 larger.
    expect(michelson(10, 100).shot / 4.090292093013533e-21).toBeCloseTo(1, 8)
  })

  test('radiation pressure (1/mf²L)√(ħP/π³cλ)', () => {
    expect(michelson(10, 100).pressure / 8.163419504186148e-28).toBeCloseTo(1, 8)
  })

  test('the least sum over power is the limit of two free mirrors, √(4ħ/mω²L²)', () => {
    const { shot, pressure } = michelson(10, 100)
    const limit = (4 * hbar) / (10 * (turn * 100) ** 2 * L ** 2)
    expect((2 * shot * pressure) / limit).toBeCloseTo(1, 9)
    expect(michelson((10 * shot) / pressure, 100).total ** 2 / limit).toBeCloseTo(1, 9)
  })
})
