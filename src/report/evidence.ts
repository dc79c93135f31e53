import type { Assessment } from '../model/assessment.js'
import type { Root } from '../model/budget.js'
import { claimedSources } from './contributions.js'
import { tableFrequencyText } from './headlines.js'
import { percentText } from './numbers.js'
import { givenNumbers, slotRoots } from './slots.js'

/** On what a budget rests. */
export interface Evidence {
  /** Sentences, the most important first. */
  readonly sentences: readonly string[]
  /** Share of the total power at the reference frequency that lies in lines with an assumed value of their own. */
  readonly assumedShare: number
}

const isAssumed = (evidence: string | null): boolean => evidence === 'assumed'

/** Counts the values by evidence and adds up the lines whose own component or text is assumed. */
export function evidenceOf(assessment: Assessment): Evidence {
  const { budget } = assessment
  const assumed = budget.roots.filter(root => isAssumed(root.evidence)).length
  const silent = budget.roots.filter(root => root.evidence === null).length
  const assumedShare = shareOfAssumed(assessment)
  return {
    assumedShare,
    sentences: [
      shareSentence(assumedShare, tableFrequencyText(assessment)),
      `Of ${countText(budget.roots.length, 'value')} in the file, ${wordOf(assumed)} ${assumed === 1 ? 'is' : 'are'} assumed, ${wordOf(budget.roots.length - assumed - silent)} rest on a stated source and ${wordOf(silent)} state no evidence.`,
    ],
  }
}

function shareSentence(share: number, frequency: string): string {
  if (share === 0) return 'No contribution uses a value of its own marked as assumed.'
  return `${percentText(share)} of the total power at ${frequency} lies in contributions that use a value of their own marked as assumed.`
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

/** The roots behind a component or a contribution of its own. */
export function rootsOf(owner: string, budget: Assessment['budget']): readonly Root[] {
  const parameters =
    budget.components.find(component => component.id === owner)?.parameters ??
    budget.lines.flatMap(line => (line.id === owner && 'kind' in line.claims ? [line.claims.parameters] : []))[0]
  if (parameters === undefined) return []
  return givenNumbers(parameters).flatMap(({ slot }) => slotRoots(budget, slot))
}
