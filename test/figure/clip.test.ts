import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { clip } from '../../src/figure/clip.js'

const BOX = { left: 0, top: 0, right: 10, bottom: 10 }

describe('clip', () => {
  it.each<[string, number[], number[][]]>([
    ['inside', [1, 1, 9, 9], [[1, 1, 9, 9]]],
    ['through', [-5, 5, 15, 5], [[0, 5, 10, 5]]],
    ['outside', [-5, -5, -1, 20], []],
    [
      'out and back',
      [2, 2, 4, 12, 6, 2],
      [
        [2, 2, 3.6, 10],
        [4.4, 10, 6, 2],
      ],
    ],
    ['along an edge', [0, 10, 10, 10], [[0, 10, 10, 10]]],
  ])('%s', (_, line, expected) => {
    const pieces = clip(line, BOX)
    expect(pieces).toHaveLength(expected.length)
    pieces.forEach((piece, k) => piece.forEach((v, n) => expect(v).toBeCloseTo(expected[k][n], 12)))
  })

  it('leaves nothing outside of the box', () => {
    const coordinate = fc.double({ min: -1e6, max: 1e6, noNaN: true })
    fc.assert(
      fc.property(fc.array(fc.tuple(coordinate, coordinate), { minLength: 2, maxLength: 20 }), points => {
        for (const v of clip(points.flat(), BOX).flat()) {
          expect(v).toBeGreaterThanOrEqual(-1e-6)
          expect(v).toBeLessThanOrEqual(10 + 1e-6)
        }
      }),
      { numRuns: 200, seed: 3 },
    )
  })
})
