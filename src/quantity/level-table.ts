import { dimensionless, dimensionOf, type Dimension } from './dimension.js'

/** A level over a fixed reference. */
export interface LevelMeaning {
  /** In the coherent SI unit. */
  readonly reference: number
  readonly dimension: Dimension
  /** 10·log₁₀ of a power, 20·log₁₀ of an amplitude. */
  readonly perDecade: 10 | 20
}

const power = dimensionOf({ mass: 1, length: 2, time: -3 })
const voltage = dimensionOf({ mass: 1, length: 2, time: -3, current: -1 })

// IEC 60027-3; `dBc` is over the carrier's power, common practice.
const levels: ReadonlyMap<string, LevelMeaning> = new Map([
  ['dBm', { reference: 1e-3, dimension: power, perDecade: 10 }],
  ['dBW', { reference: 1, dimension: power, perDecade: 10 }],
  ['dBV', { reference: 1, dimension: voltage, perDecade: 20 }],
  ['dBmV', { reference: 1e-3, dimension: voltage, perDecade: 20 }],
  ['dBµV', { reference: 1e-6, dimension: voltage, perDecade: 20 }],
  ['dBc', { reference: 1, dimension: dimensionless, perDecade: 10 }],
])

/** A ratio of powers per hertz: `dB/Hz`. Anywhere else a decibel is a unit of its own. */
const ratio: LevelMeaning = { reference: 1, dimension: dimensionless, perDecade: 10 }

export function isLevelSymbol(symbol: string): boolean {
  return levelMeaning(symbol) !== null && symbol !== 'dB'
}

export function levelMeaning(symbol: string): LevelMeaning | null {
  if (symbol === 'dB') return ratio
  return levels.get(symbol.replace('\u03bc', '\u00b5')) ?? null
}
