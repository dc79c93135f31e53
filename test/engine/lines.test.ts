import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { evaluateAtFrequencies } from '../../src/engine/assess.js'
import { assemble } from '../../src/engine/assemble.js'
import { planLines } from '../../src/engine/lines.js'
import type { Budget, DensitySpec, LineSpec } from '../../src/model/budget.js'
import type { Evaluation } from '../../src/model/evaluation.js'
import { Refusal } from '../../src/model/problem.js'
import { line, place, slot } from './budget-of.js'
import { randomReadout } from './random-readout.js'
import { readoutOf, type ReadoutOf } from './readout-of.js'

const readout: ReadoutOf = {
  modes: { drum: { mass: 1e-12, frequency: 1e6, quality: 1e6, temperature: 1 } },
  coupling: 1e17,
  ports: { front: { rate: 1e6, occupancy: 0.3 }, back: { rate: 3e6 } },
  quanta: 1e4,
  detuning: -1e6,
  record: 1,
  efficiency: 0.7,
}
const frequencies = [1e4, 0.9999e6, 1e6, 3e6]

const evaluate = (lines: LineSpec[], changes: Partial<ReadoutOf> = {}): Evaluation =>
  evaluateAtFrequencies(readoutOf({ ...readout, ...changes }, { lines }), frequencies)

const psd = (evaluation: Evaluation, id: string): Float64Array => evaluation.lines.find(l => l.id === id)!.psd
const source = (evaluation: Evaluation, id: string): Evaluation['sources'][number] =>
  evaluation.sources.find(s => s.id === id)!

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
      density: {
        density: 'level',
        level: slot(1e-18),
        power: false,
        exponent: slot(0),
        reference: null,
      } satisfies DensitySpec,
    },
    places: new Map(),
  },
}

/** Largest |Σ lines − total| over the sum of the magnitudes of the lines. */
function imbalance({ lines, total }: Evaluation): number {
  return Math.max(
    ...total.map((t, i) => {
      const sum = lines.reduce((s, l) => s + l.psd[i], 0)
      return Math.abs(sum - t) / lines.reduce((s, l) => s + Math.abs(l.psd[i]), 0)
    }),
  )
}

describe('lines without any statement', () => {
  const evaluation = evaluate([])

  test('are thermal, shot, back-action, heating and the correlation of two of them', () => {
    expect(evaluation.lines.map(l => [l.id, l.family, l.signed])).toEqual([
      ['thermal', 'thermal', false],
      ['shot', 'imprecision', false],
      ['back_action', 'back-action', false],
      ['heating', 'heating', false],
      ['correlation.shot.back_action', 'correlation', true],
    ])
  })

  test('say what they hold', () => {
    expect(evaluation.lines.map(l => l.of)).toEqual([
      ['drum.bath'],
      ['cavity.front imprecision', 'cavity.back imprecision', 'detector.loss'],
      ['cavity.front back-action', 'cavity.back back-action'],
      ['cavity.front heating'],
      ['cavity.front correlation', 'cavity.back correlation'],
    ])
  })

  test('an amplifier brings a line of its own', () => {
    const { lines } = evaluate([], { added: 2, efficiency: 1 })
    expect(lines.map(l => l.id)).toContain('added')
  })
})

describe('claims', () => {
  test('a component’s id claims all of its noises, whole', () => {
    const evaluation = evaluate([line('light', ['cavity'], null)])
    const [front, back] = [source(evaluation, 'cavity.front'), source(evaluation, 'cavity.back')]
    for (const [i, value] of psd(evaluation, 'light').entries()) {
      expect(value / (front.psd[i] + back.psd[i])).toBeCloseTo(1, 12)
    }
    expect(evaluation.lines.find(l => l.id === 'light')!.of).toEqual(['cavity.front', 'cavity.back'])
    expect(evaluation.lines.every(l => !l.signed)).toBe(true)
  })

  test('a part claims that part of the vacuum share only', () => {
    const evaluation = evaluate([line('push', ['cavity.front'], 'back-action')])
    const { vacuum } = source(evaluation, 'cavity.front')
    expect(psd(evaluation, 'push')).toEqual(vacuum!.backAction)
    // What is left of a component that a line mentions stands under its own id, with its share of the correlation in a line.
    expect(evaluation.lines.map(l => l.id)).toContain('cavity.front')
    expect(evaluation.lines.map(l => l.id)).toContain('cavity.back')
    expect(evaluation.lines.map(l => l.id)).toContain('correlation.cavity.front.push')
  })

  test('imprecision and back-action in one line bring their correlation along', () => {
    const evaluation = evaluate([line('warm', ['cavity'], 'heating'), line('vacuum', ['cavity'], 'imprecision')])
    const own = evaluation.lines.find(l => l.id === 'cavity.front')
    expect(own?.of).toEqual(['cavity.front back-action'])
    const both = evaluate([line('warm', ['cavity.front'], 'heating')])
    const { vacuum } = source(both, 'cavity.front')
    for (const [i, value] of psd(both, 'cavity.front').entries()) {
      const { imprecision, backAction, correlation } = vacuum!
      expect(value / (imprecision[i] + backAction[i] + correlation[i])).toBeCloseTo(1, 10)
    }
  })

  test('heating is all that the occupancy adds: (2n) of what the vacuum brings, correlation included', () => {
    const evaluation = evaluate([line('warm', ['cavity.front'], 'heating')])
    const { vacuum } = source(evaluation, 'cavity.front')
    for (const [i, value] of psd(evaluation, 'warm').entries()) {
      const whole = vacuum!.imprecision[i] + vacuum!.backAction[i] + vacuum!.correlation[i]
      expect(value / (2 * 0.3 * whole)).toBeCloseTo(1, 10)
    }
  })

  test('a contribution of its own is a line and a source', () => {
    const evaluation = evaluate([stray])
    expect(psd(evaluation, 'stray')[0] / 1e-36).toBeCloseTo(1, 12)
    expect(source(evaluation, 'stray').readout).toBe(false)
  })

  test('lines stand in the order of the file, what nobody claims behind them, correlations last', () => {
    const { lines } = evaluate([stray, line('push', ['cavity'], 'back-action'), line('thermal', ['drum.bath'], null)])
    expect(lines.map(l => l.id)).toEqual([
      'stray',
      'push',
      'thermal',
      'cavity.front',
      'cavity.back',
      'shot',
      'correlation.cavity.front.push',
      'correlation.cavity.back.push',
    ])
  })

  test('two claims of one part are an engine fault, since the border refuses them', () => {
    const budget = readoutOf(readout, {
      lines: [line('a', ['cavity'], null), line('b', ['cavity.front'], 'imprecision')],
    })
    expect(() => planLines(budget, assemble(budget))).toThrow(/cavity\.front imprecision is claimed by a and by b/)
  })
})

describe('sums', () => {
  const ids = ['drum', 'drum.bath', 'cavity', 'cavity.front', 'cavity.back', 'detector.loss']
  const claim = fc.record({
    of: fc.uniqueArray(fc.constantFrom(...ids), { minLength: 1, maxLength: 3 }),
    part: fc.constantFrom(null, 'imprecision' as const, 'back-action' as const, 'heating' as const),
  })

  // Identity; 1e-12 of the magnitudes is rounding.
  test('lines add up to the total, whatever the file claims', () => {
    let good = 0
    fc.assert(
      fc.property(fc.array(claim, { maxLength: 4 }), claims => {
        const lines = claims.map(({ of, part }, i) => line(`line_${i}`, of, part))
        let evaluation: Evaluation
        try {
          evaluation = evaluate(lines)
        } catch (error) {
          expect(String(error)).toMatch(/is claimed by/)
          return
        }
        expect(imbalance(evaluation)).toBeLessThan(1e-12)
        good++
      }),
      { numRuns: 200, seed: 20268 },
    )
    expect(good).toBeGreaterThan(60)
  })

  test('sources add up to the total, parts to their source, added noise to the readout’s sources', () => {
    fc.assert(
      fc.property(randomReadout({ modes: [1, 3] }), random => {
        let evaluation: Evaluation
        const budget: Budget = readoutOf(random)
        try {
          evaluation = evaluateAtFrequencies(budget, [1e4, 3e5, 1.1e6, 3e7])
        } catch (error) {
          if (error instanceof Refusal) return
          throw error
        }
        const { sources, total, added } = evaluation
        for (const i of total.keys()) {
          const sum = (of: readonly { psd: Float64Array }[]): number => of.reduce((s, { psd: p }) => s + p[i], 0)
          expect(sum(sources) / total[i]).toBeCloseTo(1, 12)
          expect(sum(sources.filter(s => s.readout)) / added[i]).toBeCloseTo(1, 12)
          for (const { psd: all, vacuum, heating } of sources) {
            expect(all[i]).toBeGreaterThanOrEqual(0)
            if (vacuum === undefined) continue
            const parts = [vacuum, ...(heating === undefined ? [] : [heating])].flatMap(p => [
              p.imprecision[i],
              p.backAction[i],
              p.correlation[i],
            ])
            const size = parts.reduce((s, p) => s + Math.abs(p), 0)
            expect(Math.abs(parts.reduce((s, p) => s + p, 0) - all[i])).toBeLessThanOrEqual(1e-12 * size)
          }
        }
        expect(imbalance(evaluation)).toBeLessThan(1e-12)
      }),
      { numRuns: 100, seed: 20269 },
    )
  })
})
