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
  ['-150 dBm/Hz', { value: 1e-18, unit: 'm^2 kg s^-2', cycles: '-1' }],
  ['-150 dBm Hz⁻¹', { value: 1e-18, unit: 'm^2 kg s^-2', cycles: '-1' }],
  ['-30 dBW', { value: 1e-3, unit: 'm^2 kg s^-3' }],
  ['-120 dBV', { value: 1e-6, unit: 'm^2 kg s^-3 A^-1' }],
  ['-120 dBV/√Hz', { value: 1e-6, unit: 'm^2 kg s^(-5/2) A^-1', cycles: '-1/2' }],
  ['-120 dBV²/Hz', { value: 1e-12, unit: 'm^4 kg^2 s^-5 A^-2', cycles: '-1' }],
  ['60 dBµV', { value: 1e-3, unit: 'm^2 kg s^-3 A^-1' }],
  ['-120 dBc/Hz', { value: 1e-12, unit: 's', cycles: '-1' }],
  ['-120 dB/Hz', { value: 1e-12, unit: 's', cycles: '-1' }],
  ['-30 dBc', { value: 1e-3 }],
  ['0.2 dB/km', { value: 2e-4, unit: 'm^-1 dB' }],
  ['2 B', { value: 20, unit: 'dB' }],
  ['1 Np', { value: 20 / Math.LN10, unit: 'dB' }],
  ['20 °C', { value: 293.15, unit: 'K' }],
  ['20.0(5) °C', { value: 293.15, uncertainty: 0.5, unit: 'K' }],
  ['20.0 °C ± 0.5 K', { value: 293.15, uncertainty: 0.5, unit: 'K' }],
  ['20.0 ± 0.5 °C', { value: 293.15, uncertainty: 0.5, unit: 'K' }],
  ['(20.0 ± 0.5) °C', { value: 293.15, uncertainty: 0.5, unit: 'K' }],
  ['-273.15 °C', { value: 0, unit: 'K' }],
  ['3 mV/°C', { value: 3e-3, unit: 'm^2 kg s^-3 A^-1 K^-1' }],
  ['1 au', { value: 149597870700, unit: 'm' }],
  ['2 ha', { value: 2e4, unit: 'm^2' }],
  ['30′', { value: (30 * Math.PI) / 180 / 60 }],
  ['30″', { value: (30 * Math.PI) / 180 / 3600 }],
  ['2 V rms', { value: 2, unit: 'm^2 kg s^-3 A^-1' }],
  ['2 mVrms', { value: 2e-3, unit: 'm^2 kg s^-3 A^-1' }],
  ['2 V pk', { value: 2 * Math.SQRT1_2, unit: 'm^2 kg s^-3 A^-1' }],
  ['2 Vpp', { value: Math.SQRT1_2, unit: 'm^2 kg s^-3 A^-1' }],
  ['2 nm pk', { value: 2e-9 * Math.SQRT1_2, unit: 'm' }],
  ['2 Vpk²/Hz', { value: 2 * Math.SQRT1_2 ** 2, unit: 'm^4 kg^2 s^-5 A^-2', cycles: '-1' }],
  ['2 V rms/√Hz', { value: 2, unit: 'm^2 kg s^(-5/2) A^-1', cycles: '-1/2' }],
  [
    '3 µΦ₀/√Hz',
    { value: (3e-6 * 6.62607015e-34) / (2 * 1.602176634e-19), unit: 'm^2 kg s^(-3/2) A^-1', cycles: '-1/2' },
  ],
  ['1 Phi0', { value: 6.62607015e-34 / (2 * 1.602176634e-19), unit: 'm^2 kg s^-2 A^-1' }],
  ['1 Φ_0', { value: 6.62607015e-34 / (2 * 1.602176634e-19), unit: 'm^2 kg s^-2 A^-1' }],
  ['10 µqe/√Hz', { value: 10e-6 * 1.602176634e-19, unit: 's^(3/2) A', cycles: '-1/2' }],
  ['5 counts/s', { value: 5, unit: 's^-1' }],
  ['3 ppb', { value: 3e-9 }],
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

test('a level per kilohertz is spread over a thousand hertz', () => {
  expect(parseQuantity('-120 dBm/kHz').value / parseQuantity('-150 dBm/Hz').value).toBeCloseTo(1, 14)
})

test('levels, angles and Celsius are remembered', () => {
  expect(parseQuantity('-120 dBc/Hz').level).toBe('dBc')
  expect(parseQuantity('3 dB').level).toBeNull()
  expect(parseQuantity('20 °C').difference).toBe(20)
  expect(parseQuantity('20 K').difference).toBe(20)
  expect(toText(parseQuantity('3 µrad²/Hz').angle)).toBe('2')
  expect(toText(parseQuantity('3 °/√Hz').angle)).toBe('1')
  expect(parseQuantity('-60 dBm ± 1 dB').uncertainty).toBe(parseQuantity('-60(1) dBm').uncertainty)
  expect(parseQuantity('(-60 ± 1) dBm').uncertainty).toBe(parseQuantity('-60(1) dBm').uncertainty)
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
