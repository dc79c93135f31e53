import { dimensionOf, type Dimension } from './dimension.js'

export interface DeclaredMeaning {
  readonly dimension: Dimension
  /** Unit of the canonical value; empty for a plain number. */
  readonly unit: string
  /** With its article, as an error says it. */
  readonly phrase: string
  readonly example: string
  /** Turns by 2π: what the canonical unit counts. */
  readonly counts?: 'cycles' | 'radians'
  /** Whether a unit of angle is wanted, may stand, or must not. */
  readonly angle?: 'wanted' | 'allowed'
}

const number = dimensionOf({})
const time = dimensionOf({ time: 1 })
const rate = dimensionOf({ time: -1 })
const energy = dimensionOf({ mass: 1, length: 2, time: -2 })
const pressure = dimensionOf({ mass: 1, length: -1, time: -2 })
const temperature = dimensionOf({ temperature: 1 })

const table = {
  mass: { dimension: dimensionOf({ mass: 1 }), unit: 'kg', phrase: 'a mass', example: '3.1 ng' },
  frequency: { dimension: rate, unit: 'Hz', phrase: 'a frequency', example: '1.2 MHz', counts: 'cycles' },
  rate: { dimension: rate, unit: 'rad/s', phrase: 'a rate', example: '600 kHz', counts: 'radians', angle: 'allowed' },
  'rate-per-length': {
    dimension: dimensionOf({ time: -1, length: -1 }),
    unit: 'rad/(s m)',
    phrase: 'a frequency shift per length',
    example: '21 GHz/µm',
    counts: 'radians',
    angle: 'allowed',
  },
  'angle-rate': {
    dimension: rate,
    unit: 'rad/s',
    phrase: 'an angular velocity',
    example: '5 °/s',
    counts: 'radians',
    angle: 'allowed',
  },
  'count-rate': { dimension: rate, unit: '1/s', phrase: 'a count rate', example: '200 counts/s' },
  temperature: { dimension: temperature, unit: 'K', phrase: 'a temperature', example: '4.1 K' },
  'temperature-difference': {
    dimension: temperature,
    unit: 'K',
    phrase: 'a difference of temperatures',
    example: '3 mK',
  },
  number: { dimension: number, unit: '', phrase: 'a plain number', example: '0.72' },
  strain: { dimension: number, unit: '', phrase: 'a strain', example: '1e-21' },
  angle: { dimension: number, unit: 'rad', phrase: 'an angle', example: '90°', angle: 'wanted' },
  power: { dimension: dimensionOf({ mass: 1, length: 2, time: -3 }), unit: 'W', phrase: 'a power', example: '3 µW' },
  energy: { dimension: energy, unit: 'J', phrase: 'an energy', example: '2 µeV' },
  length: { dimension: dimensionOf({ length: 1 }), unit: 'm', phrase: 'a length', example: '2 nm' },
  area: { dimension: dimensionOf({ length: 2 }), unit: 'm²', phrase: 'an area', example: '4 mm²' },
  volume: { dimension: dimensionOf({ length: 3 }), unit: 'm³', phrase: 'a volume', example: '2 mL' },
  time: { dimension: time, unit: 's', phrase: 'a time', example: '3 ms' },
  speed: { dimension: dimensionOf({ length: 1, time: -1 }), unit: 'm/s', phrase: 'a speed', example: '340 m/s' },
  acceleration: {
    dimension: dimensionOf({ length: 1, time: -2 }),
    unit: 'm/s²',
    phrase: 'an acceleration',
    example: '2 m/s²',
  },
  force: { dimension: dimensionOf({ mass: 1, length: 1, time: -2 }), unit: 'N', phrase: 'a force', example: '20 aN' },
  torque: { dimension: energy, unit: 'N m', phrase: 'a torque', example: '3 zN m', angle: 'allowed' },
  stiffness: { dimension: dimensionOf({ mass: 1, time: -2 }), unit: 'N/m', phrase: 'a stiffness', example: '2 N/m' },
  'moment-of-inertia': {
    dimension: dimensionOf({ mass: 1, length: 2 }),
    unit: 'kg m²',
    phrase: 'a moment of inertia',
    example: '3 g cm²',
  },
  'mass-density': {
    dimension: dimensionOf({ mass: 1, length: -3 }),
    unit: 'kg/m³',
    phrase: 'a mass density',
    example: '3.1 g/cm³',
  },
  pressure: { dimension: pressure, unit: 'Pa', phrase: 'a pressure', example: '1e-8 mbar' },
  stress: { dimension: pressure, unit: 'Pa', phrase: 'a stress', example: '1.1 GPa' },
  current: { dimension: dimensionOf({ current: 1 }), unit: 'A', phrase: 'a current', example: '20 nA' },
  charge: { dimension: dimensionOf({ current: 1, time: 1 }), unit: 'C', phrase: 'a charge', example: '3 qe' },
  voltage: {
    dimension: dimensionOf({ mass: 1, length: 2, time: -3, current: -1 }),
    unit: 'V',
    phrase: 'a voltage',
    example: '3 mV',
  },
  'voltage-per-length': {
    dimension: dimensionOf({ mass: 1, length: 1, time: -3, current: -1 }),
    unit: 'V/m',
    phrase: 'a voltage per length',
    example: '2 V/µm',
  },
  'voltage-per-speed': {
    dimension: dimensionOf({ mass: 1, length: 1, time: -2, current: -1 }),
    unit: 'V s/m',
    phrase: 'a voltage per speed',
    example: '12 V s/m',
  },
  resistance: {
    dimension: dimensionOf({ mass: 1, length: 2, time: -3, current: -2 }),
    unit: 'Ω',
    phrase: 'a resistance',
    example: '50 Ω',
  },
  conductance: {
    dimension: dimensionOf({ mass: -1, length: -2, time: 3, current: 2 }),
    unit: 'S',
    phrase: 'a conductance',
    example: '20 µS',
  },
  capacitance: {
    dimension: dimensionOf({ mass: -1, length: -2, time: 4, current: 2 }),
    unit: 'F',
    phrase: 'a capacitance',
    example: '3 fF',
  },
  inductance: {
    dimension: dimensionOf({ mass: 1, length: 2, time: -2, current: -2 }),
    unit: 'H',
    phrase: 'an inductance',
    example: '12 nH',
  },
  'magnetic-field': {
    dimension: dimensionOf({ mass: 1, time: -2, current: -1 }),
    unit: 'T',
    phrase: 'a magnetic field',
    example: '3 mT',
  },
  flux: {
    dimension: dimensionOf({ mass: 1, length: 2, time: -2, current: -1 }),
    unit: 'Wb',
    phrase: 'a magnetic flux',
    example: '0.3 Φ₀',
  },
  decibel: { dimension: dimensionOf({ level: 1 }), unit: 'dB', phrase: 'a level', example: '6 dB' },
  'power-ratio': { dimension: number, unit: '', phrase: 'a ratio of powers', example: '0.72` or `20 dB' },
} as const satisfies Record<string, DeclaredMeaning>

/** The dimensions that a catalogue entry may declare for a field. */
export type DeclaredName = keyof typeof table

export const declaredMeanings: Readonly<Record<DeclaredName, DeclaredMeaning>> = table

export const declaredNames: readonly DeclaredName[] = Object.keys(table) as DeclaredName[]
