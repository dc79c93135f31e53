import type { Family } from '../model/evaluation.js'

/**
 * What a field of a kind may hold. The JSON schema, the reader of budget files, the equation cards and the catalogue
 * pages are all derived from these literals; kernels only import their types.
 */
export type Field =
  QuantityField | ChoiceField | NameField | NamesField | MapField | GroupField | WeightsField | DensityField

interface Common {
  /** One line, lower case, no full stop: `effective mass for unit amplitude at the reference point`. */
  readonly meaning: string
  readonly required?: true
}

export interface QuantityField extends Common {
  readonly type: 'quantity'
  /** Name in `quantity/declared.ts`. */
  readonly dimension: string
  /** TeX of its symbol in the kind's equations. */
  readonly symbol?: string
  readonly range: 'positive' | 'non-negative' | 'any' | 'fraction' | 'positive-fraction'
  /** As a person would write it; the reader parses it like any other quantity. */
  readonly default?: string
}

export interface ChoiceField extends Common {
  readonly type: 'choice'
  readonly options: readonly string[]
  readonly default?: string
}

/**
 * Names a component by what it can do, or a port of one (`cavity.back`, or a chain component). `mode`: a mechanical mode,
 * which can be pushed; `sensing`: a component with `weights`, whose coordinate can be shifted; `recorder`: a detector of light.
 */
export interface NameField extends Common {
  readonly type: 'name'
  readonly of: 'port' | 'mode' | 'sensing' | 'recorder'
}

/** Names a key of a sibling map field: `pump.port` is a key of `ports`. */
export interface NamesField extends Common {
  readonly type: 'key'
  /** Path of the map field from the component: `ports`. */
  readonly of: string
}

/** A map of names that the writer chooses to groups of fields. */
export interface MapField extends Common {
  readonly type: 'map'
  readonly fields: Fields
  readonly exclusive?: readonly Exclusive[]
}

export interface GroupField extends Common {
  readonly type: 'group'
  readonly fields: Fields
  readonly exclusive?: readonly Exclusive[]
  /** When set, a bare quantity may stand for the group and means this one field: `occupancy: 0.1`. */
  readonly shorthand?: string
}

/** A map of mechanical components to dimensionless weights. */
export interface WeightsField extends Common {
  readonly type: 'weights'
}

/**
 * A one-sided spectral density: a level (`2 aN/√Hz`, white), a power law (`density`, `exponent`, `reference`) or a
 * `table`; the unit tells amplitude (X/√Hz) from power (X²/Hz). `exponent` is that of the power density. A field that is
 * itself named `density` spreads these keys over the kind; under any other name they are a group, for which a bare
 * quantity may stand. `quanta` is a plain number and always a power.
 */
export interface DensityField extends Common {
  readonly type: 'density'
  readonly of: 'force' | 'length' | 'voltage' | 'current' | 'quanta'
}

export type Fields = { readonly [name: string]: Field }

/** Of these keys of one group: exactly one must be given, or at most one may be. */
export interface Exclusive {
  readonly keys: readonly string[]
  readonly need: 'exactly one' | 'at most one'
}

/** A noise that a component brings by itself; a line of the budget claims it as `<component>.<channel>`. */
export interface ImpliedNoise {
  /** `added`; with `each`, the channel's name where the file does not give that map. */
  readonly channel: string
  /** A map field: one channel for each of its names. */
  readonly each?: string
  /** Whether a line may claim `imprecision`, `back-action` or `heating` of it alone. */
  readonly parts: boolean
}

export interface Declaration {
  /** The word after `kind:`. */
  readonly kind: string
  readonly role: 'component' | 'contribution'
  readonly title: string
  /** Two or three sentences for the catalogue. */
  readonly summary: string
  /** `mechanical`: may carry weights and be pushed; `field`: has ports; `chain`: reads a port or a chain element; `detector`: may be the readout. */
  readonly nature: 'mechanical' | 'field' | 'chain' | 'detector' | 'noise'
  /** Brings a mechanical mode of its own, which answers to the component's id. */
  readonly moves?: true
  /** Where a noise of its own enters, for contributions. */
  readonly family?: Family
  readonly fields: Fields
  readonly exclusive?: readonly Exclusive[]
  /** Noises of a component, none where left out. */
  readonly noises?: readonly ImpliedNoise[]
  /** Display equations in TeX. */
  readonly equations: readonly { readonly name: string; readonly tex: string }[]
  /** Symbols of the equations that are not fields: TeX → meaning. */
  readonly symbols: { readonly [tex: string]: string }
  /** Keys of `catalogue/references.ts`. */
  readonly references: readonly string[]
  /** Where the formula holds, in a sentence. */
  readonly validity: string
}
