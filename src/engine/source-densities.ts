import type { Covariance, Source } from '../model/network.js'
import { transfer, type Adjoint } from './adjoint.js'
import { bilinear, quadratic } from './densities.js'
import type { Form } from './form.js'
import type { Piece } from './lines.js'
import { scaleReal, type Real } from './real.js'
import { shapeReal } from './shapes.js'
import type { Tape } from './tape.js'

export interface RealParts {
  readonly imprecision: Real
  readonly backAction: Real
  readonly correlation: Real
}

/** One-sided power densities of one source at the measurand, t S t†/|R|² and its parts, written on the tape when asked for. */
export class SourceDensities {
  readonly #full: readonly Form[]
  readonly #clamped: readonly Form[]
  readonly #moved: readonly Form[]
  readonly #shape: Real

  constructor(
    readonly tape: Tape,
    readonly source: Source,
    rows: Adjoint,
    private readonly inverseResponse: Real,
  ) {
    this.#full = source.nodes.map(node => transfer(tape, rows.full, node, true))
    this.#clamped = source.nodes.map(node => transfer(tape, rows.clamped, node, true))
    this.#moved = source.nodes.map(node => transfer(tape, rows.moved, node, false))
    this.#shape = shapeReal(tape, source.shape)
  }

  #referred(density: Real): Real {
    return this.tape.product(this.tape.product(density, this.inverseResponse), this.#shape)
  }

  /** The density of the source before any transfer, in its own unit. */
  own(): Real {
    const { ownFactor, ownShapes } = this.source
    if (ownShapes === undefined) return scaleReal(this.#shape, ownFactor)
    const product = ownShapes.map(shape => shapeReal(this.tape, shape)).reduce((a, b) => this.tape.product(a, b))
    return scaleReal(this.tape.root(product), ownFactor)
  }

  all(): Real {
    const { vacuum, heating } = this.source
    return this.#referred(quadratic(this.tape, this.#full, heating === null ? vacuum : sum(vacuum, heating)))
  }

  parts(block: Covariance): RealParts {
    return {
      imprecision: this.#referred(quadratic(this.tape, this.#clamped, block)),
      backAction: this.#referred(quadratic(this.tape, this.#moved, block)),
      correlation: this.#referred(scaleReal(bilinear(this.tape, this.#clamped, block, this.#moved), 2)),
    }
  }

  piece(piece: Piece | 'all'): Real[] {
    const { vacuum, heating } = this.source
    if (piece === 'all') return [this.all()]
    if (piece === 'heating') return heating === null ? [] : [this.#referred(quadratic(this.tape, this.#full, heating))]
    const parts = this.parts(vacuum)
    if (piece === 'imprecision') return [parts.imprecision]
    return [piece === 'back-action' ? parts.backAction : parts.correlation]
  }
}

const sum = (a: Covariance, b: Covariance): Covariance =>
  a.map((row, i) => row.map((value, j) => ({ re: value.re + b[i][j].re, im: value.im + b[i][j].im })))
