import fc from 'fast-check'
import { unit as mathUnit } from 'mathjs'
import { describe, expect, test } from 'vitest'
import { parseQuantity } from '../../src/quantity/parse.js'
import { toNumber } from '../../src/quantity/rational.js'

/** Exponents of a unit of mathjs in the order of this project's base quantities. */
function exponentsOf(dimensions: readonly number[]): number[] {
  const [mass, length, time, current, temperature, intensity, amount] = dimensions
  return [length, mass, time, current, temperature, amount, intensity, 0].map(exponent => exponent + 0)
}

/** Value in SI units and exponents, as mathjs reads the text. */
function opinion(text: string): { value: number; exponents: number[] } {
  const read = mathUnit(text)
  // The dimensions are not in its types; the value in base units is what it compares by.
  const inner = read as unknown as { dimensions: number[]; value: number }
  return { value: inner.value, exponents: exponentsOf(inner.dimensions) }
}

/** Without the electronvolt and the torr, for which it keeps rounded factors. */
const symbols = ['m', 'g', 's', 'A', 'K', 'mol', 'cd', 'N', 'Pa', 'J', 'W', 'C', 'V', 'F', 'S', 'Wb', 'T', 'H', 'Hz']
const prefixes = ['', 'k', 'M', 'G', 'T', 'P', 'E', 'Z', 'Y', 'R', 'Q', 'm', 'n', 'p', 'f', 'a', 'z', 'y', 'r', 'q']

const factor = fc.record({
  prefix: fc.constantFrom(...prefixes),
  symbol: fc.constantFrom(...symbols),
  power: fc.integer({ min: -3, max: 3 }).filter(power => power !== 0),
})

describe('mathjs as a second opinion on units', () => {
  test('products of powers of prefixed units', () => {
    const written = fc.array(factor, { minLength: 1, maxLength: 4 })
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 999 }), written, (number, factors) => {
        const product = factors.map(({ prefix, symbol, power }) => `${prefix}${symbol}^${power}`).join(' ')
        const theirs = opinion(`${number} ${product}`)
        fc.pre(theirs.value > 1e-290 && theirs.value < 1e290)
        const ours = parseQuantity(`${number} ${product}`)
        expect(ours.value / theirs.value).toBeCloseTo(1, 12)
        expect(ours.dimension.map(toNumber)).toEqual(theirs.exponents)
      }),
      { numRuns: 300 },
    )
  })

  test.each([
    '3 N/m',
    '3 kg m^2 / s^2',
    '3 m/s^2',
    '3 bar',
    '3 mbar',
    '3 atm',
    '3 L',
    '3 deg',
    '3 arcsec',
    '3 min',
    '3 h',
    '3 ohm',
    '3 dyn',
    '3 Hz',
  ])('%s', text => {
    const theirs = opinion(text)
    const ours = parseQuantity(text)
    expect(Math.abs(ours.value / theirs.value - 1)).toBeLessThan(1e-12)
  })
})
