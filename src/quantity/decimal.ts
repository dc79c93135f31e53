import { refusePiece } from './error.js'
import type { NumberNode, Span } from './tree.js'
import { factorOf, type Unit } from './unit-meaning.js'

/** Digits in brackets: in the last digits of the number, or with a point the uncertainty itself. */
export function concise(number: NumberNode, unit: Unit, text: string): number {
  if (number.bracket === null) return 0
  const decimals = number.bracket.includes('.') ? 0 : (number.digits.split('.')[1]?.length ?? 0)
  return decimal(number.bracket, number.exponent - decimals, unit, number, text)
}

export function scaled(number: NumberNode, unit: Unit, shift: number, text: string): number {
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
    throw refusePiece(span, text, `is too large a number; at most 1.7e308 in SI units is read`)
  if (tiny) throw refusePiece(span, text, 'is too small a number; at least 2.3e-308 in SI units is read, or 0')
  return value
}

/** Below it doubles lose digits, and 1e-400 is 0. */
export const smallestNormal = 2 ** -1022
