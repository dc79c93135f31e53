import type { Root } from '../model/budget.js'
import { canonicalUnit, isDeclaredName } from '../quantity/declared.js'
import { numberText } from './numbers.js'

const densityUnits: ReadonlyMap<string, string> = new Map([
  ['force-amplitude-density', 'N/√Hz'],
  ['force-power-density', 'N²/Hz'],
  ['length-amplitude-density', 'm/√Hz'],
  ['length-power-density', 'm²/Hz'],
  ['voltage-amplitude-density', 'V/√Hz'],
  ['voltage-power-density', 'V²/Hz'],
  ['current-amplitude-density', 'A/√Hz'],
  ['current-power-density', 'A²/Hz'],
])

/** A root's value in the canonical unit of its dimension, without prefix: `3.1 × 10⁻¹² kg`. */
export function siText({ value, dimension }: Pick<Root, 'value' | 'dimension'>): string {
  return withUnit(numberText(value, 6), dimension)
}

/** Its standard uncertainty in the same unit; empty where none is stated. */
export function siUncertaintyText({ uncertainty, dimension }: Root): string {
  return uncertainty > 0 ? withUnit(numberText(uncertainty, 2), dimension) : ''
}

function withUnit(number: string, dimension: string): string {
  const unit = isDeclaredName(dimension) ? canonicalUnit(dimension) : (densityUnits.get(dimension) ?? '')
  return unit === '' ? number : `${number}\u00a0${unit}`
}
