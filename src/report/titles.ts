import type { Assessment } from '../model/assessment.js'
import { EngineFault } from '../model/problem.js'
import type { Family } from '../model/evaluation.js'

/** How a family is called in tables. */
export const familyTitles: { readonly [family in Family]: string } = {
  thermal: 'thermal',
  imprecision: 'imprecision',
  'back-action': 'back-action',
  correlation: 'correlation',
  heating: 'heating',
  amplifier: 'amplifier',
  detection: 'detection',
  environment: 'environment',
  stray: 'stray',
}

/** Title of a line by its id. */
export function lineTitle(assessment: Assessment, id: string): string {
  return assessment.evaluation.lines.find(line => line.id === id)?.title ?? id
}

/** Family of a line by its id. */
export function lineFamily(assessment: Assessment, id: string): Family {
  const line = assessment.evaluation.lines.find(each => each.id === id)
  if (line === undefined) throw new EngineFault(`${id} dominates a part of the band but is no line of the budget`)
  return line.family
}

/** A title within a sentence: `Thermal` becomes `thermal`, `RF pickup` stays. */
export function inSentence(title: string): string {
  return /^\p{Lu}\p{Ll}/u.test(title) ? title[0].toLowerCase() + title.slice(1) : title
}

/** `a`, `a and b`, `a, b and c`. */
export function listText(items: readonly string[]): string {
  return items.length < 2 ? items.join('') : `${items.slice(0, -1).join(', ')} and ${items.at(-1)}`
}
