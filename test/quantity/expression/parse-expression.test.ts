import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { QuantityError } from '../../../src/quantity/error.js'
import { checkExpression } from '../../../src/quantity/expression/check-expression.js'
import { evaluateExpression } from '../../../src/quantity/expression/evaluate-expression.js'
import { namesIn } from '../../../src/quantity/expression/names-in.js'
import { parseExpression } from '../../../src/quantity/expression/parse-expression.js'
import { scope, valueIn } from './scope.js'

const values: readonly (readonly [string, number])[] = [
  ['= 2 + 3', 5],
  ['-2^2', -4],
  ['−2²', -4],
  ['2^3^2', 512],
  ['2**-1', 0.5],
  ['2^-1^2', 0.5],
  ['2*-3', -6],
  ['--2', 2],
  ['+2', 2],
  ['8/4/2', 1],
  ['8/4*2', 4],
  ['1 - 2 - 3', -4],
  ['10⁻⁹', 1e-9],
  ['4^(1/2)', 2],
  ['8¹ᐟ³', 2],
  ['√(2 + 2)', 2],
  ['√4*2', 4],
  ['2·3×4', 24],
  ['2π', 2 * Math.PI],
  ['1/2π', 1 / (2 * Math.PI)],
  ['3e2', 300],
  ['3e−2', 0.03],
  ['3 kHz/(1 Hz)', 3000],
  ['90°/(1 rad)', Math.PI / 2],
  ['5 %', 0.05],
  ['(3 1/Hz)*f', 3000],
  ['(-60 dBm)/(1 nW)', 1],
  ['(0.8 aN/√Hz)/(0.4 aN/√Hz)', 2],
  ['(2 × 10⁻³ kg)/(1 g)', 2],
  ['max(1,2,3)', 3],
  ['min(3, -1)', -1],
  ['hypot(3, 4)', 5],
  ['atan2(1, 1)', Math.PI / 4],
  ['ln(exp(1))', 1],
  ['log10(1000)', 3],
  ['coth(1)', 1 / Math.tanh(1)],
  ['abs(-3)', 3],
  ['sqrt(4 N²)/(1 N)', 2],
  ['ħ/hbar', 1],
  ['ε₀/epsilon_0 + µ_0/mu_0', 2],
  ['mass/(\n  3 ng\n)', 1],
]

test.each(values)('%s', (text, value) => {
  expect(Math.abs(evaluateExpression(parseExpression(text), valueIn) - value)).toBeLessThanOrEqual(
    1e-14 * Math.abs(value),
  )
})

test('names are listed once, in the order of their use', () => {
  expect(namesIn(parseExpression('2*pi*f*mass/(mass + k_B*cycle)^2'))).toEqual(['f', 'mass', 'k_B'])
})

test('places count from the beginning of the text, its equals sign included', () => {
  const { root } = parseExpression('  = (a + b)*c')
  expect([root.start, root.end]).toEqual([4, 13])
})

const noFunction =
  'is no function; a product has its sign, `k*(…)`; the functions are sqrt, abs, sign, exp, ln, log10, sin, cos, tan, asin, acos, atan, sinh, cosh, tanh, coth, atan2, hypot, min, max'
const number = 'is not understood here; a number, a name or a bracket is wanted'

/** Expression, the piece that is at fault, and the whole message. */
const refusals: readonly (readonly [string, string, string])[] = [
  ['=', '=', 'nothing to compute stands here; write it like `= sqrt(k/m)/(2*pi)`'],
  ['f*', 'f*', 'the expression ends too early; a number or a name is missing'],
  ['*f', '*', `\`*\` ${number}`],
  ['2x', '2x', '`2 x`: a sign is missing; write `2*x`'],
  ['2 (x)', '2 (', '`2 (…)`: a sign is missing; write `2*(…)`'],
  ['x y', 'x y', '`x y`: a sign is missing; write `x*y`'],
  ['2 3', '2 3', '`2 3`: a sign is missing; write `2*3`'],
  ['k(2)', 'k', `\`k\` ${noFunction}`],
  ['log(2)', 'log', '`log` is no function; write `ln(…)` or `log10(…)`'],
  ['constructor(2)', 'constructor', `\`constructor\` ${noFunction.replace('k*', 'constructor*')}`],
  ['sqrt*2', 'sqrt', '`sqrt` is a function; write `sqrt(…)`'],
  ['sqrt()', 'sqrt()', '`sqrt` takes one argument and has 0'],
  ['sin(3,1)', 'sin(3,1)', '`sin` takes one argument and has 2; decimals stand behind a point'],
  ['max(1)', 'max(1)', '`max` takes 2 to 20 arguments and has 1'],
  ['atan2(1, 2, 3)', 'atan2(1, 2, 3)', '`atan2` takes two arguments and has 3'],
  ['3,1*k', ',', '`,` is no decimal sign; write a point'],
  ['(k, 2)', ',', '`,` stands between the arguments of a function only'],
  ['(k', '(', 'this bracket is not closed; a `)` is missing'],
  ['sin(k', '(', 'this bracket is not closed; a `)` is missing'],
  ['k)', ')', '`)` closes no bracket, or comes too early'],
  ['()', ')', '`)` closes an empty bracket'],
  ['.5*k', '.5', '`.5`: a number begins with a digit; write `0.5`'],
  ['cavity.kappa', '.', '`.`: a point stands between digits only; write numbers like `0.5`, and names without points'],
  ['k[0]', '[', '`[`: an expression is made of numbers, names, `+ - * / ^`, brackets and functions'],
  ['k ± 2', '±', '`±`: an uncertainty has no place in an expression; make the uncertain number a parameter'],
  ['(3.1(2) ng)', '(3.1(2) ng)', '`3.1(2) ng` is uncertain; make it a parameter and write its name here'],
  ['1e400', '1e400', '`1e400` is too large a number'],
  ['1e-400', '1e-400', '`1e-400` is too small a number'],
  ['f^1/2', 'f^1/2', '`f^1/2` may be read in two ways; write `f^(1/2)` or `(f^1)/2`'],
  ['f^-1/2', 'f^-1/2', '`f^-1/2` may be read in two ways; write `f^(-1/2)` or `(f^-1)/2`'],
  ['√k^2', '^', '`^` may belong to the root or to what stands under it; write `√(k^2)` or `(√k)^2`'],
  ['2π^2', '^', '`^` may belong to π or to `2π`; write `(2π)^2` or `2*π^2`'],
  ['x²³^2', '^', '`^` is a power of a power; write brackets, such as `(x^2)^3`'],
  [
    '3 N/m*x',
    '3 N/m',
    '`3 N/m` may be read in two ways; write brackets around a number with its whole unit, such as `(3 N/m)`, or `(3 N)`',
  ],
  [
    '3 m^2',
    '3 m^2',
    '`3 m^2` may be read in two ways; write brackets around a number with its whole unit, such as `(3 N/m)`, or `(3 m)`',
  ],
  [
    '3 N/√Hz',
    '3 N/√',
    '`3 N/√` may be read in two ways; write brackets around a number with its whole unit, such as `(3 N/m)`, or `(3 N)`',
  ],
  ['3 N m', '3 N m', '`3 N m`: a sign is missing; write `3 N*m`, or `(3 N m)` for a number with its unit'],
  ['2*\u0441', '\u0441', 'the character U+0441 only looks like `c`; write `c`'],
  ['k\u200b', '\u200b', 'the character U+200B has no place in an expression; write it like `sqrt(k/m)/(2*pi)`'],
  ['1'.repeat(1001), '1', 'an expression of 1001 characters is too long; at most 1000 are read'],
  [`${'('.repeat(51)}1${')'.repeat(51)}`, '1', '`1` stands in more than 50 brackets; name a part of it as a parameter'],
]

function refusalOf(text: string): QuantityError {
  try {
    parseExpression(text)
  } catch (error) {
    if (error instanceof QuantityError) return error
    throw error
  }
  throw new Error(`${text} was read`)
}

describe('refusals name the piece, its place and the remedy', () => {
  test.each(refusals)('%s', (text, piece, message) => {
    const error = refusalOf(text)
    expect(error.message).toBe(message)
    expect(text.slice(error.offset, error.offset + error.length)).toBe(piece)
  })

  test('500 numbers, names and operations are read, and no more', () => {
    expect(() => parseExpression(`1${'+1'.repeat(249)}`)).not.toThrow()
    expect(refusalOf(`1${'+1'.repeat(250)}`).message).toBe(
      'this expression has more than 500 numbers, names and operations; name a part of it as a parameter',
    )
  })

  test.each([
    '-'.repeat(1000),
    '√'.repeat(1000),
    '2^'.repeat(500),
    'sqrt('.repeat(200),
    '('.repeat(1000),
    `${'(3 '.repeat(250)}m`,
  ])('deep nesting is refused at once', text => {
    const start = performance.now()
    expect(() => parseExpression(text)).toThrow(QuantityError)
    expect(performance.now() - start).toBeLessThan(100)
  })
})

/** What is wrong with how a text was taken: neither a finite tree nor a refusal whose place lies within the text. */
function faultsOf(text: string): string[] {
  try {
    const expression = parseExpression(text)
    checkExpression(expression, scope)
    return []
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error
    const inside = error.offset >= 0 && error.length >= 0 && error.offset + error.length <= text.length
    const printable = !/\p{Cc}/u.test(error.message.replace(/`[^`]*`/g, ''))
    return [...(inside ? [] : ['place outside the text']), ...(printable ? [] : ['control character in the message'])]
  }
}

const pieces = [
  ...[
    '1',
    '2.5',
    '3 kHz',
    '(3 kHz)',
    '90°',
    'e',
    '1e-18',
    'mass',
    'f',
    'pi',
    'π',
    'cycle',
    'k_B',
    'constructor',
    '__proto__',
  ],
  ...[
    '+',
    '-',
    '*',
    '/',
    '^',
    '**',
    '·',
    '√',
    '²',
    '⁻¹',
    '(',
    ')',
    ',',
    ' ',
    'sqrt(',
    'max(',
    'atan2(',
    '%',
    '=',
    '.',
    '±',
  ],
  ...['\u{1f600}', '\ud800', '\0', '\n', 'toString', 'this', '`', '${', ';'],
]

describe('hostile texts', () => {
  test('pieces in any order are read or refused at a place', () => {
    const jumble = fc.array(fc.constantFrom(...pieces), { maxLength: 30 }).map(parts => parts.join(''))
    fc.assert(
      fc.property(jumble, text => {
        expect(faultsOf(text)).toEqual([])
      }),
      { numRuns: 5000 },
    )
  })

  test('any text is read or refused at a place', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 60 }), text => {
        expect(faultsOf(text)).toEqual([])
      }),
      { numRuns: 3000 },
    )
  })
})
