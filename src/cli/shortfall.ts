import type { Assessment, RequirementResult } from '../model/assessment.js'
import type { Problem } from '../model/problem.js'
import { occupancyText } from '../report/headlines.js'
import { decibelText } from '../report/margins.js'
import { densityText, frequencyText } from '../report/numbers.js'

/** The requirements that a budget misses, each at its place in the file with what was found and what is wanted. */
export function shortfalls({ requirements, unit }: Pick<Assessment, 'requirements' | 'unit'>): readonly Problem[] {
  return requirements
    .filter(result => !result.met)
    .map(result => ({
      severity: 'error',
      code: 'requirement-missed',
      place: result.requirement.place,
      message: sentence(result, unit),
    }))
}

function sentence({ requirement, value, frequency }: RequirementResult, unit: string): string {
  const { id, of, bound, value: wanted } = requirement
  const where = frequency === null ? '' : ` at ${frequencyText(frequency)}`
  const text = `requirement \`${id}\` is missed: \`${of}\` is ${shown(of, value, unit)}${where}, but must be ${bound} ${shown(of, wanted, unit)}`
  return text.replaceAll('\u00a0', ' ')
}

function shown(of: string, value: number, unit: string): string {
  if (of.startsWith('margin.')) return decibelText(value)
  return of.startsWith('occupancy.') ? `${occupancyText(value)} quanta` : densityText(value, unit)
}
