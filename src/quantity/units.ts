import { dimensionless, dimensionOf, type Dimension } from './dimension.js'
import { one, zero, type Rational } from './rational.js'

/** One symbol, prefix included: 1 of it is factor · 10^ten of the coherent SI unit. */
export interface UnitMeaning {
  /** Without its prefix: `Hz` of `kHz`. */
  readonly base: string
  readonly prefix: string
  readonly factor: number
  readonly ten: number
  readonly dimension: Dimension
  /** How many cycles it carries: 1 for the hertz alone. */
  readonly cycles: Rational
  /** True where prefixes may stand before the base. */
  readonly prefixable: boolean
}

interface Entry {
  readonly factor: number
  readonly ten: number
  readonly dimension: Dimension
  readonly cycles: Rational
  readonly prefixable: boolean
}

/** The SI prefixes of 2022 with their powers of ten; `µ` is U+00B5, and U+03BC is read as the same. */
export const prefixes: ReadonlyMap<string, number> = new Map([
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
  ['h', 2],
  ['da', 1],
  ['d', -1],
  ['c', -2],
  ['m', -3],
  ['µ', -6],
  ['n', -9],
  ['p', -12],
  ['f', -15],
  ['a', -18],
  ['z', -21],
  ['y', -24],
  ['r', -27],
  ['q', -30],
])

const si = (dimension: Dimension, factor = 1, ten = 0): Entry => ({
  factor,
  ten,
  dimension,
  cycles: zero,
  prefixable: true,
})
const fixed = (dimension: Dimension, factor = 1, ten = 0): Entry => ({
  ...si(dimension, factor, ten),
  prefixable: false,
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
const dose = dimensionOf({ length: 2, time: -2 })

// Exact by definition (SI Brochure, 9th edition, tables 2, 4 and 8) unless a comment says otherwise.
const entries: ReadonlyMap<string, Entry> = new Map<string, Entry>([
  ['m', si(length)],
  ['g', si(mass, 1, -3)],
  ['s', si(time)],
  ['A', si(dimensionOf({ current: 1 }))],
  ['K', si(dimensionOf({ temperature: 1 }))],
  ['mol', si(dimensionOf({ amount: 1 }))],
  ['cd', si(dimensionOf({ intensity: 1 }))],
  ['rad', si(dimensionless)],
  ['sr', si(dimensionless)],
  ['Hz', { ...si(rate), cycles: one }],
  ['N', si(force)],
  ['Pa', si(pressure)],
  ['J', si(energy)],
  ['W', si(dimensionOf({ mass: 1, length: 2, time: -3 }))],
  ['C', si(dimensionOf({ current: 1, time: 1 }))],
  ['V', si(voltage)],
  ['F', si(dimensionOf({ mass: -1, length: -2, time: 4, current: 2 }))],
  ['Ω', si(resistance)],
  ['ohm', si(resistance)],
  ['S', si(dimensionOf({ mass: -1, length: -2, time: 3, current: 2 }))],
  ['Wb', si(dimensionOf({ mass: 1, length: 2, time: -2, current: -1 }))],
  ['T', si(fluxDensity)],
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
  ['L', si(dimensionOf({ length: 3 }), 1, -3)],
  ['l', si(dimensionOf({ length: 3 }), 1, -3)],
  ['t', si(mass, 1, 3)],
  ['eV', si(energy, 1.602176634e-19)],
  // CODATA 2022: 1.660 539 068 92(52) × 10⁻²⁷ kg.
  ['u', si(mass, 1.66053906892e-27)],
  ['Da', si(mass, 1.66053906892e-27)],
  ['bar', si(pressure, 1, 5)],
  ['atm', fixed(pressure, 101325)],
  // One standard atmosphere over 760.
  ['Torr', si(pressure, 101325 / 760)],
  ['torr', si(pressure, 101325 / 760)],
  // Standard gravity, 3rd CGPM (1901); `g` is the gram.
  ['gn', si(acceleration, 9.80665)],
  ['Gal', si(acceleration, 1, -2)],
  ['dyn', si(force, 1, -5)],
  ['erg', si(energy, 1, -7)],
  ['G', si(fluxDensity, 1, -4)],
  ['Å', fixed(length, 1, -10)],
  ['°', fixed(dimensionless, Math.PI / 180)],
  ['deg', fixed(dimensionless, Math.PI / 180)],
  ['arcmin', fixed(dimensionless, Math.PI / 180 / 60)],
  ['arcsec', fixed(dimensionless, Math.PI / 180 / 3600)],
  ['%', fixed(dimensionless, 1, -2)],
  ['ppm', fixed(dimensionless, 1, -6)],
  ['ppb', fixed(dimensionless, 1, -9)],
  ['quanta', fixed(dimensionless)],
  ['photons', fixed(dimensionless)],
  ['phonons', fixed(dimensionless)],
  ['dB', fixed(dimensionOf({ level: 1 }))],
])

/** Makes one spelling of the twin code points: both micro signs, both ohms, both ångströms. */
export function canonicalSymbol(symbol: string): string {
  return symbol.replaceAll('\u03bc', '\u00b5').replaceAll('\u2126', '\u03a9').replaceAll('\u212b', '\u00c5')
}

/** The meaning of one unit symbol with or without a prefix; null where there is none. */
export function lookUpUnit(written: string): UnitMeaning | null {
  const symbol = canonicalSymbol(written)
  const whole = entries.get(symbol)
  if (whole !== undefined) return { ...whole, base: symbol, prefix: '' }
  for (const [prefix, power] of prefixes) {
    const base = symbol.slice(prefix.length)
    const entry = symbol.startsWith(prefix) ? entries.get(base) : undefined
    if (entry?.prefixable) return { ...entry, base, prefix, ten: entry.ten + power }
  }
  return null
}

/** All symbols without prefix, and whether one may stand before them. */
export function unitSymbols(): { readonly symbol: string; readonly prefixable: boolean }[] {
  return [...entries].map(([symbol, { prefixable }]) => ({ symbol, prefixable }))
}
