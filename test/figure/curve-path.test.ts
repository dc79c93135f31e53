import { describe, expect, it } from 'vitest'
import { curvePath, type CurvePath } from '../../src/figure/curve-path.js'
import { axisScale, frequencyKind } from '../../src/figure/scales.js'

const FRAME = { left: 0, top: 0, right: 100, bottom: 100 }
const X = axisScale('linear', [0, 10], [0, 100])
/** Amplitudes from 0.1 at the bottom to 10 at the top. */
const Y = axisScale('log', [0.1, 10], [100, 0])

function pieces(psd: number[], more: Partial<CurvePath> = {}) {
  const x = Float64Array.from(psd, (_, k) => k)
  return curvePath({ x, psd: Float64Array.from(psd), sign: 1, signed: false, ...more }, X, Y, FRAME)
}

describe('curvePath', () => {
  it('draws the square root of the power density', () => {
    expect(pieces([1, 1])[0].map(v => Math.round(v * 1e6) / 1e6)).toEqual([0, 50, 10, 50])
    expect(pieces([100, 1])[0][1]).toBeCloseTo(0, 9)
  })

  it.each([0, -1, Number.NaN, Infinity])('breaks at %d instead of drawing it', hole => {
    const drawn = pieces([1, 1.1, 1, hole, 1, 1.2, 1])
    expect(drawn).toHaveLength(2)
    expect(drawn[0].at(-2)).toBeCloseTo(20, 9)
    expect(drawn[1][0]).toBeCloseTo(40, 9)
    expect(drawn.flat().every(Number.isFinite)).toBe(true)
  })

  it('draws nothing of a curve that is nowhere above zero, nor of a single point', () => {
    expect(pieces([0, 0, 0])).toEqual([])
    expect(pieces([0, 1, 0])).toEqual([])
    expect(pieces([])).toEqual([])
  })

  it('takes both signs of a signed density to the bottom of the frame where it passes through zero', () => {
    const psd = [1, 1, -1, -1]
    const positive = pieces(psd, { signed: true })
    const negative = pieces(psd, { signed: true, sign: -1 })
    expect(positive).toHaveLength(1)
    expect(negative).toHaveLength(1)
    expect(positive[0].at(-1)).toBeCloseTo(100, 9)
    expect(positive[0].at(-2)).toBeLessThan(15.01)
    expect(negative[0][1]).toBeCloseTo(100, 9)
    expect(negative[0][0]).toBeGreaterThan(14.99)
  })
})

it('frequencies stand on a log axis above a factor of three', () => {
  expect(frequencyKind({ low: 1, high: 3 })).toBe('linear')
  expect(frequencyKind({ low: 1, high: 3.01 })).toBe('log')
  expect(frequencyKind({ low: 0, high: 10 })).toBe('linear')
})
