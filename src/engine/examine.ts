import type { RequirementResult } from '../model/assessment.js'
import type { Budget } from '../model/budget.js'
import type { Problem } from '../model/problem.js'
import { evaluateBand, evaluateList, prepare, refuseBeyondNumbers, tryVariants, unitOf, warningsOf } from './assess.js'
import { requirementResults, type Grounds } from './requirements.js'
import { Changes } from './sensitivity.js'
import { modeStates } from './states.js'
import type { Differentiated } from './uncertainty.js'

/** What a check says of a budget: less than an assessment, and much sooner. */
export interface Examination {
  /** The total's amplitude density at the reference frequency in Hz; null where the file has none. */
  readonly reference: { readonly frequency: number; readonly asd: number } | null
  readonly unit: string
  readonly requirements: readonly RequirementResult[]
  readonly warnings: readonly Problem[]
}

/**
 * Whether a budget and its variants can be computed, and whether it meets its requirements. The band is evaluated, and numbers are
 * differentiated, only where a requirement asks for it. Throws like `assess`.
 */
export function examine(budget: Budget): Examination {
  const prepared = prepare(budget)
  tryVariants(budget)
  const { reference } = budget
  refuseBeyondNumbers(budget, evaluateList(prepared, [reference ?? budget.band.low]))
  return {
    reference:
      reference === null
        ? null
        : { frequency: reference, asd: Math.sqrt(evaluateList(prepared, [reference]).total[0]) },
    unit: unitOf(budget),
    requirements: budget.requirements.length === 0 ? [] : requirementResults(budget, groundsOf(budget, prepared)),
    warnings: warningsOf(prepared),
  }
}

/** Everything that requirements may ask for, computed when the first one does. */
function groundsOf(budget: Budget, prepared: ReturnType<typeof prepare>): Grounds {
  const changes = new Changes(budget)
  const counted = budget.requirements.some(({ of }) => of.startsWith('occupancy.'))
  let band: Grounds['band'] | null = null
  return {
    get band() {
      return (band ??= evaluateBand(prepared))
    },
    modes: counted ? modeStates(budget, prepared.network, { poles: prepared.poles, changes }) : [],
    at: (frequency): Differentiated => {
      const evaluation = evaluateList(prepared, [frequency])
      return { evaluation, slopes: changes.sensitivities(evaluation, 'spot') }
    },
  }
}
