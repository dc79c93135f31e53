import { baseUnitText, dimensionOf, equalDimensions, type Dimension } from './dimension.js'
import { equal, rational, toText, zero, type Rational } from './rational.js'

interface Known {
  readonly phrase: string
  readonly dimension: Dimension
  /** Only where it has this many cycles; any number of cycles where it is left out. */
  readonly cycles?: Rational
}

const half = rational(-1, 2)
const perRootHertz = { cycles: half }
const perHertz = { cycles: rational(-1) }

const known: readonly Known[] = [
  // Before the time and the energy of the same dimension.
  { phrase: 'a ratio of powers per hertz', dimension: dimensionOf({ time: 1 }), ...perHertz },
  { phrase: 'a power per hertz', dimension: dimensionOf({ mass: 1, length: 2, time: -2 }), ...perHertz },
  { phrase: 'a plain number', dimension: dimensionOf({}) },
  { phrase: 'a length', dimension: dimensionOf({ length: 1 }) },
  { phrase: 'an area', dimension: dimensionOf({ length: 2 }) },
  { phrase: 'a volume', dimension: dimensionOf({ length: 3 }) },
  { phrase: 'a mass', dimension: dimensionOf({ mass: 1 }) },
  { phrase: 'a time', dimension: dimensionOf({ time: 1 }) },
  { phrase: 'a frequency', dimension: dimensionOf({ time: -1 }), cycles: rational(1) },
  { phrase: 'a rate', dimension: dimensionOf({ time: -1 }), cycles: zero },
  { phrase: 'a temperature', dimension: dimensionOf({ temperature: 1 }) },
  { phrase: 'a speed', dimension: dimensionOf({ length: 1, time: -1 }) },
  { phrase: 'an acceleration', dimension: dimensionOf({ length: 1, time: -2 }) },
  { phrase: 'a force', dimension: dimensionOf({ mass: 1, length: 1, time: -2 }) },
  { phrase: 'a spring constant', dimension: dimensionOf({ mass: 1, time: -2 }) },
  { phrase: 'an energy', dimension: dimensionOf({ mass: 1, length: 2, time: -2 }) },
  { phrase: 'a power', dimension: dimensionOf({ mass: 1, length: 2, time: -3 }) },
  { phrase: 'a pressure', dimension: dimensionOf({ mass: 1, length: -1, time: -2 }) },
  { phrase: 'a mass density', dimension: dimensionOf({ mass: 1, length: -3 }) },
  { phrase: 'an action', dimension: dimensionOf({ mass: 1, length: 2, time: -1 }) },
  { phrase: 'a level in dB', dimension: dimensionOf({ level: 1 }) },
  { phrase: 'a current', dimension: dimensionOf({ current: 1 }) },
  { phrase: 'a voltage', dimension: dimensionOf({ mass: 1, length: 2, time: -3, current: -1 }) },
  { phrase: 'a resistance', dimension: dimensionOf({ mass: 1, length: 2, time: -3, current: -2 }) },
  { phrase: 'a charge', dimension: dimensionOf({ current: 1, time: 1 }) },
  { phrase: 'a conductance', dimension: dimensionOf({ mass: -1, length: -2, time: 3, current: 2 }) },
  { phrase: 'a capacitance', dimension: dimensionOf({ mass: -1, length: -2, time: 4, current: 2 }) },
  { phrase: 'an inductance', dimension: dimensionOf({ mass: 1, length: 2, time: -2, current: -2 }) },
  { phrase: 'a magnetic flux', dimension: dimensionOf({ mass: 1, length: 2, time: -2, current: -1 }) },
  { phrase: 'a magnetic field', dimension: dimensionOf({ mass: 1, time: -2, current: -1 }) },
  { phrase: 'a moment of inertia', dimension: dimensionOf({ mass: 1, length: 2 }) },
  { phrase: 'a viscosity', dimension: dimensionOf({ mass: 1, length: -1, time: -1 }) },
  {
    phrase: 'an amplitude density of voltage',
    dimension: dimensionOf({ mass: 1, length: 2, time: rational(-5, 2), current: -1 }),
    ...perRootHertz,
  },
  {
    phrase: 'a power density of voltage',
    dimension: dimensionOf({ mass: 2, length: 4, time: -5, current: -2 }),
    ...perHertz,
  },
  {
    phrase: 'an amplitude density of current',
    dimension: dimensionOf({ current: 1, time: rational(1, 2) }),
    ...perRootHertz,
  },
  { phrase: 'a power density of current', dimension: dimensionOf({ current: 2, time: 1 }), ...perHertz },
  { phrase: 'a frequency shift per length', dimension: dimensionOf({ time: -1, length: -1 }) },
  {
    phrase: 'an amplitude density of force',
    dimension: dimensionOf({ mass: 1, length: 1, time: rational(-3, 2) }),
    ...perRootHertz,
  },
  { phrase: 'a power density of force', dimension: dimensionOf({ mass: 2, length: 2, time: -3 }), ...perHertz },
  {
    phrase: 'an amplitude density of displacement',
    dimension: dimensionOf({ length: 1, time: rational(1, 2) }),
    ...perRootHertz,
  },
  { phrase: 'a power density of displacement', dimension: dimensionOf({ length: 2, time: 1 }), ...perHertz },
  {
    phrase: 'an amplitude density of acceleration',
    dimension: dimensionOf({ length: 1, time: rational(-3, 2) }),
    ...perRootHertz,
  },
  { phrase: 'a power density of acceleration', dimension: dimensionOf({ length: 2, time: -3 }), ...perHertz },
  { phrase: 'a mass per root hertz', dimension: dimensionOf({ mass: 1, time: rational(1, 2) }), ...perRootHertz },
]

/** A phrase with its article for any dimension: `a mass`, `an amplitude density of force`, `a quantity in kg m^-4`. */
export function describeDimension(dimension: Dimension, cycles: Rational = zero): string {
  const named = known.find(
    each => equalDimensions(each.dimension, dimension) && (each.cycles === undefined || equal(each.cycles, cycles)),
  )
  if (named !== undefined) return named.phrase
  const tag = cycles.numerator === 0 ? '' : ` with cycle^(${toText(cycles)})`
  return `a quantity in ${baseUnitText(dimension)}${tag}`
}
