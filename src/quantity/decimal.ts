import { refusePiece } from './error.js'
import type { NumberNode } from './tree.js'
import { factorOf, type Unit } from './unit-meaning.js'

/** Below it doubles lose digits, and 1e-400 is 0. */
export const smallestNormal = 2 ** -1022

/** A written number times its unit and 10^shift, in the coherent SI unit. */
export function scaled(number: NumberNode, unit: Unit, shift: number, text: string): number {
  const digits = (number.negative ? '-' : '') + number.digits
  return checked(decimal(digits, number.exponent + shift, unit), number, text)
}

/** Digits in brackets: in the last digits of the number, or with a point the uncertainty itself. */
export function concise(number: NumberNode, unit: Unit, text: string): number {
  if (number.bracket === null) return 0
  const decimals = number.bracket.includes('.') ? 0 : (number.digits.split('.')[1]?.length ?? 0)
  return checked(decimal(number.bracket, number.exponent - decimals, unit), number, text)
}

interface Decimal {
  readonly value: number
  /** The same before its unit. */
  readonly plain: number
  readonly zero: boolean
}

/** Digits · 10^exponent · unit, rounded once where the unit is a power of ten. */
function decimal(digits: string, exponent: number, unit: Unit): Decimal {
  const whole = unit.ten.denominator === 1
  const tens = exponent + (whole ? unit.ten.numerator : 0)
  return {
    value: Number(`${digits}e${tens}`) * (whole ? unit.factor : factorOf(unit)),
    plain: Number(`${digits}e${exponent}`),
    zero: !/[1-9]/.test(digits),
  }
}

function checked({ value, plain, zero }: Decimal, number: NumberNode, text: string): number {
  if (!Number.isFinite(value) || !Number.isFinite(plain)) {
    throw refusePiece(number, text, 'is too large a number; at most 1.7e308 in SI units is read')
  }
  if (!zero && Math.min(Math.abs(value), Math.abs(plain)) < smallestNormal) {
    throw refusePiece(number, text, 'is too small a number; at least 2.3e-308 in SI units is read, or 0')
  }
  return value
}
