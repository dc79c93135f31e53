import { describe, expect, test } from 'vitest'
import { baseUnitText } from '../../src/quantity/dimension.js'
import { parseQuantity, parseUnit } from '../../src/quantity/parse.js'
import { toText } from '../../src/quantity/rational.js'

interface Reading {
  readonly value: number
  readonly uncertainty?: number
  /** In base units. */
  readonly unit?: string
  readonly cycles?: string
}

/** Values are exact doubles: the decimal number that a person means, rounded once. */
const readings: readonly (readonly [string, Reading])[] = [
  ['3.1(2) ng', { value: 3.1e-12, uncertainty: 2e-13, unit: 'kg' }],
  ['3.1 ± 0.2 ng', { value: 3.1e-12, uncertainty: 2e-13, unit: 'kg' }],
  ['3.1 +/- 0.2 ng', { value: 3.1e-12, uncertainty: 2e-13, unit: 'kg' }],
  ['(3.1 ± 0.2) ng', { value: 3.1e-12, uncertainty: 2e-13, unit: 'kg' }],
  ['(3.1 ± 0.2) × 10^-12 kg', { value: 3.1e-12, uncertainty: 2e-13, unit: 'kg' }],
  ['(3.1 ± 0.2)e-12 kg', { value: 3.1e-12, uncertainty: 2e-13, unit: 'kg' }],
  ['3.1(2)e-12 kg', { value: 3.1e-12, uncertainty: 2e-13, unit: 'kg' }],
  ['3.1(2) × 10^-12 kg', { value: 3.1e-12, uncertainty: 2e-13, unit: 'kg' }],
  ['3.1(2)×10⁻¹² kg', { value: 3.1e-12, uncertainty: 2e-13, unit: 'kg' }],
  ['3.1(0.2) ng', { value: 3.1e-12, uncertainty: 2e-13, unit: 'kg' }],
  ['48(3) pg', { value: 48e-15, uncertainty: 3e-15, unit: 'kg' }],
  ['3.1 ng ± 200 pg', { value: 3.1e-12, uncertainty: 2e-13, unit: 'kg' }],
  ['5.2 MHz ± 1 %', { value: 5.2e6, uncertainty: 52e3, unit: 's^-1', cycles: '1' }],
  ['5.2 MHz ± 40 kHz', { value: 5.2e6, uncertainty: 40e3, unit: 's^-1', cycles: '1' }],
  ['4.1(1) K', { value: 4.1, uncertainty: 0.1, unit: 'K' }],
  ['12.3(1.2) K', { value: 12.3, uncertainty: 1.2, unit: 'K' }],
  ['320(20) Hz', { value: 320, uncertainty: 20, unit: 's^-1', cycles: '1' }],
  ['2.4e7', { value: 2.4e7 }],
  ['+2', { value: 2 }],
  ['0', { value: 0 }],
  ['-0 K', { value: 0, unit: 'K' }],
  ['10⁻⁹', { value: 1e-9 }],
  ['10^-9', { value: 1e-9 }],
  ['-10^3', { value: -1000 }],
  ['10 K', { value: 10, unit: 'K' }],
  ['5 %', { value: 0.05 }],
  ['(72 ± 3) %', { value: 0.72, uncertainty: 0.03 }],
  ['0.72(3)', { value: 0.72, uncertainty: 0.03 }],
  ['40 ppm', { value: 4e-5 }],
  ['0.8 quanta', { value: 0.8 }],
  ['0.8 aN/√Hz', { value: 8e-19, unit: 'm kg s^(-3/2)', cycles: '-1/2' }],
  ['0.8 aN/sqrt(Hz)', { value: 8e-19, unit: 'm kg s^(-3/2)', cycles: '-1/2' }],
  ['0.8 aN·Hz⁻¹ᐟ²', { value: 8e-19, unit: 'm kg s^(-3/2)', cycles: '-1/2' }],
  ['3e-16 m/Hz^(1/2)', { value: 3e-16, unit: 'm s^(1/2)', cycles: '-1/2' }],
  ['3e-16 m/Hz^½', { value: 3e-16, unit: 'm s^(1/2)', cycles: '-1/2' }],
  ['3e-16 m Hz^-1/2', { value: 3e-16, unit: 'm s^(1/2)', cycles: '-1/2' }],
  ['3e-16 m Hz^(−1/2)', { value: 3e-16, unit: 'm s^(1/2)', cycles: '-1/2' }],
  ['1e-18 N/Hz^0.5', { value: 1e-18, unit: 'm kg s^(-3/2)', cycles: '-1/2' }],
  ['4 N²/Hz', { value: 4, unit: 'm^2 kg^2 s^-3', cycles: '-1' }],
  ['4 N**2/Hz', { value: 4, unit: 'm^2 kg^2 s^-3', cycles: '-1' }],
  ['4 aN²/Hz', { value: 4e-36, unit: 'm^2 kg^2 s^-3', cycles: '-1' }],
  ['9.8 m·s⁻²', { value: 9.8, unit: 'm s^-2' }],
  ['9.8 m/s/s', { value: 9.8, unit: 'm s^-2' }],
  ['9.8 m/(s s)', { value: 9.8, unit: 'm s^-2' }],
  ['2 µm^(2/3)', { value: 2e-4, unit: 'm^(2/3)' }],
  ['21 GHz/µm', { value: 2.1e16, unit: 'm^-1 s^-1', cycles: '1' }],
  ['21 GHz/\u03bcm', { value: 2.1e16, unit: 'm^-1 s^-1', cycles: '1' }],
  ['2π × 3 MHz', { value: 2 * Math.PI * 3e6, unit: 's^-1', cycles: '0' }],
  ['2*pi*3 MHz', { value: 2 * Math.PI * 3e6, unit: 's^-1', cycles: '0' }],
  ['-2π × 3 MHz', { value: -2 * Math.PI * 3e6, unit: 's^-1', cycles: '0' }],
  ['2π × (3.0 ± 0.1) MHz', { value: 2 * Math.PI * 3e6, uncertainty: 2 * Math.PI * 1e5, unit: 's^-1', cycles: '0' }],
  ['2π × 3.0(1) MHz', { value: 2 * Math.PI * 3e6, uncertainty: 2 * Math.PI * 1e5, unit: 's^-1', cycles: '0' }],
  ['2π', { value: 2 * Math.PI, cycles: '-1' }],
  ['3 rad/s', { value: 3, unit: 's^-1', cycles: '0' }],
  ['3 1/s', { value: 3, unit: 's^-1', cycles: '0' }],
  ['3 /s', { value: 3, unit: 's^-1', cycles: '0' }],
  ['-0.2 MHz', { value: -2e5, unit: 's^-1', cycles: '1' }],
  ['−0.2 MHz', { value: -2e5, unit: 's^-1', cycles: '1' }],
  ['90°', { value: Math.PI / 2 }],
  ['90 °', { value: Math.PI / 2 }],
  ['50 \u03a9', { value: 50, unit: 'm^2 kg s^-3 A^-2' }],
  ['50 \u2126', { value: 50, unit: 'm^2 kg s^-3 A^-2' }],
  ['3\u00a0ng', { value: 3e-12, unit: 'kg' }],
  ['3\u2009ng', { value: 3e-12, unit: 'kg' }],
  ['3\u202fng', { value: 3e-12, unit: 'kg' }],
  ['3ng', { value: 3e-12, unit: 'kg' }],
  ['3 kg m', { value: 3, unit: 'm kg' }],
  ['1 u', { value: 1.66053906892e-27, unit: 'kg' }],
  ['1 eV', { value: 1.602176634e-19, unit: 'm^2 kg s^-2' }],
  ['1eV', { value: 1.602176634e-19, unit: 'm^2 kg s^-2' }],
  ['2 min', { value: 120, unit: 's' }],
  ['2 h', { value: 7200, unit: 's' }],
  ['2 L', { value: 2e-3, unit: 'm^3' }],
  ['1e-8 mbar', { value: 1e-6, unit: 'm^-1 kg s^-2' }],
  ['1 gn', { value: 9.80665, unit: 'm s^-2' }],
  ['2 Qm', { value: 2e30, unit: 'm' }],
  ['2 Rm', { value: 2e27, unit: 'm' }],
  ['2 rm', { value: 2e-27, unit: 'm' }],
  ['2 qm', { value: 2e-30, unit: 'm' }],
  ['2 Tm', { value: 2e12, unit: 'm' }],
  ['2 T m', { value: 2, unit: 'm kg s^-2 A^-1' }],
  ['6 dB', { value: 6, unit: 'dB' }],
  ['0 dBm', { value: 1e-3, unit: 'm^2 kg s^-3' }],
  ['-60 dBm', { value: 1e-9, unit: 'm^2 kg s^-3' }],
  ['1.7e308', { value: 1.7e308 }],
]

describe('spellings of a quantity', () => {
  test.each(readings)('%s', (text, { value, uncertainty = 0, unit = '1', cycles = '0' }) => {
    const quantity = parseQuantity(text)
    expect(quantity.value).toBe(value)
    expect(quantity.uncertainty).toBeCloseTo(uncertainty, 12)
    expect(Math.abs(quantity.uncertainty - uncertainty)).toBeLessThanOrEqual(4e-16 * uncertainty)
    expect(baseUnitText(quantity.dimension)).toBe(unit)
    expect(toText(quantity.cycles)).toBe(cycles)
  })
})

test('text, unit and factor stay beside the value', () => {
  const quantity = parseQuantity('  2π × 3.0(1) MHz ')
  expect(quantity.text).toBe('2π × 3.0(1) MHz')
  expect(quantity.unitText).toBe('MHz')
  expect(quantity.unitFactor).toBe(1e6)
})

test('the uncertainty of a level in dBm goes with its slope', () => {
  const { value, uncertainty } = parseQuantity('-60(1) dBm')
  const slope = (parseQuantity('-59.9999 dBm').value - parseQuantity('-60.0001 dBm').value) / 0.0002
  expect(uncertainty / slope).toBeCloseTo(1, 8)
  expect(value).toBe(1e-9)
})

test('a unit is read alone', () => {
  expect(baseUnitText(parseUnit(' aN/√Hz ').dimension)).toBe('m kg s^(-3/2)')
  expect(parseUnit('')).toEqual(parseUnit('1'))
  expect(parseUnit('1/√Hz').cycles).toEqual({ numerator: -1, denominator: 2 })
})

test('the longest text that is read is 200 characters', () => {
  expect(parseQuantity(`1${' '.repeat(197)}kg`).value).toBe(1)
})
