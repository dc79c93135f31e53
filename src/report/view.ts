import type { Assessment } from '../model/assessment.js'
import { bandRows, type BandRow } from './bands.js'
import { equationCards, type EquationCard } from './cards.js'
import { bibliographyOf, evidenceText, type BibliographyEntry, type EvidenceText } from './citations.js'
import { cautions, type Caution } from './cautions.js'
import { contributionRows, type ContributionRow } from './contributions.js'
import { evidenceOf, type Evidence } from './evidence.js'
import { furtherFacts, headlineNumbers, opening, tableFrequencyText, type Headline, type Opening } from './headlines.js'
import { limitRows, type LimitRow } from './limit-rows.js'
import { densityText, percentText, rangeText } from './numbers.js'
import { correlationRows, parameterRows, type CorrelationRow, type ParameterRow } from './parameters.js'
import { requirementRows, requirementStatus, type RequirementRow } from './requirements.js'
import { cavityBlocks, modeBlocks, type Fact, type StateBlock } from './state.js'
import { spreadAtReference, uncertainValues, type Uncertain } from './uncertain-values.js'
import { variantRows, type VariantRow } from './variants.js'

/** A card whose references have got their numbers in the report's list. */
export interface CitedCard extends EquationCard {
  readonly citations: readonly number[]
  readonly basis: EvidenceText
}

/** Everything that a report prints, as plain data with finished texts; TeX stays TeX until the template typesets it. */
export interface ReportView {
  readonly sensor: string
  readonly title: string
  /** Markdown, or empty. */
  readonly summary: string
  readonly revision: string
  readonly file: string
  readonly quantity: string
  readonly unit: string
  readonly readout: string
  readonly band: string
  /** Where the tables' values are taken. */
  readonly referenceFrequency: string
  /** Whether the file states that frequency; otherwise it is the best one. */
  readonly referenceStated: boolean
  readonly opening: Opening
  readonly headlines: readonly Headline[]
  /** For a list of sensors. */
  readonly facts: readonly Fact[]
  readonly bands: readonly BandRow[]
  readonly contributions: readonly ContributionRow[]
  /** At the reference frequency. */
  readonly total: { readonly value: string }
  readonly limits: readonly LimitRow[]
  readonly cards: readonly CitedCard[]
  /** Null where nothing is uncertain. */
  readonly uncertain: Uncertain | null
  /** Standard uncertainty of the total at the reference frequency over the total; empty where there is none. */
  readonly relativeSpread: string
  readonly requirements: readonly RequirementRow[]
  readonly requirementStatus: { readonly text: string; readonly met: boolean } | null
  /** The budget as it is, then its variants; empty where it has none. */
  readonly variants: readonly VariantRow[]
  readonly parameters: readonly ParameterRow[]
  readonly correlations: readonly CorrelationRow[]
  readonly modes: readonly StateBlock[]
  readonly cavities: readonly StateBlock[]
  readonly evidence: Evidence
  readonly warnings: readonly string[]
  readonly cautions: readonly Caution[]
  /** In the order of first mention; a card's number is the index + 1. */
  readonly bibliography: readonly BibliographyEntry[]
}

/** The whole report of one budget. */
export function reportView(assessment: Assessment): ReportView {
  const { budget } = assessment
  const cards = equationCards(assessment)
  const cited = [...new Set(cards.flatMap(card => card.references))]
  const bibliography = bibliographyOf(budget, cited)
  return {
    sensor: budget.sensor,
    title: budget.title,
    summary: budget.summary ?? '',
    revision: budget.revision,
    file: budget.file,
    quantity: budget.measurand.quantity,
    unit: assessment.unit,
    readout: budget.readout,
    band: rangeText(budget.band.low, budget.band.high),
    referenceFrequency: tableFrequencyText(assessment),
    referenceStated: budget.reference !== null,
    opening: opening(assessment),
    headlines: headlineNumbers(assessment),
    facts: furtherFacts(assessment),
    bands: bandRows(assessment),
    contributions: contributionRows(assessment),
    total: totalText(assessment),
    limits: limitRows(assessment),
    cards: cards.map(card => ({
      ...card,
      citations: card.references.map(key => cited.indexOf(key) + 1),
      basis: evidenceText(card.evidence, bibliography),
    })),
    uncertain: uncertainValues(assessment),
    relativeSpread: relativeSpread(assessment),
    requirements: requirementRows(assessment),
    requirementStatus: requirementStatus(assessment),
    variants: variantRows(assessment),
    parameters: parameterRows(budget, bibliography),
    correlations: correlationRows(budget),
    modes: modeBlocks(assessment),
    cavities: cavityBlocks(assessment),
    evidence: evidenceOf(assessment),
    warnings: [...new Set([...budget.warnings, ...assessment.warnings].map(warningText))],
    cautions: cautions(assessment),
    bibliography,
  }
}

function totalText(assessment: Assessment): { value: string } {
  const { atReference, unit } = assessment
  return { value: densityText(Math.sqrt(atReference.total[0]), unit, spreadAtReference(assessment).combined) }
}

function relativeSpread(assessment: Assessment): string {
  const { combined } = spreadAtReference(assessment)
  return combined > 0 ? percentText(combined / Math.sqrt(assessment.atReference.total[0])) : ''
}

function warningText({ place, message }: Assessment['warnings'][number]): string {
  return `${place.file}:${place.line}:${place.column}: ${message}`
}
