import type { Dimension } from './dimension.js'
import type { Rational } from './rational.js'
import { unitEntries, type UnitEntry } from './unit-table.js'

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
  /** How many radians it carries: 1 for angles. */
  readonly angle: Rational
  /** True where prefixes may stand before the base. */
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

/** Makes one spelling of twin code points (both micro signs, ohms, ångströms) and of the flux quantum. */
export function canonicalSymbol(symbol: string): string {
  return symbol
    .replaceAll('\u03bc', '\u00b5')
    .replaceAll('\u2126', '\u03a9')
    .replaceAll('\u212b', '\u00c5')
    .replace(/(?:Φ|Phi)(?:₀|_?0)$/u, 'Φ₀')
}

/**
 * Behind the unit of an oscillation, in root mean square: its amplitude is √2 and its whole swing 2√2 times as much,
 * as instruments mean them, for a sine.
 */
const swings: ReadonlyMap<string, number> = new Map([
  ['rms', 1],
  ['pk', Math.SQRT1_2],
  ['pp', Math.SQRT1_2 / 2],
])

/** The meaning of one unit symbol with or without a prefix; null where there is none. */
export function lookUpUnit(written: string): UnitMeaning | null {
  const symbol = canonicalSymbol(written)
  const swing = /^(.*?)([ \u00a0\u2000-\u200a\u202f]*)(rms|pk|pp)$/u.exec(symbol)
  if (swing === null) return plainMeaning(symbol)
  const [, base, space, word] = swing
  const meaning = plainMeaning(base)
  const joined = space === '' && !/[VA]$/.test(base)
  if (meaning === null || joined || !unitEntries.get(meaning.base)?.varies) return plainMeaning(symbol)
  return { ...meaning, factor: meaning.factor * (swings.get(word) ?? 1), base: meaning.base + space + word }
}

function plainMeaning(symbol: string): UnitMeaning | null {
  const whole = unitEntries.get(symbol)
  if (whole !== undefined) return meaningOf(whole, symbol, '')
  for (const [prefix, power] of prefixes) {
    const base = symbol.slice(prefix.length)
    const entry = symbol.startsWith(prefix) ? unitEntries.get(base) : undefined
    if (entry?.prefixable) return meaningOf({ ...entry, ten: entry.ten + power }, base, prefix)
  }
  return null
}

function meaningOf(entry: UnitEntry, base: string, prefix: string): UnitMeaning {
  const { factor, ten, dimension, cycles, angle, prefixable } = entry
  return { base, prefix, factor, ten, dimension, cycles, angle, prefixable }
}

/** All symbols without prefix, and whether one may stand before them. */
export function unitSymbols(): { readonly symbol: string; readonly prefixable: boolean }[] {
  return [...unitEntries].map(([symbol, { prefixable }]) => ({ symbol, prefixable }))
}
