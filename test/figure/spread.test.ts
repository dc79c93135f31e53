import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { spread } from '../../src/figure/spread.js'

describe('spread', () => {
  it('leaves boxes that are apart where they are', () => {
    expect(spread([10, 50, 90], [8, 8, 8], 0, 100)).toEqual([10, 50, 90])
  })

  it('moves a pair apart by equal ways, and keeps to the ends', () => {
    expect(spread([50, 50], [10, 10], 0, 100)).toEqual([45, 55])
    expect(spread([2, 1], [10, 10], 0, 100)).toEqual([15, 5])
    expect(spread([99, 98, 97], [10, 10, 10], 0, 100)).toEqual([95, 85, 75])
  })

  it('never lets boxes overlap, leave the range or change order', () => {
    const boxes = fc.array(
      fc.record({
        target: fc.double({ min: -50, max: 650, noNaN: true }),
        size: fc.double({ min: 5, max: 30, noNaN: true }),
      }),
      {
        minLength: 1,
        maxLength: 18,
      },
    )
    fc.assert(
      fc.property(boxes, list => {
        const centres = spread(
          list.map(b => b.target),
          list.map(b => b.size),
          0,
          600,
        )
        const sorted = list
          .map((b, k) => ({ ...b, centre: centres[k] }))
          .sort((a, b) => a.target - b.target || a.centre - b.centre)
        let end = 0
        for (const { centre, size } of sorted) {
          expect(centre - size / 2).toBeGreaterThanOrEqual(end - 1e-6)
          end = centre + size / 2
        }
        expect(end).toBeLessThanOrEqual(600 + 1e-6)
      }),
      { numRuns: 200, seed: 11 },
    )
  })
})
