import { isCelsius } from './celsius.js'
import { QuantityError } from './error.js'
import { parseUnitTree } from './grammar.js'
import { atLevel, levelUnit } from './level.js'
import { parseQuantity, type Quantity } from './parse.js'

/**
 * A unit that a whole column of numbers is in. A number w of it, used as some dimension or density, is
 * `toSi(w) · toDensity(unit, of).value / unit.value`, and the same with `toDeclared`.
 */
export interface Scale {
  /** What one of the unit is: ask `toDeclared` or `toDensity` of it what the column may be used as. */
  readonly unit: Quantity
  /** A number of the column in the coherent SI unit of `unit`; of a level what it is the level of. */
  readonly toSi: (written: number) => number
}

/**
 * Reads the unit of a column: `Hz`, `aN/√Hz`, `dBm/Hz`, `dBc/Hz`, `°C`; the empty text and `1` are a plain number.
 * Throws a QuantityError whose place counts from the first character that is no space.
 */
export function parseScale(text: string): Scale {
  const written = text.trim()
  if (written === '' || written === '1') return { unit: parseQuantity('1'), toSi: number => number }
  const unit = oneOf(written)
  if (unit.unitText !== written) {
    throw new QuantityError(`\`${written}\` is no unit alone; write one such as \`Hz\` or \`dBm\``, 0, written.length)
  }
  const tree = parseUnitTree(written)
  const level = levelUnit(tree, written)
  if (level !== null) return { unit, toSi: number => atLevel(level, number, 0).value }
  if (isCelsius(tree)) return { unit, toSi: number => (number * 100 + 27315) / 100 }
  return { unit, toSi: number => number * unit.unitFactor }
}

function oneOf(unit: string): Quantity {
  try {
    return parseQuantity(`1 ${unit}`)
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error
    throw new QuantityError(error.message, Math.max(0, error.offset - 2), Math.min(error.length, unit.length))
  }
}
