import type { Slot } from '../model/budget.js'
import type { DensityOf } from '../quantity/density.js'
import { QuantityError } from '../quantity/error.js'
import { textOf } from './amount.js'
import { readBandwidth, readResistance } from './curve-bandwidth.js'
import { meaningsOf, type Kind, type Meaning } from './curve-meaning.js'
import { noMeaning } from './curve-refusals.js'
import { noScale, readColumnUnit, type ColumnUnit } from './curve-unit.js'
import { child, placeWithin, type Tree } from './tree.js'
import type { Values } from './values.js'

/** How a number of the column becomes a one-sided power density. */
export interface CurveReading {
  readonly unit: ColumnUnit
  /** Of power; an amplitude is squared. */
  readonly power: boolean
  /** Of the power, from the way in which the instrument counts. */
  readonly factor: number
  /** Of the transducer, left to the engine: it may be uncertain and shared. */
  readonly scale: Slot | null
}

/** Where a table stands: what the field takes, and the path that names its roots. */
export interface CurveSpot {
  readonly of: DensityOf
  readonly path: string
  readonly values: Values
}

/** The one-sided power density of a number in a cell, before the transducer's scale; in the unit's own dimension per hertz. */
export function powerDensity(x: number, { unit, power, factor }: CurveReading): number {
  const level = unit.level ? 10 ** (x / (power ? 10 : 20)) : x
  const value = level * unit.factor
  return (power ? value : value * value) * factor
}

/** Reads what the numbers of the second column mean; null where that is wrong or open, which has been said. */
export function readReading(table: Tree, spot: CurveSpot): CurveReading | null {
  const unitTree = secondUnit(table)
  const unit = unitTree === null ? null : columnUnit(unitTree, spot)
  const scaleTree = child(table, 'scale')
  const scale = scaleTree === undefined ? { kind: noScale, slot: null } : readScale(scaleTree, spot)
  if (unitTree === null || unit === null || scale === null) return null
  if (refusesValues(child(table, 'values'), unit, spot.values)) return null
  const meaning = choose(unit, scale.kind, { table, spot, unitTree })
  const factor = meaning === null ? null : factorOf(meaning, table, spot.values)
  return meaning === null || factor === null ? null : { unit, power: meaning.power, factor, scale: scale.slot }
}

function secondUnit(table: Tree): Tree | null {
  const units = child(table, 'units')
  return units?.type === 'list' ? (units.items[1] ?? null) : null
}

function columnUnit(tree: Tree, { of, values }: CurveSpot): ColumnUnit | null {
  const text = textOf(tree)
  if (tree.type !== 'scalar' || text === null) return null
  try {
    return readColumnUnit(text, of)
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error
    values.issues.error('quantity', placeWithin(tree, error.offset), error.message)
    return null
  }
}

function readScale(tree: Tree, { values, path }: CurveSpot): { readonly kind: Kind; readonly slot: Slot } | null {
  let kind: Kind = noScale
  const given = values.read(
    tree,
    ({ value, uncertainty, dimension, cycles }) => {
      kind = { dimension, cycles }
      return { value, uncertainty, dimension: 'scale', power: false }
    },
    { path: `${path}.scale`, range: 'positive' },
  )
  return given === null ? null : { kind, slot: given.slot }
}

/** `values` beside a unit that leaves nothing to say: of power, or `V pk`. */
function refusesValues(tree: Tree | undefined, unit: ColumnUnit, { issues }: Values): boolean {
  if (tree === undefined) return false
  const told = /(?:rms|pk|pp)(?![A-Za-z])/.exec(unit.text)?.[0]
  if (told === undefined && !(unit.power && textOf(tree) === 'peak')) return false
  const reason = told === undefined ? 'is a power, which has no peak value' : `says \`${told}\` already`
  issues.error('table-meaning', tree.place, `\`${unit.text}\` ${reason}; delete \`values\``)
  return true
}

interface Chosen {
  readonly table: Tree
  readonly spot: CurveSpot
  readonly unitTree: Tree
}

/** The one meaning that unit, scale and the stated keys leave. */
function choose(unit: ColumnUnit, scale: Kind, { table, spot, unitTree }: Chosen): Meaning | null {
  const keys = {
    density: child(table, 'density'),
    bandwidth: child(table, 'bandwidth'),
    resistance: child(table, 'resistance'),
  }
  const stated = textOf(keys.density)
  const all = meaningsOf(unit, scale, spot.of)
  const fit = all.filter(
    ({ power, resistance }) =>
      (resistance === 'none') === (keys.resistance === undefined) &&
      (stated === null || power === (stated === 'power')),
  )
  const [first] = fit
  const inBand = keys.bandwidth !== undefined
  if (first !== undefined && fit.length === 1 && (first.density ? !inBand : inBand || stated !== null)) return first
  const { at, message } = noMeaning({ unit, scale, of: spot.of, all, fit, keys })
  spot.values.issues.error('table-meaning', (at ?? unitTree).place, message)
  return null
}

/** What the way of counting does to the power: peak, two-sided, a bandwidth, a resistance. */
function factorOf(meaning: Meaning, table: Tree, values: Values): number | null {
  const bandwidthTree = child(table, 'bandwidth')
  const bandwidth = bandwidthTree === undefined ? 1 : readBandwidth(bandwidthTree, values)
  const resistanceTree = child(table, 'resistance')
  const resistance = resistanceTree === undefined ? 1 : readResistance(resistanceTree, values)
  if (bandwidth === null || resistance === null) return null
  // An instrument that shows peak values shows √2 times the rms of a sine at every frequency.
  const peak = textOf(child(table, 'values')) === 'peak' ? 0.5 : 1
  // A two-sided density is half of the one-sided one at each of the two frequencies.
  const sides = textOf(child(table, 'sides')) === 'two' ? 2 : 1
  return (peak * sides * (meaning.resistance === 'over' ? 1 / resistance : resistance)) / bandwidth
}
