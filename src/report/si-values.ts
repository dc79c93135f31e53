import type { Root } from '../model/budget.js'

export function siText(value: number, _dimension: string): string {
  return String(value)
}
export function siUncertaintyText(root: Root): string {
  return String(root.uncertainty)
}
