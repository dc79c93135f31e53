import { isWindowName, windowNames, type WindowName } from '../physics/window-shapes.js'
import { noiseBandwidth } from '../physics/windows.js'
import { dimensionOf, equalDimensions } from '../quantity/dimension.js'
import { QuantityError } from '../quantity/error.js'
import type { Quantity } from '../quantity/parse.js'
import { textOf } from './amount.js'
import { suggestion } from './nearest.js'
import { quoted } from './quoted.js'
import { child, type Tree } from './tree.js'
import { useAs, type Use } from './use.js'
import type { Values } from './values.js'

const frequency = certain(useAs('frequency'))

/**
 * Noise bandwidth in Hz in which the lines of a spectrum were measured: a frequency, or window, rate of sampling and
 * number of samples, whence f_s·Σw²/(Σw)². Null where nothing stands or it is wrong, which has been said.
 */
export function readBandwidth(tree: Tree | undefined, values: Values): number | null {
  if (tree?.type !== 'map' || child(tree, 'value') !== undefined) return values.number(tree, frequency, 'positive')
  const window = windowOf(child(tree, 'window'), values)
  const rate = values.number(child(tree, 'rate'), frequency, 'positive')
  const length = Number(textOf(child(tree, 'samples')) ?? NaN)
  if (window === null || rate === null || !(Number.isInteger(length) && length >= 2)) return null
  return noiseBandwidth(window, { rate, length })
}

function windowOf(tree: Tree | undefined, { issues }: Values): WindowName | null {
  const word = textOf(tree)
  if (tree === undefined || word === null) return null
  const name = word.toLowerCase()
  if (isWindowName(name)) return name
  const other = otherNames.get(name)
  const listed = windowNames.map(each => `\`${each}\``).join(', ')
  const choice = other === undefined ? `there are ${listed}${suggestion(name, windowNames)}` : `write \`${other}\``
  issues.error('choice', tree.place, `${quoted(word)} is no window; ${choice}`)
  return null
}

/** What the windows are called elsewhere; the nearest word would be a wrong one. */
const otherNames: ReadonlyMap<string, WindowName> = new Map([
  ['hanning', 'hann'],
  ['von hann', 'hann'],
  ['boxcar', 'rectangular'],
  ['uniform', 'rectangular'],
  ['none', 'rectangular'],
  ['triangular', 'bartlett'],
  ['parabolic', 'welch'],
  ['flattop', 'flat-top'],
  ['flat top', 'flat-top'],
])

const ohm = dimensionOf({ mass: 1, length: 2, time: -3, current: -2 })

/** A resistance in Ω that turns watts into volts squared. */
export function readResistance(tree: Tree | undefined, values: Values): number | null {
  return values.number(tree, certain(asResistance), 'positive')
}

function asResistance({ value, uncertainty, dimension, text }: Quantity): ReturnType<Use> {
  if (equalDimensions(dimension, ohm)) return { value, uncertainty, dimension: 'resistance', power: false }
  throw new QuantityError(`\`${text}\` is no resistance; write one such as \`50 Ω\``, 0, text.length)
}

/** A number that is folded into the rows of a table, where an uncertainty would be lost in silence. */
function certain(use: Use): Use {
  return quantity => {
    if (quantity.uncertainty === 0) return use(quantity)
    const { text } = quantity
    throw new QuantityError(
      `\`${text}\` has an uncertainty, which would be lost here; state it with \`scale\``,
      0,
      text.length,
    )
  }
}
