import { describe, expect, it } from 'vitest'
import { curvesOf } from '../../src/figure/input.js'
import { membraneEvaluation } from './membrane.js'

describe('curvesOf', () => {
  const evaluation = membraneEvaluation()

  it('counts the lines of one family', () => {
    const twice = {
      ...evaluation,
      lines: [...evaluation.lines, { ...evaluation.lines[0], id: 'gas', title: 'gas damping' }],
    }
    const tones = curvesOf(twice).lines.map(line => [line.id, line.tone])
    expect(tones).toContainEqual(['thermal', 0])
    expect(tones).toContainEqual(['gas', 1])
  })

  it('keeps a published tone', () => {
    const lines = curvesOf(evaluation, new Map([['thermal', 3]])).lines
    expect(lines.find(line => line.id === 'thermal')!.tone).toBe(3)
  })

  it.each([
    ['sql', true],
    ['standard-quantum-limit', true],
    ['standard_quantum', true],
    ['correlation-limit', false],
  ])('%s is the standard quantum limit: %s', (id, expected) => {
    const limits = [{ ...evaluation.limits[0], id }]
    expect(curvesOf({ ...evaluation, limits }).limits[0].prominent).toBe(expected)
  })
})
