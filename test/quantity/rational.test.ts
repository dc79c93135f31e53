import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { add, equal, multiply, negate, one, rational, toNumber, toText, zero } from '../../src/quantity/rational.js'

const small = fc
  .tuple(fc.integer({ min: -1000, max: 1000 }), fc.integer({ min: 1, max: 1000 }))
  .map(([numerator, denominator]) => rational(numerator, denominator))

describe('exact fractions', () => {
  test('obey the laws of a field', () => {
    fc.assert(
      fc.property(small, small, small, (a, b, c) => {
        expect(add(a, b)).toEqual(add(b, a))
        expect(multiply(a, b)).toEqual(multiply(b, a))
        expect(add(add(a, b), c)).toEqual(add(a, add(b, c)))
        expect(multiply(a, add(b, c))).toEqual(add(multiply(a, b), multiply(a, c)))
        expect(add(a, negate(a))).toEqual(zero)
        expect(multiply(a, one)).toEqual(a)
      }),
    )
  })

  test('agree with big integers', () => {
    fc.assert(
      fc.property(small, small, (a, b) => {
        const sum = add(a, b)
        const left = BigInt(sum.numerator) * BigInt(a.denominator) * BigInt(b.denominator)
        const right =
          (BigInt(a.numerator) * BigInt(b.denominator) + BigInt(b.numerator) * BigInt(a.denominator)) *
          BigInt(sum.denominator)
        expect(left).toBe(right)
      }),
    )
  })

  test('stand in lowest terms with a positive denominator', () => {
    expect(rational(2, -4)).toEqual({ numerator: -1, denominator: 2 })
    expect(Object.is(rational(0, -5).numerator, 0)).toBe(true)
    expect(equal(rational(50, 100), rational(1, 2))).toBe(true)
    expect(toText(rational(-3, 6))).toBe('-1/2')
    expect(toNumber(rational(-3, 6))).toBe(-0.5)
  })

  test('refuse what is not exact', () => {
    expect(() => rational(1, 0)).toThrow('1/0 is no exact fraction')
    expect(() => rational(0.5)).toThrow('0.5/1 is no exact fraction')
    expect(() => multiply(rational(2 ** 40), rational(2 ** 40))).toThrow('is no exact fraction')
  })
})
