import { describe, expect, it } from 'vitest'
import { evaluateAtFrequencies } from '../../src/engine/assess.js'
import { asdOf, demo, demoBudget, largestAt } from './demo.js'

/**
 * What the summaries of the demo budgets say, and estimates by hand from published formulas, with the budgets' numbers
 * typed in again. A relative tolerance of 1 % stands for what the estimates leave out: the other mode, the optical spring,
 * corrections of order κ²/Ω² and of the counter-rotating sideband.
 */
const hbar = 1.054571817e-34 // CODATA 2022, exact by definition of h
const k = 1.380649e-23 // CODATA 2022, exact
const turn = 2 * Math.PI

function expectNear(value: number | null | undefined, estimate: number, tolerance = 0.01): void {
  expect(Math.abs((value ?? NaN) / estimate - 1), `${value} against ${estimate}`).toBeLessThan(tolerance)
}

/** Quanta in the cavity: n̄ = P κ_in / (ħω (κ²/4 + Δ²)) [Aspelmeyer, Kippenberg, Marquardt 2014], rates in Hz. */
function quanta(power: number, frequency: number, [input, total, detuning]: readonly [number, number, number]): number {
  return (power * input) / turn / (hbar * turn * frequency * (total ** 2 / 4 + detuning ** 2))
}

describe('avocet, a membrane in an optical cavity', () => {
  const f0 = 1.24312e6
  const mass = 3.1e-12
  const n = quanta(32e-6, 281.8e12, [0.52e6, 6.1e6, -0.32e6])
  const G = turn * 21.3e15

  it('holds the quanta, coupling and cooperativity of the handbook', () => {
    const { cavities, modes } = demo('avocet')
    const zeroPoint = Math.sqrt(hbar / (2 * mass * turn * f0))
    const gamma = turn * f0 * (1 / 2.4e8 + 1 / 6e8)
    expectNear(cavities[0]?.quanta, n, 1e-6)
    expectNear(modes[0]?.zeroPoint, zeroPoint, 1e-9)
    expectNear(modes[0]?.cooperativity, (4 * (G * zeroPoint) ** 2 * n) / (turn * 6.1e6 * gamma), 1e-6)
    expectNear(modes[0]?.thermalOccupancy, (k * 4.3) / (hbar * turn * f0), 1e-4)
    // g₀/2π of some tens of hertz is what a membrane in the middle of a short cavity has.
    expect((G * zeroPoint) / turn).toBeCloseTo(31.4, 1)
  })

  it('has the bath of its film and of its gas, √(4kTmΓ) [Saulson 1990]', () => {
    expectNear(asdOf('avocet', 'intrinsic', 1.243e6), Math.sqrt((4 * k * 4.3 * mass * turn * f0) / 2.4e8))
    expectNear(asdOf('avocet', 'gas', 1.243e6), Math.sqrt((4 * k * 4.3 * mass * turn * f0) / 6e8))
  })

  it('has the gas damping of its pressure, Q = (π/2)^{3/2} ρtf √(RT/M)/p [Christian 1966]', () => {
    // Film of 50 nm and 3.1 g/cm³, helium at 4.3 K and 60 µPa; the file rounds to 6e8.
    const Q = ((Math.PI / 2) ** 1.5 * 3100 * 50e-9 * f0 * Math.sqrt((8.314 * 4.3) / 4.0026e-3)) / 60e-6
    expectNear(Q, 6e8, 0.02)
  })

  it('has the back-action of its light, ħ²G²n̄κ(|χ_c(ω)|² + |χ_c(−ω)|²) [Clerk et al. 2010]', () => {
    const kappa = turn * 6.1e6
    const response = (f: number) => 1 / (kappa ** 2 / 4 + (turn * f) ** 2)
    const S = (hbar * G) ** 2 * n * kappa * (response(-0.32e6 + 1.243e6) + response(-0.32e6 - 1.243e6))
    expectNear(asdOf('avocet', 'back_action', 1.243e6), Math.sqrt(S))
  })

  it('would have, colder and with less loss, the bath of that film alone', () => {
    const [cold] = demoBudget('avocet').variants
    const line = cold && evaluateAtFrequencies(cold.budget, [1.243e6]).lines.find(({ id }) => id === 'intrinsic')
    // 335 quanta: the half quantum of the zero-point motion counts for a part in a thousand.
    expectNear(Math.sqrt(line?.psd[0] ?? NaN), Math.sqrt((4 * k * 20e-3 * mass * turn * f0) / 2.4e9))
    expect(cold?.budget.lines.map(({ id }) => id)).not.toContain('gas')
  })

  it('is limited as its summary says', () => {
    const { headlines } = demo('avocet')
    expect(headlines.best.asd).toBeGreaterThan(9e-18)
    expect(headlines.best.asd).toBeLessThan(10e-18)
    expect(headlines.best.shares.slice(0, 2).map(({ line }) => line)).toEqual(['back_action', 'intrinsic'])
    expect([1.2e6, 1.243e6, 1.3e6, 1.3375e6, 1.37e6].map(f => largestAt('avocet', f))).toEqual([
      'shot',
      'back_action',
      'shot',
      'second_mode',
      'shot',
    ])
    // The heat of the second mode, felt by a tip that pushes it with a weight of 0.85.
    const second = Math.sqrt((4 * k * 4.3 * 3.7e-12 * turn * 1.33748e6) / 0.9e8) / 0.85
    expectNear(asdOf('avocet', 'second_mode', 1.33748e6), second)
  })
})

describe('dunlin, a membrane over a microwave circuit', () => {
  const omega = turn * 1.486e6
  const gamma = omega / 8.1e7
  const kappa = turn * 149e3
  const g = turn * 1.42 * Math.sqrt(1.7e5)
  const bath = 1 / Math.expm1((hbar * omega) / (k * 24e-3))
  const circuit = (6 * (0.02 + 1.3) + 121 * 0.012 + 22 * (0.04 + 0.52)) / 149

  it('is cooled as published, n_f of a resolved red sideband [Dobrindt et al. 2008; Teufel et al. 2011]', () => {
    const [drum] = demo('dunlin').modes
    // The bias is one more white force, worth some thirty quanta of the bath.
    const stray = 0.35e-18 ** 2 / (4 * hbar * omega * 9.2e-12 * gamma)
    const cooled =
      ((bath + stray) * (gamma / kappa) * (4 * g ** 2 + kappa ** 2)) / (4 * g ** 2 + kappa * gamma) +
      (circuit * 4 * g ** 2) / (4 * g ** 2 + kappa * gamma) +
      (kappa ** 2 + 8 * g ** 2) / (16 * (omega ** 2 - 4 * g ** 2))
    expectNear(drum?.finalOccupancy, cooled, 0.003)
    expectNear(drum?.cooperativity, (4 * g ** 2) / (kappa * gamma), 1e-6)
    // Somewhat less than one quantum, and a sixth of it is that of the circuit.
    expect(drum?.finalOccupancy).toBeGreaterThan(0.8)
    expect(drum?.finalOccupancy).toBeLessThan(0.95)
    expectNear(circuit / (drum?.finalOccupancy ?? NaN), 1 / 6, 0.1)
  })

  it('has the bath of its drum, 4ħω(n + ½)mΓ [Callen, Welton 1951]', () => {
    expectNear(asdOf('dunlin', 'thermal', 1.486e6), Math.sqrt(4 * hbar * omega * (bath + 0.5) * 9.2e-12 * gamma), 1e-6)
  })

  it('adds the noise of its amplifiers, each divided by the gain in front of it [Friis 1944]', () => {
    const added = (0.68 + 9 / 10 ** 1.9) / 10 ** -0.11
    // Quanta of the bath that make one quantum at the strong port, on resonance, for weak coupling (Γ_tot ≪ κ ≪ Ω).
    const total = gamma + (4 * g ** 2) / kappa
    const perQuantum = (kappa ** 2 * total ** 2) / (16 * turn * 121e3 * g ** 2 * gamma)
    const S = 4 * hbar * omega * 9.2e-12 * gamma * added * perQuantum
    expectNear(asdOf('dunlin', 'added', 1.486e6), Math.sqrt(S))
  })

  it('has an amplifier whose noise temperature gives its quanta, k T_N / h f', () => {
    expectNear((k * 2.3) / (turn * hbar * 5.312e9), 9)
  })

  it('is limited as its summary says', () => {
    const { best } = demo('dunlin').headlines
    expect(best.asd).toBeGreaterThan(1.5e-18)
    expect(best.asd).toBeLessThan(1.7e-18)
    expect(best.shares.slice(0, 2).map(({ line }) => line)).toEqual(['thermal', 'back_action'])
    const share = (line: string) => best.shares.find(each => each.line === line)?.share ?? NaN
    expectNear(share('correlation.vacuum.back_action'), -share('back_action'))
    expect([1.4855e6, 1.485994e6, 1.486e6, 1.486006e6, 1.4865e6].map(f => largestAt('dunlin', f))).toEqual([
      'added',
      'added',
      'thermal',
      'added',
      'added',
    ])
    const heating = asdOf('dunlin', 'heating', 1.4862e6) ** 2
    expectNear(heating / asdOf('dunlin', 'vacuum', 1.4862e6) ** 2, 2 / 3, 0.1)
  })
})

describe('oystercatcher, a suspended mirror', () => {
  const mass = 0.502e-3
  const omega = turn * 600
  const n = quanta(11.5e-3, 281.8e12, [900e3, 939e3, 0])
  const kappa = turn * 939e3
  const G = turn * 5.64e15
  // Above the pendulum the mirror is a free mass but for (2.81/600)².
  const stiffness = mass * omega ** 2

  it('has the suspension and the gas of the handbook, 4kTmΩ²/Qω and 4kTmΓ [Saulson 1990]', () => {
    const Omega = turn * 2.81
    expectNear(asdOf('oystercatcher', 'suspension', 600), Math.sqrt((4 * k * 295 * mass * Omega ** 2) / (3e6 * omega)))
    expectNear(asdOf('oystercatcher', 'gas', 600), Math.sqrt((4 * k * 295 * mass * Omega) / 1.2e9))
  })

  it('has the gas damping of its pressure, Γ = (32/3)(1 + π/8) r²p/(m v̄) [Epstein 1924]', () => {
    // Water at 20 µPa on a sphere of the mirror's radius, 3.85 mm.
    const speed = Math.sqrt((8 * 8.314 * 295) / (Math.PI * 18.015e-3))
    const gamma = ((32 / 3) * (1 + Math.PI / 8) * 3.85e-3 ** 2 * 20e-6) / (mass * speed)
    expectNear((turn * 2.81) / gamma, 1.2e9, 0.02)
  })

  it('has the back-action and the shot noise of a resonant cavity, S_F S_x = ħ²κ/(ηκ_d) [Clerk et al. 2010]', () => {
    const S = (8 * (hbar * G) ** 2 * n) / kappa
    expectNear(demo('oystercatcher').cavities[0]?.quanta, n, 1e-6)
    expectNear(asdOf('oystercatcher', 'back_action', 600), Math.sqrt(S))
    const product = (hbar ** 2 * 939) / (900 * 0.9)
    expectNear(asdOf('oystercatcher', 'shot', 600), stiffness * Math.sqrt(product / S))
  })

  it('comes within a factor of 1.5 of the standard quantum limit, √(2ħmω²) as a force', () => {
    const ratio = asdOf('oystercatcher', 'total', 600) / Math.sqrt(2 * hbar * mass * omega ** 2)
    expect(ratio).toBeGreaterThan(1)
    expect(ratio).toBeLessThan(1.5)
    expectNear(demo('oystercatcher').headlines.reference?.totalMargin, 20 * Math.log10(ratio), 0.001)
  })

  it('has the coatings of the handbook, S_x ∝ 1/f from 0.36 am/√Hz at 100 Hz [Harry et al. 2002]', () => {
    expectNear(asdOf('oystercatcher', 'coating', 600), (stiffness * 0.36e-18) / Math.sqrt(6), 0.001)
  })

  it('is limited as its summary says', () => {
    const { best } = demo('oystercatcher').headlines
    expect(best.asd).toBeGreaterThan(1.1e-15)
    expect(best.asd).toBeLessThan(1.4e-15)
    expect(best.frequency).toBeGreaterThan(190)
    expect(best.frequency).toBeLessThan(500)
    expect([15, 100, 274, 600, 3000].map(f => largestAt('oystercatcher', f))).toEqual([
      'seismic',
      'suspension',
      'back_action',
      'coating',
      'shot',
    ])
  })
})

describe('sanderling, an accelerometer', () => {
  const mass = 4.2e-3
  const Omega = turn * 58.3

  it('has the springs and the gas of the handbook, 4kTΩ²/mQω and 4kTΩ/mQ [Saulson 1990]', () => {
    const springs = Math.sqrt((4 * k * 295 * Omega ** 2) / (mass * 3e5 * turn * 10))
    expectNear(asdOf('sanderling', 'springs', 10), springs, 1e-6)
    expectNear(asdOf('sanderling', 'gas', 10), Math.sqrt((4 * k * 295 * Omega) / (mass * 6e5)), 1e-6)
  })

  it('refers the readout through |Ω² − ω²|', () => {
    const readout = 1.1e-15 * (Omega ** 2 - (turn * 10) ** 2)
    expectNear(asdOf('sanderling', 'readout_floor', 10), readout, 1e-6)
    expectNear(asdOf('sanderling', 'drift', 10), (readout * 2.4) / 1.1, 1e-6)
  })

  it('is limited as its summary says', () => {
    const { best } = demo('sanderling').headlines
    expect(best.asd).toBeGreaterThan(80e-12)
    expect(best.asd).toBeLessThan(95e-12)
    expect(best.shares.slice(0, 2).map(({ line }) => line)).toEqual(['springs', 'gas'])
    expect([3, 35, 58, 100, 900].map(f => largestAt('sanderling', f))).toEqual([
      'drift',
      'readout_floor',
      'springs',
      'readout_floor',
      'readout_floor',
    ])
  })
})
