import type { Assessment, At } from '../model/assessment.js'
import { frequencyDigits, densityText, frequencyText, marginText, percentText, rangeText } from './numbers.js'
import { inSentence, lineTitle, listText } from './titles.js'

/** A number that a report opens with. */
export interface Headline {
  readonly id: string
  readonly label: string
  readonly value: string
  readonly note: string
}

/** The first sentence: its number apart, because it is set larger. */
export interface Opening {
  readonly value: string
  readonly rest: string
  /** The whole sentence, for the front page and for machines. */
  readonly sentence: string
}

/** How good the sensor is, where, how far from the quantum limit, and what sets it. */
export function opening(assessment: Assessment): Opening {
  const { best } = assessment.headlines
  const value = densityText(best.asd, assessment.unit)
  const margin = best.totalMargin === null ? '' : `, ${limitText(best.totalMargin)}`
  const rest = `at ${bestFrequencyText(assessment)}${margin}, set by ${setBy(assessment, best)}.`
  return { value, rest, sentence: `Best ${value} ${rest}` }
}

/** The best frequency to a hundredth or so of the band in which the sensor is good. */
export function bestFrequencyText({ headlines: { best, halfPowerBand } }: Assessment): string {
  return frequencyText(best.frequency, frequencyDigits(best.frequency, halfPowerBand.to - halfPowerBand.from))
}

/** Where tables and cards are evaluated: the file's reference frequency, else the best one. */
export function tableFrequencyText(assessment: Assessment): string {
  const { reference } = assessment.headlines
  return reference === null ? bestFrequencyText(assessment) : frequencyText(reference.frequency, 12)
}

function limitText(margin: number): string {
  const text = marginText(margin)
  return text === 'at' ? 'at the standard quantum limit' : `${text} the standard quantum limit`
}

/** The lines that make up three quarters of the total between them, three at most. */
function setBy(assessment: Assessment, at: At): string {
  const named: string[] = []
  let sum = 0
  for (const { line, share } of at.shares) {
    if (named.length === 3 || sum >= 0.75 || share <= 0) break
    named.push(`${inSentence(lineTitle(assessment, line))} (${roundPercent(share)})`)
    sum += share
  }
  return listText(named)
}

/** A sentence wants no tenths: `60 %`. */
function roundPercent(share: number): string {
  return share < 0.1 ? percentText(share) : `${Math.round(100 * share)}\u00a0%`
}

/** Every headline number, in the order of a reader's questions. */
export function headlineNumbers(assessment: Assessment): readonly Headline[] {
  const { headlines } = assessment
  return [
    bestHeadline(assessment),
    ...(headlines.reference === null ? [] : [referenceHeadline(assessment, headlines.reference)]),
    ...marginHeadlines(headlines.reference ?? headlines.best, tableFrequencyText(assessment)),
    largestHeadline(assessment, headlines.reference ?? headlines.best),
    {
      id: 'band',
      label: 'Half-power band',
      value: frequencyText(headlines.halfPowerBand.to - headlines.halfPowerBand.from, 3),
      note: `total power at most twice the best, ${rangeText(headlines.halfPowerBand.from, headlines.halfPowerBand.to)}`,
    },
    ...occupancyHeadlines(assessment),
  ]
}

function bestHeadline(assessment: Assessment): Headline {
  const value = densityText(assessment.headlines.best.asd, assessment.unit)
  return { id: 'best', label: 'Best sensitivity', value, note: `at ${bestFrequencyText(assessment)}` }
}

function referenceHeadline(assessment: Assessment, reference: At): Headline {
  return {
    id: 'reference',
    label: 'At the reference frequency',
    value: densityText(reference.asd, assessment.unit),
    note: `at ${tableFrequencyText(assessment)}`,
  }
}

function marginHeadlines(at: At, frequency: string): readonly Headline[] {
  const where = `the standard quantum limit, as a ratio of powers, at ${frequency}`
  const margin = (id: string, label: string, value: number | null): readonly Headline[] =>
    value === null ? [] : [{ id, label, value: marginHeadline(value), note: where }]
  return [
    ...margin('total-margin', 'Margin of the total', at.totalMargin),
    ...margin('added-margin', 'Margin of the added noise', at.addedMargin),
  ]
}

/** For a list of sensors: what the opening sentence does not say. */
export function furtherFacts(assessment: Assessment): readonly { readonly label: string; readonly value: string }[] {
  const { best, reference, halfPowerBand } = assessment.headlines
  const added = best.addedMargin
  return [
    ...(reference === null
      ? []
      : [{ label: `At ${tableFrequencyText(assessment)}`, value: densityText(reference.asd, assessment.unit) }]),
    ...(added === null ? [] : [{ label: 'Added noise, to the same limit', value: marginHeadline(added) }]),
    { label: 'Half-power band', value: frequencyText(halfPowerBand.to - halfPowerBand.from, 3) },
  ]
}

function marginHeadline(margin: number): string {
  const text = marginText(margin)
  return text === 'at' ? 'Exactly at' : text
}

function largestHeadline(assessment: Assessment, at: At): Headline {
  const [largest] = at.shares
  return {
    id: 'largest',
    label: 'Largest contribution',
    value: lineTitle(assessment, largest.line),
    note: `${percentText(largest.share)} of the total power at ${tableFrequencyText(assessment)}`,
  }
}

function occupancyHeadlines({ modes }: Assessment): readonly Headline[] {
  return modes.flatMap(mode =>
    mode.finalOccupancy === null
      ? []
      : [
          {
            id: `occupancy-${mode.id}`,
            label: `Final occupancy of ${mode.id}`,
            value: occupancyText(mode.finalOccupancy),
            note: `quanta with the light on; the bath alone has ${occupancyText(mode.thermalOccupancy)}`,
          },
        ],
  )
}

/** `26.4`, `0.31`, `6.87 × 10⁴`. */
export function occupancyText(quanta: number): string {
  return densityText(quanta, '')
}
