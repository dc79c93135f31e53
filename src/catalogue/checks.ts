// Generated from the folder beside it by .ci/generate-catalogue.mjs; do not edit.
import type { Check } from './check.js'
import { check as amplifier } from './checks/amplifier.js'
import { check as cavity } from './checks/cavity.js'
import { check as freeSpaceInterferometer } from './checks/free-space-interferometer.js'
import { check as interferometer } from './checks/interferometer.js'
import { check as linearDetector } from './checks/linear-detector.js'
import { check as resonator } from './checks/resonator.js'
import { check as rigid } from './checks/rigid.js'
import { check as transducer } from './checks/transducer.js'

/** What a kind refuses beyond the ranges of its fields; kinds without an entry refuse nothing more. */
export const checks: ReadonlyMap<string, Check> = new Map<string, Check>([
  ['amplifier', amplifier],
  ['cavity', cavity],
  ['free-space-interferometer', freeSpaceInterferometer],
  ['interferometer', interferometer],
  ['linear-detector', linearDetector],
  ['resonator', resonator],
  ['rigid', rigid],
  ['transducer', transducer],
])
