import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { QuantityError } from '../../src/quantity/error.js'
import { formatPlain } from '../../src/quantity/format.js'
import { parseQuantity, type Quantity } from '../../src/quantity/parse.js'
import { prefixes, unitSymbols } from '../../src/quantity/units.js'
import { writeQuantity } from '../../src/quantity/write.js'

const written: readonly (readonly [string, string])[] = [
  ['3.1(2) ng', '(3.1e-12 ± 2e-13) kg'],
  ['2 aN/√Hz', '2e-18 Hz^(-1/2) m kg s^-2'],
  ['600 kHz', '600000 Hz'],
  ['-0.2 MHz', '-200000 Hz'],
  ['3 rad/s', '3 rad s^-1'],
  ['2π', '6.283185307179586 Hz^-1 s^-1'],
  ['4 µrad²/Hz', '4e-12 Hz^-1 rad^2'],
  ['0.72', '0.72'],
  ['6 dB', '6 dB'],
  ['20.0(5) °C', '(20 ± 0.5) °C'],
  ['-60 dBm', '1e-9 m^2 kg s^-3'],
  ['-120 dBc/Hz', '-120 dBc/Hz'],
]

test.each(written)('%s is written %s', (text, normal) => {
  expect(writeQuantity(parseQuantity(text))).toBe(normal)
})

/** All that a quantity means, without how it was written. */
function meaning({ value, uncertainty, dimension, cycles, angle, level, difference }: Quantity): unknown {
  return { value, uncertainty, dimension, cycles, angle, difference, ratio: level === 'dBc' }
}

const symbols = unitSymbols()
const anyPrefix = fc.constantFrom('', ...prefixes.keys())
const factor = fc.record({
  unit: fc.constantFrom(...symbols),
  prefix: anyPrefix,
  power: fc.constantFrom('', '', '', '^2', '²', '^-1', '⁻¹', '^(1/2)', '^(-3/2)', '^0.5'),
})
const unitText = fc
  .array(factor, { minLength: 1, maxLength: 3 })
  .map(factors =>
    factors
      .map(
        ({ unit, prefix, power }) =>
          (unit.prefixable ? prefix : '') + unit.symbol + (/[°%′″]/.test(unit.symbol) ? '' : power),
      )
      .join(' '),
  )
const special = fc.constantFrom(
  ...[
    'dBm',
    'dBm/Hz',
    'dBV',
    'dBV/√Hz',
    'dBV²/Hz',
    'dBc',
    'dBc/Hz',
    'dB/Hz',
    '°C',
    'V pk',
    'nm rms',
    'aN/√Hz',
    'N²/Hz',
    'rad²/Hz',
    '',
  ],
)
const digits = fc
  .tuple(fc.integer({ min: 1, max: 999_999 }), fc.integer({ min: 0, max: 5 }))
  .map(([whole, point]) => (whole / 10 ** point).toFixed(point))
const spread = fc.oneof(
  fc.constant((number: string, unit: string) => `${number} ${unit}`),
  fc.integer({ min: 1, max: 99 }).map(each => (number: string, unit: string) => `${number}(${each}) ${unit}`),
  digits.map(each => (number: string, unit: string) => `(${number} ± ${each}) ${unit}`),
  fc.constant((number: string, unit: string) => `2π × ${number} ${unit}`),
  fc.integer({ min: -12, max: 12 }).map(each => (number: string, unit: string) => `${number}e${each} ${unit}`),
)

/** Random quantities; null where the text leaves what is read, such as a level of 10^5 dB. */
const quantities = fc.tuple(digits, fc.oneof(unitText, special), spread).map(([number, unit, write]) => {
  const text = write(number, unit)
  try {
    return { text, quantity: parseQuantity(text) }
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error
    return { text, quantity: null }
  }
})

describe('parse, write, parse', () => {
  test('changes nothing, to the last bit', () => {
    let read = 0
    fc.assert(
      fc.property(quantities, ({ quantity }) => {
        fc.pre(quantity !== null)
        const exact = quantity.value === 0 || Math.min(Math.abs(quantity.value), quantity.uncertainty || 1) > 1e-300
        const near = quantity.dimension.every(
          ({ denominator, numerator }) => denominator <= 12 && Math.abs(numerator) < 99,
        )
        fc.pre(exact && near)
        read += 1
        const again = parseQuantity(writeQuantity(quantity))
        expect(meaning(again)).toEqual(meaning(quantity))
        expect(writeQuantity(again)).toBe(writeQuantity(quantity))
      }),
      { numRuns: 3000 },
    )
    expect(read).toBeGreaterThan(1500)
  })

  test('and so does a quantity that is printed for people, in its digits', () => {
    fc.assert(
      fc.property(quantities, fc.integer({ min: 1, max: 12 }), ({ quantity }, digits) => {
        fc.pre(quantity !== null && quantity.level === null && quantity.difference === quantity.value)
        fc.pre(!/[²/√^⁻ ]|dB|^$/.test(quantity.unitText) && !quantity.text.includes('π'))
        const shown = quantity.value / quantity.unitFactor
        fc.pre(Math.abs(shown) > 1e-250)
        const text = formatPlain(shown, quantity.unitText, { digits })
        const back = parseQuantity(text)
        expect(Math.abs(back.value / quantity.value - 1)).toBeLessThanOrEqual(0.5 * 10 ** (1 - digits) + 1e-13)
        expect(back.dimension).toEqual(quantity.dimension)
        expect(formatPlain(back.value / quantity.unitFactor, quantity.unitText, { digits })).toBe(text)
      }),
      { numRuns: 1500 },
    )
  })
})
