import { concise, scaled } from './decimal.js'
import { QuantityError, refusePiece, sliceOf } from './error.js'
import type { QuantityNode, UnitNode } from './tree.js'
import { unity } from './unit-meaning.js'

/** Whether a unit is the degree Celsius by itself; within a larger unit it is a kelvin. */
export function isCelsius(node: UnitNode): boolean {
  const { head, slash, tail } = node
  return !slash && tail.length === 0 && head.type === 'symbol' && head.symbol === '°C' && head.power === null
}

export interface CelsiusValue {
  /** In kelvin, above absolute zero. */
  readonly value: number
  readonly uncertainty: number
  /** The number itself: a difference of so many kelvins. */
  readonly difference: number
}

/** Reads `20 °C`, `20.0(5) °C`, `20 °C ± 0.5 K`; an uncertainty is a difference. Throws a QuantityError. */
export function readCelsius(tree: QuantityNode, text: string): CelsiusValue {
  const whole = { start: 0, end: text.length }
  if (tree.pi !== null || tree.number === null) {
    throw refusePiece(whole, text, 'has a factor π, which a temperature cannot have; write its number, such as `20 °C`')
  }
  const shift = tree.ten?.power ?? 0
  const difference = scaled(tree.number, unity, shift, text)
  // In hundredths, so that 20 °C is the double nearest to 293.15.
  const value = (scaled(tree.number, unity, shift + 2, text) + 27315) / 100
  if (value < 0 || !Number.isFinite(value)) {
    throw new QuantityError(
      `\`${text.trim()}\` lies below absolute zero, −273.15 °C, or beyond all numbers`,
      0,
      text.length,
    )
  }
  return { value, uncertainty: celsiusSpread(tree, shift, text), difference }
}

function celsiusSpread(tree: QuantityNode, shift: number, text: string): number {
  const { number, deviation, unit } = tree
  if (number === null) return 0
  if (deviation === null) return concise(number, unity, text)
  const own = deviation.unit === null ? null : sliceOf(deviation.unit, text)
  const fits = tree.bracketed || unit === null || own === '°C' || own === 'K'
  if (!fits) {
    throw refusePiece(
      deviation.number,
      text,
      `is the uncertainty of a temperature; write \`± ${sliceOf(deviation.number, text)} K\``,
    )
  }
  for (const twice of [number, deviation.number]) {
    if (twice.bracket !== null) throw refusePiece(twice, text, 'states a second uncertainty; keep one of the two')
  }
  return Math.abs(scaled(deviation.number, unity, shift, text))
}
