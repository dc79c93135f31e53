import fc from 'fast-check'
import { evaluate as mathEvaluate, unit as mathUnit } from 'mathjs'
import { describe, expect, test } from 'vitest'
import { QuantityError } from '../../../src/quantity/error.js'
import { compileExpression } from '../../../src/quantity/expression/compile-expression.js'
import { evaluateExpression } from '../../../src/quantity/expression/evaluate-expression.js'
import { faultOf } from '../../../src/quantity/expression/fault-of.js'
import { namesIn } from '../../../src/quantity/expression/names-in.js'
import { parseExpression } from '../../../src/quantity/expression/parse-expression.js'
import { run, runOver } from '../../../src/quantity/expression/run-program.js'
import { randomExpression, variables } from './random-expression.js'
import { scope, valueIn } from './scope.js'

const order = [...variables.keys()]
const values = Float64Array.from(variables.values())

function within(found: number, wanted: number, relative: number): boolean {
  return Object.is(found, wanted) || found === wanted || Math.abs(found - wanted) <= relative * Math.abs(wanted)
}

/** Parsed, or null where a random text leaves the bounds of the language. */
function parsed(text: string) {
  try {
    return parseExpression(text)
  } catch (error) {
    if (error instanceof QuantityError) return null
    throw error
  }
}

/** Null where mathjs goes on in complex numbers, which this language has none of. */
function opinion(text: string, f: number): number | null {
  try {
    const value: unknown = mathEvaluate(text, { ...Object.fromEntries(variables), f })
    return typeof value === 'number' ? value : null
  } catch (error) {
    if (error instanceof TypeError && /complex/i.test(error.message)) return null
    throw error
  }
}

describe('second opinions', () => {
  test('mathjs computes the same number', () => {
    let compared = 0
    fc.assert(
      fc.property(randomExpression, fc.double({ min: 0.1, max: 100, noNaN: true }), (text, f) => {
        const expression = parsed(text)
        fc.pre(expression !== null)
        const theirs = opinion(text, f)
        fc.pre(theirs !== null && Number.isFinite(theirs))
        const valueOf = (name: string): number => (name === 'f' ? f : (variables.get(name) ?? NaN))
        const ours = evaluateExpression(expression, valueOf)
        // A difference of nearly equal parts magnifies the last bit of either; both are compared where that is tame.
        const nudged = evaluateExpression(expression, name => valueOf(name) * (1 + 1e-13))
        fc.pre(Number.isFinite(nudged) && Math.abs(nudged - ours) <= 1e-10 * Math.abs(ours))
        compared += 1
        expect(within(ours, theirs ?? NaN, 1e-9), `${text}: ${ours} and ${theirs}`).toBe(true)
      }),
      { numRuns: 1500 },
    )
    expect(compared).toBeGreaterThan(500)
  })

  test('the program computes what the tree does, over any number of points', () => {
    const points = fc.array(fc.double({ min: 0.1, max: 100, noNaN: true }), { minLength: 1, maxLength: 700 })
    fc.assert(
      fc.property(randomExpression, points, (text, frequencies) => {
        const expression = parsed(text)
        fc.pre(expression !== null)
        const out = new Float64Array(frequencies.length)
        const bad = runOver(compileExpression(expression, order), values, Float64Array.from(frequencies), out)
        const wanted = frequencies.map(f =>
          evaluateExpression(expression, name => (name === 'f' ? f : (variables.get(name) ?? NaN))),
        )
        expect([...out]).toEqual(wanted)
        expect(bad).toBe(out.findIndex(value => !Number.isFinite(value)))
      }),
      { numRuns: 500 },
    )
  })

  test('mathjs computes the same quantity in units', () => {
    const theirs = (text: string): number => (mathUnit(text) as unknown as { value: number }).value
    const ours = (text: string): number => evaluateExpression(parseExpression(text), valueIn)
    expect(within(ours('(3 N/m)*(2 mm)^2/2'), theirs('6 uJ'), 1e-14)).toBe(true)
    expect(within(ours('sqrt((2 N/m)/(3 ng))'), Math.sqrt(theirs('2 N/m') / theirs('3 ng')), 1e-14)).toBe(true)
    expect(within(ours('(3 mA)*(50 kΩ)'), theirs('150 V'), 1e-14)).toBe(true)
  })
})

describe('programs', () => {
  test('what does not need the frequency is computed once', () => {
    const program = compileExpression(parseExpression('sqrt(a/b)*exp(x) + sin(y)*f'), order)
    expect(program.over.length / 4).toBe(2)
    expect(program.once.length / 4).toBe(5)
  })

  test('a hundred terms need few registers of a block', () => {
    const text = Array.from({ length: 70 }, (_, index) => `f/${index + 1}`).join('+')
    expect(compileExpression(parseExpression(text), []).overRegisters).toBeLessThanOrEqual(75)
  })

  test('an expression without f has one value, and the same at every point', () => {
    const program = compileExpression(parseExpression('a*x'), order)
    const out = new Float64Array(3)
    expect(runOver(program, values, Float64Array.of(1, 2, 3), out)).toBe(-1)
    expect([...out]).toEqual([run(program, values), run(program, values), run(program, values)])
  })

  test('the result may stand where the frequencies stood, and nothing else is touched', () => {
    const f = Float64Array.from({ length: 1000 }, (_, index) => index + 1)
    const program = compileExpression(parseExpression('1/f^2 + a'), order)
    const apart = new Float64Array(1000)
    runOver(program, values, f, apart)
    expect(runOver(program, values, f, f)).toBe(-1)
    expect([...f]).toEqual([...apart])
    expect([...values]).toEqual([...variables.values()])
    expect(runOver(program, values, new Float64Array(0), new Float64Array(0))).toBe(-1)
  })

  test('misuse is told', () => {
    const program = compileExpression(parseExpression('f*a'), order)
    expect(() => run(program, values)).toThrow('a program that needs the frequency runs over frequencies')
    expect(() => runOver(program, values, values, new Float64Array(1))).toThrow('4 frequencies do not fit 1 values')
    expect(() => runOver(program, new Float64Array(1), values, values)).toThrow('1 values do not fit 4 names')
    expect(() => compileExpression(parseExpression('2*zebra'), order)).toThrow('`zebra` has no value here')
  })
})

describe('results that are no numbers', () => {
  test('the first bad point is told', () => {
    const program = compileExpression(parseExpression('1/(f - 3)'), [])
    const out = new Float64Array(3)
    expect(runOver(program, new Float64Array(0), Float64Array.of(2, 3, 4), out)).toBe(1)
    expect([...out]).toEqual([-1, Infinity, 1])
  })

  test.each([
    ['2*sqrt(a - x)', '`sqrt(a - x)` is not a number at f = 3 Hz, as `a - x` is -1.4'],
    ['1/(f - 3)', '`1/(f - 3)` is infinite at f = 3 Hz, as `1` is 1 and `(f - 3)` is 0'],
    ['exp(1000)*a', '`exp(1000)` is infinite at f = 3 Hz, as `1000` is 1000'],
  ])('%s', (text, message) => {
    const valueOf = (name: string): number => (name === 'f' ? 3 : (variables.get(name) ?? NaN))
    expect(faultOf(parseExpression(text), valueOf, 'at f = 3 Hz').message).toBe(message)
  })

  test('an overflow on the way to a good number is none', () => {
    const expression = parseExpression('1/(exp(1000) - 1)')
    expect(run(compileExpression(expression, []), new Float64Array(0))).toBe(0)
  })
})

test('names of the scope and of the values agree', () => {
  const expression = parseExpression('4*k_B*temperature*mass*rate')
  const names = namesIn(expression)
  const program = compileExpression(expression, names)
  const value = run(
    program,
    Float64Array.from(names, name => scope.get(name)?.value ?? NaN),
  )
  expect(within(value, 4 * 1.380649e-23 * 4 * 3e-12 * 2, 1e-14)).toBe(true)
})
