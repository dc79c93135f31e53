import { visible } from '../../budget/format-problem.js'
import type { Examination } from '../../engine/examine.js'
import { requirementData } from '../../report/curves-json.js'
import { densityText, frequencyText } from '../../report/numbers.js'
import { plainRequirementRows, requirementLine } from '../../report/requirements.js'
import { worst, type ExitCode, type Io } from '../io.js'
import { codeOf, examineAll, reportOutcomes, reportProblems, type Outcome } from '../outcome.js'
import { projectAround, projectOf } from '../project.js'
import { targetNamed, targetsInside } from '../targets.js'

export interface CheckOptions {
  readonly root?: string
  readonly json?: true
  readonly budgets: readonly string[]
}

/** Reads and computes budgets: one line for each that is right, every error and warning. Writes no file. */
export async function check(options: CheckOptions, io: Io): Promise<ExitCode> {
  return options.budgets.length === 0 ? await checkAll(options, io) : await checkNamed(options, io)
}

async function checkAll(options: CheckOptions, io: Io): Promise<ExitCode> {
  const project = projectOf(options.root, io)
  const outcomes = await examineAll(targetsInside(project, [], io))
  const code = worst([reportProblems(project.problems, io), reportOutcomes(outcomes, io)])
  print(outcomes, options, io)
  return code
}

async function checkNamed(options: CheckOptions, io: Io): Promise<ExitCode> {
  const project = projectAround(options.root, io)
  const targets = options.budgets.map(name => targetNamed(project, name, io))
  const outcomes = await examineAll([...new Map(targets.map(target => [target.file, target])).values()])
  const code = reportOutcomes(outcomes, io)
  print(outcomes, options, io)
  return code
}

function print(outcomes: readonly Outcome<Examination>[], options: CheckOptions, io: Io): void {
  if (options.json) io.out(`${JSON.stringify(outcomes.map(finding), null, 2)}\n`)
  else for (const outcome of outcomes) io.out(sentence(outcome))
}

function sentence({ target, assessment }: Outcome<Examination>): string {
  if (assessment === null) return ''
  const { reference, unit, requirements } = assessment
  const value =
    reference === null ? 'fine' : `${densityText(reference.asd, unit)} at ${frequencyText(reference.frequency, 12)}`
  const rows = plainRequirementRows(requirements, unit).map(row => `  ${visible(requirementLine(row))}\n`)
  return `${target.name}: ${value.replaceAll('\u00a0', ' ')}\n${rows.join('')}`
}

/** For machines: what a line says, with every number in SI units. */
function finding(outcome: Outcome<Examination>): object {
  const { target, assessment, failure, problems } = outcome
  const reference = assessment?.reference ?? null
  return {
    budget: target.name,
    file: target.file,
    exitCode: codeOf(outcome),
    reference: reference === null ? null : { ...reference, unit: assessment?.unit },
    requirements: (assessment?.requirements ?? []).map(requirementData),
    problems: problems.map(({ severity, code, place, message }) => ({ severity, code, ...place, message })),
    fault: failure !== null && failure.problems.length === 0 ? failure.lines.join('\n') : null,
  }
}
