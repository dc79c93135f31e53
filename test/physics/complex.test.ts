import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import {
  add,
  complex,
  conjugate,
  divide,
  magnitude,
  multiply,
  norm,
  phase,
  polar,
  reciprocal,
  scale,
  subtract,
} from '../../src/physics/complex.js'

/* Road: identities of the field of complex numbers, to rounding. */

const size = fc.double({ min: -1e3, max: 1e3, noNaN: true })
const any = fc.tuple(size, size).map(([re, im]) => complex(re, im))
const nonzero = any.filter(a => magnitude(a) > 1e-3)

function close(a: { re: number; im: number }, b: { re: number; im: number }, of: number): void {
  expect(magnitude(subtract(a, b))).toBeLessThanOrEqual(1e-14 * of)
}

describe('complex numbers', () => {
  test('form a field', () => {
    fc.assert(
      fc.property(any, any, nonzero, (a, b, c) => {
        const m = magnitude(a) + magnitude(b) + magnitude(c) + 1
        close(multiply(a, add(b, c)), add(multiply(a, b), multiply(a, c)), m * m)
        close(multiply(c, reciprocal(c)), complex(1), 10)
        close(multiply(divide(a, c), c), a, 10 * m)
        close(subtract(add(a, b), b), a, m)
      }),
      { seed: 20272 },
    )
  })

  test('moduli, conjugates and polar form', () => {
    fc.assert(
      fc.property(nonzero, any, (a, b) => {
        close(conjugate(multiply(a, b)), multiply(conjugate(a), conjugate(b)), 1e7)
        close(polar(magnitude(a), phase(a)), a, 10 * magnitude(a))
        expect(norm(a) / magnitude(a) ** 2).toBeCloseTo(1, 13)
        close(scale(a, 2), add(a, a), 1)
      }),
      { seed: 20272 },
    )
  })

  test('the reciprocal neither overflows nor underflows where |a|² does', () => {
    for (const exponent of [-300, -200, 200, 300]) {
      const a = complex(3 * 10 ** exponent, -4 * 10 ** exponent)
      const { re, im } = reciprocal(a)
      expect(re * 10 ** exponent).toBeCloseTo(0.12, 13)
      expect(im * 10 ** exponent).toBeCloseTo(0.16, 13)
    }
  })
})
