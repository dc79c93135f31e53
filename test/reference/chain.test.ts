import { describe, expect, test } from 'vitest'
import { assemble } from '../../src/engine/assemble.js'
import { evaluateAtFrequencies } from '../../src/engine/assess.js'
import type { ComponentSpec, Parameters } from '../../src/model/budget.js'
import { Refusal } from '../../src/model/problem.js'
import { addedQuantaOfNoiseTemperature } from '../../src/physics/chain.js'
import { leastAddedQuanta, noiseTemperatureOfFigure } from '../../src/physics/electronics.js'
import { budgetOf, component, slot } from '../engine/budget-of.js'

/* Chains of losses and amplifiers against Friis's formula, and noise temperatures against numbers of their own. */

/** CODATA 2018, exact: h/k_B in K s. */
const hOverK = 6.62607015e-34 / 1.380649e-23

const turn = 2 * Math.PI

const carrier = 6e9

type Chain = readonly (readonly [kind: string, parameters: Parameters])[]

/** A tuned microwave cavity behind the given chain. */
function chained(chain: Chain): ReturnType<typeof budgetOf> {
  const names = chain.map((_, i) => `element_${i + 1}`)
  const elements: ComponentSpec[] = chain.map(([kind, parameters], i) =>
    component(names[i], kind, { reads: i === 0 ? 'cavity.front' : names[i - 1], ...parameters }),
  )
  return budgetOf([
    component('drum', 'resonator', {
      mass: slot(1e-13),
      frequency: slot(1e6),
      quality: slot(1e6),
      law: 'viscous',
      temperature: slot(0),
    }),
    component('cavity', 'cavity', {
      frequency: slot(carrier),
      modes: new Map([['drum', slot(1)]]),
      coupling: slot(turn * 1e16),
      ports: new Map([['front', { rate: slot(turn * 3e5) }]]),
      pump: { port: 'front', quanta: slot(1e4), detuning: slot(0) },
    }),
    ...elements,
    component('detector', 'homodyne', {
      reads: names.at(-1) ?? 'cavity.front',
      angle: slot(Math.PI / 2),
      efficiency: slot(1),
    }),
  ])
}

/**
 * Quanta that a chain adds at its input: densities of its sources over the imprecision of the port's half quantum, which a
 * tuned, lossless port shows at the phase quadrature with the very weights that the chain's noise has at its own input.
 */
function quantaAtInput(chain: Chain): number {
  const { sources } = evaluateAtFrequencies(chained(chain), [1.3e6])
  const half = sources.find(s => s.id === 'cavity.front')!.vacuum!.imprecision[0]
  const added = sources.filter(s => s.id.startsWith('element_'))
  return (0.5 * added.reduce((sum, s) => sum + s.psd[0], 0)) / half
}

const bose = (temperature: number): number => 1 / Math.expm1((hOverK * carrier) / temperature)

describe('noise temperature', () => {
  // 6 GHz is 0.28796 K: 2 K are 6.9455 quanta, by hand from h = 6.62607015e-34 J s and k = 1.380649e-23 J/K.
  test.each([
    ['rayleigh-jeans', 6.9455],
    ['callen-welton', 6.9455],
    ['planck', 6.4455],
    ['source', 6.4575],
  ] as const)('%s: 2 K at 6 GHz are %f quanta', (convention, quanta) => {
    expect(addedQuantaOfNoiseTemperature(turn * 6e9, 2, convention)).toBeCloseTo(quanta, 3)
  })

  test('a noise figure of 3.0103 dB is 290 K [Friis 1944]', () => {
    expect(noiseTemperatureOfFigure(10 * Math.log10(2))).toBeCloseTo(290, 9)
    expect(noiseTemperatureOfFigure(0)).toBe(0)
  })

  test('least added noise: half a quantum at large gain, none at gain 1 [Caves 1982]', () => {
    expect([Infinity, 1, 2, 0.5].map(leastAddedQuanta)).toEqual([0.5, 0, 0.25, 0.5])
  })
})

describe('a chain', () => {
  const [first, second, cable] = [0.9, 14, 0.4]

  test('refers to its input by the formula of Friis', () => {
    const chain = [
      ['loss', { transmission: slot(0.8), temperature: slot(0.5) }],
      ['amplifier', { added: slot(first), gain: slot(30) }],
      ['loss', { transmission: slot(cable), temperature: slot(77) }],
      [
        'amplifier',
        { noise_temperature: slot(second * hOverK * carrier), convention: 'callen-welton', gain: slot(1e3) },
      ],
    ] as const
    const bath = (transmission: number, temperature: number): number =>
      ((1 - transmission) / transmission) * (bose(temperature) + 0.5)
    const friis = bath(0.8, 0.5) + first / 0.8 + bath(cable, 77) / (0.8 * 30) + second / (0.8 * 30 * cable)
    expect(quantaAtInput(chain) / friis).toBeCloseTo(1, 9)
  })

  test('a bath at a temperature counts quanta at the carrier, its vacuum apart from its heat', () => {
    const network = assemble(chained([['loss', { transmission: slot(0.5), temperature: slot(4) }]]))
    const loss = network.sources.find(s => s.id === 'element_1.loss')!
    expect(loss.vacuum[0][0].re).toBeCloseTo(1, 12)
    expect(loss.heating![0][0].re / (2 * bose(4))).toBeCloseTo(1, 9)
  })

  test('a noise figure comes in by its temperature', () => {
    const quanta = quantaAtInput([['amplifier', { noise_figure: slot(1), convention: 'planck' }]])
    expect(quanta / ((290 * (10 ** 0.1 - 1)) / (hOverK * carrier) - 0.5)).toBeCloseTo(1, 9)
  })

  test('a noise temperature below the quantum limit is refused with the number', () => {
    const cold = chained([['amplifier', { noise_temperature: slot(0.1), convention: 'rayleigh-jeans' }]])
    expect(() => assemble(cold)).toThrow(Refusal)
    try {
      assemble(cold)
    } catch (error) {
      expect((error as Refusal).problems[0].message).toContain(
        '`noise_temperature` comes to 0.3473 at the carrier’s 6000000000 Hz',
      )
    }
  })
})
