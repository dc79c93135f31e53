import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { prepare } from '../../src/engine/assess.js'
import { modeStates } from '../../src/engine/states.js'
import type { ModeState } from '../../src/model/assessment.js'
import type { Budget } from '../../src/model/budget.js'
import { Refusal } from '../../src/model/problem.js'
import { reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { groundStateProbability, temperatureOfOccupancy } from '../../src/physics/quanta.js'
import { occupanciesOf } from '../engine/lyapunov.js'
import { randomReadout } from '../engine/random-readout.js'
import { readoutOf, type ReadoutOf } from '../engine/readout-of.js'
import { budgetOfCase, cavityCases } from './cavity-case.js'

const turn = 2 * Math.PI

function statesOf(budget: Budget): ModeState[] {
  const { network, poles } = prepare(budget)
  return modeStates(budget, network, { poles, changes: null })
}

/** A drum of a picogram in a cavity, all frequencies and rates in Hz. */
interface Cooled {
  readonly Omega: number
  readonly Gamma: number
  readonly kappa: number
  readonly g: number
  readonly Delta: number
  /** Quanta of the mechanical bath and of the cavity's. */
  readonly nth?: number
  readonly nc?: number
}

function cooled({ Omega, Gamma, kappa, g, Delta, nth = 0, nc = 0 }: Cooled): ReadoutOf {
  const mass = 4.8e-14
  const quanta = 1e4
  const zeroPoint = Math.sqrt(hbar / (2 * mass * turn * Omega))
  const temperature = nth === 0 ? 0 : temperatureOfOccupancy(turn * Omega, nth)
  return {
    modes: { drum: { mass, frequency: Omega, quality: Omega / Gamma, temperature } },
    cavityFrequency: 7.5e9,
    coupling: (turn * g) / Math.sqrt(quanta) / zeroPoint,
    ports: { out: { rate: turn * kappa, occupancy: nc } },
    quanta,
    detuning: turn * Delta,
  }
}

const state = (values: Cooled): ModeState => statesOf(readoutOf(cooled(values)))[0]

const relative = (actual: number | null, expected: number): number => Math.abs(actual! / expected - 1)

describe('working points with a known final occupancy', () => {
  // Second derivation: Lyapunov equation in 40 digits. 1e-8 is what the reference states of itself.
  const known = cavityCases.filter(c => c.stable && c.final_occupancy !== null)
  test.each(known.map(c => [c.id, c] as const))('%s', (_, working) => {
    const [mode] = statesOf(budgetOfCase(working))
    expect(relative(mode.finalOccupancy, working.final_occupancy!)).toBeLessThan(1e-8)
  })

  test('there are thirteen', () => expect(known.length).toBe(13))
})

describe('random working points against the Lyapunov equation', () => {
  // Second derivation, in the time domain and in 40 digits. 1e-10 of n + ½ leaves the rounding of poles and of some 10³ integration points.
  test.each([1, 2, 3])('%s modes in one cavity', modes => {
    let compared = 0
    fc.assert(
      fc.property(randomReadout({ modes: [modes, modes] }), random => {
        const viscous = Object.entries(random.modes).map(([id, mode], k) => [
          id,
          {
            ...mode,
            law: 'viscous' as const,
            quality: Math.min(mode.quality!, 1e5),
            frequency: mode.frequency * 1.3 ** k,
          },
        ])
        const readout = { ...random, modes: Object.fromEntries(viscous) } as ReadoutOf
        let budget: ReturnType<typeof statesOf>
        try {
          budget = statesOf(readoutOf(readout))
        } catch (error) {
          if (error instanceof Refusal) return
          throw error
        }
        const expected = occupanciesOf(readout)
        for (const [k, { finalOccupancy }] of budget.entries()) {
          expect(Math.abs(finalOccupancy! - expected[k]) / (expected[k] + 0.5)).toBeLessThan(1e-10)
        }
        compared++
      }),
      { numRuns: 60, seed: 20263, endOnFailure: true },
    )
    expect(compared).toBeGreaterThan(25)
  })
})

describe('sideband cooling, weak coupling', () => {
  // Published limits [Marquardt, Chen, Clerk, Girvin, PRL 99, 093902 (2007); Wilson-Rae et al., PRL 99, 093901 (2007)]; corrections are
  // of the order 8(g/κ)² = 8e-6 for g = κ/1000 and Γ_opt/κ.
  test('(κ/4Ω)² at Δ = −Ω: 2.24e-5 quanta for κ/Ω = 0.2/10.56', () => {
    const Gamma = 1e-7
    const { finalOccupancy } = state({ Omega: 10.56e6, Gamma, kappa: 0.2e6, g: 200, Delta: -10.56e6 })
    expect(relative(finalOccupancy, 2.2418790174471994e-5)).toBeLessThan(3e-5)
  })

  test('Doppler limit at the best detuning: 4.525 quanta for κ = 20 Ω', () => {
    const Omega = 1e5
    const kappa = 20 * Omega
    const Delta = -Math.sqrt(Omega ** 2 + kappa ** 2 / 4)
    // 8Ω/κ is the steepest slope of the limit, so that Γ_opt/Ω = 1e-5 leaves a few parts in 1e5.
    const { finalOccupancy } = state({ Omega, Gamma: 1e-7, kappa, g: 1e3, Delta })
    expect(relative(finalOccupancy, 4.524937810560445)).toBeLessThan(1e-4)
    const elsewhere = [0.9, 1.1].map(
      part => state({ Omega, Gamma: 1e-7, kappa, g: 1e3, Delta: Delta * part }).finalOccupancy!,
    )
    expect(Math.min(...elsewhere)).toBeGreaterThan(4.524937810560445)
  })

  test.each([0.02, 0.3, 2, 10])('balance of bath and light at κ = %s Ω', ratio => {
    const [Omega, Gamma, nth] = [1e6, 3, 250]
    const kappa = ratio * Omega
    const g = 1e-3 * Math.min(kappa, Omega)
    const optical = ((4 * g * g) / kappa) * (1 - 1 / (1 + (4 * Omega) ** 2 / kappa ** 2))
    const { finalOccupancy, effectiveLinewidth } = state({ Omega, Gamma, kappa, g, Delta: -Omega, nth })
    const expected = (Gamma * nth + optical * (kappa / (4 * Omega)) ** 2) / (Gamma + optical)
    expect(relative(finalOccupancy, expected)).toBeLessThan(5e-5)
    expect(relative(effectiveLinewidth, Gamma + optical)).toBeLessThan(5e-5)
  })
})

describe('sideband cooling, strong drive', () => {
  // Published formula [Dobrindt, Wilson-Rae, Kippenberg, PRL 101, 263602 (2008); Teufel et al., Nature 475, 359 (2011)] for Γ ≪ κ ≪ Ω,
  // 2g < Ω: terms left out are of relative order κ/Ω squared and Γ/κ.
  const device = { Omega: 10.56e6, Gamma: 32, kappa: 200e3, Delta: -10.56e6, nth: 39 }
  const formula = (g: number, nc: number): number => {
    const { Omega, Gamma, kappa, nth } = device
    const all = 4 * g * g + kappa * Gamma
    return (
      (nth * (Gamma / kappa) * (4 * g * g + kappa ** 2)) / all +
      (nc * 4 * g * g) / all +
      (kappa ** 2 + 8 * g * g) / (16 * (Omega ** 2 - 4 * g * g))
    )
  }

  test.each([
    [40, 0],
    [4000, 0],
    [180000, 0],
    [4000, 0.3],
    [180000, 2],
  ])('%s drive quanta, cavity occupancy %s', (quanta, nc) => {
    const g = 200 * Math.sqrt(quanta)
    expect(relative(state({ ...device, g, nc }).finalOccupancy, formula(g, nc))).toBeLessThan(1e-3)
  })

  test('a drum at 20 mK and 4000 quanta: printed 0.34(5); device numbers from memory, one sigma low; probability of the ground state', () => {
    const { finalOccupancy, cooperativity } = state({ ...device, g: 200 * Math.sqrt(4000) })
    // Teufel et al., Nature 475, 359 (2011). The round numbers from memory give 0.392.
    expect(relative(finalOccupancy, 0.34)).toBeLessThan(0.2)
    expect(groundStateProbability(finalOccupancy!)).toBeGreaterThan(0.7)
    // 4g₀²n̄/κΓ with these round numbers.
    expect(cooperativity).toBeCloseTo(100, 9)
  })

  test('180000 quanta, without the quantum limit of the pump: 0.0149', () => {
    // Computed from the first two terms alone; the third is (κ² + 8g²)/16Ω² = 5.5e-5.
    const g = 200 * Math.sqrt(180000)
    const limit = (device.kappa ** 2 + 8 * g * g) / (16 * (device.Omega ** 2 - 4 * g * g))
    expect(relative(state({ ...device, g }).finalOccupancy! - limit, 0.014903354810042211)).toBeLessThan(1e-3)
  })
})

describe('damping and spring of light', () => {
  // Published formulas [Aspelmeyer, Kippenberg, Marquardt, RMP 86, 1391 (2014)], first order in g²/κ².
  const [Omega, kappa] = [1e6, 2e5]
  const damping = (g: number, Delta: number): number =>
    g * g * kappa * (1 / (kappa ** 2 / 4 + (Delta + Omega) ** 2) - 1 / (kappa ** 2 / 4 + (Delta - Omega) ** 2))
  const shift = (g: number, Delta: number): number =>
    g *
    g *
    ((Delta + Omega) / (kappa ** 2 / 4 + (Delta + Omega) ** 2) +
      (Delta - Omega) / (kappa ** 2 / 4 + (Delta - Omega) ** 2))

  test('red sideband, 1000 quanta at 100 Hz: 199.5 Hz of damping', () => {
    const g = 100 * Math.sqrt(1000)
    const { effectiveLinewidth, linewidth } = state({ Omega, kappa, Gamma: 1, g, Delta: -Omega })
    // The full linear system differs from the formula by 0.15 %, 4(g/κ)².
    expect(relative(effectiveLinewidth - linewidth, 199.50124688279303)).toBeLessThan(2e-3)
    expect(damping(g, -Omega) / 199.50124688279303).toBeCloseTo(1, 6)
  })

  test.each([-1.3, -1, -0.9, -0.2, 0, 0.01])('weak light at Δ = %s Ω', part => {
    const [g, Delta] = [20, part * Omega]
    const { effectiveLinewidth, linewidth, effectiveFrequency } = state({ Omega, kappa, Gamma: 0.01, g, Delta })
    // Left out: Γ/κ and 4(g/κ)², some 1e-7.
    const scale = (g * g) / kappa
    expect(Math.abs(effectiveLinewidth - linewidth - damping(g, Delta)) / scale).toBeLessThan(1e-6)
    expect(Math.abs(effectiveFrequency - Omega - shift(g, Delta)) / scale).toBeLessThan(1e-6)
  })

  test('static spring far inside the linewidth: K = −2ħG²n̄Δ/(κ²/4 + Δ²) holds a mode up', () => {
    // Ω ≪ κ: mΩ_eff² = mΩ² + K; the delay of the light is a damping of first order in Ω/κ, its effect here of second.
    const [low, wide] = [1e2, 1e9]
    const Delta = 3e8
    const g = 3e5
    const readout = cooled({ Omega: low, Gamma: 1e-1, kappa: wide, g, Delta })
    const expected = low * Math.sqrt(1 + (4 * g * g * Delta) / (low * (wide ** 2 / 4 + Delta ** 2)))
    const [{ effectiveFrequency }] = statesOf(readoutOf(readout))
    expect(relative(effectiveFrequency, expected)).toBeLessThan(1e-6)
    expect(expected / low).toBeGreaterThan(1.5)
  })
})

describe('occupancy without cooling', () => {
  // Limit: light that does not act leaves the bath, whose occupancy is n(Ω,T); 1e-9 is the quadrature.
  test.each([0, 1e-3, 4, 1e5])('bath of %s quanta', nth => {
    const { finalOccupancy, thermalOccupancy } = state({ Omega: 1e6, Gamma: 10, kappa: 1e5, g: 1e-6, Delta: 0, nth })
    expect(Math.abs(thermalOccupancy - nth) / (nth + 0.5)).toBeLessThan(1e-12)
    expect(Math.abs(finalOccupancy! - nth) / (nth + 0.5)).toBeLessThan(1e-9)
  })
})
