import type { ModeState, RequirementResult, Spread } from '../model/assessment.js'
import type { Budget, Requirement } from '../model/budget.js'
import type { Evaluation } from '../model/evaluation.js'
import { Refusal, type Problem } from '../model/problem.js'
import { totalMargin } from './headlines.js'
import { spreadAt, type Differentiated } from './uncertainty.js'

/** A number that a requirement is held against. */
interface Held {
  readonly title: string
  readonly value: number
  readonly spread: Spread
  readonly frequency: number | null
}

/** The number of a requirement at one point: amplitude density of the total or a line, or a margin in dB. */
function heldAt(budget: Budget, at: Differentiated, of: string, index: number): Held | null {
  const { evaluation, slopes } = at
  const frequency = evaluation.points.frequency[index]
  if (of.startsWith('margin.')) {
    const margin = totalMargin(budget, at, of.slice('margin.'.length), index)
    const title = evaluation.limits.find(({ id }) => id === of.slice('margin.'.length))?.title
    return margin === null || title === undefined ? null : { title, ...margin, frequency }
  }
  const line = evaluation.lines.findIndex(({ id }) => id === of)
  const psd = of === 'total' ? evaluation.total : evaluation.lines[line]?.psd
  if (psd === undefined) return null
  const value = Math.sqrt(Math.abs(psd[index]))
  const slope = (k: number): number => (of === 'total' ? slopes[k].total : slopes[k].lines[line])[index]
  const title = of === 'total' ? 'Total' : evaluation.lines[line].title
  return { title, value, spread: spreadAt(budget, slopes, s => slope(slopes.indexOf(s)) / (2 * value)), frequency }
}

/** Frequency in Hz of the worst point of a stretch: the greatest value for a bound from above, the least for one from below; null where there is none. */
function worstOf(budget: Budget, evaluation: Evaluation, { of, bound, where }: Requirement): number | null {
  if (where === null || !('from' in where)) return null
  const { frequency } = evaluation.points
  let worst: { index: number; value: number } | null = null
  for (let i = 0; i < frequency.length; i++) {
    if (frequency[i] < where.from || frequency[i] > where.to) continue
    const value = heldAt(budget, { evaluation, slopes: [] }, of, i)?.value
    if (value === undefined) return null
    if (worst === null || (bound === 'below' ? value > worst.value : value < worst.value)) worst = { index: i, value }
  }
  return worst === null ? null : frequency[worst.index]
}

/** Where to take numbers from; `at` evaluates and differentiates at a frequency in Hz. */
export interface Grounds {
  readonly band: Evaluation
  readonly modes: readonly ModeState[]
  at(frequency: number): Differentiated
}

function held(budget: Budget, requirement: Requirement, grounds: Grounds): Held | null {
  const { of, where } = requirement
  if (of.startsWith('occupancy.')) {
    const mode = grounds.modes.find(({ id }) => id === of.slice('occupancy.'.length))
    if (mode?.finalOccupancy === undefined || mode.finalOccupancy === null) return null
    return { title: mode.id, value: mode.finalOccupancy, spread: mode.finalOccupancySpread!, frequency: null }
  }
  if (where === null) return null
  if ('at' in where) return heldAt(budget, grounds.at(where.at), of, 0)
  const worst = worstOf(budget, grounds.band, requirement)
  return worst === null ? null : heldAt(budget, grounds.at(worst), of, 0)
}

/** What is wanted of a budget that has no such number. */
function withoutNumber({ id, of, place }: Requirement): Problem {
  const why = of.startsWith('occupancy.')
    ? 'an occupancy needs a cavity, and a frequency of every mode'
    : 'this readout has no such limit'
  const message = `the requirement \`${id}\` asks for \`${of}\`, which this budget does not have: ${why}; ask for \`total\` or a line`
  return { severity: 'error', code: 'requirement', place, message }
}

/**
 * Holds each requirement against its number. The number itself decides, not its uncertainty, which stands beside it. Throws a `Refusal` for
 * those that ask for a number that the budget does not have.
 */
export function requirementResults(budget: Budget, grounds: Grounds): RequirementResult[] {
  const all = budget.requirements.map(requirement => ({ requirement, found: held(budget, requirement, grounds) }))
  const missing = all.filter(({ found }) => found === null)
  if (missing.length > 0) throw new Refusal(missing.map(({ requirement }) => withoutNumber(requirement)))
  return all.flatMap(({ requirement, found }) => {
    if (found === null) return []
    const met = requirement.bound === 'below' ? found.value <= requirement.value : found.value >= requirement.value
    return [{ requirement, ...found, met }]
  })
}
