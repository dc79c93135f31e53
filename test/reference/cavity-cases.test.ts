import { describe, expect, test } from 'vitest'
import { assemble } from '../../src/engine/assemble.js'
import { prepare } from '../../src/engine/assess.js'
import { evaluateAt } from '../../src/engine/evaluate.js'
import { makePoints } from '../../src/engine/points.js'
import type { Evaluation, Parts, SourceCurve } from '../../src/model/evaluation.js'
import { Refusal } from '../../src/model/problem.js'
import { budgetOfCase, cavityCases, type CavityCase } from './cavity-case.js'

/*
 * Source of the values: the coupled linear equations of a cavity readout [Aspelmeyer, Kippenberg, Marquardt, Rev. Mod. Phys.
 * 86, 1391 (2014); Clerk et al., Rev. Mod. Phys. 82, 1155 (2010)] solved as matrices at each frequency in numpy with
 * CODATA 2022 constants: a second derivation, made without this engine.
 */

function evaluateCase(working: CavityCase): Evaluation {
  const budget = budgetOfCase(working)
  const frequency = working.parameters.frequency
  const anchors = [{ id: 'mode', nature: 'mode', frequency, halfWidth: frequency / working.parameters.Q / 2 } as const]
  const points = makePoints(
    anchors,
    working.frequencies_hz.map(f => ({ anchor: 0, offset: f - frequency })),
  )
  return evaluateAt(budget, assemble(budget), points, { sources: true, limits: true })
}

const ids: Record<string, string> = {
  port_pumped: 'cavity.pumped',
  port_second: 'cavity.second',
  internal_loss: 'cavity.internal',
  amplifier: 'amplifier.added',
  mechanical_bath: 'mode.bath',
}

function sourceOf(evaluation: Evaluation, name: string): SourceCurve | undefined {
  const loss = evaluation.sources.find(s => s.id === 'line.loss' || s.id === 'detector.loss')
  return name === 'detection_loss' ? loss : evaluation.sources.find(s => s.id === ids[name])
}

function largestDifference(actual: ArrayLike<number>, expected: number[], scale: ArrayLike<number> = expected): number {
  return Math.max(...expected.map((e, i) => Math.abs(actual[i] - e) / Math.max(Math.abs(e), Math.abs(scale[i]))))
}

/** Whole-port parts: of the vacuum share and of what the occupancy adds. */
const whole = (source: SourceCurve, part: keyof Parts): Float64Array =>
  source.vacuum![part].map((v, i) => v + (source.heating?.[part][i] ?? 0))

const stable = cavityCases.filter(c => c.stable)

describe.each(stable)('$id', working => {
  const evaluation = evaluateCase(working)
  const baths = Object.entries(working.force_psd).filter(([name, psd]) => name !== 'total' && psd.some(v => v !== 0))

  test.each(baths)('%s to 1e-8', (name, expected) => {
    expect(largestDifference(sourceOf(evaluation, name)!.psd, expected)).toBeLessThan(1e-8)
  })

  test('no bath is missing and none is added', () => {
    expect(evaluation.sources.length).toBe(baths.length)
    expect(largestDifference(evaluation.total, working.force_psd['total'])).toBeLessThan(1e-8)
  })

  test.each(Object.entries(working.parts))('parts of %s to 1e-8 of the larger of part and bath', (name, expected) => {
    const source = sourceOf(evaluation, name)!
    const bath = working.force_psd[name]
    expect(largestDifference(whole(source, 'imprecision'), expected.imprecision, bath)).toBeLessThan(1e-8)
    expect(largestDifference(whole(source, 'backAction'), expected.back_action, bath)).toBeLessThan(1e-8)
    expect(largestDifference(whole(source, 'correlation'), expected.correlation, bath)).toBeLessThan(1e-8)
  })

  test('standard quantum limit', () => {
    const sql = evaluation.limits.find(limit => limit.id === 'sql')!
    expect(largestDifference(sql.psd, working.sql_force_psd)).toBeLessThan(1e-8)
  })
})

test('the unstable working point is refused at its pump, and no stable one is', () => {
  const refusals = cavityCases.map(working => {
    try {
      prepare(budgetOfCase(working))
      return []
    } catch (error) {
      return error instanceof Refusal ? error.problems.map(p => p.code) : [String(error)]
    }
  })
  expect(refusals).toEqual(cavityCases.map(working => (working.stable ? [] : ['unstable'])))
  expect(refusals.flat().length).toBe(1)
})
