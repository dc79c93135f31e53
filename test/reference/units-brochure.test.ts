import { describe, expect, test } from 'vitest'
import { elementaryCharge, magneticFluxQuantum } from '../../src/physics/constants.js'
import { toDensity } from '../../src/quantity/declared.js'
import { baseUnitText } from '../../src/quantity/dimension.js'
import { parseQuantity, parseUnit } from '../../src/quantity/parse.js'
import { prefixes } from '../../src/quantity/units.js'

/** SI Brochure, 9th edition, version 3.01 (2024), table 7: prefixes. */
const prefixTable: readonly (readonly [string, number])[] = [
  ...([
    ['Q', 30],
    ['R', 27],
    ['Y', 24],
    ['Z', 21],
    ['E', 18],
    ['P', 15],
    ['T', 12],
    ['G', 9],
    ['M', 6],
    ['k', 3],
  ] as const),
  ...([
    ['h', 2],
    ['da', 1],
    ['d', -1],
    ['c', -2],
    ['m', -3],
    ['µ', -6],
    ['n', -9],
    ['p', -12],
    ['f', -15],
  ] as const),
  ...([
    ['a', -18],
    ['z', -21],
    ['y', -24],
    ['r', -27],
    ['q', -30],
  ] as const),
]

/** Table 4: the 22 units with special names, in base units in the order length, mass, time, current and so on. */
const derivedTable: readonly (readonly [string, string])[] = [
  ['rad', '1'],
  ['sr', '1'],
  ['Hz', 's^-1'],
  ['N', 'm kg s^-2'],
  ['Pa', 'm^-1 kg s^-2'],
  ['J', 'm^2 kg s^-2'],
  ['W', 'm^2 kg s^-3'],
  ['C', 's A'],
  ['V', 'm^2 kg s^-3 A^-1'],
  ['F', 'm^-2 kg^-1 s^4 A^2'],
  ['Ω', 'm^2 kg s^-3 A^-2'],
  ['S', 'm^-2 kg^-1 s^3 A^2'],
  ['Wb', 'm^2 kg s^-2 A^-1'],
  ['T', 'kg s^-2 A^-1'],
  ['H', 'm^2 kg s^-2 A^-2'],
  ['°C', 'K'],
  ['lm', 'cd'],
  ['lx', 'm^-2 cd'],
  ['Bq', 's^-1'],
  ['Gy', 'm^2 s^-2'],
  ['Sv', 'm^2 s^-2'],
  ['kat', 's^-1 mol'],
]

/** Table 8: units outside the SI that are accepted with it; values in coherent units, dalton by CODATA 2022. */
const acceptedTable: readonly (readonly [string, number, string])[] = [
  ['min', 60, 's'],
  ['h', 3600, 's'],
  ['d', 86400, 's'],
  ['au', 149597870700, 'm'],
  ['°', Math.PI / 180, '1'],
  ['′', Math.PI / 10800, '1'],
  ['″', Math.PI / 648000, '1'],
  ['ha', 1e4, 'm^2'],
  ['L', 1e-3, 'm^3'],
  ['l', 1e-3, 'm^3'],
  ['t', 1e3, 'kg'],
  ['Da', 1.66053906892e-27, 'kg'],
  ['u', 1.66053906892e-27, 'kg'],
  ['eV', 1.602176634e-19, 'm^2 kg s^-2'],
  // In decibel: 1 B = 10 dB and 1 Np = (20/ln 10) dB, some 8.685 890 dB.
  ['B', 10, 'dB'],
  ['Np', 8.685889638065037, 'dB'],
  ['dB', 1, 'dB'],
]

function relative(found: number, wanted: number): number {
  return Math.abs(found / wanted - 1)
}

describe('SI Brochure, 9th edition', () => {
  test('table 7: the prefixes are these and no others', () => {
    expect([...prefixes]).toEqual(prefixTable)
    for (const [prefix, power] of prefixTable) expect(parseQuantity(`1 ${prefix}m`).value).toBe(Number(`1e${power}`))
  })

  test.each(derivedTable)('table 4: %s', (symbol, base) => {
    expect(baseUnitText(parseUnit(symbol).dimension)).toBe(base)
    if (symbol !== '°C') expect(parseQuantity(`1 ${symbol}`).value).toBe(1)
  })

  test.each(derivedTable.filter(([symbol]) => symbol !== '°C'))('table 4: %s takes every prefix', symbol => {
    for (const [prefix, power] of prefixTable) {
      expect(parseQuantity(`1 ${prefix}${symbol}`).value).toBe(Number(`1e${power}`))
    }
  })

  test.each(acceptedTable)('table 8: %s', (symbol, value, base) => {
    const quantity = parseQuantity(`1 ${symbol}`)
    expect(relative(quantity.value, value)).toBeLessThan(1e-15)
    expect(baseUnitText(quantity.dimension)).toBe(base)
  })

  test('section 2.3.1: t/°C = T/K − 273.15', () => {
    expect(parseQuantity('0 °C').value).toBe(273.15)
    expect(parseQuantity('0.01 °C').value).toBe(273.16)
    expect(parseQuantity('100 °C').value).toBe(373.15)
  })
})

describe('units of the trade', () => {
  test('elementary charge and flux quantum are those of the table of constants', () => {
    expect(parseQuantity('1 qe').value).toBe(elementaryCharge)
    expect(relative(parseQuantity('1 Φ₀').value, magneticFluxQuantum)).toBeLessThan(2e-16)
  })

  test('0 dBm into 50 Ω is 224 mV rms, 316 mV peak and 13 dB below a volt [definitions]', () => {
    const rms = Math.sqrt(parseQuantity('0 dBm').value * parseQuantity('50 Ω').value)
    expect(relative(rms, 0.22360679774997896)).toBeLessThan(1e-15)
    expect(relative(parseQuantity('0.31622776601683794 V pk').value, rms)).toBeLessThan(1e-15)
    expect(relative(parseQuantity('-13.010299956639813 dBV').value, rms)).toBeLessThan(1e-14)
    expect(relative(parseQuantity('46.98970004336019 dBmV').value, rms)).toBeLessThan(1e-14)
  })

  test('noise of 50 Ω at 290 K is −174 dBm/Hz [k·T₀, as noise figures are referred to]', () => {
    const density = parseQuantity('-173.97519 dBm/Hz').value
    expect(relative(density, 1.380649e-23 * 290)).toBeLessThan(1e-6)
  })

  test('one density of voltage in six spellings', () => {
    const wanted = 1e-14
    for (const text of [
      '-140 dBV²/Hz',
      '-140 dBV/√Hz',
      '100 nV/√Hz',
      '0.1 µV rms Hz^-1/2',
      '1e-14 V²/Hz',
      '-20 dBµV/√Hz',
    ]) {
      const { value, power } = toDensity(parseQuantity(text), 'voltage')
      expect(relative(power ? value : value * value, wanted)).toBeLessThan(1e-14)
    }
  })
})
