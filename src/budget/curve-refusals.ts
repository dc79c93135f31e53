import { meaningOfDensity, type DensityOf } from '../quantity/density.js'
import { describeDimension } from '../quantity/describe.js'
import { multiplyDimensions } from '../quantity/dimension.js'
import { add } from '../quantity/rational.js'
import { textOf } from './amount.js'
import { meaningsOf, type Kind, type Meaning } from './curve-meaning.js'
import { noScale, type ColumnUnit } from './curve-unit.js'
import type { Tree } from './tree.js'

/** Keys of a table that decide what its numbers mean. */
export interface MeaningKeys {
  readonly density: Tree | undefined
  readonly bandwidth: Tree | undefined
  readonly resistance: Tree | undefined
}

export interface Undecided {
  readonly unit: ColumnUnit
  readonly scale: Kind
  readonly of: DensityOf
  /** What unit and scale admit, and of it what the keys leave. */
  readonly all: readonly Meaning[]
  readonly fit: readonly Meaning[]
  readonly keys: MeaningKeys
}

/** A sentence, and the key at which it is said; null for the unit of the column. */
export interface MeaningFault {
  readonly at: Tree | null
  readonly message: string
}

/** Why unit, scale and keys leave no meaning, or more than one. */
export function noMeaning(undecided: Undecided): MeaningFault {
  const { fit, all } = undecided
  if (fit.length > 0) return openMeaning(undecided)
  return all.length > 0 ? contradiction(undecided) : wrongKind(undecided)
}

function openMeaning({ unit, fit, keys }: Undecided): MeaningFault {
  if (fit.length > 1)
    return {
      at: null,
      message: `\`${unit.text}\` does not tell amplitude from power; state \`density: amplitude\` or \`density: power\``,
    }
  const [only] = fit
  if (only?.density)
    return {
      at: keys.bandwidth ?? null,
      message: `\`${unit.text}\` is a density already; delete \`bandwidth\`, which would divide it once more`,
    }
  const [word, per] = only?.power ? ['power', 'Hz'] : ['amplitude', '√Hz']
  return {
    at: null,
    message: `\`${unit.text}\` is no density; state the \`bandwidth\` in which it was measured, or \`density: ${word}\` where the numbers are per ${per}`,
  }
}

function contradiction({ unit, all, keys }: Undecided): MeaningFault {
  const plain = all.find(({ resistance }) => resistance === 'none')
  const turned = all.find(({ resistance }) => resistance !== 'none')
  if (plain !== undefined && keys.resistance !== undefined)
    return { at: keys.resistance, message: `\`${unit.text}\` needs no \`resistance\` here; delete it` }
  if (turned !== undefined && keys.resistance === undefined) {
    const [is, wanted] = turned.resistance === 'times' ? ['a power', 'volts'] : ['a voltage', 'watts']
    const message = `\`${unit.text}\` is ${is}, but the scale is of ${wanted}; state the \`resistance\` in which it was measured, such as \`50 Ω\``
    return { at: null, message }
  }
  const stated = textOf(keys.density) ?? ''
  const is = stated === 'power' ? 'amplitude' : 'power'
  return {
    at: keys.density ?? null,
    message: `\`${unit.text}\` is a unit of ${is}, which \`density: ${stated}\` contradicts; delete it or correct the unit`,
  }
}

function wantedFor(of: DensityOf): string {
  if (of === 'quanta') return 'a number of quanta is wanted, the unit `1`'
  const { noun, examples } = meaningOfDensity(of)
  const [amplitude, power] = examples.map(example => example.replace(/^\S+ /, ''))
  return `a density of ${noun} is wanted, such as \`${amplitude}\` or \`${power}\``
}

function wrongKind({ unit, scale, of }: Undecided): MeaningFault {
  if (meaningsOf(unit, scale, of, false).length > 0)
    return {
      at: null,
      message: `\`${unit.text}\` is not per hertz${scale === noScale ? '' : ' together with the scale'}, so that a factor 2π stays open; ${wantedFor(of)}`,
    }
  if (scale !== noScale) {
    const kind = describeDimension(multiplyDimensions(unit.dimension, scale.dimension), add(unit.cycles, scale.cycles))
    return { at: null, message: `\`${unit.text}\` times the scale is ${kind}; ${wantedFor(of)}` }
  }
  const kind = describeDimension(unit.dimension, unit.cycles)
  return { at: null, message: `\`${unit.text}\` is ${kind}; ${wantedFor(of)}, or a \`scale\` from one to the other` }
}
