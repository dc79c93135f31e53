import type { Formula, Table } from './budget.js'
import type { Family } from './evaluation.js'
import type { Place } from './problem.js'

/** A complex number; only outside the loop over frequency. */
export interface Complex {
  readonly re: number
  readonly im: number
}

/**
 * An element of the network's matrix. Convention x(ω) = ∫x(t)e^{+iωt}dt, so d/dt → −iω.
 * oscillator: m[Ω² − ω² − iωΓ − iΩ²φ], frequency = Ω/2π in Hz, gamma = Γ in rad/s, phi = φ (structural, at ω > 0);
 * decay: κ/2 − i(Δ + ω), half = κ/2 and detuning = Δ in rad/s.
 */
export type Entry =
  | { readonly form: 'constant'; readonly value: Complex }
  | {
      readonly form: 'oscillator'
      readonly mass: number
      readonly frequency: number
      readonly gamma: number
      readonly phi: number
    }
  | { readonly form: 'decay'; readonly half: number; readonly detuning: number }

/**
 * The frequency dependence of a density, one-sided. constant: value; power: value·(f/reference)^exponent;
 * table: log–log between rows; formula: a stated expression of f, squared where it is an amplitude; viscous bath: 4ħω(n+½)·strength with strength = mΓ; structural bath: 4ħ(n+½)·strength with strength = mΩ²φ.
 */
export type Shape =
  | { readonly form: 'constant'; readonly value: number }
  | { readonly form: 'power'; readonly value: number; readonly exponent: number; readonly reference: number }
  | { readonly form: 'table'; readonly value: number; readonly table: Table }
  | { readonly form: 'formula'; readonly power: boolean; readonly formula: Formula; readonly roots: Float64Array }
  | { readonly form: 'viscous bath'; readonly strength: number; readonly temperature: number }
  | { readonly form: 'structural bath'; readonly strength: number; readonly temperature: number }

/**
 * A factor that depends on frequency: (−iω)^order · e^{iωτ} · [constant + Σ coefficient/(half − i(detuning + ω))], rates in rad/s, the
 * delay τ in s. The sum over decays is what a field meets at a cavity that only filters it.
 */
export interface Filter {
  readonly order?: -2 | -1 | 0 | 1 | 2
  readonly delay?: number
  readonly constant: Complex
  readonly decays?: readonly { readonly coefficient: Complex; readonly half: number; readonly detuning: number }[]
}

/**
 * Where a unit of something enters: into the equations of some unknowns, and straight into the record; all of it behind the filter, and times
 * the root of the shape where one source has another density at each of its nodes.
 */
export interface Injection {
  readonly rows: readonly { readonly row: number; readonly value: Complex }[]
  readonly direct: Complex
  readonly filter?: Filter
  readonly shape?: Shape
}

/** Hermitian, positive semidefinite, one row a node of the source; one-sided (2V for fields). */
export type Covariance = readonly (readonly Complex[])[]

export interface Source {
  readonly id: string
  readonly title: string
  readonly family: Family
  /** True for noise of the readout itself; such noise counts as added. */
  readonly readout: boolean
  readonly owner: string
  readonly channel: string | null
  readonly ownUnit: 'N²/Hz' | 'm²/Hz' | 'quanta'
  /** Times the shape: the own density in `ownUnit`. */
  readonly ownFactor: number
  /** Where given, it is times the root of the product of these instead. */
  readonly ownShapes?: readonly Shape[]
  /** Of a readout that states its noise: what the quantum bound says of it. */
  readonly claim?: QuantumClaim
  readonly nodes: readonly Injection[]
  /** Times the shape: the density block of the vacuum share (or of all, for a source without quanta). */
  readonly vacuum: Covariance
  /** What the occupancy adds, or null. */
  readonly heating: Covariance | null
  readonly shape: Shape
  /** Enters at fields or at the record, so that it has imprecision, back-action and correlation. */
  readonly parted: boolean
}

/** A stated pair of imprecision and back-action, held against √(S_xx S_FF)·factor ≥ ħ; the source's own density is √(S_xx S_FF)/2ħ. */
export interface QuantumClaim {
  /** √(1 − ρ′²) − |ρ″| of the correlation ρ = S_xF/√(S_xx S_FF) = ρ′ + iρ″. */
  readonly factor: number
  /** `√(S_xx S_FF)`, and what it is counted in: `ħ`. */
  readonly product: string
  readonly unit: string
  readonly remedy: string
  readonly place: Place
}

export interface Unknown {
  readonly id: string
  /** Mechanical unknowns are clamped for the imprecision part. */
  readonly nature: 'mechanical' | 'field'
  /** Of a field: the unknown that is its Hermitian conjugate. */
  readonly conjugate: number | null
}

/** A mechanical unknown with what others need to know of it. */
export interface Mode {
  readonly id: string
  readonly unknown: number
  readonly mass: number
  /** Bare, in Hz; 0 for a free mass. */
  readonly frequency: number
  /** Viscous part of the energy decay rate in rad/s, and structural loss angle. */
  readonly gamma: number
  readonly phi: number
  /** n(Ω,T) averaged over the channels by their damping at Ω; 0 for a free mass. */
  readonly thermalOccupancy: number
  /** In m; null for a free mass. */
  readonly zeroPoint: number | null
  /** Mass that the frame's acceleration moves; null where the file does not say. */
  readonly movedMass: number | null
  /** F/ḧ in kg m: force on the mode for the second derivative of a strain; absent where the file does not say. */
  readonly strainMoment?: number
}

/** The coordinate x_s = Σ c_k x_k that a cavity or a plain readout senses. */
export interface Sensing {
  /** Component that senses. */
  readonly id: string
  readonly weights: readonly { readonly mode: Mode; readonly weight: number }[]
  /** A displacement of the coordinate. */
  readonly injection: Injection
  /** Force of the light on the coordinate as a row over the fields: F = Σ value·z; null without back-action. */
  readonly light: readonly { readonly column: number; readonly value: Complex }[] | null
  /** Of a readout without fields: sources that push the coordinate, with the force on it of a unit at each of their nodes. */
  readonly push?: readonly {
    readonly source: string
    readonly force: readonly Pick<Injection, 'direct' | 'filter' | 'shape'>[]
  }[]
}

/** A cavity at its working point. */
export interface WorkingPoint {
  readonly id: string
  /** κ in rad/s. */
  readonly kappa: number
  readonly detuning: number
  /** Intracavity quanta. */
  readonly quanta: number
  /** In W. */
  readonly pumpPower: number
  /** G in rad/s/m. */
  readonly coupling: number
  readonly ports: readonly { readonly id: string; readonly rate: number; readonly occupancy: number }[]
  /** Where a refusal of this working point points to. */
  readonly place: Place
}

/** One linear network M z = inputs with a record y = readout·z + direct inputs. */
export interface Network {
  readonly unknowns: readonly Unknown[]
  readonly entries: readonly { readonly row: number; readonly column: number; readonly entry: Entry }[]
  readonly readout: readonly { readonly column: number; readonly value: Complex }[]
  readonly measurand: Injection
  readonly sources: readonly Source[]
  readonly modes: readonly Mode[]
  /** What the readout senses; null when it senses no motion that has a coordinate of its own. */
  readonly sensing: Sensing
  readonly cavities: readonly WorkingPoint[]
}
