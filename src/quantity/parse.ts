import { checkCharacters } from './characters.js'
import { equalDimensions, isDimensionless, dimensionOf, type Dimension } from './dimension.js'
import { QuantityError } from './error.js'
import { GrammarError, parseQuantityTree, parseUnitTree } from './grammar.js'
import { add, equal, negate, one, type Rational } from './rational.js'
import { checkSlips } from './slips.js'
import type { NumberNode, QuantityNode, Span, UnitNode } from './tree.js'
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
  /** What one of the written unit is in the coherent SI unit. */
  readonly unitFactor: number
}

/** A quantity is at most this long, in UTF-16 units. */
export const longestQuantity = 200

/**
 * Reads a quantity: `3.1(2) ng`, `5.2 MHz ± 1 %`, `2π × 3 MHz`, `3e-16 m/Hz^(1/2)`.
 * Digits in brackets count in the last digits of the number, or are the uncertainty itself when they hold a point
 * (JCGM 100:2008, 7.2.2). Hz carries one cycle and π carries cycle⁻¹.
 * Throws a QuantityError that names the piece and what would be right.
 */
export function parseQuantity(text: string): Quantity {
  checkText(text)
  const level = readPowerLevel(text)
  if (level !== null) return level
  return meaningOfQuantity(readTree(text, parseQuantityTree), text)
}

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
  const symbol = /[A-Za-zµμΩÅ°]+$/.exec(before)?.[0]
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
  const spread = settleDeviation(tree, text)
  const unit = spread.unit === null ? unity : meaningOfUnit(spread.unit, text)
  const scale = tree.pi === null ? 1 : Number(tree.pi.digits) * Math.PI * (tree.pi.negative ? -1 : 1)
  const shift = tree.ten?.power ?? 0
  const value = tree.number === null ? scale * factorOf(unit) : scale * scaled(tree.number, unit, shift, text)
  return {
    value: value + 0,
    uncertainty: Math.abs(scale) * spread.uncertainty(unit, value / scale, shift),
    dimension: unit.dimension,
    cycles: tree.pi === null ? unit.cycles : add(unit.cycles, negate(one)),
    text: text.trim(),
    unitText: spread.unit === null ? '' : text.slice(spread.unit.start, spread.unit.end),
    unitFactor: factorOf(unit),
  }
}

interface Spread {
  readonly unit: UnitNode | null
  /** In the coherent unit, from the unit, the value before a factor 2π, and a power of ten outside the brackets. */
  readonly uncertainty: (unit: Unit, value: number, shift: number) => number
}

/** Decides which unit belongs to the number and what the uncertainty is. */
function settleDeviation(tree: QuantityNode, text: string): Spread {
  const { number, deviation } = tree
  if (number === null || deviation === null) {
    return { unit: tree.unit, uncertainty: unit => (number === null ? 0 : concise(number, unit, text)) }
  }
  for (const twice of [
    number.bracket === null ? null : number,
    deviation.number.bracket === null ? null : deviation.number,
  ]) {
    if (twice !== null) throw refuse(twice, text, 'states a second uncertainty; keep one of the two')
  }
  if (tree.bracketed || tree.unit === null) return sharedUnit(tree, text)
  return unitsOfTheirOwn(tree, text)
}

/** `3.1 ± 0.2 ng` and `(3.1 ± 0.2) ng`. */
function sharedUnit(tree: QuantityNode, text: string): Spread {
  const [number, deviation] = [
    tree.number as NumberNode,
    tree.deviation as { number: NumberNode; unit: UnitNode | null },
  ]
  const unit = tree.bracketed ? tree.unit : deviation.unit
  if (!tree.bracketed) {
    const whole: Span = { start: number.start, end: unit?.end ?? deviation.number.end }
    if (unit !== null && isRatio(unit, text))
      throw refuse(whole, text, `may be read in two ways; ${ratioRemedy(number, deviation.number, text, unit)}`)
    if (tree.pi !== null)
      throw refuse(
        whole,
        text,
        `wants brackets behind a factor π; write \`(${slice(number, text)} ± ${slice(deviation.number, text)})\``,
      )
    if (deviation.number.spelled === 'ten' && number.spelled !== 'ten') {
      throw refuse(whole, text, 'wants brackets before its power of ten; write it like `(3.1 ± 0.2) × 10^-12 kg`')
    }
  }
  return { unit, uncertainty: (meaning, _value, shift) => Math.abs(scaled(deviation.number, meaning, shift, text)) }
}

function ratioRemedy(number: NumberNode, deviation: NumberNode, text: string, unit: UnitNode): string {
  const symbol = slice(unit, text)
  const [a, b] = [slice(number, text), slice(deviation, text)]
  return `write \`(${a} ± ${b}) ${symbol}\` for both in ${symbol}, or both as plain numbers`
}

/** `5.2 MHz ± 1 %` and `5.2 MHz ± 40 kHz`. */
function unitsOfTheirOwn(tree: QuantityNode, text: string): Spread {
  const deviation = tree.deviation as { number: NumberNode; unit: UnitNode | null }
  const [unit, own] = [tree.unit as UnitNode, deviation.unit]
  const whole: Span = { start: deviation.number.start, end: own?.end ?? deviation.number.end }
  if (own === null)
    throw refuse(
      whole,
      text,
      `has no unit; write \`± ${slice(deviation.number, text)} ${slice(unit, text)}\` or a part in %`,
    )
  const [main, second] = [meaningOfUnit(unit, text), meaningOfUnit(own, text)]
  if (isRatio(own, text)) {
    if (isDimensionless(main.dimension)) {
      throw refuse(
        whole,
        text,
        `may be a part of the value or be added to it; ${ratioRemedy(tree.number as NumberNode, deviation.number, text, unit)}`,
      )
    }
    return { unit, uncertainty: (_unit, value) => Math.abs(value * scaled(deviation.number, second, 0, text)) }
  }
  if (!equalDimensions(main.dimension, second.dimension) || !equal(main.cycles, second.cycles)) {
    throw refuse(whole, text, `is of another kind than the value; write it in \`${slice(unit, text)}\` or in %`)
  }
  if (tree.pi !== null)
    throw refuse(whole, text, 'may stand inside or outside the factor π; write it like `2π × (3.0 ± 0.1) MHz` or in %')
  return { unit, uncertainty: () => Math.abs(scaled(deviation.number, second, 0, text)) }
}

function isRatio(unit: UnitNode, text: string): boolean {
  return ['%', '‰', 'ppm', 'ppb'].includes(slice(unit, text))
}

/** Digits in brackets: in the last digits of the number, or with a point the uncertainty itself. */
function concise(number: NumberNode, unit: Unit, text: string): number {
  if (number.bracket === null) return 0
  const decimals = number.bracket.includes('.') ? 0 : (number.digits.split('.')[1]?.length ?? 0)
  return decimal(number.bracket, number.exponent - decimals, unit, number, text)
}

function scaled(number: NumberNode, unit: Unit, shift: number, text: string): number {
  return decimal((number.negative ? '-' : '') + number.digits, number.exponent + shift, unit, number, text)
}

/** Digits · 10^exponent · unit, rounded once where the unit is a power of ten. */
function decimal(digits: string, exponent: number, unit: Unit, span: Span, text: string): number {
  const whole = unit.ten.denominator === 1
  const tens = exponent + (whole ? unit.ten.numerator : 0)
  const value = Number(`${digits}e${tens}`) * (whole ? unit.factor : factorOf(unit))
  const plain = Number(`${digits}e${exponent}`)
  const written = /[1-9]/.test(digits)
  const tiny = written && [value, plain].some(each => Math.abs(each) < smallestNormal)
  if (!Number.isFinite(value) || !Number.isFinite(plain))
    throw refuse(span, text, `is too large a number; at most 1.7e308 in SI units is read`)
  if (tiny) throw refuse(span, text, 'is too small a number; at least 2.3e-308 in SI units is read, or 0')
  return value
}

/** Below it doubles lose digits, and 1e-400 is 0. */
const smallestNormal = 2 ** -1022

/** `-60 dBm` is a power: 1 mW · 10^(L/10). */
function readPowerLevel(text: string): Quantity | null {
  const found = /^(.*\d\)?)\s*dBm\s*$/su.exec(text)
  if (found === null) return null
  const level = meaningOfQuantity(readTree(found[1], parseQuantityTree), found[1])
  if (level.unitText !== '' || level.cycles.numerator !== 0) return null
  const value = 1e-3 * 10 ** (level.value / 10)
  if (!Number.isFinite(value) || value < smallestNormal) {
    throw new QuantityError(
      `\`${text.trim()}\` is beyond the numbers that are read; write a power such as \`-60 dBm\``,
      0,
      text.length,
    )
  }
  return {
    ...level,
    value,
    uncertainty: ((value * Math.LN10) / 10) * level.uncertainty,
    dimension: dimensionOf({ mass: 1, length: 2, time: -3 }),
    text: text.trim(),
    unitText: 'dBm',
    unitFactor: 1e-3,
  }
}

function slice(span: Span, text: string): string {
  return text.slice(span.start, span.end)
}

function refuse(span: Span, text: string, remedy: string): QuantityError {
  return new QuantityError(`\`${slice(span, text)}\` ${remedy}`, span.start, span.end - span.start)
}
