import fc from 'fast-check'
import { expect, test } from 'vitest'
import { QuantityError } from '../../src/quantity/error.js'
import { parseQuantity } from '../../src/quantity/parse.js'

const pieces = [
  '3',
  '1e400',
  '10',
  '(',
  ')',
  '±',
  ' ',
  '\u00a0',
  'π',
  '×',
  '*',
  '/',
  '√',
  '^',
  '^-1/2',
  '⁻¹',
  'Hz',
  'kg',
  'dBm',
  'dBV²',
  'dBc/Hz',
  '°C',
  'Φ₀',
  'V pk',
  '″',
  'dB',
  '%',
  '°',
  '-',
  '−',
  '.',
  ',',
  'e',
  '½',
  '__proto__',
  'sqrt(',
  '\u{1f600}',
  '\ud800',
  '\0',
]

/** What is wrong with how a text was taken: neither a finite quantity nor a refusal whose place lies within the text. */
function faultsOf(text: string): string[] {
  try {
    const { value, uncertainty, unitFactor } = parseQuantity(text)
    const finite = [value, uncertainty, unitFactor].every(Number.isFinite) && uncertainty >= 0
    return finite ? [] : [`${value} ± ${uncertainty}`]
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error
    const inside = error.offset >= 0 && error.offset + error.length <= text.length
    const printable = !/\p{Cc}/u.test(error.message)
    return [...(inside ? [] : ['place outside the text']), ...(printable ? [] : ['control character in the message'])]
  }
}

test('pieces of quantities in any order are read or refused', () => {
  const jumble = fc.array(fc.constantFrom(...pieces), { maxLength: 30 }).map(parts => parts.join(''))
  fc.assert(
    fc.property(jumble, text => {
      expect(faultsOf(text)).toEqual([])
    }),
    { numRuns: 5000 },
  )
})

test('any text behind a number is read or refused', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'binary', maxLength: 60 }), tail => {
      expect(faultsOf(`3 ${tail}`)).toEqual([])
    }),
    { numRuns: 3000 },
  )
})
