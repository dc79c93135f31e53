import type { Assessment, RootShare, Spread } from '../model/assessment.js'
import { plainDecimal, toSignificant } from '../quantity/digits.js'
import { besideText, densityText, percentText } from './numbers.js'
import { decibelText, hasBackAction } from './margins.js'

/** What one uncertain value does to the total at the reference frequency. */
export interface UncertainValueRow {
  readonly id: string
  readonly written: string
  readonly effect: 'statistical' | 'systematic'
  readonly assumed: boolean
  /** `1 % → 0.43 %`, or empty for a value that is zero. */
  readonly elasticity: string
  /** Standard uncertainty of the total that this value alone would bring. */
  readonly change: string
  /** Part of the total's variance. */
  readonly share: string
  /** Length of the bar, 0 to 100. */
  readonly bar: number
}

/** A number of the report with the two kinds of its uncertainty apart. */
export interface SpreadRow {
  readonly label: string
  readonly value: string
  readonly statistical: string
  readonly systematic: string
  readonly combined: string
}

export interface Uncertain {
  readonly rows: readonly UncertainValueRow[]
  /** How many further values there are that do next to nothing; 0 for none. */
  readonly small: number
  /** What the stated correlations add to the variance, signed; empty where there are none. */
  readonly correlations: string
  readonly spreads: readonly SpreadRow[]
}

/** Values that bring less of the variance than this are counted, not listed. */
const leastListed = 1e-4

/** What is uncertain and by how much, values that matter most first; null where nothing is. */
export function uncertainValues(assessment: Assessment): Uncertain | null {
  const total = spreadAtReference(assessment).combined
  if (!(total > 0)) return null
  const parts = assessment.rootShares.map(share => ({ share, part: (share.change / total) ** 2 }))
  const listed = parts.filter(({ part }) => part >= leastListed)
  const sum = parts.reduce((all, { part }) => all + part, 0)
  return {
    rows: listed.map(({ share, part }) => valueRow(assessment, share, part)),
    small: parts.length - listed.length,
    correlations: assessment.budget.correlations.length === 0 ? '' : percentText(1 - sum),
    spreads: spreadRows(assessment),
  }
}

/** Of the total where the tables are taken: at the reference frequency, else at the best. */
export function spreadAtReference({ headlines }: Assessment): Spread {
  return (headlines.reference ?? headlines.best).asdSpread
}

function valueRow({ budget, atReference, unit }: Assessment, share: RootShare, part: number): UncertainValueRow {
  const { id, text, effect, evidence } = budget.roots[share.root]
  return {
    id,
    written: text,
    effect,
    assumed: evidence === 'assumed',
    elasticity: share.elasticity === null ? '' : elasticityText(share.elasticity),
    change: besideText(share.change, Math.sqrt(atReference.total[0]), unit),
    share: percentText(part),
    bar: Math.round(1000 * Math.min(1, part)) / 10,
  }
}

/** `1 % → 0.43 %`: what one per cent more of the value does to the total. */
function elasticityText(elasticity: number): string {
  const size = Math.abs(elasticity)
  const text = size < 5e-5 ? '0' : plainDecimal(toSignificant(size, 2), 0)
  return `1\u00a0% → ${elasticity < 0 && text !== '0' ? '−' : ''}${text}\u00a0%`
}

function spreadRows(assessment: Assessment): readonly SpreadRow[] {
  const { unit, headlines, modes } = assessment
  const { best, reference } = headlines
  const density = (label: string, value: number, spread: Spread): SpreadRow =>
    spreadRow({ label, value, unit, spread }, densityText(value, unit, spread.combined))
  const margin = (label: string, value: number | null, spread: Spread | null): SpreadRow[] =>
    value === null || spread === null || !hasBackAction(assessment)
      ? []
      : [spreadRow({ label, value, unit: 'dB', spread }, decibelText(value, spread.combined))]
  const at = reference ?? best
  return [
    density('Best sensitivity', best.asd, best.asdSpread),
    ...(reference === null ? [] : [density('At the reference frequency', reference.asd, reference.asdSpread)]),
    ...margin('Margin of the total', at.totalMargin, at.totalMarginSpread),
    ...margin('Margin of the added noise', at.addedMargin, at.addedMarginSpread),
    ...modes.flatMap(({ id, finalOccupancy: value, finalOccupancySpread: spread }) =>
      value === null || spread === null
        ? []
        : [
            spreadRow(
              { label: `Final occupancy of ${id}`, value, unit: '', spread },
              densityText(value, '', spread.combined),
            ),
          ],
    ),
  ]
}

function spreadRow(
  { label, value, unit, spread }: { label: string; value: number; unit: string; spread: Spread },
  text: string,
): SpreadRow {
  const say = (uncertainty: number): string => (uncertainty > 0 ? besideText(uncertainty, value, unit) : '—')
  const { statistical, systematic, combined } = spread
  return {
    label,
    value: text,
    statistical: say(statistical),
    systematic: say(systematic),
    combined: say(combined),
  }
}
