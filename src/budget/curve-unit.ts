import { dimensionless, type Dimension } from '../quantity/dimension.js'
import type { DensityOf } from '../quantity/density.js'
import { QuantityError } from '../quantity/error.js'
import { levelMeaning } from '../quantity/level-table.js'
import { parseQuantity, parseUnit } from '../quantity/parse.js'
import { zero, type Rational } from '../quantity/rational.js'
import { factorOf } from '../quantity/unit-meaning.js'

/** What the numbers of a column count in. */
export interface ColumnUnit {
  /** As written. */
  readonly text: string
  /** One of the unit in the coherent SI unit; of a level, what 0 dB is. */
  readonly factor: number
  readonly dimension: Dimension
  readonly cycles: Rational
  /** The numbers are levels: 10 log₁₀ of powers, 20 log₁₀ of amplitudes. */
  readonly level: boolean
  /** Where the unit itself says that it is one of power: `dBm`, `dBc/Hz`. */
  readonly power: boolean
}

/** Levels of powers; what 0 dB of them is, the quantities know. */
const powers: ReadonlySet<string> = new Set(['dBm', 'dBW', 'dBc', 'dB'])

/** Reads `V/√Hz`, `V²/Hz`, `dBm`, `dBV/√Hz`, `dBc/Hz`, `dB(m²/Hz)`. Throws a QuantityError. */
export function readColumnUnit(text: string, of: DensityOf): ColumnUnit {
  const bracket = /^dB ?\((.+)\)$/su.exec(text)
  if (bracket !== null) return { ...linear(bracket[1] ?? '', text.indexOf('(') + 1), level: true, text }
  if (text === 'dB') return { ...linear('', 0), level: true, power: true, text }
  return text.startsWith('dB') ? levelOf(text, of) : { ...linear(text, 0), text }
}

function linear(text: string, offset: number): Omit<ColumnUnit, 'text'> {
  const unit = shifted(offset, () => parseUnit(text))
  const { dimension, cycles } = unit
  return { factor: factorOf(unit), dimension, cycles, level: false, power: false }
}

/**
 * The phase noise 𝓛(f) of one sideband in dBc/Hz is half the one-sided density of the phase, S_φ = 2𝓛 in rad²/Hz
 * [IEEE Std 1139-2008, from memory]. Relative intensity in dB/Hz, or dBc/Hz where a field takes that, is the one-sided
 * S_P/P² itself: common practice, no source.
 */
function levelOf(text: string, of: DensityOf): ColumnUnit {
  const symbol = /^dB\p{L}*/u.exec(text)?.[0] ?? ''
  if (levelMeaning(symbol) === null) {
    const message = `\`${symbol}\` is no level; there are \`dBm\`, \`dBW\`, \`dBV\`, \`dBmV\`, \`dBµV\`, \`dBc\`, \`dB\`, and \`dB(V²/Hz)\` over any unit`
    throw new QuantityError(message, 0, symbol.length)
  }
  const { value, dimension, cycles, level } = shifted(-2, () => parseQuantity(`0 ${text}`))
  const sidebands = level === 'dBc' && of !== 'relative-intensity' ? 2 : 1
  return { text, factor: sidebands * value, dimension, cycles, level: true, power: powers.has(level ?? '') }
}

/** Places of errors count in the whole text. */
function shifted<Result>(offset: number, work: () => Result): Result {
  try {
    return work()
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error
    throw new QuantityError(error.message, Math.max(0, error.offset + offset), error.length)
  }
}

/** The number 1: what stands where no scale is given. */
export const noScale = { dimension: dimensionless, cycles: zero }
