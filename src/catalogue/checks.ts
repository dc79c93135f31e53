// Generated from the folder beside it by .ci/generate-catalogue.mjs; do not edit.
import type { Check } from './check.js'
import { check as amplifier } from './checks/amplifier.js'
import { check as cavity } from './checks/cavity.js'
import { check as resonator } from './checks/resonator.js'
import { check as rigid } from './checks/rigid.js'

/** What a kind refuses beyond the ranges of its fields; kinds without an entry refuse nothing more. */
export const checks: ReadonlyMap<string, Check> = new Map<string, Check>([
  ['amplifier', amplifier],
  ['cavity', cavity],
  ['resonator', resonator],
  ['rigid', rigid],
])
