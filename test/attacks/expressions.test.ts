import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { changed, lines, read } from '../budget/read.js'
import { fastest } from './fastest.js'

const inField = (expression: string) => changed(['mass: 3.1(2) ng', `mass: ${JSON.stringify(expression)}`])
const inNoise = (expression: string) =>
  `${changed()}contributions:\n  stray: { kind: force-noise, into: drum, expression: ${JSON.stringify(expression)} }\n`

describe('hostile expressions', () => {
  it.each([
    '= constructor',
    '= __proto__',
    '= toString(1)',
    '= this',
    '= globalThis.process',
    '= process.exit(1)',
    '= require("fs")',
    '= (() => 1)()',
    '= `x`',
    '= m0[0]',
    '= a = b',
    '= 1; 2',
    '= /x/',
    '= 0x10',
    '= 1e999',
    '= 9**9',
    '= eval(1)',
    '= sqrt.constructor(1)',
  ])('%s is refused as what it is', expression => {
    for (const text of [inField(expression), inNoise(expression)])
      expect(lines(read(text))).toEqual([expect.stringMatching(/^budget\.yaml:(?:8|18):\d+: /)])
  })

  const piece = fc.constantFrom(
    ...['f', 'm0', 'k_B', 'pi', 'c', 'sqrt', 'exp', 'max', 'abs', '(', ')', ',', '+', '-', '*', '/', '^', ' '],
    ...[
      '1',
      '2',
      '0.5',
      '1e300',
      '1e-300',
      '3 ng',
      '(2 aN/√Hz)',
      '(1 kHz)',
      'µ',
      '√',
      '²',
      'π',
      '×',
      '\u0430',
      '.',
      "'",
    ],
  )

  it('come to a finite number of the right kind, or are refused with a place', () => {
    fc.assert(
      fc.property(fc.array(piece, { minLength: 1, maxLength: 12 }), fc.boolean(), (pieces, noise) => {
        const expression = `= ${pieces.join('')}`
        const result = read(noise ? inNoise(expression) : inField(expression))
        const errors = result.problems.filter(({ severity }) => severity === 'error')
        expect(result.budget === null).toBe(errors.length > 0)
        for (const { place } of errors) expect([place.file, place.line]).toEqual(['budget.yaml', noise ? 18 : 8])
      }),
      { numRuns: 1500, seed: 20261201 },
    )
  })

  it.each([
    ['brackets', `= ${'('.repeat(990)}`],
    ['signs', `= ${'-'.repeat(990)}1`],
    ['powers', `= 2${'^2'.repeat(490)}`],
    ['roots', `= ${'√'.repeat(990)}2`],
    ['a long sum', `= ${'1+'.repeat(490)}1`],
    ['many names', `= ${Array.from({ length: 200 }, (_, i) => `a${i}`).join('+')}`],
    ['far too long', `= ${'1+'.repeat(50_000)}1`],
  ])('cost little: %s', (_name, expression) => {
    expect(fastest(() => read(inField(expression)))).toBeLessThan(250)
  })

  it('cost little where two hundred parameters rest on each other', () => {
    const chain = Array.from({ length: 198 }, (_, i) => `  a${i + 1}: "= (a${i} + a${Math.max(0, i - 1)})/2"\n`)
    const text = changed(
      ['components:', `parameters:\n  a0: 3 ng\n${chain.join('')}components:`],
      ['mass: 3.1(2) ng', 'mass: a198'],
    )
    expect(lines(read(text))).toEqual([])
    expect(fastest(() => read(text))).toBeLessThan(500)
  })

  it('cost little where they go in a hundred circles', () => {
    const circles = Array.from({ length: 99 }, (_, i) => `  a${i}: "= b${i}"\n  b${i}: "= a${i}"\n`)
    const text = changed(['components:', `parameters:\n${circles.join('')}components:`])
    expect(lines(read(text)).filter(line => line.includes('goes in a circle'))).toHaveLength(99)
    expect(fastest(() => read(text))).toBeLessThan(500)
  })
})
