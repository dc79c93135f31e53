import type { At, Dominance, Headlines } from '../model/assessment.js'
import type { Evaluation } from '../model/evaluation.js'

const decibels = (ratio: number): number => 10 * Math.log10(ratio)

/** Everything said about one point of an evaluation. */
export function valuesAt(evaluation: Evaluation, index: number): At {
  const total = evaluation.total[index]
  const sql = evaluation.limits.find(limit => limit.id === 'sql')?.psd[index]
  const margin = (psd: number): number | null => (sql === undefined || !(psd > 0) ? null : decibels(psd / sql))
  return {
    frequency: evaluation.points.frequency[index],
    asd: Math.sqrt(total),
    totalMargin: margin(total),
    addedMargin: margin(evaluation.added[index]),
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

/** The numbers that a report begins with; `reference` is an evaluation at the file's reference frequency alone. */
export function headlinesOf(evaluation: Evaluation, reference: Evaluation | null): Headlines {
  const { total } = evaluation
  const best = total.reduce((least, value, i) => (value < total[least] ? i : least), 0)
  return {
    best: valuesAt(evaluation, best),
    reference: reference === null ? null : valuesAt(reference, 0),
    halfPowerBand: halfPowerBand(evaluation, best),
    dominance: dominance(evaluation),
  }
}
