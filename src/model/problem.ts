/** Where a value stands in a file; lines and columns count from 1. */
export interface Place {
  /** Path as a person would type it: relative to the project's root, forward slashes. */
  readonly file: string
  readonly line: number
  readonly column: number
}

/**
 * What is wrong with an input, as data. `error` stops a budget; `warning` is printed beside its results.
 * The one printed form is `file:line:column: message`; `message` names the value and ends with what would be right.
 */
export interface Problem {
  readonly severity: 'error' | 'warning'
  /** Stable short name, words joined by hyphens: `unknown-key`, `dimension`, `unstable`. */
  readonly code: string
  readonly place: Place
  readonly message: string
}

/** The same, said of a variant of a budget. */
export function ofVariant(id: string, problem: Problem): Problem {
  return { ...problem, message: `variant \`${id.slice(0, 60)}\`: ${problem.message}` }
}

/** Thrown where an input is refused; carries every problem found so far, in the order of the file. */
export class Refusal extends Error {
  constructor(readonly problems: readonly Problem[]) {
    super(problems.map(p => p.message).join('\n'))
    this.name = 'Refusal'
  }
}

/** Thrown where the engine contradicts itself: a bug of floorbook, never of the input (exit code 3). */
export class EngineFault extends Error {
  constructor(message: string) {
    super(message)
    this.name = 'EngineFault'
  }
}
