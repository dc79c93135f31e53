import { remembered } from './remembered.js'
import { checkCharacters } from './characters.js'
import { isCelsius, readCelsius } from './celsius.js'
import { scaled } from './decimal.js'
import { dimensionOf, type Dimension } from './dimension.js'
import { QuantityError, sliceOf } from './error.js'
import { GrammarError, parseQuantityTree, parseUnitTree } from './grammar.js'
import { levelUnit, readLevel } from './level.js'
import { add, negate, one, zero, type Rational } from './rational.js'
import { checkSlips } from './slips.js'
import { settleSpread } from './spread.js'
import type { QuantityNode } from './tree.js'
import { factorOf, meaningOfUnit, unity, type Unit } from './unit-meaning.js'

/** A number with its unit as a person wrote it. */
export interface Quantity {
  /** In the coherent SI unit; hertz stand as cycles per second. */
  readonly value: number
  /** Standard uncertainty, absolute and in the same unit; 0 where none is written. */
  readonly uncertainty: number
  readonly dimension: Dimension
  /** 1 for `3 MHz`, 0 for `2π × 3 MHz` and `rad/s`, −1/2 for `aN/√Hz`. */
  readonly cycles: Rational
  /** As written, without surrounding spaces. */
  readonly text: string
  /** `aN/√Hz`; empty for a bare number. */
  readonly unitText: string
  /** What one of the written unit is in the coherent SI unit; of a level, what it is at 0. */
  readonly unitFactor: number
  /** Radians that it carries: 1 for `90°`, 2 for `rad²/Hz`. */
  readonly angle: Rational
  /** The symbol of the level that it was written in: `dBm`, `dBc` of `dBc/Hz`; null elsewhere. */
  readonly level: string | null
  /** The value where a difference is meant: 20 for `20 °C`, whose value is 293.15; the value itself elsewhere. */
  readonly difference: number
  /** True for the result of an expression, whose unit nobody wrote. */
  readonly computed?: true
}

/** A quantity is at most this long, in UTF-16 units. */
export const longestQuantity = 200

/**
 * Reads a quantity: `3.1(2) ng`, `5.2 MHz ± 1 %`, `2π × 3 MHz`, `3e-16 m/Hz^(1/2)`.
 * Digits in brackets count in the last digits of the number, or are the uncertainty itself when they hold a point
 * (JCGM 100:2008, 7.2.2). Hz carries one cycle and π carries cycle⁻¹. A level becomes what it is the level of:
 * `-60 dBm` is 1 nW, `-150 dBm/Hz` in W/Hz, `-120 dBV/√Hz` 1 µV/√Hz, `-120 dBc/Hz` and `dB/Hz` 1e-12 1/Hz; a bare `dB`
 * stays a level. `20 °C` is 293.15 K, and its `difference` 20 K. `V pk` is 1/√2 of `V rms`, which is `V`.
 * Throws a QuantityError that names the piece and what would be right.
 */
export const parseQuantity: (text: string) => Quantity = remembered(text => {
  checkText(text)
  return meaningOfQuantity(readTree(text, parseQuantityTree), text)
})

/** Reads a unit alone: `aN/√Hz`; the empty text and `1` are the number 1. Places count from the first character that is no space. */
export function parseUnit(text: string): Unit {
  if (text.trim() === '' || text.trim() === '1') return unity
  checkText(text)
  const trimmed = text.trim()
  return meaningOfUnit(readTree(trimmed, parseUnitTree), trimmed)
}

function checkText(text: string): void {
  if (text.length > longestQuantity) {
    const message = `a quantity of ${text.length} characters is too long; at most ${longestQuantity} are read`
    throw new QuantityError(message, longestQuantity, text.length - longestQuantity)
  }
  if (text.trim() === '')
    throw new QuantityError('nothing stands here; write a quantity, such as `3.1(2) ng`', 0, text.length)
  checkCharacters(text)
  checkSlips(text)
}

function readTree<Tree>(text: string, parse: (text: string) => Tree): Tree {
  try {
    return parse(text)
  } catch (error) {
    if (!(error instanceof GrammarError)) throw error
    throw unreadable(text, error.location.start.offset)
  }
}

function unreadable(text: string, offset: number): QuantityError {
  const rest = text.slice(offset)
  const piece = /^\s*\S+/.exec(rest)?.[0] ?? ''
  const before = text.slice(0, offset)
  const symbol = /[A-Za-zµμΩ\u2126Å°]+$/.exec(before)?.[0]
  const exponent = /^[-−]?\d+/.exec(rest)?.[0]
  if (symbol !== undefined && exponent !== undefined) {
    const message = `\`${symbol}${exponent}\`: an exponent needs its sign of power; write \`${symbol}^${exponent.replace('−', '-')}\``
    return new QuantityError(message, offset - symbol.length, symbol.length + exponent.length)
  }
  if (piece === '') {
    return new QuantityError(
      `\`${text.trim()}\` ends too early; write a quantity like \`3.1(2) ng\` or \`0.8 aN/√Hz\``,
      0,
      text.length,
    )
  }
  const message = `\`${piece.trim()}\` is not understood here; write a quantity like \`3.1(2) ng\`, \`5.2 MHz ± 1 %\` or \`0.8 aN/√Hz\``
  return new QuantityError(message, offset, piece.length)
}

function meaningOfQuantity(tree: QuantityNode, text: string): Quantity {
  const node = tree.unit ?? tree.deviation?.unit ?? null
  const level = node === null ? null : levelUnit(node, text)
  if (node !== null && level !== null) {
    const { symbol, reference, dimension, cycles } = level
    const { value, uncertainty } = readLevel(tree, level, text)
    const unit = { dimension, cycles, angle: zero, unitText: sliceOf(node, text), unitFactor: reference }
    return { value, uncertainty, ...unit, text: text.trim(), level: symbol, difference: value }
  }
  if (node !== null && isCelsius(node)) {
    const unit = { dimension: kelvin, cycles: zero, angle: zero, unitText: sliceOf(node, text), unitFactor: 1 }
    return { ...readCelsius(tree, text), ...unit, text: text.trim(), level: null }
  }
  return linear(tree, text)
}

const kelvin = dimensionOf({ temperature: 1 })

function linear(tree: QuantityNode, text: string): Quantity {
  const spread = settleSpread(tree, text)
  const unit = spread.unit === null ? unity : meaningOfUnit(spread.unit, text)
  const shift = tree.ten?.power ?? 0
  const number = tree.number === null ? factorOf(unit) : scaled(tree.number, unit, shift, text)
  const scale = tree.pi === null ? 1 : Number(tree.pi.digits) * Math.PI * (tree.pi.negative ? -1 : 1)
  // Adding zero turns −0 into 0.
  const value = scale * number + 0
  const uncertainty = Math.abs(scale) * spread.uncertainty(unit, number, shift)
  checkRange(value, uncertainty, text)
  return {
    value,
    uncertainty,
    dimension: unit.dimension,
    cycles: tree.pi === null ? unit.cycles : add(unit.cycles, negate(one)),
    text: text.trim(),
    unitText: spread.unit === null ? '' : sliceOf(spread.unit, text),
    unitFactor: factorOf(unit),
    angle: unit.angle,
    level: null,
    difference: value,
  }
}

function checkRange(value: number, uncertainty: number, text: string): void {
  if (Number.isFinite(value) && Number.isFinite(uncertainty)) return
  throw new QuantityError(`\`${text.trim()}\` is beyond the numbers that are read, 1.7e308 in SI units`, 0, text.length)
}
