import { QuantityError } from '../error.js'
import { dimensionless } from '../dimension.js'
import { parseQuantity, type Quantity } from '../parse.js'
import { rational, zero, type Rational } from '../rational.js'
import { lookUpUnit } from '../units.js'
import { isFunctionName } from './functions.js'
import type { Token } from './tokens.js'
import type { Span } from '../tree.js'
import type { ExpressionNode } from './tree.js'

/** A number, perhaps times a power of ten, and right behind it what begins a unit. */
const quantityLike =
  /^\s*[-−+]?\d+(?:\.\d+)?(?:\([\d.]+\))?(?:[eE][-−+]?\d+|\s*[×·*]\s*10(?:\^\(?[-−+]?\d+\)?|[⁻⁺]?[⁰¹²³⁴-⁹]+))?\s*(?:[A-Za-zµμΩ\u2126Å\u212bΦ°%√′″]|(?<=\s)1\s*\/)/u

/** A bare number. Throws a QuantityError where a double cannot hold it. */
export function numberNode(token: Token): ExpressionNode {
  const digits = token.text.replace('−', '-')
  const value = Number(digits)
  const collapsed = value === 0 && /[1-9]/.test(digits.split(/e/i)[0])
  if (!Number.isFinite(value) || collapsed) {
    const size = collapsed ? 'small' : 'large'
    throw new QuantityError(`\`${token.text}\` is too ${size} a number`, token.start, token.end - token.start)
  }
  const { start, end } = token
  return {
    type: 'literal',
    value,
    dimension: dimensionless,
    cycles: zero,
    exact: exactOf(digits),
    unitText: '',
    start,
    end,
  }
}

/** `0.5` is 1/2; null for what an exponent never is. */
function exactOf(digits: string): Rational | null {
  const found = /^(\d{1,6})(?:\.(\d{1,6}))?$/.exec(digits)
  if (found === null) return null
  const [, whole, decimals = ''] = found
  return rational(Number(whole + decimals), 10 ** decimals.length)
}

/** What stands in a bracket, where that is one number with a unit: `(3 kHz)`, `(0.8 aN/√Hz)`; null otherwise. */
export function bracketedQuantity(inside: string, span: Span): ExpressionNode | null {
  if (!quantityLike.test(inside)) return null
  const quantity = attempt(inside)
  if (quantity === null || quantity.unitText === '') return null
  return quantityNode(quantity, span)
}

function attempt(text: string): Quantity | null {
  try {
    return parseQuantity(text)
  } catch (error) {
    if (error instanceof QuantityError) return null
    throw error
  }
}

/** A quantity as a part of an expression. Throws a QuantityError where it is uncertain. */
function quantityNode(quantity: Quantity, { start, end }: Span): ExpressionNode {
  if (quantity.uncertainty !== 0) {
    const message = `\`${quantity.text}\` is uncertain; make it a parameter and write its name here`
    throw new QuantityError(message, start, end - start)
  }
  const { value, dimension, cycles, unitText } = quantity
  return { type: 'literal', value, dimension, cycles, exact: null, unitText, start, end }
}

/** Whether a token may be a unit right behind its number. */
export function isUnitToken(token: Token): boolean {
  if (token.type === 'sign') return /^(?:°C?|[%′″])$/.test(token.text)
  return token.type === 'name' && !isFunctionName(token.text) && lookUpUnit(token.text) !== null
}

/** `3 kHz` without brackets: one symbol, no power. Throws a QuantityError for a number and a symbol that are no quantity. */
export function plainQuantity(number: Token, unit: Token, text: string): ExpressionNode {
  const span = { start: number.start, end: unit.end }
  const written = text.slice(span.start, span.end)
  try {
    return quantityNode(parseQuantity(written), span)
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error
    throw new QuantityError(error.message, span.start, span.end - span.start)
  }
}
