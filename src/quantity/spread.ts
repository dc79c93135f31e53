import { equalDimensions, isDimensionless } from './dimension.js'
import { concise, scaled } from './decimal.js'
import { refusePiece, sliceOf } from './error.js'
import { equal } from './rational.js'
import type { NumberNode, QuantityNode, Span, UnitNode } from './tree.js'
import { meaningOfUnit, type Unit } from './unit-meaning.js'

/** Which unit belongs to the number, and what its uncertainty is. */
export interface Spread {
  readonly unit: UnitNode | null
  /** In the coherent unit, from the unit, the value before a factor 2π, and a power of ten outside the brackets. */
  readonly uncertainty: (unit: Unit, value: number, shift: number) => number
}

/** Decides which unit belongs to the number and what the uncertainty is. */
export function settleSpread(tree: QuantityNode, text: string): Spread {
  const { number, deviation } = tree
  if (number === null || deviation === null) {
    return { unit: tree.unit, uncertainty: unit => (number === null ? 0 : concise(number, unit, text)) }
  }
  for (const twice of [
    number.bracket === null ? null : number,
    deviation.number.bracket === null ? null : deviation.number,
  ]) {
    if (twice !== null) throw refusePiece(twice, text, 'states a second uncertainty; keep one of the two')
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
      throw refusePiece(whole, text, `may be read in two ways; ${ratioRemedy(number, deviation.number, text, unit)}`)
    if (tree.pi !== null)
      throw refusePiece(
        whole,
        text,
        `wants brackets behind a factor π; write \`(${sliceOf(number, text)} ± ${sliceOf(deviation.number, text)})${unit === null ? '' : ` ${sliceOf(unit, text)}`}\``,
      )
    if (deviation.number.spelled === 'ten' && number.spelled !== 'ten') {
      throw refusePiece(whole, text, 'wants brackets before its power of ten; write it like `(3.1 ± 0.2) × 10^-12 kg`')
    }
  }
  return { unit, uncertainty: (meaning, _value, shift) => Math.abs(scaled(deviation.number, meaning, shift, text)) }
}

function ratioRemedy(number: NumberNode, deviation: NumberNode, text: string, unit: UnitNode): string {
  const symbol = sliceOf(unit, text)
  const [a, b] = [sliceOf(number, text), sliceOf(deviation, text)]
  return `write \`(${a} ± ${b}) ${symbol}\` for both in ${symbol}, or both as plain numbers`
}

/** `5.2 MHz ± 1 %` and `5.2 MHz ± 40 kHz`. */
function unitsOfTheirOwn(tree: QuantityNode, text: string): Spread {
  const deviation = tree.deviation as { number: NumberNode; unit: UnitNode | null }
  const [unit, own] = [tree.unit as UnitNode, deviation.unit]
  const whole: Span = { start: deviation.number.start, end: own?.end ?? deviation.number.end }
  if (own === null)
    throw refusePiece(
      whole,
      text,
      `has no unit; write \`± ${sliceOf(deviation.number, text)} ${sliceOf(unit, text)}\` or a part in %`,
    )
  const [main, second] = [meaningOfUnit(unit, text), meaningOfUnit(own, text)]
  if (isRatio(own, text)) {
    if (isDimensionless(main.dimension)) {
      throw refusePiece(
        whole,
        text,
        `may be a part of the value or be added to it; ${ratioRemedy(tree.number as NumberNode, deviation.number, text, unit)}`,
      )
    }
    return { unit, uncertainty: (_unit, value) => Math.abs(value * scaled(deviation.number, second, 0, text)) }
  }
  if (!equalDimensions(main.dimension, second.dimension) || !equal(main.cycles, second.cycles)) {
    throw refusePiece(whole, text, `is of another kind than the value; write it in \`${sliceOf(unit, text)}\` or in %`)
  }
  if (tree.pi !== null)
    throw refusePiece(
      whole,
      text,
      'may stand inside or outside the factor π; write it like `2π × (3.0 ± 0.1) MHz` or in %',
    )
  return { unit, uncertainty: () => Math.abs(scaled(deviation.number, second, 0, text)) }
}

function isRatio(unit: UnitNode, text: string): boolean {
  return ['%', 'ppm', 'ppb'].includes(sliceOf(unit, text))
}
