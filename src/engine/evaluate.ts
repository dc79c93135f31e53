import type { Budget } from '../model/budget.js'
import type { Evaluation, LimitCurve, LineCurve, Parts, SourceCurve } from '../model/evaluation.js'
import type { Covariance, Network, Source } from '../model/network.js'
import type { Points } from '../model/points.js'
import { adjoint, transfer, type Adjoint } from './adjoint.js'
import { bilinear, quadratic } from './densities.js'
import { gridArrays } from './grid-arrays.js'
import { planLimits } from './limits.js'
import { planLines, type LinePlan, type Piece } from './lines.js'
import { realZero, scaleReal, Tape, type Form, type Real } from './tape.js'

/** What to compute besides the total and the lines. */
export interface Wanted {
  readonly sources: boolean
  readonly limits: boolean
}

/** Power densities of one source at the measurand, as reals on the tape; computed when asked for. */
class SourceDensities {
  readonly #full: readonly Form[]
  readonly #clamped: readonly Form[]
  readonly #moved: readonly Form[]
  readonly #inverseResponse: Real
  readonly #shape: Real

  constructor(
    readonly tape: Tape,
    readonly source: Source,
    rows: Adjoint,
    inverseResponse: Real,
  ) {
    this.#full = source.nodes.map(node => transfer(rows.full, node, true))
    this.#clamped = source.nodes.map(node => transfer(rows.clamped, node, true))
    this.#moved = source.nodes.map(node => transfer(rows.moved, node, false))
    this.#inverseResponse = inverseResponse
    this.#shape = tape.shape(source.shape)
  }

  #times(density: Real): Real {
    return this.tape.product(this.tape.product(density, this.#inverseResponse), this.#shape)
  }

  all(): Real[] {
    const { vacuum, heating } = this.source
    return [this.#times(quadratic(this.tape, this.#full, heating === null ? vacuum : sum(vacuum, heating)))]
  }

  parts(block: Covariance): { imprecision: Real; backAction: Real; correlation: Real } {
    return {
      imprecision: this.#times(quadratic(this.tape, this.#clamped, block)),
      backAction: this.#times(quadratic(this.tape, this.#moved, block)),
      correlation: this.#times(scaleReal(bilinear(this.tape, this.#clamped, block, this.#moved), 2)),
    }
  }

  piece(piece: Piece | 'all'): Real[] {
    const { vacuum, heating } = this.source
    if (piece === 'all') return this.all()
    if (piece === 'heating') return heating === null ? [] : [this.#times(quadratic(this.tape, this.#full, heating))]
    const parts = this.parts(vacuum)
    if (piece === 'imprecision') return [parts.imprecision]
    return [piece === 'back-action' ? parts.backAction : parts.correlation]
  }
}

const sum = (a: Covariance, b: Covariance): Covariance =>
  a.map((row, i) => row.map((value, j) => ({ re: value.re + b[i][j].re, im: value.im + b[i][j].im })))

/** Arrays that a run of the tape fills. */
class Outputs {
  constructor(
    readonly tape: Tape,
    readonly length: number,
  ) {}

  array(terms: readonly Real[]): Float64Array {
    const array = new Float64Array(this.length)
    this.tape.output(array, terms)
    return array
  }

  parts({ imprecision, backAction, correlation }: { imprecision: Real; backAction: Real; correlation: Real }): Parts {
    return {
      imprecision: this.array([imprecision]),
      backAction: this.array([backAction]),
      correlation: this.array([correlation]),
    }
  }
}

function sourceCurve(out: Outputs, densities: SourceDensities): SourceCurve {
  const { id, title, family, readout, owner, channel, ownUnit, ownFactor, vacuum, heating, shape, parted } =
    densities.source
  return {
    id,
    title,
    family,
    readout,
    owner,
    channel,
    ownUnit,
    psd: out.array(densities.all()),
    own: out.array([scaleReal(out.tape.shape(shape), ownFactor)]),
    ...(parted && { vacuum: out.parts(densities.parts(vacuum)) }),
    ...(heating !== null && { heating: out.parts(densities.parts(heating)) }),
  }
}

function lineCurve(out: Outputs, line: LinePlan, of: (source: Source) => SourceDensities): LineCurve {
  return {
    id: line.id,
    title: line.title,
    family: line.family,
    signed: line.signed,
    of: line.pieces.map(({ source, piece }) => (piece === 'all' ? source.id : `${source.id} ${piece}`)),
    psd: out.array(line.pieces.flatMap(({ source, piece }) => of(source).piece(piece))),
  }
}

/**
 * The primitive of the engine: all curves of a network on the given points. Power densities, one-sided, at the measurand
 * (unit²/Hz). Every source's density is t S t†/|R|² with t and R from one adjoint solution at each point.
 */
export function evaluateAt(
  budget: Pick<Budget, 'lines'>,
  network: Network,
  points: Points,
  wanted: Wanted,
): Evaluation {
  const tape = new Tape()
  const rows = adjoint(tape, network)
  const response = transfer(rows.full, network.measurand, true)
  const inverseResponse = tape.inverseAbs2(response)
  const all = new Map(network.sources.map(source => [source, new SourceDensities(tape, source, rows, inverseResponse)]))
  const of = (source: Source): SourceDensities => all.get(source)!
  const densities = [...all.values()]
  const limits = wanted.limits ? planLimits(tape, network, rows, inverseResponse) : []
  const out = new Outputs(tape, points.frequency.length)
  const evaluation: Evaluation = {
    points,
    total: out.array(densities.flatMap(d => d.all())),
    added: out.array(densities.filter(d => d.source.readout).flatMap(d => d.all())),
    lines: planLines(budget, network).map(line => lineCurve(out, line, of)),
    sources: wanted.sources ? densities.map(d => sourceCurve(out, d)) : [],
    limits: limits.map(({ id, title, bounds, about, psd }): LimitCurve => ({
      id,
      title,
      bounds,
      about,
      psd: out.array([psd]),
    })),
    response: wanted.limits ? out.array([tape.abs2(response)]) : out.array([realZero]),
  }
  tape.run(gridArrays(points))
  return evaluation
}
