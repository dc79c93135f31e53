import { formatProblem } from '../budget/format-problem.js'
import type { Depth } from '../engine/assess.js'
import type { Examination } from '../engine/examine.js'
import type { Assessment } from '../model/assessment.js'
import type { Budget } from '../model/budget.js'
import { Refusal, type Problem } from '../model/problem.js'
import { failureOf, type Failure } from './failure.js'
import { exitCodes, worst, type ExitCode, type Io } from './io.js'
import { shortfalls } from './shortfall.js'
import type { Target } from './targets.js'

/** What every way of computing a budget gives. */
export type Computed = Pick<Assessment, 'requirements' | 'unit' | 'warnings'>

/** What became of one budget; one that is refused stops no other. */
export interface Outcome<Result extends Computed = Assessment> {
  readonly target: Target
  readonly assessment: Result | null
  readonly failure: Failure | null
  /** Errors and warnings, of the file and of the engine, each once. */
  readonly problems: readonly Problem[]
}

/** Reads and computes one budget. The engine is loaded here, once the call is known to be right. */
export async function assessTarget(target: Target, depth: Depth): Promise<Outcome> {
  const { assess } = await import('../engine/assess.js')
  return computed(target, budget => assess(budget, depth))
}

export async function assessAll(targets: readonly Target[], depth: Depth): Promise<readonly Outcome[]> {
  const { assess } = await import('../engine/assess.js')
  return targets.map(target => computed(target, budget => assess(budget, depth)))
}

/** What a check needs of each. */
export async function examineAll(targets: readonly Target[]): Promise<readonly Outcome<Examination>[]> {
  const { examine } = await import('../engine/examine.js')
  return targets.map(target => computed(target, examine))
}

function computed<Result extends Computed>(target: Target, work: (budget: Budget) => Result): Outcome<Result> {
  let read: readonly Problem[] = []
  try {
    const { budget, problems } = target.read()
    if (budget === null) throw new Refusal(problems)
    read = problems
    const assessment = work(budget)
    return { target, assessment, failure: null, problems: each([...problems, ...assessment.warnings]) }
  } catch (error) {
    const failure = failureOf(error)
    return { target, assessment: null, failure, problems: each([...read, ...failure.problems]) }
  }
}

/** Without repetitions: the engine may hand on what the reader has said. */
function each(problems: readonly Problem[]): readonly Problem[] {
  return [...new Map(problems.map(problem => [formatProblem(problem), problem])).values()]
}

/**
 * Errors, warnings and missed requirements of every budget, one line each; the exit code of all. What is wrong in a file
 * that several budgets share is said once.
 */
export function reportOutcomes(outcomes: readonly Outcome<Computed>[], io: Io): ExitCode {
  const said = new Set<string>()
  for (const { problems, failure, assessment } of outcomes) {
    const news = problems.filter(problem => !said.has(formatProblem(problem)))
    for (const problem of news) said.add(formatProblem(problem))
    reportProblems([...news, ...(assessment === null ? [] : shortfalls(assessment))], io)
    // A fault of the engine has no place in the file.
    if (failure !== null && failure.problems.length === 0) for (const line of failure.lines) io.err(`${line}\n`)
  }
  return worst(outcomes.map(codeOf))
}

export function codeOf({ failure, assessment }: Outcome<Computed>): ExitCode {
  if (failure !== null) return failure.code
  return assessment !== null && shortfalls(assessment).length > 0 ? exitCodes.short : exitCodes.fine
}

export function reportProblems(problems: readonly Problem[], io: Io): ExitCode {
  for (const problem of problems) io.err(`${formatProblem(problem)}\n`)
  return problems.some(problem => problem.severity === 'error') ? exitCodes.wrong : exitCodes.fine
}
