// Generated from the folder beside it by .ci/generate-catalogue.mjs; do not edit.
import type { Check } from './check.js'

/** What a kind refuses beyond the ranges of its fields; kinds without an entry refuse nothing more. */
export const checks: ReadonlyMap<string, Check> = new Map<string, Check>([])
