import type { DensityField } from '../catalogue/declaration.js'
import {
  dimensionOf,
  equalDimensions,
  isDimensionless,
  multiplyDimensions,
  raiseDimension,
  type Dimension,
} from '../quantity/dimension.js'
import { add, equal, multiply, one, rational, zero, type Rational } from '../quantity/rational.js'
import type { ColumnUnit } from './curve-unit.js'

/** One way to read the numbers of a column. */
export interface Meaning {
  /** Of power, to be counted once; an amplitude is squared. */
  readonly power: boolean
  /** Per hertz (or per root hertz); else in the bandwidth of the measurement. */
  readonly density: boolean
  /** What the resistance does to a power: volts squared from watts, or watts from volts squared. */
  readonly resistance: 'none' | 'times' | 'over'
}

/** A dimension with the cycles that it carries. */
export interface Kind {
  readonly dimension: Dimension
  readonly cycles: Rational
}

type Of = DensityField['of']

/** What a field takes: its amplitude in no bandwidth. */
const amplitudes: Readonly<Record<Of, Kind>> = {
  force: { dimension: dimensionOf({ mass: 1, length: 1, time: -2 }), cycles: zero },
  length: { dimension: dimensionOf({ length: 1 }), cycles: zero },
  // A number of quanta is a power per hertz without a unit.
  quanta: { dimension: dimensionOf({ time: rational(-1, 2) }), cycles: rational(1, 2) },
}

const half = rational(1, 2)
const perRootHertz: Kind = { dimension: dimensionOf({ time: half }), cycles: rational(-1, 2) }
const rootOhm: Kind = {
  dimension: dimensionOf({ mass: half, length: 1, time: rational(-3, 2), current: -1 }),
  cycles: zero,
}

/** Whether a scale multiplies the power itself: quanta are counted, not squared. */
export function scalesPower(of: Of): boolean {
  return of === 'quanta'
}

/**
 * Every way to read a column, times a scale, as the density of a field; a resistance is tried in both ways. With `counted`
 * false, hertz are not told from radians per second.
 */
export function meaningsOf(unit: ColumnUnit, scale: Kind, of: Of, counted = true): Meaning[] {
  const transducer = scalesPower(of) ? raised(scale, half) : scale
  return everyMeaning.filter(meaning => {
    if (!meaning.power && (unit.power || (scalesPower(of) && isDimensionless(unit.dimension)))) return false
    const amplitude = raised(unit, meaning.power ? half : one)
    const turned = times(amplitude, raised(rootOhm, rational(turns[meaning.resistance])))
    const wanted = meaning.density ? times(amplitudes[of], perRootHertz) : amplitudes[of]
    return same(times(turned, transducer), wanted, counted && !scalesPower(of))
  })
}

const turns = { none: 0, times: 1, over: -1 } as const

const everyMeaning: readonly Meaning[] = [true, false].flatMap(power =>
  [true, false].flatMap(density =>
    (['none', 'times', 'over'] as const).map(resistance => ({ power, density, resistance })),
  ),
)

function same(a: Kind, b: Kind, counted: boolean): boolean {
  return equalDimensions(a.dimension, b.dimension) && (!counted || equal(a.cycles, b.cycles))
}

function times(a: Kind, b: Kind): Kind {
  return { dimension: multiplyDimensions(a.dimension, b.dimension), cycles: add(a.cycles, b.cycles) }
}

function raised(a: Kind, power: Rational): Kind {
  return { dimension: raiseDimension(a.dimension, power), cycles: multiply(a.cycles, power) }
}
