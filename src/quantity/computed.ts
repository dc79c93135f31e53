import type { ValueKind } from './expression/value-kind.js'
import type { Quantity } from './parse.js'
import { zero } from './rational.js'

/**
 * The result of an expression as a quantity, for `toDeclared` and `toDensity`; `text` is the expression, which the
 * errors name.
 */
export function computedQuantity(text: string, kind: ValueKind, value: number, uncertainty = 0): Quantity {
  return {
    value,
    uncertainty,
    dimension: kind.dimension,
    cycles: kind.cycles,
    text: text.trim(),
    unitText: '',
    unitFactor: 1,
    angle: zero,
    level: null,
    difference: value,
    computed: true,
  }
}
