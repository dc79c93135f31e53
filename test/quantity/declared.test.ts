import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import {
  canonicalUnit,
  declaredNames,
  densityNames,
  isDeclaredName,
  toDeclared,
  toDensity,
  type DeclaredName,
  type DensityOf,
} from '../../src/quantity/declared.js'
import { describeDimension } from '../../src/quantity/describe.js'
import { QuantityError } from '../../src/quantity/error.js'
import { parseQuantity } from '../../src/quantity/parse.js'

const turn = 2 * Math.PI

const accepted: readonly (readonly [string, DeclaredName, number, 'angular' | 'cyclic' | null])[] = [
  ['3.1 ng', 'mass', 3.1e-12, null],
  ['1.2 MHz', 'frequency', 1.2e6, 'cyclic'],
  ['2π × 1.2 MHz', 'frequency', 1.2e6, 'angular'],
  ['1.2e6 rad/s', 'frequency', 1.2e6 / turn, 'angular'],
  ['1.2e6 s⁻¹', 'frequency', 1.2e6 / turn, 'angular'],
  ['600 kHz', 'rate', turn * 6e5, 'cyclic'],
  ['2π × 600 kHz', 'rate', turn * 6e5, 'angular'],
  ['3 rad/s', 'rate', 3, 'angular'],
  ['3 1/s', 'rate', 3, 'angular'],
  ['-0.2 MHz', 'rate', -turn * 2e5, 'cyclic'],
  ['21 GHz/µm', 'rate-per-length', turn * 2.1e16, 'cyclic'],
  ['2π × 21 GHz/µm', 'rate-per-length', turn * 2.1e16, 'angular'],
  ['2 rad/s/m', 'rate-per-length', 2, 'angular'],
  ['4.1 K', 'temperature', 4.1, null],
  ['0.72', 'number', 0.72, null],
  ['72 %', 'number', 0.72, null],
  ['5 kHz ms', 'number', 5, null],
  ['90°', 'angle', Math.PI / 2, null],
  ['0', 'angle', 0, null],
  ['1.5 rad', 'angle', 1.5, null],
  ['2π', 'angle', turn, null],
  ['-60 dBm', 'power', 1e-9, null],
  ['3 µW', 'power', 3e-6, null],
  ['2 nm', 'length', 2e-9, null],
  ['20 aN', 'force', 2e-17, null],
  ['2 gn', 'acceleration', 19.6133, null],
  ['6 dB', 'decibel', 6, null],
  ['20 dB', 'power-ratio', 100, null],
  ['0.72', 'power-ratio', 0.72, null],
  ['72 %', 'power-ratio', 0.72, null],
  ['-20 dBc', 'power-ratio', 0.01, null],
  ['20 °C', 'temperature', 293.15, null],
  ['3 °C', 'temperature-difference', 3, null],
  ['3 mK', 'temperature-difference', 3e-3, null],
  ['30 °/s', 'angle-rate', Math.PI / 6, 'angular'],
  ['2 Hz', 'angle-rate', 2 * turn, 'cyclic'],
  ['5 counts/s', 'count-rate', 5, null],
  ['3 V pk', 'voltage', 3 * Math.SQRT1_2, null],
  ['-20 dBV', 'voltage', 0.1, null],
  ['2 Φ₀', 'flux', 4.135667696923859e-15, null],
  ['3 qe', 'charge', 4.806529902e-19, null],
  ['3 zN m/rad', 'torque', 3e-21, null],
  ['5e-21', 'strain', 5e-21, null],
  ['2 g/cm³', 'mass-density', 2000, null],
  ['3 g cm²', 'moment-of-inertia', 3e-7, null],
  ['1.1 GPa', 'stress', 1.1e9, null],
  ['2 MΩ', 'resistance', 2e6, null],
  ['2 fF', 'capacitance', 2e-15, null],
  ['2 nH', 'inductance', 2e-9, null],
  ['2 µS', 'conductance', 2e-6, null],
]

describe('quantities used as a declared dimension', () => {
  test.each(accepted)('%s as %s', (text, name, value, note) => {
    const declared = toDeclared(parseQuantity(text), name)
    expect(Math.abs(declared.value - value)).toBeLessThanOrEqual(4e-16 * Math.abs(value))
    expect(declared.note).toBe(note)
  })

  test('the uncertainty goes along', () => {
    expect(toDeclared(parseQuantity('600(6) kHz'), 'rate').uncertainty).toBeCloseTo(turn * 6e3, 6)
    expect(toDeclared(parseQuantity('2π × 600(6) kHz'), 'frequency').uncertainty).toBeCloseTo(6e3, 8)
    expect(toDeclared(parseQuantity('10.0(1) dB'), 'power-ratio').uncertainty).toBeCloseTo(Math.LN10 / 10, 12)
  })
})

const refused: readonly (readonly [string, DeclaredName, string])[] = [
  ['3 kg', 'frequency', '`3 kg` is a mass; a frequency is wanted, such as `1.2 MHz`'],
  ['3', 'mass', '`3` is a plain number; a mass is wanted, such as `3.1 ng`'],
  ['3 Hz', 'mass', '`3 Hz` is a frequency; a mass is wanted, such as `3.1 ng`'],
  ['3 rad/s', 'mass', '`3 rad/s` is a rate; a mass is wanted, such as `3.1 ng`'],
  ['3 kg/m⁴', 'mass', '`3 kg/m⁴` is a quantity in m^-4 kg; a mass is wanted, such as `3.1 ng`'],
  ['3 N/√Hz', 'force', '`3 N/√Hz` is an amplitude density of force; a force is wanted, such as `20 aN`'],
  ['90', 'angle', '`90` has no unit; an angle is wanted, such as `90°` or `90 rad`'],
  ['90°', 'number', '`90°` is an angle; a plain number is wanted, such as `0.72`'],
  ['6', 'decibel', '`6` is a plain number; a level is wanted, such as `6 dB`'],
  ['6 dB', 'number', '`6 dB` is a level in dB; a plain number is wanted, such as `0.72`'],
  [
    '2π × 3 rad/s',
    'rate',
    '`2π × 3 rad/s` does not tell cycles from radians; write hertz alone, `2π ×` hertz, or radians per second without 2π, such as `600 kHz`',
  ],
  [
    '3 m Hz²',
    'acceleration',
    '`3 m Hz²` does not tell cycles from radians; write its unit without hertz, such as `2 m/s²`',
  ],
  [
    '3 g',
    'acceleration',
    '`3 g` is a mass; an acceleration is wanted, such as `2 m/s²`; `g` is the gram, standard gravity is written `gn`',
  ],
  ['4000 dB', 'power-ratio', '`4000 dB` is beyond the numbers that are read; a ratio such as `20 dB` is wanted'],
  ['5 counts/s', 'rate', '`5 counts/s` counts events; a rate is wanted, such as `600 kHz`'],
  ['5 Bq', 'frequency', '`5 Bq` counts events; a frequency is wanted, such as `1.2 MHz`'],
  ['3 rad/s', 'count-rate', '`3 rad/s` counts angles; a count rate is wanted, such as `200 counts/s`'],
  ['-20 dBc', 'number', '`-20 dBc` is a ratio of powers; a plain number is wanted, such as `0.72`'],
  ['3 µrad', 'strain', '`3 µrad` is an angle; a strain is wanted, such as `1e-21`'],
  ['3 V', 'current', '`3 V` is a voltage; a current is wanted, such as `20 nA`'],
  ['1e308 Hz', 'rate', '`1e308 Hz` is beyond the numbers that are read; a rate such as `600 kHz` is wanted'],
]

function messageOf(act: () => unknown): string {
  try {
    act()
  } catch (error) {
    if (error instanceof QuantityError) return error.message
    throw error
  }
  throw new Error('nothing was refused')
}

test.each(refused)('%s as %s is refused', (text, name, message) => {
  expect(messageOf(() => toDeclared(parseQuantity(text), name))).toBe(message)
})

const densities: readonly (readonly [string, DensityOf, number, boolean])[] = [
  ['2 aN/√Hz', 'force', 2e-18, false],
  ['4 aN²/Hz', 'force', 4e-36, true],
  ['3e-16 m Hz^-1/2', 'length', 3e-16, false],
  ['9 fm²/Hz', 'length', 9e-30, true],
  ['3 nm/s²/√Hz', 'acceleration', 3e-9, false],
  ['1 µgn/√Hz', 'acceleration', 9.80665e-6, false],
  ['2 m²/(s⁴ Hz)', 'acceleration', 2, true],
  ['-120 dBV/√Hz', 'voltage', 1e-6, false],
  ['-120 dBV²/Hz', 'voltage', 1e-12, true],
  ['4 nV rms/√Hz', 'voltage', 4e-9, false],
  ['4 nVpk/√Hz', 'voltage', 4e-9 * Math.SQRT1_2, false],
  ['3 fA/√Hz', 'current', 3e-15, false],
  ['10 µqe/√Hz', 'charge', 1.602176634e-24, false],
  ['2 µΦ₀/√Hz', 'flux', 4.135667696923859e-21, false],
  ['3 zN m/√Hz', 'torque', 3e-21, false],
  ['2 µPa/√Hz', 'pressure', 2e-6, false],
  ['3 fT/√Hz', 'magnetic-field', 3e-15, false],
  ['3 µK/√Hz', 'temperature', 3e-6, false],
  ['1e-21 1/√Hz', 'strain', 1e-21, false],
  ['2 nrad/√Hz', 'angle', 2e-9, false],
  ['2 °/√Hz', 'angle', Math.PI / 90, false],
  ['5 µrad/s/√Hz', 'angle-rate', 5e-6, false],
  ['5 Hz/√Hz', 'angle-rate', 5 * turn, false],
  ['5 Hz/√Hz', 'frequency', 5, false],
  ['25 Hz²/Hz', 'frequency', 25, true],
  ['5 rad/s/√Hz', 'frequency', 5 / turn, false],
  ['-150 dB/Hz', 'relative-intensity', 1e-15, true],
  ['-150 dBc/Hz', 'relative-intensity', 1e-15, true],
  ['1e-8 1/√Hz', 'relative-intensity', 1e-8, false],
  ['-120 dBc/Hz', 'phase', 2e-12, true],
  ['4e-12 rad²/Hz', 'phase', 4e-12, true],
  ['2 µrad/√Hz', 'phase', 2e-6, false],
  ['0.5', 'quanta', 0.5, true],
  ['0.5 quanta', 'quanta', 0.5, true],
]

test.each(densities)('%s as a density of %s', (text, of, value, power) => {
  const density = toDensity(parseQuantity(text), of)
  expect(Math.abs(density.value - value)).toBeLessThanOrEqual(4e-16 * value)
  expect(density.power).toBe(power)
})

const refusedDensities: readonly (readonly [string, DensityOf, string])[] = [
  ['2 aN', 'force', '`2 aN` is a force; a density of force is wanted, such as `2 aN/√Hz` or `4 aN²/Hz`'],
  [
    '2 am/√Hz',
    'force',
    '`2 am/√Hz` is an amplitude density of displacement; a density of force is wanted, such as `2 aN/√Hz` or `4 aN²/Hz`',
  ],
  [
    '2 aN √s',
    'force',
    '`2 aN √s` is not per hertz, so that a factor 2π stays open; a density of force is wanted, such as `2 aN/√Hz` or `4 aN²/Hz`',
  ],
  [
    '4 m²/(rad/s)',
    'length',
    '`4 m²/(rad/s)` is not per hertz, so that a factor 2π stays open; a density of displacement is wanted, such as `3 am/√Hz` or `9 am²/Hz`',
  ],
  [
    '1 µg/√Hz',
    'acceleration',
    '`1 µg/√Hz` is a mass per root hertz; a density of acceleration is wanted, such as `5 µgn/√Hz` or `4e-15 m²/(s⁴ Hz)`; `g` is the gram, standard gravity is written `gn`',
  ],
  ['10 Hz', 'frequency', '`10 Hz` is a frequency; a density of frequency is wanted, such as `3 Hz/√Hz` or `9 Hz²/Hz`'],
  [
    '-120 dB/Hz',
    'phase',
    '`-120 dB/Hz` is a ratio of powers; a density of phase is wanted, such as `2 nrad/√Hz` or `-120 dBc/Hz`',
  ],
  [
    '1e-12 1/Hz',
    'phase',
    '`1e-12 1/Hz` has no unit of angle; a density of phase is wanted, such as `2 nrad/√Hz` or `-120 dBc/Hz`',
  ],
  [
    '2 nrad/√Hz',
    'strain',
    '`2 nrad/√Hz` is a density of angle; a density of strain is wanted, such as `1e-21 1/√Hz` or `1e-42 1/Hz`',
  ],
  [
    '-150 dBm/Hz',
    'voltage',
    '`-150 dBm/Hz` is a power per hertz; a density of voltage is wanted, such as `4 nV/√Hz` or `-150 dBV²/Hz`',
  ],
  [
    '2 ng/√Hz',
    'acceleration',
    '`2 ng/√Hz` is a mass per root hertz; a density of acceleration is wanted, such as `5 µgn/√Hz` or `4e-15 m²/(s⁴ Hz)`; `g` is the gram, standard gravity is written `gn`',
  ],
  [
    '2 1/√Hz',
    'quanta',
    '`2 1/√Hz` is a quantity in s^(1/2) with cycle^(-1/2); a number of quanta is wanted, such as `0.5`',
  ],
]

test.each(refusedDensities)('%s as a density of %s is refused', (text, of, message) => {
  expect(messageOf(() => toDensity(parseQuantity(text), of))).toBe(message)
})

test('every dimension that the catalogue declares is known here', () => {
  const folder = new URL('../../src/catalogue/declarations/', import.meta.url)
  const text = readdirSync(folder)
    .map(file => readFileSync(new URL(file, folder), 'utf8'))
    .join('')
  const names = [...text.matchAll(/dimension: '([^']*)'/g)].map(([, name]) => name)
  expect(names.length).toBeGreaterThan(10)
  expect(names.filter(name => !isDeclaredName(name))).toEqual([])
  expect(isDeclaredName('constructor')).toBe(false)
})

test('the example in every message and every canonical unit is of its own dimension', () => {
  for (const name of declaredNames.filter(each => each !== 'power-ratio')) {
    const value = toDeclared(parseQuantity(`3 ${canonicalUnit(name)}`), name).value
    expect(value, name).toBe(3)
    const message = messageOf(() => toDeclared(parseQuantity('3 kg/m⁴'), name))
    const example = /such as `([^`]*)`/.exec(message)?.[1] ?? ''
    expect(toDeclared(parseQuantity(example), name).value, name).toBeGreaterThan(0)
  }
})

test('the examples in every message about a density are an amplitude and a power', () => {
  for (const of of densityNames.filter(each => each !== 'quanta')) {
    const message = messageOf(() => toDensity(parseQuantity('3 kg/m⁴'), of))
    const [, amplitude, power] = /such as `([^`]*)` or `([^`]*)`/.exec(message) ?? ['', '', '']
    expect(toDensity(parseQuantity(amplitude), of).power, of).toBe(false)
    expect(toDensity(parseQuantity(power), of).power, of).toBe(true)
  }
})

test('a dimension without a word is told in base units', () => {
  const { dimension, cycles } = parseQuantity('1 kg/m³')
  expect(describeDimension(dimension, cycles)).toBe('a mass density')
  expect(describeDimension(parseQuantity('1 V/m').dimension)).toBe('a quantity in m kg s^-3 A^-1')
})
