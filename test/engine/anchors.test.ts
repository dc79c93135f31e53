import { describe, expect, test } from 'vitest'
import { ascending, modeAnchors } from '../../src/engine/anchors.js'
import { evaluateBand, prepare } from '../../src/engine/assess.js'
import type { Anchor } from '../../src/model/points.js'
import { place } from './budget-of.js'
import { readoutOf, type ReadoutOf } from './readout-of.js'

const readout: ReadoutOf = {
  modes: {
    low: { mass: 1e-12, frequency: 1e6, quality: 1e7 },
    high: { mass: 1e-12, frequency: 2e6, quality: 1e7 },
  },
  coupling: 1e17,
  ports: { front: { rate: 1e7 } },
  quanta: 1e-6,
}
const band = { low: 1e5, high: 1e7, place }

const anchorsOf = (changes: Partial<ReadoutOf>, within = band): readonly Anchor[] => {
  const { network, poles } = prepare(readoutOf({ ...readout, ...changes }, { band }))
  return modeAnchors(network, poles, within)
}

describe('modes', () => {
  test('stand where the file says, as wide as half a linewidth', () => {
    const anchors = anchorsOf({})
    expect(anchors.map(a => [a.id, a.nature, a.frequency])).toEqual([
      ['low', 'mode', 1e6],
      ['high', 'mode', 2e6],
    ])
    expect(anchors.map(a => a.halfWidth)).toEqual([expect.closeTo(0.05, 12), expect.closeTo(0.1, 12)])
  })

  test('that light has moved or broadened have a pole beside them', () => {
    const anchors = anchorsOf({ quanta: 1e4, detuning: -6e6 })
    expect(anchors.map(a => a.id).sort()).toEqual(['high', 'high with light', 'low', 'low with light'])
    for (const { nature, halfWidth } of anchors) if (nature === 'pole') expect(halfWidth).toBeGreaterThan(1)
  })

  test('outside the band are left out', () => {
    expect(anchorsOf({}, { ...band, low: 1.5e6 }).map(a => a.id)).toEqual(['high'])
    expect(anchorsOf({}, { ...band, low: 3e6 })).toEqual([])
  })

  test('are no narrower than double precision tells apart', () => {
    const sharp = { low: { ...readout.modes['low'], quality: 1e30 } }
    expect(anchorsOf({ modes: sharp })[0].halfWidth).toBe(1e-13 * 1e6)
  })
})

describe('zeros of the response', () => {
  // Closed form: two modes of equal mass and weight cancel at ω² = (Ω₁² + Ω₂²)/2.
  test('stand where two modes cancel', () => {
    const { points } = evaluateBand(prepare(readoutOf(readout, { band })))
    const zeros = points.anchors.filter(a => a.nature === 'zero')
    expect(zeros.length).toBe(1)
    expect(zeros[0].frequency / Math.sqrt(2.5e12)).toBeCloseTo(1, 9)
    expect(zeros[0].halfWidth).toBeGreaterThan(0.01)
    expect(zeros[0].halfWidth).toBeLessThan(0.2)
  })

  test('none stands between modes that are pushed with opposite signs', () => {
    const modes = { ...readout.modes, high: { ...readout.modes['high'], weight: -1 } }
    const measurand = {
      quantity: 'force',
      weights: new Map([
        ['low', 1],
        ['high', 1],
      ]),
      at: null,
      place,
    } as const
    const { points } = evaluateBand(prepare(readoutOf({ ...readout, modes }, { band, measurand })))
    expect(points.anchors.filter(a => a.nature === 'zero')).toEqual([])
  })
})

test('anchors ascend; of two on one frequency the narrower stays', () => {
  const anchor = (id: string, frequency: number, halfWidth: number): Anchor => ({
    id,
    nature: 'mode',
    frequency,
    halfWidth,
  })
  const list = [anchor('c', 3, 1), anchor('wide', 2, 1), anchor('narrow', 2, 0.1)]
  expect(ascending(list).map(a => a.id)).toEqual(['narrow', 'c'])
  expect(list.map(a => a.id)).toEqual(['c', 'wide', 'narrow'])
})
