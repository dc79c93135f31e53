import type { Place } from '../model/problem.js'

/** Where something else stands, seen from a place: `line 12` in the same file, `budgets/shared/laser.yaml:12` elsewhere. */
export function where(place: Place, from: Place): string {
  return place.file === from.file ? `line ${place.line}` : `${place.file}:${place.line}`
}
