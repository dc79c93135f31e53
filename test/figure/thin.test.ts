import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { thin, thinTo } from '../../src/figure/thin.js'

/** Vertical distance of the kept line from every point of the full one. */
function largestError(full: readonly number[], kept: readonly number[]): number {
  let worst = 0
  let s = 0
  for (let k = 0; k < full.length; k += 2) {
    while (s + 4 < kept.length && kept[s + 2] < full[k]) s += 2
    worst = Math.max(worst, distance(full[k], full[k + 1], kept.slice(s, s + 4)))
  }
  return worst
}

function distance(x: number, y: number, [x0, y0, x1, y1]: readonly number[]): number {
  const length = (x1 - x0) ** 2 + (y1 - y0) ** 2
  const t = length === 0 ? 0 : Math.min(1, Math.max(0, ((x - x0) * (x1 - x0) + (y - y0) * (y1 - y0)) / length))
  return Math.hypot(x - x0 - t * (x1 - x0), y - y0 - t * (y1 - y0))
}

function resonance(count: number): number[] {
  return Array.from({ length: count }, (_, k) => {
    const x = (k / (count - 1)) * 1000
    return [x, 600 - 250 * Math.log10(1 + 1e4 / (1 + (x - 400) ** 2))]
  }).flat()
}

describe('thin', () => {
  it('keeps every point within the tolerance of the line that is left', () => {
    const ordinates = fc.array(fc.double({ min: -500, max: 500, noNaN: true }), { minLength: 3, maxLength: 120 })
    fc.assert(
      fc.property(ordinates, fc.double({ min: 0.01, max: 20, noNaN: true }), (ys, tolerance) => {
        const full = ys.flatMap((y, k) => [k * 1.7, y])
        const kept = thin(full, tolerance)
        for (let k = 0; k < kept.length; k += 2) expect(full.indexOf(kept[k])).toBeGreaterThanOrEqual(0)
        expect(largestError(full, kept)).toBeLessThanOrEqual(tolerance * (1 + 1e-9))
      }),
      { numRuns: 150, seed: 7 },
    )
  })

  it('draws a resonance of 20 000 points with some hundred, within a tenth of a pixel, its peak exact', () => {
    const full = resonance(20001)
    const kept = thin(full, 0.1)
    expect(kept.length / 2).toBeLessThan(200)
    expect(largestError(full, kept)).toBeLessThanOrEqual(0.1)
    const peak = Math.min(...full.filter((_, k) => k % 2 === 1))
    expect(kept).toContain(peak)
  })

  it('leaves two points of a straight line, and short lines as they are', () => {
    expect(thin([0, 0, 1, 1, 2, 2, 3, 3], 0.1)).toEqual([0, 0, 3, 3])
    expect(thin([0, 5, 1, 6], 0.1)).toEqual([0, 5, 1, 6])
    expect(thin([], 0.1)).toEqual([])
  })

  it('keeps to the most points allowed', () => {
    const zigzag = Array.from({ length: 5000 }, (_, k) => [k, k % 2 ? 90 : 10]).flat()
    expect(thinTo(zigzag, 0.1, 800).length / 2).toBeLessThanOrEqual(800)
    expect(thinTo(resonance(20001), 0.1, 800)).toEqual(thin(resonance(20001), 0.1))
  })
})
