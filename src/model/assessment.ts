import type { Budget } from './budget.js'
import type { Evaluation } from './evaluation.js'
import type { Problem } from './problem.js'

/** A value at one frequency. */
export interface At {
  /** In Hz. */
  readonly frequency: number
  /** One-sided amplitude density of the total at the measurand. */
  readonly asd: number
  /** 10 log₁₀ of total over the standard quantum limit, in dB; null where there is no such limit. */
  readonly totalMargin: number | null
  /** The same of the readout's added noise alone. */
  readonly addedMargin: number | null
  /** Ids of lines with their share of the total power, largest first; signed lines included. */
  readonly shares: readonly { readonly line: string; readonly share: number }[]
}

/** A stretch of the band in which one line is the largest. */
export interface Dominance {
  readonly line: string
  /** In Hz. */
  readonly from: number
  readonly to: number
  /** Least and greatest share of the total power within the stretch. */
  readonly least: number
  readonly greatest: number
}

export interface Headlines {
  /** The least total in the band. */
  readonly best: At
  /** At the file's reference frequency, or null. */
  readonly reference: At | null
  /** Around the best frequency, where the total's power is at most twice the best, in Hz. */
  readonly halfPowerBand: { readonly from: number; readonly to: number }
  readonly dominance: readonly Dominance[]
}

/** A mode at the working point. */
export interface ModeState {
  readonly id: string
  /** Bare and effective frequency in Hz; effective energy decay rate over 2π in Hz. */
  readonly frequency: number
  readonly effectiveFrequency: number
  readonly linewidth: number
  readonly effectiveLinewidth: number
  /** Of the bath, n(Ω, T) averaged over the loss channels by their damping. */
  readonly thermalOccupancy: number
  /** With the light on; null where it is not computed. */
  readonly finalOccupancy: number | null
  /** In m; null for a free mass. */
  readonly zeroPoint: number | null
  /** 4g²/κΓ; null without a cavity. */
  readonly cooperativity: number | null
}

export interface CavityState {
  readonly id: string
  /** κ/2π in Hz. */
  readonly linewidth: number
  readonly quanta: number
  /** In W. */
  readonly pumpPower: number
  /** Δ/2π in Hz. */
  readonly detuning: number
  /** Ports with their occupancies as they are at this pump. */
  readonly ports: readonly { readonly id: string; readonly rate: number; readonly occupancy: number }[]
}

/** All that a report says about one budget. */
export interface Assessment {
  readonly budget: Budget
  /** On the engine's own grid over the whole band. */
  readonly evaluation: Evaluation
  /** Evaluated at the reference frequency (or the best one), not interpolated. */
  readonly atReference: Evaluation
  readonly headlines: Headlines
  readonly modes: readonly ModeState[]
  readonly cavities: readonly CavityState[]
  /** Unit of the measurand's amplitude density: `N/√Hz`. */
  readonly unit: string
  readonly warnings: readonly Problem[]
}
