import { plainDecimal, toPlace, toSignificant, uncertaintyDigits, type Digits } from './digits.js'
import { unitTex } from './unit-tex.js'
import { lookUpUnit, prefixes } from './units.js'

export interface FormatOptions {
  /** Significant digits where no uncertainty decides them; 3 when left out. */
  readonly digits?: number
  /** Standard uncertainty in the same unit; 0 counts as none. */
  readonly uncertainty?: number
}

const space = '\u00a0'
const minus = '\u2212'

/**
 * A number with its unit for people: `3.2(2) aN/√Hz`, `1.24 MHz`, `6.40 × 10⁻³⁷ N²/Hz`.
 * The prefix of the unit's first symbol is chosen so that the number lies from 1 to under 1000; where none does it, a
 * power of ten is written. `parseQuantity` reads the text back to the digits it shows.
 */
export function formatQuantity(value: number, unit: string, options: FormatOptions = {}): string {
  if (!Number.isFinite(value)) return join(notFinite(value), unit.trim())
  const shown = show(value, unit, options)
  const power = shown.ten === 0 ? '' : `${space}×${space}10${raised(shown.ten)}`
  return join((shown.negative ? minus : '') + shown.mantissa + power, shown.unit)
}

/** The same for KaTeX: `3.2(2)\,\mathrm{aN}/\sqrt{\mathrm{Hz}}`. */
export function formatTex(value: number, unit: string, options: FormatOptions = {}): string {
  if (!Number.isFinite(value)) return `\\text{${notFinite(value).replace('∞', 'infinite')}}`
  const shown = show(value, unit, options)
  const power = shown.ten === 0 ? '' : `\\times 10^{${shown.ten}}`
  const tex = unitTex(shown.unit)
  const between = tex === '' || /^(?:°(?!C)|[′″])/.test(shown.unit) ? '' : '\\,'
  return (shown.negative ? '-' : '') + shown.mantissa + power + between + tex
}

/** The same with plain spaces and a plain minus, for terminals and for files that tools read. */
export function formatPlain(value: number, unit: string, options: FormatOptions = {}): string {
  return formatQuantity(value, unit, options).replaceAll(space, ' ').replaceAll(minus, '-')
}

interface Shown {
  readonly negative: boolean
  /** With the concise uncertainty: `3.2(2)`. */
  readonly mantissa: string
  readonly ten: number
  /** With the prefix that was chosen. */
  readonly unit: string
}

function show(value: number, unit: string, { digits = 3, uncertainty = 0 }: FormatOptions): Shown {
  const spread = uncertainty > 0 ? uncertaintyDigits(uncertainty) : null
  const place = spread === null ? 0 : spread.exponent - spread.digits.length + 1
  const number = spread === null ? toSignificant(value, digits) : toPlace(value, place)
  const lead = isZero(number) && spread !== null ? spread.exponent : number.exponent
  if (isZero(number) && spread === null) return { negative: false, mantissa: '0', ten: 0, unit: unit.trim() }
  const chosen = choose(unit.trim(), lead)
  return {
    negative: number.negative,
    mantissa: mantissaOf(number, spread, chosen.shift),
    ten: chosen.ten,
    unit: chosen.unit,
  }
}

function mantissaOf(number: Digits, spread: Digits | null, shift: number): string {
  if (spread === null) return plainDecimal(number, shift)
  const place = spread.exponent - spread.digits.length + 1 - shift
  // A zero is written out to the place of the uncertainty.
  const plain = isZero(number) ? plainZero(place) : plainDecimal(number, shift)
  return `${plain}(${spread.digits}${'0'.repeat(Math.max(place, 0))})`
}

function plainZero(place: number): string {
  return place < 0 ? `0.${'0'.repeat(-place)}` : '0'
}

function isZero({ digits }: Digits): boolean {
  return /^0+$/.test(digits)
}

interface Choice {
  readonly unit: string
  /** The mantissa is the value over 10^shift. */
  readonly shift: number
  readonly ten: number
}

/** Prefix for a value whose first digit counts 10^lead of the unit. */
function choose(unit: string, lead: number): Choice {
  const first = firstSymbol(unit)
  if (first !== null) {
    const { power, own, base, rest, most } = first
    for (const [prefix, ten] of [...prefixes, ['', 0] as const]) {
      const over = lead + own * power - ten * power
      if (ten % 3 === 0 && ten <= most && over >= 0 && over < 3) {
        return { unit: prefix + base + rest, shift: (ten - own) * power, ten: 0 }
      }
    }
  }
  const plain = lead >= -2 && lead <= 3
  return plain ? { unit, shift: 0, ten: 0 } : { unit, shift: lead, ten: lead }
}

interface FirstSymbol {
  readonly base: string
  /** Power of ten of the prefix it is given with: 3 for kg. */
  readonly own: number
  readonly power: number
  readonly rest: string
  /** Largest power of ten among the prefixes that are usual for it. */
  readonly most: number
}

/** Nobody reads kiloseconds, kilokelvins or megagrams with ease. */
const usualPrefixes: ReadonlyMap<string, number> = new Map([
  ['s', 0],
  ['K', 0],
  ['g', 3],
])

/** The first symbol of a unit where a prefix may be chosen for it: it has none yet, or is the kilogram. */
function firstSymbol(unit: string): FirstSymbol | null {
  const found = /^([A-Za-zµ]*Φ₀|[A-Za-zµΩ]+)(²|³|\^[23](?![\d./]))?(?=$|[\s/·⋅*])(.*)$/su.exec(unit)
  const meaning = found === null ? null : lookUpUnit(found[1])
  if (found === null || meaning === null || !meaning.prefixable) return null
  if (meaning.prefix !== '' && found[1] !== 'kg') return null
  const raisedPower = found[2] ?? ''
  return {
    base: meaning.base,
    own: prefixes.get(meaning.prefix) ?? 0,
    power: raisedPower === '' ? 1 : /[²2]/.test(raisedPower) ? 2 : 3,
    rest: raisedPower + found[3],
    most: usualPrefixes.get(meaning.base) ?? 30,
  }
}

function raised(exponent: number): string {
  const digits = [...String(Math.abs(exponent))].map(digit => '⁰¹²³⁴⁵⁶⁷⁸⁹'[Number(digit)]).join('')
  return (exponent < 0 ? '⁻' : '') + digits
}

function join(number: string, unit: string): string {
  if (unit === '' || unit === '1') return number
  return /^(?:°(?!C)|[′″])/.test(unit) ? number + unit : number + space + unit
}

function notFinite(value: number): string {
  if (Number.isNaN(value)) return 'not a number'
  return value < 0 ? `${minus}∞` : '∞'
}
