import { describe, expect, test } from 'vitest'
import { evaluateAtFrequencies, prepare } from '../../src/engine/assess.js'
import { Evaluator } from '../../src/engine/evaluate.js'
import { makePoints } from '../../src/engine/points.js'
import { modeStates } from '../../src/engine/states.js'
import type { ModeState } from '../../src/model/assessment.js'
import type { Budget, Parameters } from '../../src/model/budget.js'
import { boltzmannConstant as kB, standardGravity } from '../../src/physics/constants.js'
import { addedQuantaOfChain } from '../../src/physics/electronics.js'
import { gaussLegendre } from '../../src/physics/gauss-legendre.js'
import { occupancy, temperatureOfOccupancy } from '../../src/physics/quanta.js'
import { budgetOf, component, place, slot } from '../engine/budget-of.js'
import { deviation, type Check } from './check.js'

/*
 * Road: published numbers and worked examples of the fluctuation–dissipation theorem [Callen, Welton 1951; Saulson 1990]. 1e-6 is what the
 * printed values allow, unless the row says otherwise.
 */

const turn = 2 * Math.PI

interface Oscillator {
  readonly mass: number
  readonly frequency: number
  readonly quality: number
  readonly temperature: number
  readonly law?: 'viscous' | 'structural'
}

const displacement = { quantity: 'displacement', weights: null, at: null, place } as const
const acceleration = { quantity: 'acceleration', weights: null, at: null, place } as const

/** An oscillator with a plain readout that adds next to nothing. */
function oscillator(
  values: Oscillator,
  changes: Partial<Budget> = {},
  more: Parameters = {},
  kind = 'resonator',
): Budget {
  const { mass, frequency, quality, temperature, law = 'viscous' } = values
  const silent = { density: 'level', level: slot(1e-40), power: false, exponent: slot(0), reference: null } as const
  return budgetOf(
    [
      component('mode', kind, {
        mass: slot(mass),
        frequency: slot(frequency),
        quality: slot(quality),
        temperature: slot(temperature),
        law,
        ...more,
      }),
      component('detector', 'displacement', { modes: new Map([['mode', slot(1)]]), noise: silent }),
    ],
    changes,
  )
}

/** Amplitude density of the thermal noise at a frequency, at the measurand. */
function thermal(budget: Budget, frequency: number): number {
  const evaluation = evaluateAtFrequencies(budget, [frequency])
  return Math.sqrt(evaluation.lines.find(line => line.id === 'thermal')!.psd[0])
}

/** An oscillator by its spring constant. */
const spring = (k: number, frequency: number, quality: number, temperature: number): Oscillator => ({
  mass: k / (turn * frequency) ** 2,
  frequency,
  quality,
  temperature,
})

const nanogram = { mass: 1e-12, frequency: 1e5, quality: 1e4, temperature: 300 }

function state(budget: Budget): ModeState {
  const { network, poles } = prepare(budget)
  return modeStates(budget, network, { poles, changes: null })[0]
}

const checks: readonly Check[] = [
  {
    quantity: 'force noise of a cantilever of 110 µN/m, 5.5 kHz, Q 5e4, 1.6 K',
    computed: () => thermal(oscillator(spring(1.1e-4, 5500, 5e4, 1.6)), 5500),
    expected: 2.3717651851389053e-18,
    tolerance: 1e-6,
    source: 'device class of Rugar et al., Nature 430, 329 (2004), inputs from memory; √(4kk_BT/ω₀Q)',
  },
  {
    quantity: 'force noise of a damping coefficient of 3.616e-15 kg/s at 125 mK',
    computed: () =>
      thermal(
        oscillator({
          mass: 3.616270319248411e-15 / 0.4,
          frequency: 2e3,
          quality: (turn * 2e3) / 0.4,
          temperature: 0.125,
        }),
        2e3,
      ),
    expected: 1.58e-19,
    tolerance: 1e-6,
    source: 'Héritier et al., Nano Lett. 18, 1814 (2018): 158 zN/√Hz at 100 to 150 mK; mΓ = S_F/4k_BT',
  },
  {
    quantity: 'acceleration noise of a micromachined mass of 1 µg in standard gravities, 2 kHz, Q 5',
    computed: () =>
      thermal(
        oscillator(
          { mass: 1e-9, frequency: 2e3, quality: 5, temperature: 300 },
          { measurand: acceleration },
          {},
          'rigid',
        ),
        300,
      ) / standardGravity,
    expected: 2.080805650967313e-5,
    tolerance: 1e-6,
    source: 'Gabrielson, IEEE Trans. Electron Devices 40, 903 (1993): √(4k_BTω₀/mQ)',
  },
  {
    quantity: 'peak displacement noise of a nanogram at 100 kHz, Q 1e4, 300 K',
    computed: () => thermal(oscillator(nanogram, { measurand: displacement }), 1e5),
    expected: 2.584416242509973e-11,
    tolerance: 1e-6,
    source: 'fluctuation–dissipation theorem, √(4k_BTQ/mω₀³)',
  },
  {
    quantity: 'its plateau at low frequency, viscous',
    computed: () => thermal(oscillator(nanogram, { measurand: displacement }), 1),
    expected: 2.584416242509973e-15,
    tolerance: 1e-6,
    source: 'fluctuation–dissipation theorem, √(4k_BT/mω₀³Q)',
  },
  {
    quantity: 'the same with structural loss at a hundredth of the resonance',
    computed: () => thermal(oscillator({ ...nanogram, law: 'structural' }, { measurand: displacement }), 1e3),
    expected: 2.5846746970550128e-14,
    tolerance: 1e-6,
    source: 'Saulson, Phys. Rev. D 42, 2437 (1990)',
  },
  {
    quantity: 'excess of structural over viscous amplitude there',
    computed: () =>
      thermal(oscillator({ ...nanogram, law: 'structural' }, { measurand: displacement }), 1e3) /
      thermal(oscillator(nanogram, { measurand: displacement }), 1e3),
    expected: 9.999999949995,
    tolerance: 1e-6,
    source: 'Saulson (1990): √(ω₀/ω), to the small term in φ²',
  },
  {
    // Torque and angle obey the same equations with the moment of inertia as the mass.
    quantity: 'torque noise of a fibre of 2.4 nN m, structural Q 5000, 8 mHz, 295 K',
    computed: () => thermal(oscillator({ ...spring(2.4e-9, 2e-3, 5000, 295), law: 'structural' }), 8e-3),
    expected: 3.9442854361926775e-16,
    tolerance: 1e-6,
    source: 'textbook, √(4k_BTκ/Qω), numbers of tungsten-fibre class',
  },
  {
    quantity: 'quality of the channels 1e6, 2e6 and 5e5 together',
    computed: () => {
      const channel = (quality: number): Parameters => ({ quality: slot(quality), law: 'viscous' })
      const losses = new Map([
        ['gas', channel(1e6)],
        ['clamp', channel(2e6)],
        ['film', channel(5e5)],
      ])
      const budget = budgetOf([
        component('mode', 'resonator', {
          mass: slot(1),
          frequency: slot(1e3),
          law: 'viscous',
          temperature: slot(4),
          losses,
        }),
        component('detector', 'displacement', {
          modes: new Map([['mode', slot(1)]]),
          noise: { density: 'level', level: slot(1), power: false, exponent: slot(0), reference: null },
        }),
      ])
      return 1e3 / state(budget).linewidth
    },
    expected: 285714.28571428574,
    tolerance: 1e-9,
    source: '1/Q = Σ1/Q_i, exact',
  },
  {
    quantity: 'decay time of the amplitude in s, 1 MHz and Q 1e6: 2/Γ, twice that of the energy',
    computed: () => 1 / (Math.PI * state(oscillator({ ...nanogram, frequency: 1e6, quality: 1e6 })).linewidth),
    expected: 0.3183098861837907,
    tolerance: 1e-9,
    source: 'τ = Q/πf, exact',
  },
]

test.each(checks)('$quantity ($source)', check => {
  expect(deviation(check)).toBeLessThanOrEqual(check.tolerance)
})

/** ∫S df and ∫(2πf)²S df over one-sided S of the motion, in panels of asinh((f − f₀)/halfwidth) around the resonance. */
function areas(values: Oscillator): { position: number; velocity: number } {
  const budget = oscillator(values, { measurand: displacement })
  const { network } = prepare(budget)
  const halfWidth = values.frequency / values.quality / 2
  const { nodes, weights } = gaussLegendre(16)
  const from = -Math.asinh(values.frequency / halfWidth)
  const to = Math.asinh((1e9 * values.frequency) / halfWidth)
  const panels = Math.ceil(to - from)
  const offsets: number[] = []
  const measure: number[] = []
  for (let panel = 0; panel < panels; panel++) {
    const half = (to - from) / panels / 2
    for (const [k, node] of nodes.entries()) {
      const u = from + half * (2 * panel + 1 + node)
      offsets.push(halfWidth * Math.sinh(u))
      measure.push(weights[k] * half * halfWidth * Math.cosh(u))
    }
  }
  const anchors = [{ id: 'mode', nature: 'mode', frequency: values.frequency, halfWidth } as const]
  const points = makePoints(
    anchors,
    offsets.map(offset => ({ anchor: 0, offset })),
  )
  const { total } = new Evaluator(budget, network, { sources: false, limits: false }).at(points)
  let [position, velocity] = [0, 0]
  for (const [i, psd] of total.entries()) {
    position += psd * measure[i]
    velocity += psd * measure[i] * (turn * points.frequency[i]) ** 2
  }
  return { position, velocity }
}

describe('equipartition [identity of the fluctuation–dissipation theorem; Saulson 1990]', () => {
  // 1e-6: the velocity's tail ends at 1e9 resonances, 1/(Q·1e9) of it; quanta matter by (ħω/k_BT)²/12 < 1e-16 at 300 K.
  test.each([10, 1e4, 1e9])('area under the displacement spectrum is k_BT/k, Q = %s', quality => {
    const values = { mass: 1e-12, frequency: 1e5, quality, temperature: 300 }
    const { position, velocity } = areas(values)
    const k = values.mass * (turn * values.frequency) ** 2
    expect(position / ((kB * 300) / k)).toBeCloseTo(1, 6)
    expect(velocity / ((kB * 300) / values.mass)).toBeCloseTo(1, 6)
  })

  // Published number: 2.0(3)e-21 J measured in a torsion mode at room temperature [Yan et al. 2014, abstract]; k_BT/2 at 300 K is 2.07e-21 J.
  test('kinetic energy of a mode at 300 K', () => {
    const { velocity } = areas({ mass: 1e-9, frequency: 500, quality: 1e3, temperature: 300 })
    expect(Math.abs((1e-9 * velocity) / 2 / 2.0e-21 - 1)).toBeLessThan(0.05)
  })

  // Limit: at T = 0 the area is the zero-point amplitude, ħ/2mΩ, to first order in 1/Q.
  test('zero-point motion', () => {
    const { network } = prepare(oscillator({ mass: 1e-12, frequency: 1e5, quality: 1e6, temperature: 0 }))
    const { position } = areas({ mass: 1e-12, frequency: 1e5, quality: 1e6, temperature: 0 })
    expect(position / network.modes[0].zeroPoint! ** 2).toBeCloseTo(1, 5)
  })
})

describe('a chain of losses and amplifiers [Friis, Proc. IRE 32, 419 (1944), in quanta]', () => {
  const chain = (links: readonly ReturnType<typeof component>[], last: string): Budget =>
    budgetOf([
      component('mode', 'resonator', {
        mass: slot(1e-13),
        frequency: slot(1e6),
        quality: slot(1e6),
        law: 'viscous',
        temperature: slot(1),
      }),
      component('cavity', 'cavity', {
        frequency: slot(6e9),
        modes: new Map([['mode', slot(1)]]),
        coupling: slot(1e16),
        ports: new Map([['out', { rate: slot(1e6) }]]),
        pump: { port: 'out', quanta: slot(1e5), detuning: slot(0) },
      }),
      ...links,
      component('detector', 'homodyne', { reads: last, angle: slot(Math.PI / 2), efficiency: slot(1) }),
    ])
  /** All noise behind the port in quanta at the port, where the vacuum is one half. */
  const added = (budget: Budget, ids: readonly string[]): number => {
    const { sources } = evaluateAtFrequencies(budget, [3e5])
    const psd = (id: string): number => sources.find(s => s.id === id)!.psd[0]
    const vacuum = sources.find(s => s.id === 'cavity.out')!.vacuum!.imprecision[0]
    return (0.5 * ids.reduce((sum, id) => sum + psd(id), 0)) / vacuum
  }

  // Identity: Friis’s formula in another room of this project against the network; 1e-12 is rounding.
  test('warm cable, amplifier, cable, amplifier', () => {
    const warm = occupancy(turn * 6e9, 1.2)
    const budget = chain(
      [
        component('cable', 'loss', { reads: 'cavity.out', transmission: slot(0.6), occupancy: slot(warm) }),
        component('first', 'amplifier', { reads: 'cable', added: slot(0.7), gain: slot(20) }),
        component('line', 'loss', { reads: 'first', transmission: slot(0.1), occupancy: slot(300) }),
        component('second', 'amplifier', { reads: 'line', added: slot(9) }),
      ],
      'second',
    )
    const expected = addedQuantaOfChain([
      { added: (0.4 / 0.6) * (warm + 0.5), gain: 0.6 },
      { added: 0.7, gain: 20 },
      { added: (0.9 / 0.1) * 300.5, gain: 0.1 },
      { added: 9, gain: Infinity },
    ])
    expect(added(budget, ['cable.loss', 'first.added', 'line.loss', 'second.added']) / expected).toBeCloseTo(1, 12)
  })

  // Published formula: a 3 dB loss at T → ∞ quanta n adds n + ½ at its input.
  test('half of the power lost at 4 K', () => {
    const n = occupancy(turn * 6e9, 4)
    const budget = chain(
      [component('cable', 'loss', { reads: 'cavity.out', transmission: slot(0.5), occupancy: slot(n) })],
      'cable',
    )
    expect(added(budget, ['cable.loss']) / (n + 0.5)).toBeCloseTo(1, 12)
    expect(temperatureOfOccupancy(turn * 6e9, n)).toBeCloseTo(4, 10)
  })
})
