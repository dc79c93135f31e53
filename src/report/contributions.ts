import type { Assessment } from '../model/assessment.js'
import type { Evaluation, Family, LineCurve, SourceCurve } from '../model/evaluation.js'
import { densityText, percentText } from './numbers.js'
import { familyTitles } from './titles.js'

/** One line, source or limit at the reference frequency. */
export interface ContributionRow {
  readonly id: string
  readonly title: string
  readonly family: Family
  readonly familyTitle: string
  readonly value: string
  readonly share: string
  /** Where its noise enters the network. */
  readonly enters: string
  readonly signed: boolean
}

/** Every line with its value and share at the reference frequency, largest first. */
export function contributionRows(assessment: Assessment): readonly ContributionRow[] {
  const at = assessment.atReference
  return at.lines
    .toSorted((a, b) => b.psd[0] - a.psd[0])
    .map(line => ({
      id: line.id,
      title: line.title,
      family: line.family,
      familyTitle: familyTitles[line.family],
      value: lineValue(line, assessment),
      share: percentText(line.psd[0] / at.total[0]),
      enters: entersText(line, at),
      signed: line.signed,
    }))
}

/** A line's amplitude density at the reference frequency with its standard uncertainty. */
export function lineValue(line: LineCurve, { atReference, lineSpreads, unit }: Assessment): string {
  const index = atReference.lines.findIndex(each => each.id === line.id)
  return pointValue(line, atReference, { unit, index: 0, uncertainty: lineSpreads[index]?.combined ?? 0 })
}

/** A signed line below this share of the total's power is told as negligible: near its zero it has any size. */
const leastSigned = 1e-6

/** The root of a line's power density at a point; a negative one is marked, since it lowers the total. */
export function pointValue(
  { psd, signed }: LineCurve,
  { total }: Evaluation,
  { unit, index, uncertainty = 0 }: { unit: string; index: number; uncertainty?: number },
): string {
  const density = psd[index]
  if (signed && Math.abs(density) < leastSigned * total[index]) return 'negligible'
  const text = densityText(Math.sqrt(Math.abs(density)), unit, uncertainty)
  return density < 0 ? `−${text}` : text
}

/** `fundamental (bath)`, `cavity (front, back)`: owners and channels of the sources that a line claims. */
function entersText(line: LineCurve, at: Evaluation): string {
  const channels = new Map<string, string[]>()
  for (const source of claimedSources(line, at)) {
    const named = channels.get(source.owner) ?? []
    if (source.channel !== null && !named.includes(source.channel)) named.push(source.channel)
    channels.set(source.owner, named)
  }
  return [...channels].map(([owner, named]) => (named.length > 0 ? `${owner} (${named.join(', ')})` : owner)).join('; ')
}

/** Sources behind a line's `of` list, each once. */
export function claimedSources(line: LineCurve, at: Evaluation): readonly SourceCurve[] {
  const ids = new Set(line.of.map(claim => claim.split(' ')[0]))
  return at.sources.filter(source => ids.has(source.id))
}
