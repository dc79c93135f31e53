import { describe, expect, it } from 'vitest'
import type { Formula, Parameters } from '../../src/model/budget.js'
import { givenNumbers, slotAt, slotRoots, slotText, slotValue, wordAt } from '../../src/report/slots.js'
import { fixtureBudget } from './fixture.js'

const plain = fixtureBudget()
/** Twice the first root. */
const formula: Formula = { roots: [0], value: roots => 2 * roots[0], over: () => undefined }
const derived = { id: 'double', text: '= 2*mass', dimension: 'mass', formula, about: null, evidence: null }
const budget = { ...plain, derived: [{ ...derived, place: plain.roots[0].place }] }

const parameters: Parameters = {
  mass: { formula },
  law: 'viscous',
  losses: new Map([['gas', { quality: { root: 2, scale: 3 }, law: 'structural' }]]),
  pump: { detuning: { constant: 0 } },
  density: { density: 'formula', power: true, formula, text: '= 2*f' },
}

describe('numbers among parameters', () => {
  it('are found through maps and groups, and none in words or in a density by formula', () => {
    expect(givenNumbers(parameters).map(({ path }) => path.join('.'))).toEqual([
      'mass',
      'losses.gas.quality',
      'pump.detuning',
    ])
  })

  it('have their values', () => {
    const value = (...path: readonly string[]) => {
      const slot = slotAt(parameters, ...path)
      return slot === null ? null : slotValue(budget, slot)
    }
    expect(value('mass')).toBe(2 * 3.1e-12)
    expect(value('losses', 'gas', 'quality')).toBe(3 * 2.4e7)
    expect(value('pump', 'detuning')).toBe(0)
    expect(value('losses', 'clamp', 'quality')).toBeNull()
  })

  it('say what the file says', () => {
    expect(slotText(budget, { formula })).toEqual({ text: '= 2*mass', root: 'double' })
    expect(slotText(budget, { root: 0 })).toEqual({ text: '3.1(2) ng', root: 'mass' })
    expect(slotText(budget, { constant: 1 })).toBeNull()
  })

  it('lead back to the roots that they rest on', () => {
    expect(slotRoots(budget, { formula }).map(root => root.id)).toEqual(['mass'])
    expect(slotRoots(budget, { root: 2 }).map(root => root.id)).toEqual(['fundamental.quality'])
    expect(slotRoots(budget, { constant: 1 })).toEqual([])
  })
})

describe('words among parameters', () => {
  it('are found by their path', () => {
    expect(wordAt(parameters, 'law')).toBe('viscous')
    expect(wordAt(parameters, 'losses', 'gas', 'law')).toBe('structural')
    expect(wordAt(parameters, 'losses', 'clamp', 'law')).toBeNull()
    expect(wordAt(parameters, 'mass')).toBeNull()
  })
})
