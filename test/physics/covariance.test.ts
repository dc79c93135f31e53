import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Covariance } from '../../src/model/network.js'
import { squeezedBlock, thermalBlock } from '../../src/physics/covariance.js'

/** One-sided density of the quadrature e^{−iθ}a + e^{iθ}a†, t S t† with t = (e^{−iθ}, e^{iθ}). */
function quadrature(block: Covariance, theta: number): number {
  const [[a, { re, im }], [, d]] = block
  // 2 Re(t₁ S₁₂ t₂*), t₁t₂* = e^{−2iθ}.
  return a.re + d.re + 2 * (re * Math.cos(2 * theta) + im * Math.sin(2 * theta))
}

const half = 0.5

describe('blocks of field noise', () => {
  test('a vacuum has two in every quadrature, one-sided: twice the two-sided one', () => {
    for (const theta of [0, 0.4, 1.5]) expect(quadrature(thermalBlock(half), theta)).toBeCloseTo(2, 14)
  })

  test('quanta add up', () => {
    expect(quadrature(thermalBlock(half + 3), 1)).toBeCloseTo(2 * 7, 13)
  })

  // Definition of the level: 10 log₁₀ of the noise power over the vacuum’s; identity, to rounding of cosh − sinh at 20 dB.
  test('squeezing lowers the quadrature at its angle by its level and raises the other by as much', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 20, noNaN: true }),
        fc.double({ min: -4, max: 4, noNaN: true }),
        (level, angle) => {
          const block = squeezedBlock(half, { level, angle })
          const ratio = 10 ** (level / 10)
          expect(quadrature(block, angle) / 2 / (1 / ratio)).toBeCloseTo(1, 10)
          expect(quadrature(block, angle + Math.PI / 2) / 2 / ratio).toBeCloseTo(1, 12)
          const [[a, b], [c, d]] = block
          expect([c.re, c.im]).toEqual([b.re, -b.im])
          // Pure: determinant of the vacuum, 1 for the one-sided block.
          expect((a.re * d.re - b.re ** 2 - b.im ** 2) / (a.re * d.re)).toBeCloseTo(1 / (a.re * d.re), 12)
        },
      ),
      { seed: 20272 },
    )
  })

  test('no squeezing is a thermal block', () => {
    for (const [i, row] of squeezedBlock(0.7, { level: 0, angle: 1 }).entries()) {
      for (const [j, value] of row.entries()) {
        expect(Math.hypot(value.re - thermalBlock(0.7)[i][j].re, value.im)).toBe(0)
      }
    }
  })
})
