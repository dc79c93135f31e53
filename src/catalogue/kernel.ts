import type { Complex, Injection, Mode, Sensing, Source, Entry, WorkingPoint } from '../model/network.js'
import type { Place } from '../model/problem.js'

/** One component or contribution with its values, as a kernel sees it. */
export interface Instance<Values> {
  readonly id: string
  readonly title: string
  readonly values: Values
  /** Place of a field (`pump.power`), or of the component when the field has none. */
  place(path?: string): Place
}

/** What leaves a port: whoever reads it asks with the weights (u, v) of a_out and a_out†. */
export interface Output {
  /** Component that turned motion into this field. */
  senses(): string
  /** Phase ψ of the mean carrier in rad, or null where no carrier leaves. */
  carrier(): number | null
  /** Frequency of the carrier in Hz, at which baths on the way count their quanta. */
  frequency(): number
  /** True behind an amplifier whose gain is so large that no noise behind it matters. */
  amplified(): boolean
  /** Adds u·a_out + v·a_out† to the record, with all noise on the way. */
  read(u: Complex, v: Complex): void
}

/** The network while it is built. Kernels are called in the order mechanical, field, chain, detector, noise; what is read is looked up when it is read. */
export interface Assembly {
  /** A new mechanical unknown. */
  displacement(id: string): number
  /** A new field a and its conjugate a†. */
  field(id: string): readonly [number, number]
  stamp(row: number, column: number, entry: Entry): void
  source(source: Source): void
  mode(mode: Mode): void
  modeOf(id: string): Mode
  sensing(sensing: Sensing): void
  sensingOf(id: string): Sensing
  workingPoint(point: WorkingPoint): void
  output(id: string, output: Output): void
  outputOf(id: string): Output
  /** Adds value·z[column] to the record. */
  record(column: number, value: Complex): void
  /** Adds an input of the record itself to the nodes of an already known source. */
  direct(source: string, node: number, value: Complex): void
  /** True for the component whose record is y. */
  isReadout(id: string): boolean
  /** The weights (u, v) with which the detector reads its input; set by the detector, used by detector noise. */
  detector: { u: Complex; v: Complex } | null
  /** Names the sensing component behind a detector. */
  reads(id: string): void
}

export type Stage = 'mechanical' | 'field' | 'chain' | 'detector' | 'noise'

/** The numerical face of a kind: puts unknowns, equations and sources into the network. */
export interface Kernel<Values = never> {
  /** When it is called: what it refers to at once must be there already. */
  readonly stage: Stage
  /** Puts a mode of its own into the network, before any field asks for modes. */
  move?(instance: Instance<Values>, net: Assembly): void
  assemble(instance: Instance<Values>, net: Assembly): void
}

export const noDirect: Complex = { re: 0, im: 0 }

/** An injection into one row. */
export function into(row: number, value: Complex): Injection {
  return { rows: [{ row, value }], direct: noDirect }
}
