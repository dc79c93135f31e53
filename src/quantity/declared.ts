import { describeDimension } from './describe.js'
import {
  baseQuantities,
  dimensionOf,
  equalDimensions,
  exponentOf,
  isDimensionless,
  type Dimension,
} from './dimension.js'
import { QuantityError } from './error.js'
import type { Quantity } from './parse.js'
import { equal, one, rational, zero, type Rational } from './rational.js'

/** The dimensions that a catalogue entry may declare for a field. */
export type DeclaredName =
  | 'mass'
  | 'frequency'
  | 'rate'
  | 'rate-per-length'
  | 'temperature'
  | 'number'
  | 'angle'
  | 'power'
  | 'length'
  | 'force'
  | 'acceleration'
  | 'decibel'
  | 'power-ratio'

export interface Declared {
  /** In the canonical unit of the declared dimension. */
  readonly value: number
  readonly uncertainty: number
  /** How a frequency or rate was written: with hertz, or in rad/s, s⁻¹ or as 2π × hertz; null elsewhere. */
  readonly note: 'angular' | 'cyclic' | null
}

interface Meaning {
  readonly dimension: Dimension
  /** Unit of the canonical value; empty for a plain number. */
  readonly unit: string
  /** With its article, as an error says it. */
  readonly phrase: string
  readonly example: string
  /** Turns by 2π: what the canonical unit counts. */
  readonly counts?: 'cycles' | 'radians'
}

const meanings: Readonly<Record<DeclaredName, Meaning>> = {
  mass: { dimension: dimensionOf({ mass: 1 }), unit: 'kg', phrase: 'a mass', example: '3.1 ng' },
  frequency: {
    dimension: dimensionOf({ time: -1 }),
    unit: 'Hz',
    phrase: 'a frequency',
    example: '1.2 MHz',
    counts: 'cycles',
  },
  rate: {
    dimension: dimensionOf({ time: -1 }),
    unit: 'rad/s',
    phrase: 'a rate',
    example: '600 kHz',
    counts: 'radians',
  },
  'rate-per-length': {
    dimension: dimensionOf({ time: -1, length: -1 }),
    unit: 'rad/(s m)',
    phrase: 'a frequency shift per length',
    example: '21 GHz/µm',
    counts: 'radians',
  },
  temperature: { dimension: dimensionOf({ temperature: 1 }), unit: 'K', phrase: 'a temperature', example: '4.1 K' },
  number: { dimension: dimensionOf({}), unit: '', phrase: 'a plain number', example: '0.72' },
  angle: { dimension: dimensionOf({}), unit: 'rad', phrase: 'an angle', example: '90°' },
  power: { dimension: dimensionOf({ mass: 1, length: 2, time: -3 }), unit: 'W', phrase: 'a power', example: '3 µW' },
  length: { dimension: dimensionOf({ length: 1 }), unit: 'm', phrase: 'a length', example: '2 nm' },
  force: { dimension: dimensionOf({ mass: 1, length: 1, time: -2 }), unit: 'N', phrase: 'a force', example: '20 aN' },
  acceleration: {
    dimension: dimensionOf({ length: 1, time: -2 }),
    unit: 'm/s²',
    phrase: 'an acceleration',
    example: '2 m/s²',
  },
  decibel: { dimension: dimensionOf({ level: 1 }), unit: 'dB', phrase: 'a level', example: '6 dB' },
  'power-ratio': { dimension: dimensionOf({}), unit: '', phrase: 'a ratio of powers', example: '0.72` or `20 dB' },
}

export function isDeclaredName(name: string): name is DeclaredName {
  return Object.hasOwn(meanings, name)
}

/** Unit in which the canonical value counts: `rad/s` for a rate; empty for a plain number. */
export function canonicalUnit(name: DeclaredName): string {
  return meanings[name].unit
}

/**
 * The canonical value of a quantity that is used as the declared dimension.
 * A frequency counts cycles: what carries none is divided by 2π. A rate counts radians: what carries one cycle is
 * multiplied by 2π. Dimensions without time take the number whatever cycles it carries. Throws a QuantityError.
 */
export function toDeclared(quantity: Quantity, name: DeclaredName): Declared {
  const meaning = meanings[name]
  if (name === 'power-ratio' && isLevel(quantity)) return fromLevel(quantity)
  if (!equalDimensions(quantity.dimension, meaning.dimension)) throw wrongKind(quantity, meaning)
  checkPlainNumber(quantity, name)
  if (meaning.counts !== undefined) return turned(quantity, meaning)
  const timeless = exponentOf(meaning.dimension, 'time').numerator === 0
  if (!timeless && !equal(quantity.cycles, zero)) throw wrongCycles(quantity, meaning)
  return { value: quantity.value, uncertainty: quantity.uncertainty, note: null }
}

/** A level as a power ratio: 10^(L/10). */
function fromLevel(quantity: Quantity): Declared {
  const value = 10 ** (quantity.value / 10)
  if (!Number.isFinite(value) || value === 0) {
    throw refuse(
      quantity,
      `\`${quantity.text}\` is beyond the numbers that are read; a ratio such as \`20 dB\` is wanted`,
    )
  }
  return { value, uncertainty: ((value * Math.LN10) / 10) * quantity.uncertainty, note: null }
}

function turned(quantity: Quantity, meaning: Meaning): Declared {
  const cyclic = equal(quantity.cycles, one)
  if (!cyclic && !equal(quantity.cycles, zero)) throw wrongCycles(quantity, meaning)
  const turn = 2 * Math.PI
  const factor = meaning.counts === 'cycles' ? (cyclic ? 1 : 1 / turn) : cyclic ? turn : 1
  const value = quantity.value * factor
  const uncertainty = quantity.uncertainty * factor
  if (!Number.isFinite(value) || !Number.isFinite(uncertainty))
    throw refuse(
      quantity,
      `\`${quantity.text}\` is beyond the numbers that are read; ${meaning.phrase} such as \`${meaning.example}\` is wanted`,
    )
  return { value, uncertainty, note: cyclic ? 'cyclic' : 'angular' }
}

/** A bare `90` as an angle would be 90 radians, and `90°` as a plain number 1.57: neither is likely meant. */
function checkPlainNumber(quantity: Quantity, name: DeclaredName): void {
  const bare = quantity.unitText === '' && /^[-+−]?\d/.test(quantity.text) && !/π|pi/.test(quantity.text)
  if (name === 'angle' && bare && quantity.value !== 0) {
    throw refuse(
      quantity,
      `\`${quantity.text}\` has no unit; an angle is wanted, such as \`${quantity.text}°\` or \`${quantity.text} rad\``,
    )
  }
  const ratioOnly = name === 'number' || name === 'power-ratio'
  if (ratioOnly && /°|rad|deg|arc/.test(quantity.unitText)) {
    throw refuse(
      quantity,
      `\`${quantity.text}\` is an angle; ${meanings[name].phrase} is wanted, such as \`${meanings[name].example}\``,
    )
  }
}

export type DensityOf = 'force' | 'length' | 'acceleration' | 'quanta'

export interface Density {
  /** X/√Hz of an amplitude density, X²/Hz of a power density, in SI; quanta are a plain number. */
  readonly value: number
  readonly uncertainty: number
  readonly power: boolean
}

const densities: Readonly<Record<Exclude<DensityOf, 'quanta'>, { dimension: Dimension; unit: string; noun: string }>> =
  {
    force: { dimension: meanings.force.dimension, unit: 'N', noun: 'force' },
    length: { dimension: meanings.length.dimension, unit: 'm', noun: 'displacement' },
    acceleration: { dimension: meanings.acceleration.dimension, unit: 'm/s²', noun: 'acceleration' },
  }

/** A one-sided density per hertz: the unit tells amplitude (X/√Hz) from power (X²/Hz). Throws a QuantityError. */
export function toDensity(quantity: Quantity, of: DensityOf): Density {
  const { value, uncertainty } = quantity
  if (of === 'quanta') {
    if (!isDimensionless(quantity.dimension)) {
      throw refuse(
        quantity,
        `\`${quantity.text}\` is ${phraseOf(quantity)}; a number of quanta is wanted, such as \`0.5\``,
      )
    }
    checkPlainNumber(quantity, 'number')
    return { value, uncertainty, power: true }
  }
  const { dimension } = densities[of]
  const amplitude = dimension.map((exponent, index) => (index === timeIndex ? shifted(exponent.numerator) : exponent))
  const power = dimension.map((exponent, index) =>
    rational(2 * exponent.numerator + (index === timeIndex ? 1 : 0), exponent.denominator),
  )
  const isPower = equalDimensions(quantity.dimension, power)
  if (!isPower && !equalDimensions(quantity.dimension, amplitude)) throw wrongDensity(quantity, of)
  if (!equal(quantity.cycles, isPower ? rational(-1) : rational(-1, 2))) throw notPerHertz(quantity, of)
  return { value, uncertainty, power: isPower }
}

const timeIndex = baseQuantities.indexOf('time')

/** The exponent of time of an amplitude density: √Hz in the denominator adds one half. */
function shifted(numerator: number): Rational {
  return rational(2 * numerator + 1, 2)
}

function densityRemedy(of: Exclude<DensityOf, 'quanta'>): string {
  const examples = {
    force: '2 aN/√Hz` or `4 aN²/Hz',
    length: '3 am/√Hz` or `9 am²/Hz',
    acceleration: '5 µgn/√Hz` or `4e-15 m²/(s⁴ Hz)',
  }
  return `a density of ${densities[of].noun} is wanted, such as \`${examples[of]}\``
}

function wrongDensity(quantity: Quantity, of: Exclude<DensityOf, 'quanta'>): QuantityError {
  const gravity = of === 'acceleration' && exponentOf(quantity.dimension, 'mass').numerator === 1
  const hint = gravity ? '; `g` is the gram, standard gravity is written `gn`' : ''
  return refuse(quantity, `\`${quantity.text}\` is ${phraseOf(quantity)}; ${densityRemedy(of)}${hint}`)
}

function notPerHertz(quantity: Quantity, of: Exclude<DensityOf, 'quanta'>): QuantityError {
  return refuse(quantity, `\`${quantity.text}\` is not per hertz, so that a factor 2π stays open; ${densityRemedy(of)}`)
}

function isLevel(quantity: Quantity): boolean {
  return equalDimensions(quantity.dimension, meanings.decibel.dimension)
}

function wrongKind(quantity: Quantity, meaning: Meaning): QuantityError {
  const wantsGravity = meaning.unit === 'm/s²' && equalDimensions(quantity.dimension, meanings.mass.dimension)
  const hint = wantsGravity ? '; `g` is the gram, standard gravity is written `gn`' : ''
  return refuse(
    quantity,
    `\`${quantity.text}\` is ${phraseOf(quantity)}; ${meaning.phrase} is wanted, such as \`${meaning.example}\`${hint}`,
  )
}

function wrongCycles(quantity: Quantity, meaning: Meaning): QuantityError {
  const remedy =
    meaning.counts === undefined
      ? 'write its unit without hertz'
      : 'write hertz alone, `2π ×` hertz, or radians per second without 2π'
  return refuse(
    quantity,
    `\`${quantity.text}\` does not tell cycles from radians; ${remedy}, such as \`${meaning.example}\``,
  )
}

function phraseOf(quantity: Quantity): string {
  return describeDimension(quantity.dimension, quantity.cycles)
}

function refuse(quantity: Quantity, message: string): QuantityError {
  return new QuantityError(message, 0, quantity.text.length)
}
