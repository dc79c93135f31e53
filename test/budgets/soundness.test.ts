import { describe, expect, it } from 'vitest'
import type { Curve } from '../../src/model/evaluation.js'
import { demo, demoBudget, sensors } from './demo.js'

/** Largest difference of the sum of curves from the total, in units of the sum of their magnitudes. */
function worstSum(curves: readonly Curve[], total: Float64Array): number {
  return total.reduce((worst, whole, i) => {
    const sum = curves.reduce((all, curve) => all + curve.psd[i], 0)
    const size = curves.reduce((all, curve) => all + Math.abs(curve.psd[i]), 0)
    return Math.max(worst, Math.abs(sum - whole) / size)
  }, 0)
}

it('has the demo sensors', () => {
  expect(sensors).toEqual(['avocet', 'dunlin', 'oystercatcher', 'sanderling'])
})

describe.each(sensors)('%s', sensor => {
  const { budget, evaluation, headlines, warnings } = demo(sensor)

  it('warns only where back-action is left out', () => {
    expect(warnings.map(warning => warning.code)).toEqual(sensor === 'sanderling' ? ['no-back-action'] : [])
  })

  it('has a finite, positive total over the whole band', () => {
    const { frequency } = evaluation.points
    expect([frequency[0], frequency.at(-1)]).toEqual([budget.band.low, budget.band.high])
    expect(evaluation.total.filter(psd => !(psd > 0 && Number.isFinite(psd)))).toHaveLength(0)
  })

  it('is resolved by a few thousand points at most', () => {
    expect(evaluation.total.length).toBeGreaterThan(100)
    expect(evaluation.total.length).toBeLessThan(4000)
  })

  it('adds up, by lines and by sources', () => {
    expect(worstSum(evaluation.lines, evaluation.total)).toBeLessThan(1e-9)
    expect(worstSum(evaluation.sources, evaluation.total)).toBeLessThan(1e-9)
  })

  it('has no line that is nowhere more than a ten-thousandth of the power', () => {
    const idle = evaluation.lines
      .filter(line => line.psd.every((psd, i) => Math.abs(psd) < 1e-4 * evaluation.total[i]))
      .map(line => line.id)
    expect(idle).toEqual(sensor === 'oystercatcher' ? ['correlation.shot.back_action'] : [])
  })

  it('is best inside its band', () => {
    expect(headlines.best.frequency).toBeGreaterThan(budget.band.low)
    expect(headlines.best.frequency).toBeLessThan(budget.band.high)
  })

  it('says of every number what it is and what it rests on', () => {
    const bare = budget.roots.filter(root => root.about === null || root.evidence === null).map(root => root.id)
    // Choices and conventions, not measurements: weight 1, the law's exponent, and where a level is stated.
    expect(bare.filter(id => !/\.(?:exponent|reference|at|modes\.\w+)$/.test(id))).toEqual([])
  })

  it('describes itself', () => {
    const { title, summary, revision } = demoBudget(sensor)
    expect(title.length).toBeGreaterThan(10)
    expect(summary?.length).toBeGreaterThan(200)
    expect(revision).toMatch(/^\d+\.\d+$/)
  })
})
