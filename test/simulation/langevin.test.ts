import { describe, expect, test } from 'vitest'
import { component, budgetOf, slot } from '../engine/budget-of.js'
import type { ModeOf, ReadoutOf } from '../engine/readout-of.js'
import { boltzmannConstant, reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { agreement, compare, within } from './agreement.js'

/*
 * Road: simulation. The Langevin equations run in time with fixed seeds; the averaged spectrum of the record must be the engine's
 * total times its response in every bin, within the statistical error that follows from the number of averages. Nothing is fitted.
 */
const turn = 2 * Math.PI
const mass = 1e-12
const drum: ModeOf = { mass, frequency: 1e6, quality: 200, temperature: 0.01 }

/** G in rad/s/m for g/2π in Hz at a million quanta. */
const coupling = (g: number): number => (turn * g) / (1e3 * Math.sqrt(hbar / (2 * mass * turn * 1e6)))

const base = { modes: { drum }, quanta: 1e6 }

const rich: ReadoutOf = {
  ...base,
  coupling: coupling(6e4),
  ports: { front: { rate: turn * 5e5, occupancy: 1.5 }, back: { rate: turn * 3e5, occupancy: 0.6 } },
  detuning: -turn * 4e5,
  record: 1.1,
  efficiency: 0.6,
}

const points: Record<string, ReadoutOf> = {
  'tuned, unresolved sidebands, phase quadrature': {
    ...base,
    coupling: coupling(1e5),
    ports: { front: { rate: turn * 1e7 } },
  },
  'tuned, amplitude and phase mixed by the angle, light lost': {
    ...base,
    modes: { drum: { ...drum, temperature: 1e-3 } },
    coupling: coupling(1.5e5),
    ports: { front: { rate: turn * 3e6 } },
    record: 0.4,
    efficiency: 0.8,
  },
  'red of a resolved sideband, cooled, warm ports': {
    ...base,
    coupling: coupling(3e4),
    ports: { front: { rate: turn * 2e5, occupancy: 0.3 }, inner: { rate: turn * 1e5, occupancy: 2 } },
    detuning: -turn * 1e6,
  },
  'strong coupling, split peaks': {
    ...base,
    coupling: coupling(1.5e5),
    ports: { front: { rate: turn * 1e5 }, inner: { rate: turn * 2e4 } },
    detuning: -turn * 1e6,
    record: 0.9,
  },
  'blue detuned, gain by the light': {
    ...base,
    coupling: coupling(8e3),
    ports: { front: { rate: turn * 2e5 } },
    detuning: turn * 1e6,
  },
  'squeezed input, detuned': {
    ...base,
    coupling: coupling(6e4),
    ports: { front: { rate: turn * 1e6, squeezing: [8, 0.7] }, inner: { rate: turn * 2e5 } },
    detuning: -turn * 6e5,
    record: 1.2,
    efficiency: 0.9,
  },
  'squeezed input, read in transmission': {
    ...base,
    coupling: coupling(6e4),
    ports: { front: { rate: turn * 8e5, squeezing: [10, 1.9] }, back: { rate: turn * 6e5 } },
    detuning: turn * 5e4,
    reads: 'back',
    record: 0.6,
  },
  'both ports hot, detuned, light lost': rich,
  'amplifier behind a microwave cavity, one sideband': {
    ...base,
    cavityFrequency: 7e9,
    coupling: coupling(3e4),
    ports: { output: { rate: turn * 3e5, occupancy: 0.2 }, inner: { rate: turn * 1e5, occupancy: 1 } },
    detuning: -turn * 1e6,
    record: 'upper',
    added: 4,
  },
  'amplifier, one quadrature': {
    ...base,
    coupling: coupling(5e4),
    ports: { output: { rate: turn * 1e6 } },
    detuning: -turn * 2e5,
    added: 1.3,
  },
  'two modes that share the light': {
    ...base,
    modes: { drum, second: { mass: 2e-12, frequency: 1.15e6, quality: 120, temperature: 0.03, weight: -0.7 } },
    coupling: coupling(8e4),
    ports: { front: { rate: turn * 1.5e6 } },
    detuning: -turn * 3e5,
    record: 1.3,
  },
}

describe('the Langevin equations in time give the spectrum of the record', () => {
  test.each(Object.entries(points).map(([name, readout], i) => ({ name, readout, seed: i + 1 })))(
    '$name',
    ({ readout, seed }) => expect(agreement(readout, seed)).toSatisfy(within),
  )

  test('plain readout of displacement', () => {
    const noise = 3e-34
    const omega = turn * drum.frequency
    const gamma = omega / drum.quality!
    const scale = Math.sqrt(hbar / (mass * omega))
    const system = {
      A: [
        [0, omega],
        [-omega, -gamma],
      ],
      B: [
        [0, 0],
        [Math.sqrt((2 * boltzmannConstant * drum.temperature! * gamma) / (hbar * omega)), 0],
      ],
      C: [[scale, 0]],
      D: [[0, Math.sqrt(noise / 2)]],
    }
    const level = { density: 'level', level: slot(noise), power: true, exponent: slot(0), reference: null } as const
    const budget = budgetOf([
      component('drum', 'resonator', {
        mass: slot(mass),
        frequency: slot(drum.frequency),
        quality: slot(drum.quality!),
        law: 'viscous',
        temperature: slot(drum.temperature!),
      }),
      component('detector', 'displacement', { modes: new Map([['drum', slot(1)]]), noise: level }),
    ])
    expect(compare(system, [budget, null], 101)).toSatisfy(within)
  })
})

describe('a factor of two in any one noise is seen', () => {
  test.each(['drum.bath', 'cavity.front', 'cavity.back', 'detector.loss'])('%s', wrong => {
    expect(agreement(rich, 8, wrong).chiSquared).toBeGreaterThan(10)
  })

  test('amplifier.added', () => {
    expect(agreement(points['amplifier, one quadrature'], 10, 'amplifier.added').chiSquared).toBeGreaterThan(10)
  })
})
