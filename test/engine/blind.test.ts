import { describe, expect, test } from 'vitest'
import { assess, evaluateAtFrequencies } from '../../src/engine/assess.js'
import type { Budget } from '../../src/model/budget.js'
import { Refusal } from '../../src/model/problem.js'
import { budgetOf, component, place, slot } from './budget-of.js'
import { readoutOf, type ReadoutOf } from './readout-of.js'

const readout: ReadoutOf = {
  modes: { drum: { mass: 1e-12, frequency: 1e6, quality: 1e6, temperature: 1 } },
  coupling: 1e17,
  ports: { front: { rate: 1e6 } },
  quanta: 1e4,
}
const band = { low: 1e5, high: 1e7, place }

function refused(budget: Budget): string[] {
  try {
    assess(budget)
    return []
  } catch (error) {
    if (!(error instanceof Refusal)) throw error
    return error.problems.map(p => `${p.code} ${p.place.line}: ${p.message}`)
  }
}

describe('a record that holds nothing of the measurand', () => {
  // 180° is 0 but for the rounding of π.
  test.each([0, Math.PI])('amplitude quadrature of a resonant pump, angle %s rad', record => {
    const [message] = refused(readoutOf({ ...readout, record }, { band, readoutPlace: { ...place, line: 7 } }))
    expect(message).toMatch(/^blind 7: `detector` records nothing of the measurand .* 90°/)
  })

  test('a readout of one mode while another is pushed', () => {
    const modes = ['read', 'pushed'].map(id =>
      component(id, 'resonator', {
        mass: slot(1),
        frequency: slot(3),
        quality: slot(10),
        law: 'viscous',
        temperature: slot(1),
      }),
    )
    const noise = {
      density: 'level',
      level: slot(1e-9),
      power: false,
      exponent: slot(0),
      reference: null,
    } as const
    const detector = component('detector', 'displacement', { modes: new Map([['read', slot(1)]]), noise })
    const measurand = { quantity: 'force', weights: new Map([['pushed', 1]]), at: null, place } as const
    expect(refused(budgetOf([...modes, detector], { measurand }))[0]).toMatch(/^blind/)
  })
})

test('a small angle, a small detuning and a zero of the response are not blind', () => {
  expect(refused(readoutOf({ ...readout, record: 1e-4 }, { band }))).toEqual([])
  expect(refused(readoutOf({ ...readout, record: 0, detuning: -10 }, { band }))).toEqual([])
  const two = { ...readout.modes, other: { mass: 1e-12, frequency: 2e6, quality: 1e6, temperature: 1 } }
  const evaluation = evaluateAtFrequencies(readoutOf({ ...readout, modes: two }, { band }), [1e6])
  expect(evaluation.total[0]).toBeGreaterThan(0)
})
