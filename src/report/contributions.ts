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

export interface LimitRow {
  readonly id: string
  readonly title: string
  readonly value: string
  readonly bounds: string
  readonly about: string
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
      value: signedDensity(line.psd[0], assessment.unit),
      share: percentText(line.psd[0] / at.total[0]),
      enters: entersText(line, at),
      signed: line.signed,
    }))
}

/** The root of a power density; a negative one is marked, since it lowers the total. */
export function signedDensity(psd: number, unit: string): string {
  return psd < 0 ? `−${densityText(Math.sqrt(-psd), unit)}` : densityText(Math.sqrt(psd), unit)
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

/** Every limit at the reference frequency. */
export function limitRows({ atReference, unit }: Assessment): readonly LimitRow[] {
  const bounds = { added: 'the added noise', total: 'the total', none: 'nothing strictly; shown to compare' }
  return atReference.limits.map(limit => ({
    id: limit.id,
    title: limit.title,
    value: densityText(Math.sqrt(limit.psd[0]), unit),
    bounds: bounds[limit.bounds],
    about: limit.about,
  }))
}
