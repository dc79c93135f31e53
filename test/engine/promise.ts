import { evaluateBand, prepare } from '../../src/engine/assess.js'
import { Evaluator } from '../../src/engine/evaluate.js'
import { makePoints, type Point } from '../../src/engine/points.js'
import type { Budget } from '../../src/model/budget.js'
import type { Evaluation } from '../../src/model/evaluation.js'

/** A small generator of random numbers in [0, 1), the same on every run [mulberry32, public domain]. */
export function seeded(seed: number): () => number {
  let state = seed
  return () => {
    state = (state + 0x6d2b79f5) | 0
    let t = Math.imul(state ^ (state >>> 15), 1 | state)
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296
  }
}

/** How far log–log interpolation of a band's curves is off between its points. */
export interface Kept {
  readonly evaluation: Evaluation
  readonly points: number
  /** Largest error in amplitude, relative to the curve or to the floor of 1e-6 of the total's power, by curve. */
  readonly worst: number
  readonly worstCurve: string
  readonly worstAt: number
}

const curvesOf = ({ total, lines, limits }: Evaluation): [string, Float64Array][] => [
  ['total', total],
  ...[...lines, ...limits].map(({ id, psd }): [string, Float64Array] => [id, psd]),
]

/**
 * Compares exact values at `probes` random frequencies in every interval of the grid with what a reader makes of the curves: straight
 * in log f and log amplitude between neighbours of one sign, straight in log f between others.
 */
export function checkPromise(budget: Budget, probes = 3): Kept {
  const prepared = prepare(budget)
  const evaluation = evaluateBand(prepared)
  const { points } = evaluation
  const random = seeded(7)
  const list: Point[] = []
  const interval: number[] = []
  const fraction: number[] = []
  for (let i = 0; i + 1 < points.frequency.length; i++) {
    const shared = points.anchor[i] === points.anchor[i + 1]
    const gap = shared ? points.offset[i + 1] - points.offset[i] : points.frequency[i + 1] - points.frequency[i]
    for (let k = 0; k < probes; k++) {
      // Offsets count from the left neighbour's anchor, so that an interval of microhertz at megahertz is still resolved.
      const part = random()
      list.push({ anchor: points.anchor[i], offset: points.offset[i] + part * gap })
      interval.push(i)
      fraction.push(Math.log1p((part * gap) / points.frequency[i]) / Math.log1p(gap / points.frequency[i]))
    }
  }
  const exact = evaluateInOrder(prepared, evaluation, list)
  return { evaluation, points: points.frequency.length, ...compare(evaluation, exact, interval, fraction) }
}

function evaluateInOrder(
  { budget, network }: ReturnType<typeof prepare>,
  { points: { anchors } }: Evaluation,
  list: readonly Point[],
): Evaluation {
  const frequencyOf = ({ anchor, offset }: Point): number => (anchor < 0 ? offset : anchors[anchor].frequency + offset)
  return new Evaluator(budget, network, { sources: false, limits: true }).at({
    ...makePoints(anchors, []),
    frequency: Float64Array.from(list, frequencyOf),
    anchor: Int32Array.from(list, p => p.anchor),
    offset: Float64Array.from(list, p => p.offset),
  })
}

function compare(
  evaluation: Evaluation,
  exact: Evaluation,
  interval: readonly number[],
  fraction: readonly number[],
): Pick<Kept, 'worst' | 'worstCurve' | 'worstAt'> {
  const found = { worst: 0, worstCurve: '', worstAt: 0 }
  const there = curvesOf(exact)
  for (const [c, [id, psd]] of curvesOf(evaluation).entries()) {
    for (const [k, i] of interval.entries()) {
      const [left, right, actual] = [psd[i], psd[i + 1], there[c][1][k]]
      const ratio = right / left
      const read = ratio > 0 ? left * ratio ** fraction[k] : left + (right - left) * fraction[k]
      const scale = Math.max(Math.abs(actual), 1e-6 * exact.total[k])
      // Half of the error in power is that in amplitude.
      const off = Math.abs(read - actual) / scale / 2
      if (off > found.worst) Object.assign(found, { worst: off, worstCurve: id, worstAt: exact.points.frequency[k] })
    }
  }
  return found
}
