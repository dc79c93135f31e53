import { declaredMeanings, type DeclaredName } from './declared-meanings.js'
import { describeDimension } from './describe.js'
import {
  dimensionOf,
  equalDimensions,
  exponentOf,
  isDimensionless,
  multiplyDimensions,
  raiseDimension,
} from './dimension.js'
import { QuantityError } from './error.js'
import type { Quantity } from './parse.js'
import { add, equal, one, rational, zero, type Rational } from './rational.js'

export interface Density {
  /** X/√Hz of an amplitude density, X²/Hz of a power density, in SI; quanta are a plain number. */
  readonly value: number
  readonly uncertainty: number
  readonly power: boolean
}

interface DensityMeaning {
  /** What fluctuates; its canonical unit is that of the density. */
  readonly of: DeclaredName
  /** `displacement`, as it goes on behind `a density of`. */
  readonly noun: string
  /** An amplitude density and a power density. */
  readonly examples: readonly [string, string]
}

const densities = {
  force: { of: 'force', noun: 'force', examples: ['2 aN/√Hz', '4 aN²/Hz'] },
  length: { of: 'length', noun: 'displacement', examples: ['3 am/√Hz', '9 am²/Hz'] },
  acceleration: { of: 'acceleration', noun: 'acceleration', examples: ['5 µgn/√Hz', '4e-15 m²/(s⁴ Hz)'] },
  speed: { of: 'speed', noun: 'velocity', examples: ['2 nm/s/√Hz', '4 nm²/(s² Hz)'] },
  torque: { of: 'torque', noun: 'torque', examples: ['3 zN m/√Hz', '9e-42 N² m²/Hz'] },
  angle: { of: 'angle', noun: 'angle', examples: ['2 nrad/√Hz', '4 nrad²/Hz'] },
  'angle-rate': { of: 'angle-rate', noun: 'angular velocity', examples: ['5 µrad/s/√Hz', '2.5e-11 rad²/(s² Hz)'] },
  strain: { of: 'strain', noun: 'strain', examples: ['1e-21 1/√Hz', '1e-42 1/Hz'] },
  pressure: { of: 'pressure', noun: 'pressure', examples: ['3 µPa/√Hz', '9 µPa²/Hz'] },
  temperature: { of: 'temperature', noun: 'temperature', examples: ['3 µK/√Hz', '9 µK²/Hz'] },
  voltage: { of: 'voltage', noun: 'voltage', examples: ['4 nV/√Hz', '-150 dBV²/Hz'] },
  current: { of: 'current', noun: 'current', examples: ['2 fA/√Hz', '4 fA²/Hz'] },
  charge: { of: 'charge', noun: 'charge', examples: ['10 µqe/√Hz', '1e-48 C²/Hz'] },
  flux: { of: 'flux', noun: 'magnetic flux', examples: ['2 µΦ₀/√Hz', '4 µΦ₀²/Hz'] },
  'magnetic-field': { of: 'magnetic-field', noun: 'magnetic field', examples: ['3 fT/√Hz', '9 fT²/Hz'] },
  power: { of: 'power', noun: 'power', examples: ['3 pW/√Hz', '9 pW²/Hz'] },
  energy: { of: 'energy', noun: 'energy', examples: ['3 zJ/√Hz', '9 zJ²/Hz'] },
  mass: { of: 'mass', noun: 'mass', examples: ['2 ng/√Hz', '4 ng²/Hz'] },
  frequency: { of: 'frequency', noun: 'frequency', examples: ['3 Hz/√Hz', '9 Hz²/Hz'] },
  'relative-intensity': { of: 'number', noun: 'relative intensity', examples: ['1e-8 1/√Hz', '-160 dB/Hz'] },
  phase: { of: 'angle', noun: 'phase', examples: ['2 nrad/√Hz', '-120 dBc/Hz'] },
} as const satisfies Record<string, DensityMeaning>

type DensityName = keyof typeof densities

/** What a noise or a table may be a one-sided density of. */
export type DensityOf = DensityName | 'quanta'

export const densityNames: readonly DensityOf[] = [...(Object.keys(densities) as DensityName[]), 'quanta']

export function meaningOfDensity(of: DensityName): DensityMeaning {
  return densities[of]
}

/**
 * A one-sided density per hertz: the unit tells amplitude (X/√Hz) from power (X²/Hz). Throws a QuantityError.
 * A phase takes `dBc/Hz` as 𝓛(f), half of the density of phase in rad²/Hz (IEEE Std 1139, from memory); a relative
 * intensity takes it for the ratio of powers itself, like `dB/Hz` (common practice, no source). A frequency counts
 * cycles and an angular velocity radians, whichever of Hz/√Hz and (rad/s)/√Hz is written. The result of an expression
 * may lack the tag of hertz: 4·k_B·T·m·Γ is per hertz by its law.
 */
export function toDensity(quantity: Quantity, of: DensityOf): Density {
  if (of === 'quanta') return quanta(quantity)
  const meaning: DensityMeaning = densities[of]
  const isPower = equalDimensions(quantity.dimension, densityDimension(of, true))
  if (!isPower && !equalDimensions(quantity.dimension, densityDimension(of, false))) throw wrongDensity(quantity, of)
  checkAngle(quantity, of, isPower)
  const factor = levelFactor(quantity, of) * turnFactor(quantity, of, isPower)
  if (meaning.of === 'frequency' && isPower && /^[a-zA-Zµμ]*Hz$/u.test(quantity.unitText))
    throw wrongDensity(quantity, of)
  return { value: quantity.value * factor, uncertainty: quantity.uncertainty * factor, power: isPower }
}

/** Of a one-sided density per hertz: that of its amplitude or of its power. */
function densityDimension(of: DensityName, power: boolean) {
  const { dimension } = declaredMeanings[densities[of].of]
  const perHertz = dimensionOf({ time: power ? 1 : rational(1, 2) })
  return multiplyDimensions(power ? raiseDimension(dimension, rational(2)) : dimension, perHertz)
}

function quanta(quantity: Quantity): Density {
  const { text, value, uncertainty, dimension, angle, level } = quantity
  const wanted = 'a number of quanta is wanted, such as `0.5`'
  if (!isDimensionless(dimension)) throw refuse(quantity, `\`${text}\` is ${phraseOf(quantity)}; ${wanted}`)
  if (angle.numerator !== 0)
    throw refuse(quantity, `\`${text}\` is an angle; a plain number is wanted, such as \`0.72\``)
  if (level !== null) throw refuse(quantity, `\`${text}\` is a level; ${wanted}`)
  return { value, uncertainty, power: true }
}

/** A factor 2π, or its square of a power, where cycles are written for radians or the other way round. */
function turnFactor(quantity: Quantity, of: DensityName, power: boolean): number {
  const { counts } = declaredMeanings[densities[of].of]
  const perHertz = power ? rational(-1) : rational(-1, 2)
  const inHertz = add(perHertz, power ? rational(2) : one)
  const written = quantity.cycles
  const bare = quantity.computed === true && equal(written, zero)
  if (counts === undefined) {
    if (bare || equal(written, perHertz)) return 1
    throw notPerHertz(quantity, of)
  }
  const turn = (2 * Math.PI) ** (power ? 2 : 1)
  if (equal(written, inHertz)) return counts === 'cycles' ? 1 : turn
  if (equal(written, perHertz)) return counts === 'cycles' ? 1 / turn : 1
  throw notPerHertz(quantity, of)
}

function levelFactor(quantity: Quantity, of: DensityName): number {
  const { level, text } = quantity
  if (of === 'phase' && level === 'dBc') return 2
  const ratio = level === 'dBc' || level === 'dB'
  if (!ratio || of === 'relative-intensity') return 1
  throw refuse(quantity, `\`${text}\` is a ratio of powers; ${remedyFor(of)}`)
}

/** Of an angle the unit must say so, since a bare 1/√Hz may be anything; a strain or ratio must carry none. */
function checkAngle(quantity: Quantity, of: DensityName, power: boolean): void {
  const { dimension, angle } = declaredMeanings[densities[of].of]
  if (!isDimensionless(dimension) || quantity.computed === true) return
  const found: Rational = quantity.angle
  if (angle !== 'wanted') {
    if (found.numerator !== 0) throw refuse(quantity, `\`${quantity.text}\` is a density of angle; ${remedyFor(of)}`)
    return
  }
  if (quantity.level === null && !equal(found, rational(power ? 2 : 1))) {
    throw refuse(quantity, `\`${quantity.text}\` has no unit of angle; ${remedyFor(of)}`)
  }
}

function remedyFor(of: DensityName): string {
  const { noun, examples } = densities[of]
  return `a density of ${noun} is wanted, such as \`${examples[0]}\` or \`${examples[1]}\``
}

function wrongDensity(quantity: Quantity, of: DensityName): QuantityError {
  const gravity = of === 'acceleration' && exponentOf(quantity.dimension, 'mass').numerator === 1
  const hint = gravity ? '; `g` is the gram, standard gravity is written `gn`' : ''
  return refuse(quantity, `\`${quantity.text}\` is ${phraseOf(quantity)}; ${remedyFor(of)}${hint}`)
}

function notPerHertz(quantity: Quantity, of: DensityName): QuantityError {
  return refuse(quantity, `\`${quantity.text}\` is not per hertz, so that a factor 2π stays open; ${remedyFor(of)}`)
}

function phraseOf(quantity: Quantity): string {
  return describeDimension(quantity.dimension, quantity.cycles)
}

function refuse(quantity: Quantity, message: string): QuantityError {
  return new QuantityError(message, 0, quantity.text.length)
}
