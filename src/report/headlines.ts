import type { Assessment, At, Spread } from '../model/assessment.js'
import { spokenFrequency, spokenRange } from './landmarks.js'
import { hasBackAction, marginText, noMarginReason } from './margins.js'
import { densityText, frequencyText, partsText, percentText } from './numbers.js'
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
  const value = densityText(best.asd, assessment.unit, best.asdSpread.combined)
  const margin = best.totalMargin === null || !hasBackAction(assessment) ? '' : `, ${limitText(best.totalMargin, best)}`
  const rest = `at ${bestFrequencyText(assessment)}${margin}, set by ${setBy(assessment, best)}.`
  return { value, rest, sentence: `Best ${value} ${rest}` }
}

/** The best frequency to a hundredth or so of the band in which the sensor is good. */
export function bestFrequencyText(assessment: Assessment): string {
  const { best, halfPowerBand } = assessment.headlines
  return spokenFrequency(assessment, best.frequency, halfPowerBand.to - halfPowerBand.from)
}

/** Where tables and cards are evaluated: the file's reference frequency, else the best one. */
export function tableFrequencyText(assessment: Assessment): string {
  const { reference } = assessment.headlines
  return reference === null ? bestFrequencyText(assessment) : frequencyText(reference.frequency, 12)
}

function limitText(margin: number, { totalMarginSpread }: At): string {
  const text = marginText(margin, totalMarginSpread?.combined)
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
    densityHeadline(assessment, headlines.best, {
      id: 'best',
      label: 'Best sensitivity',
      note: `at ${bestFrequencyText(assessment)}`,
    }),
    ...(headlines.reference === null ? [] : [referenceHeadline(assessment, headlines.reference)]),
    ...marginHeadlines(assessment, headlines.reference ?? headlines.best),
    largestHeadline(assessment, headlines.reference ?? headlines.best),
    {
      id: 'band',
      label: 'Half-power band',
      value: frequencyText(headlines.halfPowerBand.to - headlines.halfPowerBand.from, 3),
      note: `total power at most twice the best, ${spokenRange(assessment, headlines.halfPowerBand)}`,
    },
    ...occupancyHeadlines(assessment),
  ]
}

function referenceHeadline(assessment: Assessment, reference: At): Headline {
  const note = `at ${tableFrequencyText(assessment)}`
  return densityHeadline(assessment, reference, { id: 'reference', label: 'At the reference frequency', note })
}

function densityHeadline({ unit }: Assessment, { asd, asdSpread }: At, words: Omit<Headline, 'value'>): Headline {
  const value = densityText(asd, unit, asdSpread.combined)
  return { ...words, value, note: joined(words.note, partsText(asd, unit, asdSpread)) }
}

function marginHeadlines(assessment: Assessment, at: At): readonly Headline[] {
  if (at.totalMargin !== null && !hasBackAction(assessment))
    return [{ id: 'margins', label: 'Margins to quantum limits', value: 'left out', note: noMarginReason }]
  const where = `the standard quantum limit, as a ratio of powers, at ${tableFrequencyText(assessment)}`
  const margin = (words: Pick<Headline, 'id' | 'label'>, value: number | null, spread: Spread | null): Headline[] => {
    if (value === null) return []
    const note = joined(where, spread === null ? '' : partsText(value, 'dB', spread))
    return [{ ...words, value: marginHeadline(value, spread), note }]
  }
  return [
    ...margin({ id: 'total-margin', label: 'Margin of the total' }, at.totalMargin, at.totalMarginSpread),
    ...margin({ id: 'added-margin', label: 'Margin of the added noise' }, at.addedMargin, at.addedMarginSpread),
  ]
}

/** For a list of sensors: what the opening sentence does not say. */
export function furtherFacts(assessment: Assessment): readonly { readonly label: string; readonly value: string }[] {
  const { best, reference, halfPowerBand } = assessment.headlines
  const added = best.addedMargin
  return [
    ...(reference === null
      ? []
      : [
          {
            label: `At ${tableFrequencyText(assessment)}`,
            value: densityText(reference.asd, assessment.unit, reference.asdSpread.combined),
          },
        ]),
    ...(added === null ? [] : [addedFact(assessment, added, best.addedMarginSpread)]),
    { label: 'Half-power band', value: frequencyText(halfPowerBand.to - halfPowerBand.from, 3) },
  ]
}

function addedFact(assessment: Assessment, added: number, spread: Spread | null): { label: string; value: string } {
  if (!hasBackAction(assessment)) return { label: 'Margins to quantum limits', value: 'left out: no back-action in it' }
  return { label: 'Added noise, to the same limit', value: marginHeadline(added, spread) }
}

function marginHeadline(margin: number, spread: Spread | null): string {
  const text = marginText(margin, spread?.combined)
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
  return modes.flatMap(mode => {
    if (mode.finalOccupancy === null) return []
    const spread = mode.finalOccupancySpread
    const note = `quanta with the light on; the bath alone has ${occupancyText(mode.thermalOccupancy)}`
    return [
      {
        id: `occupancy-${mode.id}`,
        label: `Final occupancy of ${mode.id}`,
        value: occupancyText(mode.finalOccupancy, spread?.combined),
        note: joined(note, spread === null ? '' : partsText(mode.finalOccupancy, '', spread)),
      },
    ]
  })
}

function joined(note: string, parts: string): string {
  return parts === '' ? note : `${note}; ${parts}`
}

/** `26.4`, `0.31(4)`, `6.87 × 10⁴`. */
export function occupancyText(quanta: number, uncertainty = 0): string {
  return densityText(quanta, '', uncertainty)
}
