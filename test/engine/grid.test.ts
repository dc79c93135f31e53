import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { evaluateAtFrequencies, evaluateBand, prepare } from '../../src/engine/assess.js'
import { Evaluator } from '../../src/engine/evaluate.js'
import { firstPoints, gridFloor, gridTolerance, pointAt } from '../../src/engine/grid.js'
import { makePoints } from '../../src/engine/points.js'
import type { Budget, DensitySpec, LineSpec, Table } from '../../src/model/budget.js'
import { Refusal } from '../../src/model/problem.js'
import { component, place, slot } from './budget-of.js'
import { checkPromise } from './promise.js'
import { randomReadout } from './random-readout.js'
import { readoutOf, type ModeOf, type ReadoutOf } from './readout-of.js'

/*
 * Road: simulation. The promise of the grid is tested where the engine did not look: at random frequencies between its points, against
 * exact evaluation there.
 */

const mode = (frequency: number, quality = 1e9, more: Partial<ModeOf> = {}): ModeOf => ({
  mass: 1e-12,
  frequency,
  quality,
  temperature: 4,
  ...more,
})

const light: Omit<ReadoutOf, 'modes'> = {
  coupling: 1e17,
  ports: { front: { rate: 1e7 }, inner: { rate: 1e6 } },
  quanta: 1e3,
  efficiency: 0.8,
}

const band = (low: number, high: number): Partial<Budget> => ({ band: { low, high, place } })
const wide = band(1e3, 1e9)
const spread = { a: mode(0.3e6), b: mode(1e6), c: mode(1.2e6), d: mode(7e6) }

const density = (level: number, exponent = 0): DensitySpec => ({
  density: 'level',
  level: slot(level),
  power: false,
  exponent: slot(exponent),
  reference: slot(1e5),
})

const noise = (id: string, kind: string, into: string, given: DensitySpec): LineSpec => ({
  id,
  title: null,
  about: null,
  evidence: null,
  place,
  claims: { kind, parameters: { into, density: given }, places: new Map() },
})

const table: Table = {
  file: 'test',
  place,
  frequency: Float64Array.of(5e2, 2e4, 2.1e4, 1e6, 1e10),
  psd: Float64Array.of(1e-30, 1e-34, 1e-29, 1e-36, 1e-38),
  averages: null,
  outside: 'refuse',
}

/** Budgets that a grid may stumble over, each with the most points it may take. */
const budgets: Record<string, [Budget, number]> = {
  'one mode of quality 1e9 over a factor 1e6': [readoutOf({ ...light, modes: { a: mode(1e6) } }, wide), 800],
  'one mode, detuned, homodyne at 1 rad': [
    readoutOf({ ...light, modes: { a: mode(1e6) }, detuning: -1e6, record: 1 }, wide),
    900,
  ],
  'four modes of quality 1e9 over a factor 1e6': [readoutOf({ ...light, modes: spread }, wide), 4000],
  'four modes, detuned, homodyne at 1 rad': [
    readoutOf({ ...light, modes: spread, detuning: -5e6, record: 1, quanta: 100 }, wide),
    4100,
  ],
  'four modes, two of them 10 mHz apart': [
    readoutOf({ ...light, modes: { a: mode(1e6), b: mode(1.0001e6), c: mode(1.00010001e6), d: mode(1.1e6) } }, wide),
    4000,
  ],
  'four modes, one sideband behind an amplifier': [
    readoutOf({ ...light, efficiency: 1, record: 'upper', added: 3, modes: spread, detuning: -1e6, quanta: 100 }, wide),
    4000,
  ],
  'four modes of different signs, one of them pushed': [
    readoutOf(
      {
        ...light,
        efficiency: 1,
        record: 'lower',
        added: 3,
        modes: { ...spread, b: mode(1e6, 1e9, { weight: -0.3 }), c: mode(1.2e6, 1e9, { weight: 0.2 }) },
        detuning: -1e6,
        quanta: 100,
      },
      { ...wide, measurand: { quantity: 'force', weights: new Map([['a', 1]]), at: null, place } },
    ),
    4000,
  ],
  'three modes in one readout, strong light': [
    readoutOf(
      {
        ...light,
        quanta: 1e7,
        modes: { a: mode(0.3e6, 1e8), b: mode(1e6, 1e7), c: mode(1.2e6, 1e6) },
        detuning: -1e6,
        record: 1,
      },
      band(1e5, 1e7),
    ),
    4000,
  ],
  'free mass, power laws and a jagged table': [
    readoutOf(
      { ...light, modes: { mirror: { mass: 1e-3, frequency: 0 } }, quanta: 1e6 },
      {
        ...wide,
        tables: [table],
        lines: [
          noise('drift', 'force-noise', 'mirror', density(1e-15, -4)),
          noise('mount', 'displacement-noise', 'cavity', density(1e-18, -2.5)),
          noise('ground', 'force-noise', 'mirror', { density: 'table', table: 0 }),
        ],
      },
    ),
    800,
  ],
  'structural loss and absolute zero': [
    readoutOf({ ...light, modes: { a: mode(1e6, 1e9, { law: 'structural', temperature: 0 }) } }, wide),
    800,
  ],
}

describe('interpolation between points', () => {
  test.each(Object.entries(budgets))('%s', (_, [budget, most]) => {
    const { points, worst, worstCurve, worstAt, evaluation } = checkPromise(budget)
    expect(worst, `${worstCurve} at ${worstAt} Hz`).toBeLessThan(gridTolerance)
    expect(points).toBeLessThan(most)
    expect(evaluation.points.frequency[0]).toBe(budget.band.low)
    expect(evaluation.points.frequency.at(-1)).toBe(budget.band.high)
  })

  test('random readouts of one to four modes', () => {
    let checked = 0
    fc.assert(
      fc.property(randomReadout({ modes: [1, 4] }), readout => {
        try {
          const { points, worst, worstCurve, worstAt } = checkPromise(readoutOf(readout, band(1e4, 1e8)))
          expect(worst, `${worstCurve} at ${worstAt} Hz`).toBeLessThan(gridTolerance)
          expect(points).toBeLessThan(4000)
          checked++
        } catch (error) {
          if (!(error instanceof Refusal)) throw error
        }
      }),
      { numRuns: 40, seed: 5, endOnFailure: true },
    )
    expect(checked).toBeGreaterThan(30)
  })
})

describe('points', () => {
  test('ascend without repetition, and every offset fits its anchor', () => {
    for (const [budget] of Object.values(budgets)) {
      const { points } = evaluateBand(prepare(budget))
      for (const [i, f] of points.frequency.entries()) {
        const anchor = points.anchor[i]
        const base = anchor < 0 ? 0 : points.anchors[anchor].frequency
        expect(base + points.offset[i]).toBe(f)
        if (i === 0) continue
        const same = anchor === points.anchor[i - 1]
        expect(same ? points.offset[i] - points.offset[i - 1] : f - points.frequency[i - 1]).toBeGreaterThan(0)
      }
    }
  })

  test('every peak is reached: a point stands on each mode, and the curve there is the exact one', () => {
    const [budget] = budgets['four modes of quality 1e9 over a factor 1e6']
    const { points, response } = evaluateBand(prepare(budget))
    for (const { frequency } of Object.values(spread)) {
      const i = points.frequency.indexOf(frequency)
      const exact = evaluateAtFrequencies(budget, [frequency])
      expect(points.offset[i]).toBe(0)
      // Same equations at the same point: the same bits but for the order of blocks.
      expect(Math.abs(response[i] / exact.response[0] - 1)).toBeLessThan(1e-12)
      // Half a linewidth away the response has half of its height.
      const at = (offset: number): number => {
        const { network } = prepare(budget)
        const anchor = points.anchor[i]
        const there = makePoints(points.anchors, [{ anchor, offset }])
        return new Evaluator(budget, network, { sources: false, limits: false }).at(there).response[0]
      }
      // 1e-6: the other modes and (Γ/Ω).
      expect(at(frequency / 2e9) / response[i]).toBeCloseTo(0.5, 6)
    }
  })

  test('zeros of the response have a point, where the total has its peak', () => {
    const { points, total, response } = evaluateBand(prepare(budgets['four modes of quality 1e9 over a factor 1e6'][0]))
    const zeros = points.anchors.flatMap((anchor, k) => (anchor.nature === 'zero' ? [k] : []))
    expect(zeros.length).toBe(3)
    for (const zero of zeros) {
      const i = points.anchor.findIndex((anchor, k) => anchor === zero && points.offset[k] === 0)
      const near = [i - 40, i + 40]
      for (const j of near) {
        expect(response[i]).toBeLessThan(1e-2 * response[j])
        expect(total[i]).toBeGreaterThan(total[j])
      }
    }
  })
})

test('the floor: a contribution far below it asks for no points', () => {
  const bare = readoutOf({ ...light, modes: { a: mode(1e6, 1e3) } }, band(1e4, 1e8))
  const small = component('faint', 'resonator', {
    mass: slot(1e-12),
    frequency: slot(3e6),
    quality: slot(1e9),
    law: 'viscous',
    temperature: slot(4),
  })
  // A mode that is neither sensed nor pushed: its thermal noise does not reach the record at all.
  const more: Budget = { ...bare, components: [...bare.components, small] }
  const [few, some] = [bare, more].map(b => evaluateBand(prepare(b)).points.frequency.length)
  expect(few).toBeLessThan(600)
  // Its anchor alone brings the first steps around it.
  expect(some).toBeLessThan(few + 200)
  expect(gridFloor).toBe(1e-6)
})

test('the start covers the band whatever stands in it', () => {
  const anchors = [
    { id: 'a', nature: 'mode', frequency: 2, halfWidth: 1e-9 },
    { id: 'b', nature: 'mode', frequency: 2.5, halfWidth: 1 },
  ] as const
  const points = firstPoints(anchors, { low: 1, high: 4 }, [0.5, 1.234, 9])
  expect(points.frequency[0]).toBe(1)
  expect(points.frequency.at(-1)).toBe(4)
  expect([...points.frequency].some(f => Math.abs(f - 1.234) < 1e-15)).toBe(true)
  expect(Math.min(...points.frequency)).toBe(1)
  expect(pointAt(anchors, 2.2)).toEqual({ anchor: 0, offset: 2.2 - 2 })
  expect(pointAt([], 2.2)).toEqual({ anchor: -1, offset: 2.2 })
})
