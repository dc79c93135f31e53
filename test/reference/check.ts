/** A value from outside the project: what it is, the value, a relative tolerance with its reason in the file, and who says so. */
export interface Check {
  readonly quantity: string
  readonly computed: () => number
  readonly expected: number
  readonly tolerance: number
  readonly source: string
}

/** Relative deviation of the computed from the expected value; NaN, which no tolerance admits, where either is no number. */
export function deviation({ computed, expected }: Check): number {
  return Math.abs(computed() / expected - 1)
}
