import type { Budget } from '../model/budget.js'
import type { Evaluation, Parts } from '../model/evaluation.js'
import type { Network, Source } from '../model/network.js'
import type { Points } from '../model/points.js'
import { adjoint, transfer, type Adjoint } from './adjoint.js'
import { Arena } from './arena.js'
import type { Form } from './form.js'
import { gridArrays } from './grid-arrays.js'
import { planLimits, type LimitPlan } from './limits.js'
import { planLines, type LinePlan } from './lines.js'
import type { Real } from './real.js'
import { copyOut } from './registers.js'
import { SourceDensities, type RealParts } from './source-densities.js'
import { Tape } from './tape.js'

/** What to compute besides the total and the lines. */
export interface Wanted {
  readonly sources: boolean
  readonly limits: boolean
}

/** Makes one curve after a run: addresses of registers are turned into arrays in the order in which they were planned. */
class Harvest {
  readonly addresses: number[] = []
  #next = 0
  #arrays: Float64Array[] = []

  constructor(readonly tape: Tape) {}

  plan(...terms: Real[]): void {
    this.addresses.push(this.tape.written(terms))
  }

  /** √ of the sum, shared where sums differ by a factor alone. */
  planRoot(terms: readonly Real[]): void {
    this.addresses.push(this.tape.written([this.tape.root(this.tape.sum(terms))]))
  }

  planParts({ imprecision, backAction, correlation }: RealParts): void {
    for (const part of [imprecision, backAction, correlation]) this.plan(part)
  }

  run(points: Points, arena: Arena): void {
    const grid = gridArrays(points)
    this.#arrays = this.addresses.map(() => arena.take(grid.length))
    this.#next = 0
    this.tape.run(grid, block => {
      for (const [i, array] of this.#arrays.entries()) copyOut(this.addresses[i], block, array)
    })
  }

  take(): Float64Array {
    return this.#arrays[this.#next++]
  }

  takeParts(): Parts {
    return { imprecision: this.take(), backAction: this.take(), correlation: this.take() }
  }
}

/** What the sources of a network give on a tape, referred to the measurand. */
interface Referred {
  readonly rows: Adjoint
  readonly response: Form
  readonly inverseResponse: Real
  readonly densities: ReadonlyMap<Source, SourceDensities>
}

function refer(tape: Tape, network: Network): Referred {
  const rows = adjoint(tape, network)
  const response = transfer(tape, rows.full, network.measurand, true)
  const inverseResponse = tape.inverseAbs2(response)
  const densities = new Map(network.sources.map(s => [s, new SourceDensities(tape, s, rows, inverseResponse)]))
  return { rows, response, inverseResponse, densities }
}

const termsOf = ({ pieces }: LinePlan, densities: Referred['densities']): Real[] =>
  pieces.flatMap(({ source, piece }) => densities.get(source)!.piece(piece))

/** The power density of the total alone, unit²/Hz, at given points: what a search or an integral looks at. */
export function totalDensity(network: Network, points: Points): Float64Array {
  const harvest = new Harvest(new Tape())
  const { densities } = refer(harvest.tape, network)
  harvest.plan(...[...densities.values()].map(d => d.all()))
  harvest.run(points, new Arena())
  return harvest.take()
}

/** Amplitude densities alone, of the total and of the lines, in unit/√Hz: what a sweep over many values of the roots looks at. */
export class Amplitudes {
  readonly #harvest = new Harvest(new Tape())
  readonly #lines: number

  constructor(budget: Pick<Budget, 'lines'>, network: Network) {
    const { densities } = refer(this.#harvest.tape, network)
    const lines = planLines(budget, network)
    this.#lines = lines.length
    this.#harvest.planRoot([...densities.values()].map(d => d.all()))
    for (const line of lines) this.#harvest.planRoot(termsOf(line, densities))
  }

  /** The total first, then the lines in their order, NaN where a signed one is negative; an arena's arrays are overwritten. */
  at(points: Points, arena = new Arena()): Float64Array[] {
    arena.reset()
    this.#harvest.run(points, arena)
    return Array.from({ length: 1 + this.#lines }, () => this.#harvest.take())
  }
}

/**
 * The engine's primitive, prepared for one network: `at(points)` gives all curves there. Power densities, one-sided, at the
 * measurand (unit²/Hz): every source's density is t S t†/|R|², with t and R from one adjoint solution at each point.
 */
export class Evaluator {
  readonly #harvest: Harvest
  readonly #sources: readonly Source[]
  readonly #lines: readonly LinePlan[]
  readonly #limits: readonly LimitPlan[]

  constructor(budget: Pick<Budget, 'lines'>, network: Network, wanted: Wanted) {
    const tape = new Tape()
    const { rows, response, inverseResponse, densities: all } = refer(tape, network)
    this.#harvest = new Harvest(tape)
    this.#sources = wanted.sources ? network.sources : []
    this.#lines = planLines(budget, network)
    this.#limits = wanted.limits ? planLimits(tape, network, rows, inverseResponse) : []
    this.#harvest.plan(...[...all.values()].map(d => d.all()))
    this.#harvest.plan(...[...all.values()].filter(d => d.source.readout).map(d => d.all()))
    for (const line of this.#lines) this.#harvest.plan(...termsOf(line, all))
    for (const source of this.#sources) this.#planSource(all.get(source)!)
    for (const limit of this.#limits) this.#harvest.plan(limit.psd)
    this.#harvest.plan(tape.abs2(response))
  }

  #planSource(densities: SourceDensities): void {
    const { parted, vacuum, heating } = densities.source
    this.#harvest.plan(densities.all())
    this.#harvest.plan(densities.own())
    if (parted) this.#harvest.planParts(densities.parts(vacuum))
    if (heating !== null) this.#harvest.planParts(densities.parts(heating))
  }

  /** With an arena, the curves of the evaluation before are overwritten. */
  at(points: Points, arena = new Arena()): Evaluation {
    const h = this.#harvest
    arena.reset()
    h.run(points, arena)
    return {
      points,
      total: h.take(),
      added: h.take(),
      lines: this.#lines.map(({ pieces, ...line }) => ({
        ...line,
        of: pieces.map(({ source, piece }) => (piece === 'all' ? source.id : `${source.id} ${piece}`)),
        psd: h.take(),
      })),
      sources: this.#sources.map(({ id, title, family, readout, owner, channel, ownUnit, parted, heating }) => ({
        id,
        title,
        family,
        readout,
        owner,
        channel,
        ownUnit,
        psd: h.take(),
        own: h.take(),
        ...(parted && { vacuum: h.takeParts() }),
        ...(heating !== null && { heating: h.takeParts() }),
      })),
      limits: this.#limits.map(({ psd: _, ...limit }) => ({ ...limit, psd: h.take() })),
      response: h.take(),
    }
  }
}

/** All curves of a network on the given points, once. */
export function evaluateAt(
  budget: Pick<Budget, 'lines'>,
  network: Network,
  points: Points,
  wanted: Wanted,
): Evaluation {
  return new Evaluator(budget, network, wanted).at(points)
}
