/** What stands in the file for one component, as a check of its kind sees it. */
export interface Given {
  readonly id: string
  readonly kind: string
  /** True where the file states the field: a path of names, `pump.power` or `ports.front.squeezing`. */
  has(path: string): boolean
  /** Value in SI of a quantity that is stated or has a default; undefined otherwise. */
  number(path: string): number | undefined
  /** The word of a choice, a name or a key; undefined where the file leaves it out and there is no default. */
  word(path: string): string | undefined
  /** Names that the file gives in a map or in weights, in its order. */
  names(path: string): readonly string[]
}

/** What stands around a component. */
export interface Surroundings {
  /** Any component by its id. */
  component(id: string): Given | undefined
  /** Components between this one's output and the record, nearest first, the detector last. */
  readonly behind: readonly Given[]
  /** Ids of contributions that enter the given component. */
  entering(id: string): readonly string[]
}

/** One refusal: the field it speaks of (`''` is the component itself), and a sentence that ends with what would be right. */
export interface Finding {
  readonly path: string
  readonly code: string
  readonly message: string
}

/** Refusals of physics that a kind makes at the border, before anything is computed. */
export type Check = (given: Given, around: Surroundings) => readonly Finding[]
