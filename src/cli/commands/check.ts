import { visible } from '../../budget/format-problem.js'
import { requirementData } from '../../report/curves-json.js'
import { requirementLine, requirementRows } from '../../report/requirements.js'
import { terminalHeading } from '../../report/terminal.js'
import { worst, type ExitCode, type Io } from '../io.js'
import { assessAll, codeOf, reportOutcomes, reportProblems, type Outcome } from '../outcome.js'
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
  const outcomes = await assessAll(targetsInside(project, [], io), 'glance')
  const code = worst([reportProblems(project.problems, io), reportOutcomes(outcomes, io)])
  print(outcomes, options, io)
  return code
}

async function checkNamed(options: CheckOptions, io: Io): Promise<ExitCode> {
  const project = projectAround(options.root, io)
  const targets = options.budgets.map(name => targetNamed(project, name, io))
  const outcomes = await assessAll([...new Map(targets.map(target => [target.file, target])).values()], 'glance')
  const code = reportOutcomes(outcomes, io)
  print(outcomes, options, io)
  return code
}

function print(outcomes: readonly Outcome[], options: CheckOptions, io: Io): void {
  if (options.json) io.out(`${JSON.stringify(outcomes.map(finding), null, 2)}\n`)
  else for (const outcome of outcomes) io.out(sentence(outcome))
}

function sentence({ target, assessment }: Outcome): string {
  if (assessment === null) return ''
  const [, best] = terminalHeading(assessment)
  const requirements = requirementRows(assessment).map(row => `  ${visible(requirementLine(row))}\n`)
  return `${target.name}: ${best}\n${requirements.join('')}`
}

/** For machines: what a line says, with every number in SI units. */
function finding(outcome: Outcome): object {
  const { target, assessment, failure, problems } = outcome
  const best = assessment?.headlines.best
  return {
    budget: target.name,
    file: target.file,
    exitCode: codeOf(outcome),
    best:
      best === undefined
        ? null
        : { frequency: best.frequency, asd: best.asd, spread: best.asdSpread, unit: assessment?.unit },
    requirements: (assessment?.requirements ?? []).map(requirementData),
    problems: problems.map(({ severity, code, place, message }) => ({ severity, code, ...place, message })),
    fault: failure !== null && failure.problems.length === 0 ? failure.lines.join('\n') : null,
  }
}
