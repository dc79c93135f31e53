import type { Budget, Requirement } from './budget.js'
import type { Evaluation } from './evaluation.js'
import type { Problem } from './problem.js'

/** Standard uncertainties of a number, by the law of propagation of the GUM (JCGM 100:2008, 5.1 and 5.2), first order. */
export interface Spread {
  /** From roots whose effect is statistical, and from those whose effect is systematic; correlations within each. */
  readonly statistical: number
  readonly systematic: number
  /** Of all roots with all correlations. */
  readonly combined: number
}

/** A value at one frequency. */
export interface At {
  /** In Hz. */
  readonly frequency: number
  /** One-sided amplitude density of the total at the measurand, and its standard uncertainty. */
  readonly asd: number
  readonly asdSpread: Spread
  /** 10 log₁₀ of total over the standard quantum limit, in dB; null where there is no such limit. */
  readonly totalMargin: number | null
  readonly totalMarginSpread: Spread | null
  /** The same of the readout's added noise alone. */
  readonly addedMargin: number | null
  readonly addedMarginSpread: Spread | null
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
  readonly finalOccupancySpread: Spread | null
  /** In m; null for a free mass. */
  readonly zeroPoint: number | null
  /** 4g²/κΓ; null without a cavity. */
  readonly cooperativity: number | null
  /** (c x_zp)²/(2 S_x^imp) over 2π in Hz, one-sided imprecision at the bare frequency; null where the readout does not sense the mode. */
  readonly measurementRate: number | null
  /** Γ(n_th + ½) over 2π in Hz. */
  readonly decoherenceRate: number
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
  /** Frequency pulled by the rms motion over half the linewidth, G x_rms/(κ/2); null where it is not known. */
  readonly linearity: number | null
  /** Ports with their occupancies as they are at this pump. */
  readonly ports: readonly { readonly id: string; readonly rate: number; readonly occupancy: number }[]
}

/** The amplitude density of the total with its standard uncertainties, on the points of the evaluation. */
export interface Bands {
  readonly statistical: Float64Array
  readonly systematic: Float64Array
  readonly combined: Float64Array
}

/** What one root adds to the uncertainty of the total at the reference frequency. */
export interface RootShare {
  /** Index into the budget's roots. */
  readonly root: number
  /** ∂ ln(amplitude density)/∂ ln(root): per cent of the total for one per cent of the root; null for a root that is zero. */
  readonly elasticity: number | null
  /** |∂(amplitude density)/∂root|·u(root), in the unit of the amplitude density. */
  readonly change: number
}

/** A requirement with the number that it was held against. */
export interface RequirementResult {
  readonly requirement: Requirement
  /** What it speaks of, as its line or limit is called: `Total`, `Shot noise`, `Standard quantum limit`; null where nothing has that name. */
  readonly title: string | null
  readonly value: number
  readonly spread: Spread
  /** In Hz: where the value was taken, the worst place of a band; null for an occupancy. */
  readonly frequency: number | null
  readonly met: boolean
}

/** The pump at which the total at a frequency is least. */
export interface BestPump {
  /** Times the present pump. */
  readonly factor: number
  /** Amplitude density of the total there. */
  readonly asd: number
}

/** What a weaker or stronger pump would do at one frequency, by factors of the present pump. */
export interface PumpRange {
  /** In Hz. */
  readonly frequency: number
  /** Null where the least total lies at an end of the range looked at. */
  readonly best: BestPump | null
  /** The last stable pump; null where it is stable up to the farthest. */
  readonly stableUpTo: number | null
  readonly farthest: number
}

/** All that a report says about one budget. */
export interface Assessment {
  readonly budget: Budget
  /** On the engine's own grid over the whole band. */
  readonly evaluation: Evaluation
  /** Evaluated at the reference frequency (or the best one), not interpolated. */
  readonly atReference: Evaluation
  readonly headlines: Headlines
  /** Standard uncertainty of the total's amplitude density on the points of `evaluation`; null where only a glance was asked for. */
  readonly bands: Bands | null
  /** At the reference frequency, largest first. */
  readonly rootShares: readonly RootShare[]
  /** Standard uncertainty of each line's amplitude density at the reference, in the order of `atReference.lines`. */
  readonly lineSpreads: readonly Spread[]
  readonly requirements: readonly RequirementResult[]
  /** Variants of the budget, each assessed by itself. */
  readonly variants: readonly { readonly id: string; readonly title: string; readonly assessment: Assessment }[]
  readonly modes: readonly ModeState[]
  readonly cavities: readonly CavityState[]
  /** Null without a cavity, or where only a glance was asked for. */
  readonly pumpRange: PumpRange | null
  /** Unit of the measurand's amplitude density: `N/√Hz`. */
  readonly unit: string
  readonly warnings: readonly Problem[]
}
