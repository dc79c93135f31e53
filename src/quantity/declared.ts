import { declaredMeanings, type DeclaredMeaning, type DeclaredName } from './declared-meanings.js'
import { describeDimension } from './describe.js'
import { dimensionOf, equalDimensions, exponentOf } from './dimension.js'
import { QuantityError } from './error.js'
import type { Quantity } from './parse.js'
import { equal, one, zero } from './rational.js'

export { declaredNames, type DeclaredName } from './declared-meanings.js'
export { toDensity, densityNames, type Density, type DensityOf } from './density.js'

export interface Declared {
  /** In the canonical unit of the declared dimension. */
  readonly value: number
  readonly uncertainty: number
  /** How a frequency or rate was written: with hertz, or in rad/s, s⁻¹ or as 2π × hertz; null elsewhere. */
  readonly note: 'angular' | 'cyclic' | null
}

export function isDeclaredName(name: string): name is DeclaredName {
  return Object.hasOwn(declaredMeanings, name)
}

/** Unit in which the canonical value counts: `rad/s` for a rate; empty for a plain number. */
export function canonicalUnit(name: DeclaredName): string {
  return declaredMeanings[name].unit
}

/**
 * The canonical value of a quantity that is used as the declared dimension.
 * A frequency counts cycles: what carries none is divided by 2π. A rate counts radians: what carries one cycle is
 * multiplied by 2π. Dimensions without time take the number whatever cycles it carries, and the result of an
 * expression the 2π that are left in it. A difference of temperatures takes `3 °C` as 3 K. Throws a QuantityError.
 */
export function toDeclared(quantity: Quantity, name: DeclaredName): Declared {
  const meaning = declaredMeanings[name]
  if (name === 'power-ratio' && isLevel(quantity)) return fromLevel(quantity)
  if (!equalDimensions(quantity.dimension, meaning.dimension)) throw wrongKind(quantity, meaning)
  checkAngle(quantity, meaning)
  checkEvents(quantity, name)
  if (quantity.level === 'dBc' && name !== 'power-ratio') {
    throw refuse(quantity, `\`${quantity.text}\` is a ratio of powers; ${wanted(meaning)}`)
  }
  if (meaning.counts !== undefined) return turned(quantity, meaning)
  const timeless = exponentOf(meaning.dimension, 'time').numerator === 0
  const left = quantity.computed === true && quantity.cycles.numerator < 0
  if (!timeless && !left && !equal(quantity.cycles, zero)) throw wrongCycles(quantity, meaning)
  const value = name === 'temperature-difference' ? quantity.difference : quantity.value
  return { value, uncertainty: quantity.uncertainty, note: null }
}

function wanted({ phrase, example }: DeclaredMeaning): string {
  return `${phrase} is wanted, such as \`${example}\``
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

function turned(quantity: Quantity, meaning: DeclaredMeaning): Declared {
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
function checkAngle(quantity: Quantity, meaning: DeclaredMeaning): void {
  const { angle, text, unitText, value } = quantity
  const bare = unitText === '' && /^[-+−]?\d/.test(text) && !/π|pi/.test(text)
  if (meaning.angle === 'wanted' && bare && value !== 0) {
    throw refuse(quantity, `\`${text}\` has no unit; an angle is wanted, such as \`${text}°\` or \`${text} rad\``)
  }
  if (meaning.angle === undefined && equalDimensions(meaning.dimension, dimensionOf({})) && angle.numerator !== 0) {
    throw refuse(quantity, `\`${text}\` is an angle; ${wanted(meaning)}`)
  }
}

/** Counts per second are neither cycles nor radians. */
function checkEvents(quantity: Quantity, name: DeclaredName): void {
  const { counts, ...meaning } = declaredMeanings[name]
  const events = /(?:counts?|quanta|photons|phonons|Bq)\b/.test(quantity.unitText)
  if (counts !== undefined && events) throw refuse(quantity, `\`${quantity.text}\` counts events; ${wanted(meaning)}`)
  if (name === 'count-rate' && quantity.cycles.numerator === 0 && quantity.angle.numerator !== 0) {
    throw refuse(quantity, `\`${quantity.text}\` counts angles; ${wanted(meaning)}`)
  }
}

function isLevel(quantity: Quantity): boolean {
  return equalDimensions(quantity.dimension, declaredMeanings.decibel.dimension)
}

function wrongKind(quantity: Quantity, meaning: DeclaredMeaning): QuantityError {
  const wantsGravity = meaning.unit === 'm/s²' && equalDimensions(quantity.dimension, declaredMeanings.mass.dimension)
  const hint = wantsGravity ? '; `g` is the gram, standard gravity is written `gn`' : ''
  return refuse(quantity, `\`${quantity.text}\` is ${phraseOf(quantity)}; ${wanted(meaning)}${hint}`)
}

function wrongCycles(quantity: Quantity, meaning: DeclaredMeaning): QuantityError {
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
