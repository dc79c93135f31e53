import { describe, expect, test } from 'vitest'
import { evaluateAtFrequencies } from '../../src/engine/assess.js'
import type { Budget, ComponentSpec } from '../../src/model/budget.js'
import { temperatureOfOccupancy } from '../../src/physics/quanta.js'
import { budgetOf, component, slot } from '../engine/budget-of.js'

/* Squeezed light with losses, and the asymmetry of sidebands, against their published laws. */

const turn = 2 * Math.PI

interface Squeezing {
  readonly level: number
  readonly antisqueezing?: number
  readonly angle: number
  readonly injection_loss?: number
}

const slots = (values: Squeezing) => Object.fromEntries(Object.entries(values).map(([k, v]) => [k, slot(v as number)]))

interface Readout {
  readonly squeezing?: Squeezing
  readonly efficiency?: number
  readonly side?: 'upper' | 'lower'
  readonly quanta?: number
  readonly temperature?: number
}

const frequency = 1e6

/** A drum in a tuned cavity with one lossless port, read at the phase quadrature or at one sideband. */
function readout({ squeezing, efficiency = 1, side, quanta = 1e4, temperature = 0 }: Readout): Budget {
  const detector: ComponentSpec = component('detector', side === undefined ? 'homodyne' : 'sideband', {
    reads: 'cavity.front',
    efficiency: slot(efficiency),
    ...(side === undefined ? { angle: slot(Math.PI / 2) } : { side }),
  })
  const drum = { mass: slot(1e-12), frequency: slot(frequency), quality: slot(1e6) }
  return budgetOf([
    component('drum', 'resonator', { ...drum, law: 'viscous', temperature: slot(temperature) }),
    component('cavity', 'cavity', {
      frequency: slot(2.8e14),
      modes: new Map([['drum', slot(1)]]),
      coupling: slot(turn * 1e15),
      ports: new Map([
        ['front', { rate: slot(turn * 3e5), ...(squeezing !== undefined && { squeezing: slots(squeezing) }) }],
      ]),
      pump: { port: 'front', quanta: slot(quanta), detuning: slot(0) },
    }),
    detector,
  ])
}

interface Parts {
  readonly imprecision: number
  readonly backAction: number
  readonly total: number
}

/** Parts of all noise of the readout, and all noise with the bath, at one frequency. */
function partsOf(of: Readout, at: number): Parts {
  const { sources } = evaluateAtFrequencies(readout(of), [at])
  const sum = (value: (s: (typeof sources)[number]) => number): number => sources.reduce((x, s) => x + value(s), 0)
  return {
    imprecision: sum(s => s.vacuum?.imprecision[0] ?? 0),
    backAction: sum(s => s.vacuum?.backAction[0] ?? 0),
    total: sum(s => s.psd[0]),
  }
}

// Measured noise over vacuum is 1 − η(1−ε)(1 − e^{−2r}): a beam splitter for each loss [Caves, Phys. Rev. D 23, 1693 (1981)].
describe('squeezing with losses', () => {
  const loss = 0.1
  const efficiency = 0.8
  const kept = (1 - loss) * efficiency

  test.each([3e5, 1e6, 4e6])('at %f Hz the phase quadrature is below vacuum by what both losses leave', at => {
    const squeezing = { level: 10, antisqueezing: 14, angle: Math.PI / 2, injection_loss: loss }
    const ratio = partsOf({ squeezing, efficiency }, at).imprecision / partsOf({ efficiency }, at).imprecision
    expect(ratio).toBeCloseTo(1 - kept * (1 - 0.1), 10)
  })

  test('antisqueezing stands in the other quadrature: imprecision at 0°, back-action at 90°', () => {
    const base = partsOf({ efficiency }, 3e5)
    const along = partsOf(
      { efficiency, squeezing: { level: 10, antisqueezing: 14, angle: 0, injection_loss: loss } },
      3e5,
    )
    expect(along.imprecision / base.imprecision).toBeCloseTo(1 + kept * (10 ** 1.4 - 1), 9)
    // Light in the cavity has met the injection loss alone.
    expect(along.backAction / base.backAction).toBeCloseTo(1 - (1 - loss) * (1 - 0.1), 10)
  })

  test('without antisqueezing the state is pure; with all lost it is vacuum', () => {
    const pure = partsOf({ squeezing: { level: 10, angle: 0 } }, 3e5)
    const stated = partsOf({ squeezing: { level: 10, antisqueezing: 10, angle: 0 } }, 3e5)
    expect(pure).toEqual(stated)
    const lost = partsOf({ squeezing: { level: 10, angle: 0, injection_loss: 1 } }, 3e5)
    expect(lost.total / partsOf({}, 3e5).total).toBeCloseTo(1, 12)
  })
})

// Absorption over emission is n/(n+1): nothing in the engine adds ±½, the correlation of imprecision and back-action does.
// [Safavi-Naeini et al., Phys. Rev. Lett. 108, 033602 (2012); Clerk et al., Rev. Mod. Phys. 82, 1155 (2010)]
describe('sideband asymmetry of a weakly probed mode', () => {
  const above = (side: 'upper' | 'lower', quanta: number): number => {
    // A cooperativity far below one: the probe's own back-action is not in n.
    const of = { side, quanta: 1e-4, temperature: temperatureOfOccupancy(turn * frequency, quanta) }
    const { total, imprecision } = partsOf(of, frequency)
    return total - imprecision
  }

  test.each([0.2, 0.85, 3.2, 40])('with %f quanta', n => {
    expect(above('upper', n) / above('lower', n) / (n / (n + 1))).toBeCloseTo(1, 3)
  })
})
