import { describe, expect, test } from 'vitest'
import { assess, evaluateAtFrequencies } from '../../src/engine/assess.js'
import type { Evaluation } from '../../src/model/evaluation.js'
import { Refusal } from '../../src/model/problem.js'
import { boltzmannConstant as kB, reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { good } from '../budget/read.js'

/*
 * Road: second derivation. S_F = S_FF + |χ⁻¹|²S_xx + 2Re[χ⁻¹S_xF], written out here in complex arithmetic of its own [Clerk, Devoret, Girvin,
 * Marquardt, Schoelkopf, Rev. Mod. Phys. 82, 1155 (2010), section IV]. 1e-9: next to the resonance of Q = 10⁵ this arithmetic, which
 * has no anchors, loses five digits.
 */

const turn = 2 * Math.PI
const [mass, frequency, quality, temperature] = [2e-12, 1e6, 1e5, 0.01]

const budget = (detector: string): string => `format: 1
title: Drum
revision: 1
measurand: { quantity: force, mode: drum }
readout: detector
band: 0.5 MHz to 2 MHz
components:
  drum: { kind: resonator, mass: 2 ng, frequency: 1 MHz, quality: 1e5, temperature: 10 mK }
  detector: ${detector}
`

const inverse = (f: number): { re: number; im: number } => {
  const [omega, omega0] = [turn * f, turn * frequency]
  return { re: mass * (omega0 ** 2 - omega ** 2), im: (-mass * omega * omega0) / quality }
}

/** Thermal force, viscous, one-sided. */
const thermal = (f: number): number => {
  const omega = turn * f
  const quanta = 1 / Math.expm1((hbar * omega) / (kB * temperature))
  return (4 * hbar * omega * (quanta + 0.5) * mass * turn * frequency) / quality
}

const at = (detector: string, frequencies: readonly number[]): Evaluation =>
  evaluateAtFrequencies(good(budget(detector)), frequencies)

const frequencies = [0.5e6, 0.9e6, 999_990, 1e6, 1_000_007, 1.3e6, 2e6]

/** The message with which a budget is refused. */
function refusal(detector: string): string {
  try {
    assess(good(budget(detector)))
  } catch (error) {
    if (error instanceof Refusal) return error.message
    throw error
  }
  return 'accepted'
}

describe('a detector stated by S_xx, S_FF and S_xF', () => {
  // S_xx = 1e-36 m²/Hz and S_FF = 1e-31 N²/Hz: √(S_xx S_FF) is three ħ.
  test.each([
    [0, 0],
    [0.6, 0],
    [-0.6, 0.1],
    [0.3, -0.4],
  ])('adds S_FF + |χ⁻¹|²S_xx + 2Re[χ⁻¹S_xF], correlation %s + %si', (real, imaginary) => {
    const evaluation = at(
      `{ kind: linear-detector, modes: { drum: 1 }, imprecision: 1 am/√Hz, back_action: 1e-31 N²/Hz, correlation: { real: ${real}, imaginary: ${imaginary} } }`,
      frequencies,
    )
    for (const [i, f] of frequencies.entries()) {
      const { re, im } = inverse(f)
      const cross = Math.sqrt(1e-36 * 1e-31)
      const expected = 1e-31 + (re ** 2 + im ** 2) * 1e-36 + 2 * cross * (re * real - im * imaginary)
      expect(Math.abs(evaluation.added[i] / expected - 1)).toBeLessThan(1e-9)
      expect(Math.abs(evaluation.total[i] / (expected + thermal(f)) - 1)).toBeLessThan(1e-9)
      const { vacuum } = evaluation.sources.find(source => source.id === 'detector.noise')!
      expect(Math.abs(vacuum!.imprecision[i] / ((re ** 2 + im ** 2) * 1e-36) - 1)).toBeLessThan(1e-9)
      expect(Math.abs(vacuum!.backAction[i] / 1e-31 - 1)).toBeLessThan(1e-12)
    }
  })

  test('densities of different shapes: S_xx falls with f, S_FF rises with f²', () => {
    const evaluation = at(
      '{ kind: linear-detector, modes: { drum: 1 }, imprecision: { density: 1e-36 m²/Hz, exponent: -1, reference: 1 MHz }, back_action: { expression: = (1e-31 N²/Hz)*(f/(1 MHz))^2 }, correlation: { real: 0.5 } }',
      frequencies,
    )
    for (const [i, f] of frequencies.entries()) {
      const { re, im } = inverse(f)
      const [sx, sf] = [(1e-36 * 1e6) / f, 1e-31 * (f / 1e6) ** 2]
      const expected = sf + (re ** 2 + im ** 2) * sx + Math.sqrt(sx * sf) * re
      expect(Math.abs(evaluation.added[i] / expected - 1)).toBeLessThan(1e-9)
    }
  })

  test('its own density is √(S_xx S_FF)/2ħ: half a quantum for the best', () => {
    const [x, f] = [1e-18, hbar / 1e-18]
    const { sources } = at(
      `{ kind: linear-detector, modes: { drum: 1 }, imprecision: 1 am/√Hz, back_action: ${f} N/√Hz }`,
      [1e6],
    )
    expect(x * f).toBeCloseTo(hbar, 45)
    expect(sources.find(source => source.id === 'detector.noise')!.own[0]).toBeCloseTo(0.5, 12)
  })

  // Road: limit. Without correlation and at the best strength the sum is 2ħ|χ⁻¹| where S_FF = ħ|χ⁻¹|.
  test('reaches the standard quantum limit at the best strength, off resonance', () => {
    const f = 1.3e6
    const size = Math.hypot(inverse(f).re, inverse(f).im)
    const evaluation = at(
      `{ kind: linear-detector, modes: { drum: 1 }, imprecision: ${Math.sqrt(hbar / size)} m/√Hz, back_action: ${Math.sqrt(hbar * size)} N/√Hz }`,
      [f],
    )
    const sql = evaluation.limits.find(limit => limit.id === 'sql')!.psd[0]
    expect(evaluation.added[0] / sql).toBeCloseTo(1, 10)
    expect(sql / (2 * hbar * size)).toBeCloseTo(1, 10)
    expect(evaluation.limits.find(limit => limit.id === 'energy_bound')!.psd[0] / sql).toBeCloseTo(0.5, 10)
  })

  // Real correlation takes away the real part of χ⁻¹: added noise 2ħ|Im χ⁻¹|, and not a bit less.
  test('reaches the correlation limit with the best real correlation', () => {
    const f = 1.02e6
    const { re, im } = inverse(f)
    const loss = Math.abs(im)
    // S_xx = ħ/|Im χ⁻¹|, S_xF = −Re χ⁻¹ S_xx, S_FF = (ħ² + S_xF²)/S_xx.
    const sxx = hbar / loss
    const sxf = -re * sxx
    const sff = (hbar ** 2 + sxf ** 2) / sxx
    const evaluation = at(
      `{ kind: linear-detector, modes: { drum: 1 }, imprecision: ${sxx} m²/Hz, back_action: ${sff} N²/Hz, correlation: { real: ${sxf / Math.sqrt(sxx * sff)} } }`,
      [f],
    )
    const limit = evaluation.limits.find(each => each.id === 'correlation_limit')!.psd[0]
    // √(S_FF S_xx)/ħ is 4e3: of the square seven digits go.
    expect(Math.abs(evaluation.added[0] / limit - 1)).toBeLessThan(1e-6)
  })
})

describe('a detector that beats the quantum bound is refused with what it claims', () => {
  test('uncorrelated: √(S_xx S_FF) < ħ', () => {
    expect(
      refusal('{ kind: linear-detector, modes: { drum: 1 }, imprecision: 1 am/√Hz, back_action: 5e-17 N/√Hz }'),
    ).toBe(
      '`detector` claims √(S_xx S_FF) = 0.4741 ħ at 500000 Hz, but no detector has less than 1 ħ; raise `imprecision` or `back_action`',
    )
  })

  test('at the frequency where it claims most', () => {
    expect(
      refusal(
        '{ kind: linear-detector, modes: { drum: 1 }, imprecision: { density: 1 am²/Hz, exponent: -2, reference: 1 MHz }, back_action: 1.5e-16 N/√Hz }',
      ),
    ).toBe(
      '`detector` claims √(S_xx S_FF) = 0.7112 ħ at 2000000 Hz, but no detector has less than 1 ħ; raise `imprecision` or `back_action`',
    )
  })

  test('a real correlation takes from the product: S_xx S_FF − S_xF² < ħ²', () => {
    expect(
      refusal(
        '{ kind: linear-detector, modes: { drum: 1 }, imprecision: 1 am/√Hz, back_action: 1.3e-16 N/√Hz, correlation: { real: 0.8 } }',
      ),
    ).toBe(
      '`detector` claims √(S_xx S_FF − (Re S_xF)²) − |Im S_xF| = 0.7396 ħ at 500000 Hz, but no detector has less than 1 ħ; raise `imprecision` or `back_action`',
    )
  })

  // S_xx S_FF − |S_xF|² = 1.28 ħ² would pass a bound that forgets the phase, and the added noise the correlation limit on resonance.
  test('an imaginary one takes more', () => {
    expect(
      refusal(
        '{ kind: linear-detector, modes: { drum: 1 }, imprecision: 1 am/√Hz, back_action: 1.3e-16 N/√Hz, correlation: { imaginary: 0.4 } }',
      ),
    ).toBe(
      '`detector` claims √(S_xx S_FF − (Re S_xF)²) − |Im S_xF| = 0.7396 ħ at 500000 Hz, but no detector has less than 1 ħ; raise `imprecision` or `back_action`',
    )
  })

  test('a good one is accepted, with no word of missing back-action', () => {
    const { warnings, evaluation } = assess(
      good(budget('{ kind: linear-detector, modes: { drum: 1 }, imprecision: 1 am/√Hz, back_action: 1.1e-16 N/√Hz }')),
    )
    expect(warnings).toEqual([])
    expect(evaluation.lines.map(line => line.id)).toContain('back_action')
  })
})
