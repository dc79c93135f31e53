import type { Assessment } from '../model/assessment.js'
import type { Root } from '../model/budget.js'
import { claimedSources } from './contributions.js'
import { tableFrequencyText } from './headlines.js'
import { percentText } from './numbers.js'
import { givenNumbers, slotRoots } from './slots.js'
import { spreadAtReference } from './uncertain-values.js'

/** On what a budget rests. */
export interface Evidence {
  /** Sentences, the most important first. */
  readonly sentences: readonly string[]
  /** What the shares mean. */
  readonly definition: string
  /** Share of the total power at the reference frequency that lies in lines with an assumed value of their own. */
  readonly assumedShare: number
  /** Share of the total's variance there that assumed values bring; null where nothing is uncertain. */
  readonly assumedVariance: number | null
}

const isAssumed = (evidence: string | null): boolean => evidence === 'assumed'

/** Counts the values by evidence and adds up what is assumed: in power, and in variance. */
export function evidenceOf(assessment: Assessment): Evidence {
  const { roots } = assessment.budget
  const assumed = roots.filter(root => isAssumed(root.evidence)).length
  const silent = roots.filter(root => root.evidence === null).length
  const assumedShare = shareOfAssumed(assessment)
  const assumedVariance = varianceOfAssumed(assessment)
  return {
    assumedShare,
    assumedVariance,
    definition:
      assumed === 0
        ? ''
        : 'A contribution counts as resting on an assumption where its own text, or any value of the components it comes from, is marked as assumed; correlations count with their sign.',
    sentences: [
      shareSentence(assumedShare, tableFrequencyText(assessment)),
      `Of ${countText(roots.length, 'value')} in the file, ${wordOf(assumed)} ${assumed === 1 ? 'is' : 'are'} assumed, ${wordOf(roots.length - assumed - silent)} rest on a stated source and ${wordOf(silent)} state no evidence.`,
      ...(assumed === 0 ? [] : varianceSentences(assessment, assumedVariance)),
    ],
  }
}

function shareSentence(share: number, frequency: string): string {
  if (share === 0) return 'No contribution uses a value of its own marked as assumed.'
  return `${percentText(share)} of the total power at ${frequency} lies in contributions that use a value of their own marked as assumed.`
}

function varianceSentences({ budget }: Assessment, share: number | null): readonly string[] {
  const assumed = budget.roots.filter(root => isAssumed(root.evidence))
  const exact = assumed.filter(root => root.uncertainty === 0).length
  if (exact === assumed.length) return ['No assumed value states an uncertainty, so that none counts in the variance.']
  const bring = share === null ? '' : `The assumed values bring ${percentText(share)} of the variance of the total.`
  const lack = exact === 0 ? '' : `Of the assumed values, ${exact} ${exact === 1 ? 'states' : 'state'} no uncertainty.`
  return [bring, lack].filter(sentence => sentence !== '')
}

function wordOf(count: number): string {
  return count === 0 ? 'none' : String(count)
}

function countText(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`
}

function shareOfAssumed({ budget, atReference }: Assessment): number {
  let psd = 0
  for (const line of atReference.lines) {
    const spec = budget.lines.find(each => each.id === line.id)
    const owners = claimedSources(line, atReference).map(source => source.owner)
    if (
      isAssumed(spec?.evidence ?? null) ||
      owners.some(owner => rootsOf(owner, budget).some(r => isAssumed(r.evidence)))
    )
      psd += line.psd[0]
  }
  return psd / atReference.total[0]
}

/** Each value by itself, correlations left aside. */
function varianceOfAssumed(assessment: Assessment): number | null {
  const { budget, rootShares } = assessment
  const total = spreadAtReference(assessment).combined
  if (!(total > 0)) return null
  const assumed = rootShares.filter(({ root }) => isAssumed(budget.roots[root].evidence))
  return assumed.reduce((sum, { change }) => sum + (change / total) ** 2, 0)
}

/** The roots behind a component or a contribution of its own. */
export function rootsOf(owner: string, budget: Assessment['budget']): readonly Root[] {
  const parameters =
    budget.components.find(component => component.id === owner)?.parameters ??
    budget.lines.flatMap(line => (line.id === owner && 'kind' in line.claims ? [line.claims.parameters] : []))[0]
  if (parameters === undefined) return []
  return givenNumbers(parameters).flatMap(({ slot }) => slotRoots(budget, slot))
}
