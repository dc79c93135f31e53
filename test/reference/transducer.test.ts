import { describe, expect, test } from 'vitest'
import { assess, evaluateAtFrequencies } from '../../src/engine/assess.js'
import type { Evaluation } from '../../src/model/evaluation.js'
import { Refusal } from '../../src/model/problem.js'
import { reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { good } from '../budget/read.js'

/*
 * Road: second derivation. The amplifier's record is V + e over the transducer's V(x), its current pushes; both are followed here through the
 * oscillator by hand, with x(ω) = ∫x(t)e^{iωt}dt and so q = i/(−iω) [Clerk et al., Rev. Mod. Phys. 82, 1155 (2010), section V]. 1e-9 for the digits
 * that this arithmetic loses next to the resonance.
 */

const turn = 2 * Math.PI
const [mass, frequency, quality] = [0.1, 1e3, 1e5]

const budget = (transducer: string): string => `format: 1
title: Plate
revision: 1
measurand: { quantity: force, mode: plate }
readout: pickup
band: 500 Hz to 2 kHz
components:
  plate: { kind: resonator, mass: 100 g, frequency: 1 kHz, quality: 1e5, temperature: 0 K }
  pickup: { kind: transducer, modes: { plate: 1 }, ${transducer} }
`

const inverse = (f: number): { re: number; im: number } => {
  const [omega, omega0] = [turn * f, turn * frequency]
  return { re: mass * (omega0 ** 2 - omega ** 2), im: (-mass * omega * omega0) / quality }
}

const at = (transducer: string, frequencies: readonly number[]): Evaluation =>
  evaluateAtFrequencies(good(budget(transducer)), frequencies)

const frequencies = [500, 800, 999.99, 1e3, 1000.02, 1500, 2e3]
const [e, i] = [1e-9, 1e-15]

describe('a transducer read by an amplifier with e_n and i_n', () => {
  // S_xF = ⟨xF*⟩ with x = e/α and F = α i/(−iω): −i⟨ei*⟩/ω; with x = e/(−iωβ) and F = βi: +i⟨ei*⟩/ω.
  test.each([
    ['of displacement', 'per_displacement: 3 MV/m', 3e6, -1],
    ['of velocity', 'per_velocity: 40 V s/m', 40, 1],
  ] as const)('%s: added noise with a complex correlation', (_, factor, alpha, sign) => {
    const [real, imaginary] = [0.5, -0.3]
    const { added, sources } = at(
      `${factor}, voltage_noise: 1 nV/√Hz, current_noise: 1 fA/√Hz, correlation: { real: ${real}, imaginary: ${imaginary} }`,
      frequencies,
    )
    for (const [k, f] of frequencies.entries()) {
      const omega = turn * f
      const { re, im } = inverse(f)
      const sxx = sign < 0 ? (e / alpha) ** 2 : (e / (alpha * omega)) ** 2
      const sff = sign < 0 ? ((alpha * i) / omega) ** 2 : (alpha * i) ** 2
      // ±i(ρ′ + iρ″) = ∓ρ″ ± iρ′.
      const [crossRe, crossIm] = [(-sign * imaginary * e * i) / omega, (sign * real * e * i) / omega]
      const expected = sff + (re ** 2 + im ** 2) * sxx + 2 * (re * crossRe - im * crossIm)
      expect(Math.abs(added[k] / expected - 1)).toBeLessThan(1e-9)
      // e_n i_n/2ħω quanta.
      expect(
        Math.abs(sources.find(source => source.id === 'pickup.noise')!.own[k] / ((e * i) / (2 * hbar * omega)) - 1),
      ).toBeLessThan(1e-12)
    }
  })

  // Road: limit. On resonance |χ⁻¹| = mΓω; at the noise match, α²  = |χ⁻¹|ω e/i, the added noise is that of n_add = e_n i_n/2ħω quanta of the bath.
  test.each([
    [
      'of displacement',
      (size: number, omega: number): string => `per_displacement: ${Math.sqrt((size * omega * e) / i)} V/m`,
    ],
    [
      'of velocity',
      (size: number, omega: number): string => `per_velocity: ${Math.sqrt((size * e) / (i * omega))} V s/m`,
    ],
  ] as const)('%s: n_add = e_n i_n/2ħω at the noise match, and more beside it', (_, matched) => {
    const omega = turn * frequency
    const size = Math.abs(inverse(frequency).im)
    const quanta = (transducer: string): number =>
      at(`${transducer}, voltage_noise: 1 nV/√Hz, current_noise: 1 fA/√Hz`, [frequency]).added[0] / (4 * hbar * size)
    expect(quanta(matched(size, omega)) / ((e * i) / (2 * hbar * omega))).toBeCloseTo(1, 9)
    for (const off of [0.8, 1.25])
      expect(quanta(matched(size * off, omega))).toBeGreaterThan((e * i) / (2 * hbar * omega))
  })

  test('the current noise of a table follows its frequencies', () => {
    const text = budget(
      'per_displacement: 3 MV/m, voltage_noise: 1 nV/√Hz, current_noise: { table: { file: i.csv, units: [Hz, fA/√Hz] } }',
    )
    const { added } = evaluateAtFrequencies(good(text, { 'i.csv': '400,4\n1600,1\n2500,0.64\n' }), [800])
    const { re, im } = inverse(800)
    // Straight in log–log: 2 fA/√Hz at 800 Hz.
    const expected = ((3e6 * 2e-15) / (turn * 800)) ** 2 + (re ** 2 + im ** 2) * (1e-9 / 3e6) ** 2
    expect(Math.abs(added[0] / expected - 1)).toBeLessThan(1e-9)
  })
})

describe('an amplifier that beats e_n i_n ≥ ħω is refused', () => {
  const refusal = (transducer: string): string => {
    try {
      assess(good(budget(transducer)))
    } catch (error) {
      if (error instanceof Refusal) return error.message
      throw error
    }
    return 'accepted'
  }
  // ħω is 6.6e-31 J at 1 kHz and 1.33e-30 J at the upper end of the band.
  const noise = (current: string): string =>
    `per_displacement: 3 MV/m, voltage_noise: 1 pV/√Hz, current_noise: ${current}`

  test('white noise does so first at the upper end of the band', () => {
    expect(refusal(noise('1e-18 A/√Hz'))).toBe(
      '`pickup` claims e_n i_n = 0.7546 ħω at 2000 Hz, but no detector has less than 1 ħω; raise `voltage_noise` or `current_noise`',
    )
    expect(refusal(noise('1.4e-18 A/√Hz'))).toBe('accepted')
  })

  test('what rises with frequency at the lower end', () => {
    expect(refusal(noise('{ density: 1e-18 A/√Hz, exponent: 4, reference: 1 kHz }'))).toBe(
      '`pickup` claims e_n i_n = 0.7546 ħω at 500 Hz, but no detector has less than 1 ħω; raise `voltage_noise` or `current_noise`',
    )
  })

  test('correlation is counted: √(e²i² − (Im)²) − |Re|', () => {
    expect(refusal(`${noise('2e-18 A/√Hz')}, correlation: { real: 0.2, imaginary: 0.6 }`)).toBe(
      '`pickup` claims √(e_n² i_n² − (Im S_VI)²) − |Re S_VI| = 0.9055 ħω at 2000 Hz, but no detector has less than 1 ħω; raise `voltage_noise` or `current_noise`',
    )
  })
})
