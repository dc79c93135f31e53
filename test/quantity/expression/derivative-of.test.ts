import fc from 'fast-check'
import { evaluate as mathEvaluate, derivative as mathDerivative } from 'mathjs'
import { describe, expect, test } from 'vitest'
import { derivativeOf } from '../../../src/quantity/expression/derivative-of.js'
import { compileExpression } from '../../../src/quantity/expression/compile-expression.js'
import { evaluateExpression } from '../../../src/quantity/expression/evaluate-expression.js'
import { parseExpression } from '../../../src/quantity/expression/parse-expression.js'

const at = (x: number) => (name: string) => (name === 'x' ? x : name === 'a' ? 0.7 : NaN)
const slope = (text: string, x: number): number => evaluateExpression(derivativeOf(parseExpression(text), 'x'), at(x))

/** Spelled as mathjs reads it, too. */
const smooth = [
  ...['a', '3*x', 'x^2', 'x^a', 'a^x', 'x^x', 'a/x', 'x/(a + x)', '-(x - a)*x', '1/(1 + (a*x)^2)'],
  ...['sqrt(1 + x)', 'abs(a - 2*x)', 'exp(-x^2)', 'log10(x)', 'sin(x)*cos(a*x)', 'tan(x)', 'asin(x/9)', 'acos(x/9)'],
  ...['atan(x^2)', 'sinh(x)', 'cosh(x)', 'tanh(x)', 'coth(x)'],
]

describe('derivatives', () => {
  test.each(smooth)('of %s, as mathjs takes them', text => {
    for (const x of [0.3, 1.1, 1.9]) {
      const theirs = Number(mathDerivative(text, 'x').evaluate({ x, a: 0.7 }))
      expect(Math.abs(slope(text, x) - theirs)).toBeLessThanOrEqual(1e-12 * Math.abs(theirs) + 1e-15)
    }
  })

  test.each([
    'ln(3*x)',
    'atan2(x, a)',
    'atan2(a, x^2)',
    'hypot(x, a, x^2)',
    'max(x, a, x^2)',
    'min(a, x, 1/x)',
    'max(min(x, a), a*x)',
    'sign(x)*x',
  ])('of %s, against a difference of both sides', text => {
    const expression = parseExpression(text)
    for (const x of [0.31, 1.17, 1.93]) {
      const step = 1e-5
      const both = [x + step, x - step].map(each => evaluateExpression(expression, at(each)))
      // The third derivative is of order one or below a hundred here: an error of 1e-10 to 1e-8.
      expect(Math.abs(slope(text, x) - (both[0] - both[1]) / (2 * step))).toBeLessThan(1e-7)
    }
  })

  test('a corner has the mean of both sides', () => {
    expect(slope('abs(x)', 0)).toBe(0)
    expect(slope('max(x, 3*x)', 0)).toBe(2)
  })

  test('polynomials of random coefficients', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -9, max: 9 }), { minLength: 1, maxLength: 6 }), coefficients => {
        const text = coefficients.map((each, power) => `(${each})*x^${power}`).join(' + ')
        const exact = coefficients.reduce((sum, each, power) => sum + each * power * 1.5 ** (power - 1), 0)
        expect(Math.abs(slope(text, 1.5) - exact)).toBeLessThan(1e-11)
        expect(Number.isFinite(Number(mathEvaluate(text, { x: 1.5 })))).toBe(true)
      }),
    )
  })

  test('nested extremes and quotients stay small', () => {
    const nested = `${'max(a, min(x, '.repeat(24)}x${'))'.repeat(24)}`
    const program = compileExpression(derivativeOf(parseExpression(nested), 'x'), ['a', 'x'])
    expect(program.once.length / 4).toBeLessThan(10_000)
    const chain = `x${'/(1+x)'.repeat(120)}`
    expect(compileExpression(derivativeOf(parseExpression(chain), 'x'), ['x']).once.length / 4).toBeLessThan(200_000)
  })
})
