import type { Budget } from '../model/budget.js'
import type { Evaluation } from '../model/evaluation.js'
import type { Network } from '../model/network.js'
import type { Points } from '../model/points.js'
import { followAnchors } from './anchors.js'
import { Arena } from './arena.js'
import { assemble } from './assemble.js'
import { rootValues } from './bind.js'
import { Evaluator } from './evaluate.js'
import { Following, type Reach } from './following.js'
import { polesOf, type Pole } from './poles.js'

/** Derivatives of power densities (unit²/Hz) by one root, in the order of the evaluation's curves. */
export interface Sensitivity {
  /** Index into the budget's roots. */
  readonly root: number
  readonly total: Float64Array
  readonly added: Float64Array
  readonly lines: readonly Float64Array[]
  readonly limits: readonly Float64Array[]
}

/**
 * Step of the central differences relative to the root. Their error is its square times the curvature of the third order, and rounding of
 * an evaluation over it: both near 1e-9 of the derivative.
 */
const relativeStep = 3e-5

/** A root that is zero has no scale but its uncertainty. */
const stepOf = (value: number, uncertainty: number): number =>
  value === 0 ? 0.01 * uncertainty : relativeStep * Math.abs(value)

/** The network at changed roots; its poles are found when they are asked for. */
export class Changed {
  readonly network: Network
  #poles: readonly Pole[] | null = null

  constructor(budget: Budget, roots: Float64Array) {
    this.network = assemble(budget, roots)
  }

  get poles(): readonly Pole[] {
    return (this.#poles ??= polesOf(this.network))
  }
}

/** Every uncertain root with the networks a step above and below it, assembled once for all that is differentiated. */
export class Changes {
  readonly list: readonly {
    readonly root: number
    readonly step: number
    readonly up: Changed
    readonly down: Changed
  }[]
  readonly #arenas = [new Arena(), new Arena()] as const

  constructor(readonly budget: Budget) {
    const centre = rootValues(budget)
    this.list = budget.roots.flatMap(({ value, uncertainty }, root) => {
      if (uncertainty === 0) return []
      const step = stepOf(value, uncertainty)
      const at = (change: number): Changed =>
        new Changed(
          budget,
          centre.map((v, i) => (i === root ? v + change : v)),
        )
      return [{ root, step, up: at(step), down: at(-step) }]
    })
  }

  /** Derivatives of numbers by each uncertain root. */
  derivatives(numbers: (changed: Changed) => readonly number[]): { root: number; slopes: number[] }[] {
    return this.list.map(({ root, step, up, down }) => {
      const low = numbers(down)
      return { root, slopes: numbers(up).map((high, i) => (high - low[i]) / (2 * step)) }
    })
  }

  /**
   * Derivatives of all curves of an evaluation by each uncertain root. A frequency stands still, except next to a resonance whose place is
   * uncertain by more than its width: see `Following`.
   */
  sensitivities(evaluation: Evaluation, reach: Reach): Sensitivity[] {
    const limits = evaluation.limits.length > 0
    const lines = evaluation.lines.length
    const { points } = evaluation
    const places = this.list.map(({ up, down }) => [this.#places(up, points), this.#places(down, points)] as const)
    const following = new Following(points, this.#anchorSpreads(points, places), reach)
    return this.list.map(({ root, step, up, down }, k) => {
      const high = this.#curves(up, following.moved(places[k][0]), { limits, arena: this.#arenas[0] })
      const low = this.#curves(down, following.moved(places[k][1]), { limits, arena: this.#arenas[1] })
      const [total, added, ...rest] = high.map((curve, c) => curve.map((value, i) => (value - low[c][i]) / (2 * step)))
      return { root, total, added, lines: rest.slice(0, lines), limits: rest.slice(lines) }
    })
  }

  /** Where each anchor is in a changed network, in Hz. */
  #places(changed: Changed, { anchors }: Points): number[] {
    const moving = anchors.some(anchor => anchor.nature === 'pole')
    return followAnchors(anchors, changed.network, moving ? changed.poles : []).map(({ frequency }) => frequency)
  }

  /** Standard uncertainty of each anchor's frequency, in Hz; correlations are left out, since only its size matters here. */
  #anchorSpreads({ anchors }: Points, places: readonly (readonly [number[], number[]])[]): number[] {
    return anchors.map((_, a) =>
      Math.hypot(
        ...this.list.map(({ root, step }, k) => {
          const slope = (places[k][0][a] - places[k][1][a]) / (2 * step)
          return slope * this.budget.roots[root].uncertainty
        }),
      ),
    )
  }

  #curves(changed: Changed, points: Points, { limits, arena }: { limits: boolean; arena: Arena }): Float64Array[] {
    const evaluator = new Evaluator(this.budget, changed.network, { sources: false, limits })
    const { total, added, lines, limits: bounds } = evaluator.at(points, arena)
    return [total, added, ...lines.map(line => line.psd), ...bounds.map(limit => limit.psd)]
  }
}
