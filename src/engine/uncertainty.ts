import type { Bands, RootShare, Spread } from '../model/assessment.js'
import type { Budget } from '../model/budget.js'
import type { Evaluation } from '../model/evaluation.js'
import type { Sensitivity } from './sensitivity.js'

/** An evaluation with the derivatives of its curves. */
export interface Differentiated {
  readonly evaluation: Evaluation
  readonly slopes: readonly Sensitivity[]
}

export const noSpread: Spread = { statistical: 0, systematic: 0, combined: 0 }

/** r_ij of two roots: 1 with itself, as stated otherwise. */
function correlationOf(budget: Budget, i: number, j: number): number {
  if (i === j) return 1
  const stated = budget.correlations.find(({ roots: [a, b] }) => (a === i && b === j) || (a === j && b === i))
  return stated?.coefficient ?? 0
}

/** Pairs of uncertain roots that are correlated, each with r_ij and what kind of cause both are; i ≤ j. */
interface Pair {
  readonly i: number
  readonly j: number
  /** r_ij, doubled for a pair of different roots. */
  readonly weight: number
  readonly effect: 'statistical' | 'systematic' | 'mixed'
}

function pairsOf(budget: Budget, roots: readonly number[]): Pair[] {
  return roots.flatMap((a, i) =>
    roots.slice(i).flatMap((b, k): Pair[] => {
      const r = correlationOf(budget, a, b)
      if (r === 0) return []
      const [one, two] = [budget.roots[a].effect, budget.roots[b].effect]
      return [{ i, j: i + k, weight: a === b ? r : 2 * r, effect: one === two ? one : 'mixed' }]
    }),
  )
}

/** Law of propagation of uncertainty [JCGM 100:2008, eq. 13] for one number: changes[k] = ∂y/∂x_k·u(x_k) of the k-th root in `roots`. */
export function spreadOf(budget: Budget, roots: readonly number[], changes: readonly number[]): Spread {
  const variance = { statistical: 0, systematic: 0, mixed: 0 }
  for (const { i, j, weight, effect } of pairsOf(budget, roots)) variance[effect] += weight * changes[i] * changes[j]
  return {
    statistical: Math.sqrt(Math.max(0, variance.statistical)),
    systematic: Math.sqrt(Math.max(0, variance.systematic)),
    combined: Math.sqrt(Math.max(0, variance.statistical + variance.systematic + variance.mixed)),
  }
}

/** The spread of a number whose derivative by a root's power densities is given, at one point of an evaluation. */
export function spreadAt(budget: Budget, list: readonly Sensitivity[], slope: (s: Sensitivity) => number): Spread {
  const changes = list.map(s => slope(s) * budget.roots[s.root].uncertainty)
  return spreadOf(
    budget,
    list.map(s => s.root),
    changes,
  )
}

/** Standard uncertainty of the total's amplitude density at every point: u(√S) = u(S)/2√S. */
export function bandsOf(budget: Budget, evaluation: Evaluation, list: readonly Sensitivity[]): Bands {
  const n = evaluation.total.length
  const bands = { statistical: new Float64Array(n), systematic: new Float64Array(n), combined: new Float64Array(n) }
  const pairs = pairsOf(
    budget,
    list.map(s => s.root),
  )
  const sum = { statistical: new Float64Array(n), systematic: new Float64Array(n), mixed: new Float64Array(n) }
  for (const { i, j, weight, effect } of pairs) {
    const [a, b] = [list[i], list[j]]
    const factor = weight * budget.roots[a.root].uncertainty * budget.roots[b.root].uncertainty
    const target = sum[effect]
    for (let k = 0; k < n; k++) target[k] += factor * a.total[k] * b.total[k]
  }
  for (let k = 0; k < n; k++) {
    // Where nothing is left of the total there is nothing to be uncertain about.
    const half = evaluation.total[k] > 0 ? 2 * Math.sqrt(evaluation.total[k]) : Infinity
    const { statistical, systematic, mixed } = {
      statistical: sum.statistical[k],
      systematic: sum.systematic[k],
      mixed: sum.mixed[k],
    }
    bands.statistical[k] = Math.sqrt(Math.max(0, statistical)) / half
    bands.systematic[k] = Math.sqrt(Math.max(0, systematic)) / half
    bands.combined[k] = Math.sqrt(Math.max(0, statistical + systematic + mixed)) / half
  }
  return bands
}

/** What each root does to the total at one point, largest first. */
export function rootSharesAt(budget: Budget, { evaluation, slopes: list }: Differentiated, index: number): RootShare[] {
  const asd = Math.sqrt(evaluation.total[index])
  return list
    .map(({ root, total }) => {
      const { value, uncertainty } = budget.roots[root]
      const slope = total[index] / (2 * asd)
      return { root, elasticity: value === 0 ? null : (slope * value) / asd, change: Math.abs(slope) * uncertainty }
    })
    .sort((a, b) => b.change - a.change)
}

/** Standard uncertainty of each line's amplitude density at one point; of |S|^½ for a signed line. */
export function lineSpreadsAt(budget: Budget, { evaluation, slopes: list }: Differentiated, index: number): Spread[] {
  return evaluation.lines.map((line, k) => {
    const asd = Math.sqrt(Math.abs(line.psd[index]))
    return asd === 0 ? noSpread : spreadAt(budget, list, s => s.lines[k][index] / (2 * asd))
  })
}
