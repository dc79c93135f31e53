import type { Points } from './points.js'

/** Groups of contributions by physical origin; colours follow it. */
export type Family =
  | 'thermal'
  | 'imprecision'
  | 'back-action'
  | 'correlation'
  | 'heating'
  | 'amplifier'
  | 'detection'
  | 'environment'
  | 'stray'

/** A power density at the measurand (unit² / Hz, one-sided) on the points of its evaluation. */
export interface Curve {
  readonly id: string
  readonly title: string
  readonly psd: Float64Array
}

/** The shares of a port's noise, each with its own two parts and their signed correlation. */
export interface Parts {
  readonly imprecision: Float64Array
  readonly backAction: Float64Array
  readonly correlation: Float64Array
}

export interface SourceCurve extends Curve {
  readonly family: Family
  /** True for noise of the readout itself (ports, losses, amplifiers, detector): it makes up the added noise. */
  readonly readout: boolean
  /** The component or contribution it belongs to, and its channel or port (`bath`, `front`, `loss`, `added`) or null. */
  readonly owner: string
  readonly channel: string | null
  /**
   * One-sided density of the source where it enters the network, before any transfer, in `ownUnit` (`N²/Hz`, `m²/Hz`, or
   * `quanta`: n + ½ of a bath, n_add of an amplifier); psd / own is the power transfer |t/R|².
   */
  readonly own: Float64Array
  readonly ownUnit: 'N²/Hz' | 'm²/Hz' | 'quanta'
  /** Of the vacuum share and of all that the occupancy adds; absent for sources at mechanical nodes. */
  readonly vacuum?: Parts
  readonly heating?: Parts
}

export interface LineCurve extends Curve {
  readonly family: Family
  /** A correlation: `psd` may be negative. */
  readonly signed: boolean
  /** Ids of sources, with the part where only a part is claimed: `cavity.front`, `cavity.front imprecision`. */
  readonly of: readonly string[]
}

export interface LimitCurve extends Curve {
  /** What the limit bounds: the readout's added noise, or the total. */
  readonly bounds: 'added' | 'total' | 'none'
  /** One sentence on what it means. */
  readonly about: string
}

/** Everything computed at a set of points; page, CSV, JSON, figure and terminal read this and nothing else. */
export interface Evaluation {
  readonly points: Points
  readonly total: Float64Array
  /** Sum of the sources of the readout. */
  readonly added: Float64Array
  readonly lines: readonly LineCurve[]
  readonly sources: readonly SourceCurve[]
  readonly limits: readonly LimitCurve[]
  /** |R|²: power response of the detector to the measurand, in quanta (or m²) at the detector per measurand². */
  readonly response: Float64Array
}
