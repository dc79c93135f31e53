import type { Budget } from '../model/budget.js'
import type { Evaluation } from '../model/evaluation.js'
import type { Points } from '../model/points.js'
import { followAnchors } from './anchors.js'
import { assemble } from './assemble.js'
import { rootValues } from './bind.js'
import { Evaluator } from './evaluate.js'
import { polesOf } from './poles.js'

/** Derivatives of power densities (unit²/Hz) by one root, in the order of the evaluation's curves. */
export interface Sensitivity {
  /** Index into the budget's roots. */
  readonly root: number
  readonly total: Float64Array
  readonly added: Float64Array
  readonly lines: readonly Float64Array[]
  readonly limits: readonly Float64Array[]
}

/** Relative step of the differences: rounding of an evaluation over it and its fourth power are both below 1e-9. */
const relativeStep = 3e-5

/** A root that is zero has no scale but its uncertainty. */
const stepOf = (value: number, uncertainty: number): number =>
  value === 0 ? uncertainty : relativeStep * Math.abs(value)

/**
 * An evaluation at changed roots, on points that go along with their modes: a point is an offset from its anchor, and the anchor is
 * where the changed parameters put it. So the band of a sharp resonance is that of its depth, not of its place.
 */
function evaluateChanged(budget: Budget, points: Points, roots: Float64Array, limits: boolean): Evaluation {
  const network = assemble(budget, roots)
  const followed = points.anchors.length === 0 ? [] : followAnchors(points.anchors, network, polesOf(network))
  const frequency = points.frequency.map((f, i) => {
    const anchor = points.anchor[i]
    return anchor < 0 ? f : followed[anchor].frequency + points.offset[i]
  })
  const moved = { anchors: followed, frequency, anchor: points.anchor, offset: points.offset }
  return new Evaluator(budget, network, { sources: false, limits }).at(moved)
}

const curvesOf = ({ total, added, lines, limits }: Evaluation): Float64Array[] => [
  total,
  added,
  ...lines.map(line => line.psd),
  ...limits.map(limit => limit.psd),
]

/** (4·D(h/2) − D(h))/3 of central differences D: Richardson's extrapolation, of fourth order in h. */
function derivative(budget: Budget, points: Points, root: number, limits: boolean): Float64Array[] {
  const centre = rootValues(budget)
  const step = stepOf(centre[root], budget.roots[root].uncertainty)
  const at = (change: number): Float64Array[] => {
    const roots = centre.slice()
    roots[root] += change
    return curvesOf(evaluateChanged(budget, points, roots, limits))
  }
  const [wideUp, wideDown, up, down] = [at(step), at(-step), at(step / 2), at(-step / 2)]
  return wideUp.map((curve, c) =>
    curve.map((value, i) => (8 * (up[c][i] - down[c][i]) - (value - wideDown[c][i])) / (6 * step)),
  )
}

/** Derivatives by every uncertain root on the given points. */
export function sensitivities(budget: Budget, points: Points, limits: boolean): Sensitivity[] {
  return budget.roots.flatMap(({ uncertainty }, root) => {
    if (uncertainty === 0) return []
    const [total, added, ...rest] = derivative(budget, points, root, limits)
    const count = rest.length
    const lines = rest.slice(0, count)
    return [{ root, total, added, lines, limits: [] }]
  })
}
