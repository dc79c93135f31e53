import { expect } from 'vitest'

/** A value from outside the project: what it is, the value, a relative tolerance with its reason in the file, and who says so. */
export interface Check {
  readonly quantity: string
  readonly computed: () => number
  readonly expected: number
  readonly tolerance: number
  readonly source: string
}

/** Fails with the source in the message, so that a reader knows whom the computation contradicts. */
export function agree({ computed, expected, tolerance, source }: Check): void {
  const value = computed()
  expect(Math.abs(value / expected - 1), `${value} against ${expected} [${source}]`).toBeLessThanOrEqual(tolerance)
}
