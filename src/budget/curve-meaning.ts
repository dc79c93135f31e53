import { declaredMeanings } from '../quantity/declared-meanings.js'
import { meaningOfDensity, type DensityOf } from '../quantity/density.js'
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

/** A number of quanta is a power per hertz without a unit; everything else is an amplitude in no bandwidth. */
function amplitudeOf(of: DensityOf): Kind {
  if (of === 'quanta') return { dimension: dimensionOf({ time: rational(-1, 2) }), cycles: half }
  const { dimension, counts } = declaredMeanings[meaningOfDensity(of).of]
  return { dimension, cycles: counts === 'cycles' ? one : zero }
}

const half = rational(1, 2)
const perRootHertz: Kind = { dimension: dimensionOf({ time: half }), cycles: rational(-1, 2) }
const rootOhm: Kind = {
  dimension: dimensionOf({ mass: half, length: 1, time: rational(-3, 2), current: -1 }),
  cycles: zero,
}

/** Whether a scale multiplies the power itself: quanta are counted, not squared. */
export function scalesPower(of: DensityOf): boolean {
  return of === 'quanta'
}

/**
 * Every way to read a column, times a scale, as the density of a field; a resistance is tried in both ways. With `counted`
 * false, hertz are not told from radians per second.
 */
export function meaningsOf(unit: ColumnUnit, scale: Kind, of: DensityOf, counted = true): Meaning[] {
  const transducer = scalesPower(of) ? raised(scale, half) : scale
  return everyMeaning.filter(meaning => {
    if (!meaning.power && (unit.power || (scalesPower(of) && isDimensionless(unit.dimension)))) return false
    const amplitude = raised(unit, meaning.power ? half : one)
    const turned = times(amplitude, raised(rootOhm, rational(turns[meaning.resistance])))
    const wanted = meaning.density ? times(amplitudeOf(of), perRootHertz) : amplitudeOf(of)
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
