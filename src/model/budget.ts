import type { Place } from './problem.js'

/** One number a person wrote: a named parameter, or a quantity written inline (its id is then its path). */
export interface Root {
  /** `mass`, or `cavity.pump.power`. */
  readonly id: string
  /** In the canonical unit of its declared dimension (see `quantity/declared.ts`). */
  readonly value: number
  /** Standard uncertainty in the same unit; 0 where none is stated. */
  readonly uncertainty: number
  /** What the uncertainty is the standard deviation of [JCGM 101:2008, 6.4]. */
  readonly distribution: Distribution
  /** Whether repeating the measurement would average it down. */
  readonly effect: 'statistical' | 'systematic'
  /** Name of the declared dimension it is used as: `mass`, `rate`, `frequency` … */
  readonly dimension: string
  /** The quantity as it stands in the file: `3.1(2) ng`. */
  readonly text: string
  readonly about: string | null
  /** `assumed`, a key or a note; null where the file says nothing. */
  readonly evidence: string | null
  /** ISO date of the measurement, or null. */
  readonly measured: string | null
  readonly place: Place
}

export type Distribution = 'normal' | 'rectangular' | 'triangular' | 'lognormal'

/** A parameter that the file derives from others; it has no uncertainty of its own. */
export interface Derived {
  readonly id: string
  /** As it stands in the file: `= sqrt(k/m)/(2*pi)`. */
  readonly text: string
  readonly dimension: string
  readonly formula: Formula
  readonly about: string | null
  readonly evidence: string | null
  readonly place: Place
}

/** A compiled expression of roots (and of f, where it is a density); values in, a value out, in canonical units. */
export interface Formula {
  /** Indices of the roots that it is given, in the order in which it takes them. */
  readonly roots: readonly number[]
  /** Its value; NaN is never returned: throws `Refusal` at the expression's place. */
  value(roots: Float64Array): number
  /** Its values at frequencies in Hz, into `out`; throws `Refusal` naming the first frequency where it is not finite. */
  over(roots: Float64Array, frequency: Float64Array, out: Float64Array): void
}

/** Two roots that share a cause. */
export interface Correlation {
  readonly roots: readonly [number, number]
  readonly coefficient: number
  readonly place: Place
}

/** A bound that the budget must meet. */
export interface Requirement {
  readonly id: string
  /** `total`, the id of a line, `margin.<limit>` (of the total, in dB), `occupancy.<mode>`. */
  readonly of: string
  /** In Hz; a band means its worst frequency. */
  readonly where: { readonly at: number } | { readonly from: number; readonly to: number } | null
  readonly bound: 'below' | 'above'
  /** Amplitude density of the measurand in SI, dB, or quanta. */
  readonly value: number
  /** As it stands in the file. */
  readonly text: string
  readonly about: string | null
  readonly place: Place
}

/** A named set of overrides inside a budget, resolved to a budget of its own. */
export interface Variant {
  readonly id: string
  readonly title: string
  readonly about: string | null
  readonly budget: Budget
  readonly place: Place
}

/** One entry of a BibTeX file that the budget cites, as it is printed. */
export interface Citation {
  readonly key: string
  /** Plain text in the house style. */
  readonly text: string
  /** DOI or address, or null. */
  readonly link: string | null
}

/**
 * A number that a kernel will be given: an index into the roots, or a default that a declaration states. `scale` multiplies
 * the root where one parameter is used both as a frequency (cycles) and as a rate (angular).
 */
export type Slot =
  | { readonly root: number; readonly scale?: number }
  | { readonly formula: Formula; readonly scale?: number }
  | { readonly constant: number }

/**
 * What a component or a contribution of its own was given, in the shape of its declaration's fields:
 * `quantity` → Slot, `choice`, `name`, `key` → string, `group` → Parameters, `map` → Map of Parameters, `weights` → Map of
 * Slots (names that a person chose are keys of a Map, never of an object), `density` → DensitySpec.
 * Fields that the file leaves out and that have no default are absent.
 */
export interface Parameters {
  readonly [field: string]: Slot | string | DensitySpec | ReadonlyMap<string, Parameters | Slot> | Parameters
}

/** A density as the file states it; the engine turns each into a one-sided power density. */
export type DensitySpec =
  | {
      readonly density: 'level'
      readonly level: Slot
      readonly power: boolean
      readonly exponent: Slot
      readonly reference: Slot | null
    }
  | {
      readonly density: 'table'
      readonly table: number
      /** What multiplies the table: its square, or with `power` itself, times `psd` is in canonical SI units. */
      readonly scale?: { readonly factor: Slot; readonly power: boolean }
      /** A factor of the power, 1, that carries the standard uncertainty 1/√n of a spectrum averaged n times. */
      readonly estimate?: Slot
    }
  | {
      readonly density: 'formula'
      readonly power: boolean
      readonly formula: Formula
      /** As it stands in the file: `= (2 aN/√Hz)*sqrt((1 kHz)/f)`. */
      readonly text: string
    }

/** Numbers from a file, ascending in the first column. */
export interface Table {
  readonly file: string
  readonly place: Place
  /** In Hz, strictly ascending, > 0. */
  readonly frequency: Float64Array
  /** One-sided power density, > 0, in canonical SI units unless its density has a scale that makes it so. */
  readonly psd: Float64Array
  /** Independent spectra that were averaged: the power has the relative standard uncertainty 1/√n; null where unsaid. */
  readonly averages: number | null
  /** How it goes on outside: not at all (it then covers the band), at its last value, or straight on in log–log. */
  readonly outside: 'refuse' | 'constant' | 'slope'
}

export interface ComponentSpec {
  readonly id: string
  readonly kind: string
  readonly parameters: Parameters
  readonly place: Place
  /** Places of fields by path below the component (`pump.power`), for refusals found later. */
  readonly places: ReadonlyMap<string, Place>
}

export type PartName = 'imprecision' | 'back-action' | 'heating'

/** A line of the budget: what it claims, or a source of its own. */
export interface LineSpec {
  readonly id: string
  readonly title: string | null
  readonly about: string | null
  readonly evidence: string | null
  readonly place: Place
  readonly claims:
    LineClaim | { readonly kind: string; readonly parameters: Parameters; readonly places: ReadonlyMap<string, Place> }
}

export interface LineClaim {
  /** Ids of implied noises (`cavity.front`) or of components (`cavity`: all of its noises). */
  readonly of: readonly string[]
  readonly part: PartName | null
}

export interface MeasurandSpec {
  readonly quantity: 'force' | 'acceleration' | 'displacement' | 'strain'
  /** Weights d_k of the pushed modes by component id; null: as the quantity's default says. */
  readonly weights: ReadonlyMap<string, number> | null
  /** `at: <component>`: pushes as that component senses. */
  readonly at: string | null
  readonly place: Place
}

/** A budget that passed the border: names resolved, dimensions checked, numbers in SI. */
export interface Budget {
  /** The folder's name. */
  readonly sensor: string
  readonly file: string
  readonly format: number
  readonly title: string
  readonly summary: string | null
  /** Notes on the sensor, Markdown like the summary; null where the file says nothing. */
  readonly about: string | null
  readonly revision: string
  readonly measurand: MeasurandSpec
  /** Id of the detector component whose output is y. */
  readonly readout: string
  readonly readoutPlace: Place
  /** In Hz. */
  readonly band: { readonly low: number; readonly high: number; readonly place: Place }
  /** In Hz, or null: then headlines are given at the best frequency only. */
  readonly reference: number | null
  readonly roots: readonly Root[]
  readonly derived: readonly Derived[]
  readonly correlations: readonly Correlation[]
  readonly requirements: readonly Requirement[]
  readonly variants: readonly Variant[]
  readonly citations: readonly Citation[]
  readonly tables: readonly Table[]
  /** In the order of the file. */
  readonly components: readonly ComponentSpec[]
  readonly lines: readonly LineSpec[]
  readonly warnings: readonly import('./problem.js').Problem[]
}
