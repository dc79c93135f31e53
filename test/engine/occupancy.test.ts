import { describe, expect, test } from 'vitest'
import { prepare } from '../../src/engine/assess.js'
import { finalOccupancy } from '../../src/engine/occupancy.js'
import type { LineSpec } from '../../src/model/budget.js'
import { boltzmannConstant as kB, reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { place, slot } from './budget-of.js'
import { readoutOf, type ModeOf } from './readout-of.js'

const turn = 2 * Math.PI
const drum = { mass: 1e-12, frequency: 1e6, quality: 1e6, temperature: 1e-3 }

function occupancies(modes: Record<string, ModeOf>, quanta = 1e-9, detuning = 0, lines: LineSpec[] = []): number[] {
  const budget = readoutOf({ modes, coupling: 1e17, ports: { front: { rate: 1e6 } }, quanta, detuning }, { lines })
  const { network, poles } = prepare(budget)
  return network.modes.map(mode => finalOccupancy(network, poles, mode))
}

const bose = (temperature: number): number =>
  temperature === 0 ? 0 : 1 / Math.expm1((hbar * turn * drum.frequency) / (kB * temperature))

describe('limits of temperature, dark', () => {
  // Limit: the bath's own occupancy; the integral leaves 1e-10 of n + ½.
  test.each([0, 1e-6, 1e-5, 1e-3, 300, 1e6])('%s K', temperature => {
    const [n] = occupancies({ drum: { ...drum, temperature } })
    expect(Math.abs(n - bose(temperature)) / (bose(temperature) + 0.5)).toBeLessThan(1e-10)
  })

  // Structural loss: its spectrum differs from the viscous one by 1/Q away from the resonance, and diverges as ln f below it.
  test.each([0, 1e-3, 4])('structural loss at %s K is within 1e-4 of it', temperature => {
    const [n] = occupancies({ drum: { ...drum, law: 'structural', temperature } })
    expect(Math.abs(n - bose(temperature)) / (bose(temperature) + 0.5)).toBeLessThan(1e-4)
  })

  test.each([10, 1e3, 1e9])('quality %s', quality => {
    const [n] = occupancies({ drum: { ...drum, quality } })
    expect(Math.abs(n - bose(1e-3)) / (bose(1e-3) + 0.5)).toBeLessThan(1e-10)
  })
})

describe('stated forces', () => {
  // Closed form: a white force S heats by S/(4ħΩmΓ) quanta, as 4ħΩ(n+½)mΓ says.
  test('a white force adds its quanta', () => {
    const stray: LineSpec = {
      id: 'stray',
      title: null,
      about: null,
      evidence: null,
      place,
      claims: {
        kind: 'force-noise',
        parameters: {
          into: 'drum',
          density: { density: 'level', level: slot(1e-18), power: false, exponent: slot(0), reference: null },
        },
        places: new Map(),
      },
    }
    const [n] = occupancies({ drum }, 1e-9, 0, [stray])
    const added = 1e-36 / (4 * hbar * turn * drum.frequency * drum.mass * ((turn * drum.frequency) / drum.quality))
    expect(n / (bose(1e-3) + added)).toBeCloseTo(1, 9)
  })
})

describe('light', () => {
  // Closed form at Δ = 0, weak: back-action adds (4g²/κΓ)/(1 + (2Ω/κ)²) quanta.
  test('resonant light heats by its back-action', () => {
    const quanta = 1e3
    const [n] = occupancies({ drum }, quanta)
    const g2 = (1e34 * hbar * quanta) / (2 * drum.mass * turn * drum.frequency)
    const gamma = (turn * drum.frequency) / drum.quality
    const added = (4 * g2) / (1e6 * gamma) / (1 + ((2 * turn * drum.frequency) / 1e6) ** 2)
    expect(n / (bose(1e-3) + added)).toBeCloseTo(1, 6)
  })

  test('modes that share a cavity each have their own', () => {
    const other = { mass: 1e-12, frequency: 1.7e6, quality: 1e6, temperature: 2e-3 }
    const [first, second] = occupancies({ drum, other })
    expect(first / bose(1e-3)).toBeCloseTo(1, 8)
    expect(second / (1 / Math.expm1((hbar * turn * 1.7e6) / (kB * 2e-3)))).toBeCloseTo(1, 8)
  })
})
