/** A value as it will stand in the file, or a group of them; the shape follows the declaration's fields. */
export type StarterValue = string | { readonly [field: string]: StarterValue }

/** A component or a contribution of its own: `kind` and the fields that the first draft states. */
export interface StarterEntry {
  /** A remark above it; without one the catalogue's title stands there. */
  readonly note?: string
  readonly kind: string
  readonly fields: { readonly [field: string]: StarterValue }
}

/** A line that gathers noises of components. */
export interface StarterClaim {
  readonly title: string
  readonly of: string
  readonly part?: string
}

/** The first budget of a family of sensors; every number of it is assumed. */
export interface Starter {
  /** The word behind `--like`. */
  readonly name: string
  /** What it is, for a list of starters: `a membrane in an optical cavity, read by homodyne detection`. */
  readonly about: string
  readonly title: string
  readonly measurand: string
  readonly readout: string
  readonly band: string
  readonly reference: string
  readonly components: { readonly [id: string]: StarterEntry }
  readonly contributions: { readonly [id: string]: StarterClaim | StarterEntry }
}
