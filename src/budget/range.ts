import type { QuantityField } from '../catalogue/declaration.js'

export type Range = QuantityField['range']

/** What a value must be, as a clause behind it; null where it is so. */
export function rangeFault(value: number, range: Range): string | null {
  if (range === 'positive' && !(value > 0)) return 'must be greater than 0'
  if (range === 'non-negative' && !(value >= 0)) return 'must be 0 or greater'
  if (range === 'fraction' && !(value >= 0 && value <= 1)) return 'must lie between 0 and 1'
  if (range === 'positive-fraction' && !(value > 0 && value <= 1)) return 'must be greater than 0 and at most 1'
  return null
}
