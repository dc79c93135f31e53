import type { Assessment, RequirementResult } from '../model/assessment.js'
import { spokenFrequency } from './landmarks.js'
import { decibelText } from './margins.js'
import { densityText, frequencyText, numberText, rangeText } from './numbers.js'
import { inSentence } from './titles.js'

/** A requirement with the number that it was held against. */
export interface RequirementRow {
  readonly id: string
  readonly about: string
  /** `Total`, `Margin to the standard quantum limit`. */
  readonly what: string
  /** `below 20 aN/√Hz`. */
  readonly bound: string
  readonly number: string
  readonly where: string
  readonly met: boolean
  /** `by 6.5 dB, 50 standard uncertainties`. */
  readonly distance: string
  readonly place: string
}

/** Every requirement of the budget, in the order of the file. */
export function requirementRows(assessment: Assessment): readonly RequirementRow[] {
  const spoken: Spoken = (frequency, width) => spokenFrequency(assessment, frequency, width)
  return assessment.requirements.map(result => requirementRow(result, { unit: assessment.unit, spoken }))
}

/** How the place of a worst value is told: a frequency in Hz within a width. */
type Spoken = (frequency: number, width: number) => string

/** The same where nothing but the results is known. */
export function plainRequirementRows(results: readonly RequirementResult[], unit: string): readonly RequirementRow[] {
  return results.map(result => requirementRow(result, { unit, spoken: frequency => frequencyText(frequency, 7) }))
}

/** How many requirements are met, in words; null where there are none. */
export function requirementStatus({
  requirements,
}: Assessment): { readonly text: string; readonly met: boolean } | null {
  if (requirements.length === 0) return null
  const met = requirements.filter(result => result.met).length
  if (met === requirements.length) return { text: met === 1 ? 'met' : `all ${met} met`, met: true }
  return { text: `${requirements.length - met} of ${requirements.length} missed`, met: false }
}

/** A requirement on one line of a terminal. */
export function requirementLine({ id, what, bound, number, where, met, distance }: RequirementRow): string {
  const place = where === '' ? '' : ` ${where}`
  const verdict = `${met ? 'met' : 'missed'}${distance === '' ? '' : ` ${distance}`}`
  return `${id}: ${verdict}: ${inSentence(what)} ${number}${place}, wanted ${bound}`.replaceAll('\u00a0', ' ')
}

function requirementRow(result: RequirementResult, { unit, spoken }: { unit: string; spoken: Spoken }): RequirementRow {
  const { requirement, value, spread, met } = result
  const { id, about, of, bound, text, place } = requirement
  return {
    id,
    about: about ?? '',
    what: whatText(result),
    bound: `${bound} ${text}`,
    number: Number.isFinite(value) ? numberOf(of, value, spread.combined, unit) : 'no such number here',
    where: whereText(result, spoken),
    met,
    distance: Number.isFinite(value) ? distanceText(result) : '',
    place: `${place.file}:${place.line}`,
  }
}

function whatText({ requirement: { of }, title }: RequirementResult): string {
  const [first, name] = of.split('.')
  if (first === 'occupancy') return `Final occupancy of ${name}`
  if (first === 'margin') return `Margin to the ${title === null ? `limit ${name}` : inSentence(title)}`
  return title ?? of
}

function numberOf(of: string, value: number, uncertainty: number, unit: string): string {
  if (of.startsWith('margin.')) return decibelText(value, uncertainty)
  if (of.startsWith('occupancy.')) return densityText(value, '', uncertainty)
  return densityText(value, unit, uncertainty)
}

function whereText({ requirement: { where }, frequency }: RequirementResult, spoken: Spoken): string {
  if (where === null) return ''
  if ('at' in where) return `at ${frequencyText(where.at, 12)}`
  const worst = frequency === null ? '' : `, worst at ${spoken(frequency, where.to - where.from)}`
  return `from ${rangeText(where.from, where.to)}${worst}`
}

/** How far from the bound: in dB (quanta of an occupancy), and in standard uncertainties where there are some. */
function distanceText({ requirement: { of, value: wanted }, value, spread }: RequirementResult): string {
  const size = Math.abs(value - wanted)
  if (size === 0) return 'exactly'
  const ratio = Math.abs(20 * Math.log10(value / wanted))
  const decibels = of.startsWith('margin.') ? size : ratio
  const plain = of.startsWith('occupancy.') ? `${numberText(size, 2)} quanta` : small(decibels)
  if (!(spread.combined > 0)) return `by ${plain}`
  return `by ${plain}, ${numberText(size / spread.combined, 2)} standard uncertainties`
}

/** Less than a tenth of a decibel keeps its first digits. */
function small(decibels: number): string {
  if (!Number.isFinite(decibels)) return 'any number of dB'
  return decibels < 0.1 ? `${numberText(decibels, 2)}\u00a0dB` : decibelText(decibels)
}
