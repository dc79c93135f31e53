import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { example, read, small, spring } from '../budget/read.js'

const originals = [example, small, spring]

/** Pieces that mean something to YAML, to quantities or to the reader of budgets. */
const piece = fc.oneof(
  fc.constantFrom(...'{}[]:,-?!&*#|>%@`"\'\n\t .=~'),
  fc.constantFrom(
    '\n  ',
    ': ',
    '- ',
    '&a ',
    '*a',
    '<<: ',
    '!!x ',
    '"',
    '= ',
    '= f',
    '*f',
    '^',
    '= sqrt(',
    '{ value: 1 }',
    '1e999',
    '-1',
    '__proto__',
    'constructor',
  ),
  fc.constantFrom(
    'kind: cavity',
    'of: ',
    'reads: detector',
    'table: { file: x.csv, units: [Hz, N/√Hz] }',
    'µ',
    'µ',
    '√',
    '²',
    '\u202e',
  ),
  fc.string({ unit: 'binary', maxLength: 6 }),
)

const mutation = fc.record({ at: fc.nat(2000), drop: fc.nat(30), insert: piece })

function mutate(text: string, changes: readonly { at: number; drop: number; insert: string }[]): string {
  let result = text
  for (const { at, drop, insert } of changes) {
    const start = at % (result.length + 1)
    result = result.slice(0, start) + insert + result.slice(start + drop)
  }
  return result
}

/** Either a budget without errors, or none with at least one error; places lie inside a file. */
function expectJudged(text: string | Uint8Array): void {
  const { budget, problems } = read(text)
  const errors = problems.filter(problem => problem.severity === 'error')
  expect(budget === null).toBe(errors.length > 0)
  for (const { place, message, code } of problems) {
    expect(Number.isInteger(place.line) && place.line >= 1 && Number.isInteger(place.column) && place.column >= 1).toBe(
      true,
    )
    expect(place.file).toMatch(/\.(?:yaml|csv)$/)
    expect(code).toMatch(/^[a-z0-9]+(?:-[a-z0-9]+)*$/)
    expect(message.length).toBeGreaterThan(5)
    expect(message.length).toBeLessThan(1000)
    expect(message).not.toMatch(/undefined|\[object|NaN\b(?!`)/)
  }
  for (const root of budget?.roots ?? [])
    expect([Number.isFinite(root.value), root.uncertainty >= 0]).toEqual([true, true])
}

describe('any change of a good file', () => {
  it('reads or is refused with a place', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...originals),
        fc.array(mutation, { minLength: 1, maxLength: 4 }),
        (text, changes) => {
          expectJudged(mutate(text, changes))
        },
      ),
      { numRuns: 1500, seed: 20261201 },
    )
  }, 60_000)

  it('reads or is refused with a place when words are exchanged', () => {
    const words = [...new Set(originals.flatMap(text => text.split(/[\s{}[\],]+/)).filter(word => word !== ''))]
    const exchange = fc.record({
      from: fc.constantFrom(...words),
      to: fc.constantFrom(...words, '', '~', 'null', '[]', '{}'),
    })
    fc.assert(
      fc.property(
        fc.constantFrom(...originals),
        fc.array(exchange, { minLength: 1, maxLength: 3 }),
        (text, exchanges) => {
          expectJudged(exchanges.reduce((result, { from, to }) => result.replace(from, () => to), text))
        },
      ),
      { numRuns: 1500, seed: 20261202 },
    )
  }, 60_000)

  it('reads or is refused with a place when it is cut off', () => {
    for (let length = 0; length <= example.length; length += 3) expectJudged(example.slice(0, length))
  }, 60_000)

  it('is refused when it is noise', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 400 }), bytes => {
        expect(read(bytes).budget).toBeNull()
        expectJudged(bytes)
      }),
      { numRuns: 500, seed: 20261203 },
    )
  })
})
