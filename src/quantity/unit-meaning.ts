import { dimensionless, dimensionOf, multiplyDimensions, raiseDimension, type Dimension } from './dimension.js'
import { QuantityError, refusePiece } from './error.js'
import { readExponent } from './exponent.js'
import { add, multiply, negate, one, rational, toNumber, toText, zero, type Rational } from './rational.js'
import type { PowerNode, Span, TermNode, UnitNode } from './tree.js'
import { isLevelSymbol } from './level-table.js'
import { suggestUnits } from './suggest.js'
import { lookUpUnit } from './units.js'

/** A product of units: 1 of it is factor · 10^ten of the coherent SI unit. */
export interface Unit {
  readonly factor: number
  /** The decimal part is kept apart, so that `0.8 aN` is the double nearest to 8e-19. */
  readonly ten: Rational
  readonly dimension: Dimension
  readonly cycles: Rational
  /** Radians that it carries: 1 for `rad` and `°`, 2 for `rad²/Hz`. */
  readonly angle: Rational
}

export const unity: Unit = { factor: 1, ten: zero, dimension: dimensionless, cycles: zero, angle: zero }

const half = rational(1, 2)

/** Gives a parsed unit its meaning; `text` is what the places in the tree refer to. */
export function meaningOfUnit(node: UnitNode, text: string): Unit {
  try {
    const unit = product(node, text)
    const factor = factorOf(unit)
    if (Number.isFinite(factor) && factor >= 2 ** -1022) return unit
    throw refusePiece(node, text, 'is beyond the numbers that are read; write a smaller power or another prefix')
  } catch (error) {
    if (!(error instanceof RangeError)) throw error
    throw refusePiece(node, text, 'has an exponent beyond exact reckoning; write a simpler unit')
  }
}

/** The whole factor to the coherent SI unit as one number. */
export function factorOf(unit: Unit): number {
  return unit.factor * 10 ** toNumber(unit.ten)
}

function product(node: UnitNode, text: string): Unit {
  let divided = node.slash
  const head = meaningOfTerm(node.head, text)
  let result = node.slash ? raise(head, negate(one)) : head
  for (const { operator, term } of node.tail) {
    if (operator === '*' && divided) throw ambiguous(node, term, text)
    divided ||= operator === '/'
    const factor = meaningOfTerm(term, text)
    result = times(result, operator === '/' ? raise(factor, negate(one)) : factor)
  }
  return result
}

function ambiguous(node: UnitNode, term: TermNode, text: string): QuantityError {
  const [written, behind] = [text.slice(node.start, node.end), text.slice(term.start, term.end)]
  const before = text.slice(node.start, term.start).replace(/[\s·⋅∙×*]+$/u, '')
  const slash = before.lastIndexOf('/')
  const inside = `${before.slice(0, slash)}/(${before.slice(slash + 1)} ${behind})`
  const outside = slash <= 0 ? `${behind}${before}` : `${before.slice(0, slash)} ${behind}${before.slice(slash)}`
  return new QuantityError(
    `\`${written}\` may be read in two ways, as a product stands behind a division; write \`${inside}\` or \`${outside}\``,
    node.start,
    node.end - node.start,
  )
}

function meaningOfTerm(node: TermNode, text: string): Unit {
  switch (node.type) {
    case 'one':
      return unity
    case 'root':
      return raise(meaningOfTerm(node.of, text), half)
    case 'group': {
      const inner = product(node.unit, text)
      const exponent = node.power === null ? one : meaningOfPower(node.power, text)
      return raise(inner, node.root ? multiply(exponent, half) : exponent)
    }
    case 'symbol':
      return raise(
        meaningOfSymbol(node.symbol, node, text),
        node.power === null ? one : meaningOfPower(node.power, text),
      )
  }
}

function meaningOfSymbol(symbol: string, span: Span, text: string): Unit {
  const unit = lookUpUnit(symbol)
  if (unit !== null) {
    const { factor, ten, dimension, cycles, angle } = unit
    return { factor, ten: rational(ten), dimension, cycles, angle }
  }
  // Within a larger unit a degree Celsius is a difference: `3 mV/°C`.
  if (symbol === '°C') return { ...unity, dimension: kelvin }
  throw refusePiece({ start: span.start, end: span.start + symbol.length }, text, remedyFor(symbol))
}

const kelvin = dimensionOf({ temperature: 1 })

/** What to write for a symbol that is none, going on behind it. */
function remedyFor(symbol: string): string {
  if (symbol === '°F') return 'has a zero point of its own; write the temperature in `K` or `°C`'
  if (isLevelSymbol(symbol)) {
    return `stands first in its unit, right behind its number, such as \`-60 ${symbol}\``
  }
  if (symbol === 'sqrt') return 'wants brackets; write `sqrt(Hz)` or `√Hz`'
  if (symbol === 'e') return 'is no unit, as it would be read as a power of ten; the elementary charge is written `qe`'
  if (symbol === 'ppt') return 'means 1e-12 to some and 1e-3 to others; write the number itself'
  const swing = /(?:rms|pk|pp)$/.exec(symbol)?.[0]
  if (swing !== undefined) {
    return `is not a known unit; \`${swing}\` stands right behind the unit of an oscillation, such as \`mV ${swing}\` or \`nm ${swing}\``
  }
  const suggestion = suggestUnits(symbol)
  return suggestion === null
    ? 'is not a known unit; write SI units, such as `ng` or `aN/√Hz`'
    : `is not a known unit; write ${suggestion}`
}

function meaningOfPower(node: PowerNode, text: string): Rational {
  const exponent = readExponent(node.sign, node.over, node.under)
  if (exponent !== null) return exponent
  throw refusePiece(
    node,
    text,
    'is no exponent that is read; write a small whole number or a fraction, such as `^2` or `^(-1/2)`',
  )
}

function times(a: Unit, b: Unit): Unit {
  return {
    factor: a.factor * b.factor,
    ten: add(a.ten, b.ten),
    dimension: multiplyDimensions(a.dimension, b.dimension),
    cycles: add(a.cycles, b.cycles),
    angle: add(a.angle, b.angle),
  }
}

function raise(a: Unit, power: Rational): Unit {
  if (toText(power) === '1') return a
  return {
    factor: a.factor === 1 ? 1 : a.factor ** toNumber(power),
    ten: multiply(a.ten, power),
    dimension: raiseDimension(a.dimension, power),
    cycles: multiply(a.cycles, power),
    angle: multiply(a.angle, power),
  }
}
