import type { At, Dominance, Headlines, Spread } from '../model/assessment.js'
import type { Budget } from '../model/budget.js'
import type { Evaluation } from '../model/evaluation.js'
import type { Sensitivity } from './sensitivity.js'
import { spreadAt, type Differentiated } from './uncertainty.js'

const perDecibel = 10 / Math.LN10

/** 10 log₁₀(S/L) in dB with its spread; null where there is no limit or no noise. */
function marginAt(
  budget: Budget,
  { evaluation, slopes }: Differentiated,
  { of, limit, index }: { of: 'total' | 'added'; limit: string; index: number },
): { value: number; spread: Spread } | null {
  const which = evaluation.limits.findIndex(({ id }) => id === limit)
  const psd = evaluation[of][index]
  if (which < 0 || !(psd > 0)) return null
  const bound = evaluation.limits[which].psd[index]
  const slope = (s: Sensitivity): number => perDecibel * (s[of][index] / psd - s.limits[which][index] / bound)
  return { value: perDecibel * Math.log(psd / bound), spread: spreadAt(budget, slopes, slope) }
}

/** 10 log₁₀ of the total over a limit, in dB. */
export function totalMargin(
  budget: Budget,
  at: Differentiated,
  limit: string,
  index: number,
): { value: number; spread: Spread } | null {
  return marginAt(budget, at, { of: 'total', limit, index })
}

/** Everything said about one point of an evaluation. */
export function valuesAt(budget: Budget, at: Differentiated, index: number): At {
  const { evaluation, slopes } = at
  const total = evaluation.total[index]
  const asd = Math.sqrt(total)
  const margin = totalMargin(budget, at, 'sql', index)
  const added = marginAt(budget, at, { of: 'added', limit: 'sql', index })
  return {
    frequency: evaluation.points.frequency[index],
    asd,
    asdSpread: spreadAt(budget, slopes, s => s.total[index] / (2 * asd)),
    totalMargin: margin?.value ?? null,
    totalMarginSpread: margin?.spread ?? null,
    addedMargin: added?.value ?? null,
    addedMarginSpread: added?.spread ?? null,
    shares: evaluation.lines
      .map(line => ({ line: line.id, share: line.psd[index] / total }))
      .sort((a, b) => b.share - a.share),
  }
}

/** The line that is largest at each point, as stretches of the band with the least and greatest share in each. */
function dominance({ lines, total, points }: Evaluation): Dominance[] {
  const stretches: { line: string; from: number; to: number; least: number; greatest: number }[] = []
  for (let i = 0; i < total.length; i++) {
    const largest = lines.reduce((best, line) => (line.psd[i] > best.psd[i] ? line : best))
    const share = largest.psd[i] / total[i]
    const frequency = points.frequency[i]
    const last = stretches.at(-1)
    if (last?.line === largest.id) {
      last.to = frequency
      last.least = Math.min(last.least, share)
      last.greatest = Math.max(last.greatest, share)
    } else {
      const from = last === undefined ? frequency : (last.to + frequency) / 2
      if (last !== undefined) last.to = from
      stretches.push({ line: largest.id, from, to: frequency, least: share, greatest: share })
    }
  }
  return stretches
}

/** Around the best point, as far as the total's power stays at most twice the best; ends interpolated in log–log. */
function halfPowerBand({ total, points }: Evaluation, best: number): { from: number; to: number } {
  const level = 2 * total[best]
  const edge = (step: 1 | -1): number => {
    let i = best
    while (i + step >= 0 && i + step < total.length && total[i + step] <= level) i += step
    const next = i + step
    if (next < 0 || next >= total.length) return points.frequency[i]
    const part = Math.log(level / total[i]) / Math.log(total[next] / total[i])
    return points.frequency[i] + (points.frequency[next] - points.frequency[i]) * part
  }
  return { from: edge(-1), to: edge(1) }
}

/** The numbers that a report begins with; `spots` is an evaluation at two points, the
 * reference (or the best) and the best. */
export function headlinesOf(budget: Budget, evaluation: Evaluation, spots: Differentiated): Headlines {
  return {
    best: valuesAt(budget, spots, 1),
    reference: budget.reference === null ? null : valuesAt(budget, spots, 0),
    halfPowerBand: halfPowerBand(evaluation, bestIndex(evaluation)),
    dominance: dominance(evaluation),
  }
}

/** Index of the least total. */
export const bestIndex = ({ total }: Evaluation): number =>
  total.reduce((least, value, i) => (value < total[least] ? i : least), 0)
