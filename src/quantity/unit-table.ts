import { dimensionless, dimensionOf, type Dimension } from './dimension.js'
import { one, zero, type Rational } from './rational.js'

export interface UnitEntry {
  readonly factor: number
  readonly ten: number
  readonly dimension: Dimension
  readonly cycles: Rational
  /** Radians that it carries: 1 for `rad`, `°`. */
  readonly angle: Rational
  /** Whether a prefix may stand before it. */
  readonly prefixable: boolean
  /** Whether `rms`, `pk` or `pp` may stand behind it. */
  readonly varies: boolean
}

const si = (dimension: Dimension, factor = 1, ten = 0): UnitEntry => ({
  factor,
  ten,
  dimension,
  cycles: zero,
  angle: zero,
  prefixable: true,
  varies: false,
})
const fixed = (dimension: Dimension, factor = 1, ten = 0): UnitEntry => ({
  ...si(dimension, factor, ten),
  prefixable: false,
})
/** A quantity that an oscillation has: `V rms`, `nm pk`. */
const varying = (entry: UnitEntry): UnitEntry => ({ ...entry, varies: true })
const angular = (factor: number, prefixable = false): UnitEntry => ({
  ...si(dimensionless, factor),
  angle: one,
  prefixable,
  varies: true,
})

const length = dimensionOf({ length: 1 })
const time = dimensionOf({ time: 1 })
const rate = dimensionOf({ time: -1 })
const mass = dimensionOf({ mass: 1 })
const force = dimensionOf({ mass: 1, length: 1, time: -2 })
const energy = dimensionOf({ mass: 1, length: 2, time: -2 })
const pressure = dimensionOf({ mass: 1, length: -1, time: -2 })
const acceleration = dimensionOf({ length: 1, time: -2 })
const voltage = dimensionOf({ mass: 1, length: 2, time: -3, current: -1 })
const resistance = dimensionOf({ mass: 1, length: 2, time: -3, current: -2 })
const fluxDensity = dimensionOf({ mass: 1, time: -2, current: -1 })
const charge = dimensionOf({ current: 1, time: 1 })
const flux = dimensionOf({ mass: 1, length: 2, time: -2, current: -1 })
const level = dimensionOf({ level: 1 })
const dose = dimensionOf({ length: 2, time: -2 })

// Exact by definition (SI Brochure, 9th edition, tables 2, 4 and 8) unless a comment says otherwise.
export const unitEntries: ReadonlyMap<string, UnitEntry> = new Map<string, UnitEntry>([
  ['m', varying(si(length))],
  ['g', si(mass, 1, -3)],
  ['s', si(time)],
  ['A', varying(si(dimensionOf({ current: 1 })))],
  ['K', si(dimensionOf({ temperature: 1 }))],
  ['mol', si(dimensionOf({ amount: 1 }))],
  ['cd', si(dimensionOf({ intensity: 1 }))],
  ['rad', angular(1, true)],
  ['sr', si(dimensionless)],
  ['Hz', { ...varying(si(rate)), cycles: one }],
  ['N', varying(si(force))],
  ['Pa', varying(si(pressure))],
  ['J', si(energy)],
  ['W', si(dimensionOf({ mass: 1, length: 2, time: -3 }))],
  ['C', si(charge)],
  ['V', varying(si(voltage))],
  ['F', si(dimensionOf({ mass: -1, length: -2, time: 4, current: 2 }))],
  ['Ω', si(resistance)],
  ['ohm', si(resistance)],
  ['S', si(dimensionOf({ mass: -1, length: -2, time: 3, current: 2 }))],
  ['Wb', si(flux)],
  ['T', varying(si(fluxDensity))],
  ['H', si(dimensionOf({ mass: 1, length: 2, time: -2, current: -2 }))],
  ['lm', si(dimensionOf({ intensity: 1 }))],
  ['lx', si(dimensionOf({ intensity: 1, length: -2 }))],
  ['Bq', si(rate)],
  ['Gy', si(dose)],
  ['Sv', si(dose)],
  ['kat', si(dimensionOf({ amount: 1, time: -1 }))],
  ['min', fixed(time, 60)],
  ['h', fixed(time, 3600)],
  ['d', fixed(time, 86400)],
  ['au', fixed(length, 149597870700)],
  ['ha', fixed(dimensionOf({ length: 2 }), 1, 4)],
  ['L', si(dimensionOf({ length: 3 }), 1, -3)],
  ['l', si(dimensionOf({ length: 3 }), 1, -3)],
  ['t', si(mass, 1, 3)],
  ['eV', si(energy, 1.602176634e-19)],
  // CODATA 2022: 1.660 539 068 92(52) × 10⁻²⁷ kg.
  ['u', fixed(mass, 1.66053906892e-27)],
  ['Da', si(mass, 1.66053906892e-27)],
  ['bar', si(pressure, 1, 5)],
  ['atm', fixed(pressure, 101325)],
  // One standard atmosphere over 760.
  ['Torr', si(pressure, 101325 / 760)],
  ['torr', si(pressure, 101325 / 760)],
  // Standard gravity, 3rd CGPM (1901); `g` is the gram.
  ['gn', varying(si(acceleration, 9.80665))],
  ['Gal', si(acceleration, 1, -2)],
  ['dyn', si(force, 1, -5)],
  ['erg', si(energy, 1, -7)],
  ['G', si(fluxDensity, 1, -4)],
  ['Å', fixed(length, 1, -10)],
  ['°', angular(Math.PI / 180)],
  ['deg', angular(Math.PI / 180)],
  ['arcmin', angular(Math.PI / 180 / 60)],
  ['arcsec', angular(Math.PI / 180 / 3600)],
  ['′', angular(Math.PI / 180 / 60)],
  ['″', angular(Math.PI / 180 / 3600)],
  ['%', fixed(dimensionless, 1, -2)],
  ['ppm', fixed(dimensionless, 1, -6)],
  ['ppb', fixed(dimensionless, 1, -9)],
  ['quanta', fixed(dimensionless)],
  ['photons', fixed(dimensionless)],
  ['phonons', fixed(dimensionless)],
  ['counts', fixed(dimensionless)],
  ['count', fixed(dimensionless)],
  ['dB', fixed(level)],
  ['B', fixed(level, 1, 1)],
  // 1 Np = 20/ln 10 dB, of a ratio of amplitudes (ISO 80000-3:2006).
  ['Np', fixed(level, 20 / Math.LN10)],
  // The charge e of the SI; its letter alone would be read as a power of ten.
  ['qe', si(charge, 1.602176634e-19)],
  // h/(2e), exact in the SI.
  ['Φ₀', si(flux, 6.62607015e-34 / (2 * 1.602176634e-19))],
])
