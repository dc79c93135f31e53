import type { Assessment } from '../../model/assessment.js'
import { frequenciesIn, frequenciesOf, pointsOf } from '../frequencies.js'
import type { ExitCode, Io } from '../io.js'
import { assessTarget, reportOutcomes } from '../outcome.js'
import { projectAround } from '../project.js'
import { targetNamed } from '../targets.js'

export interface ShowOptions {
  readonly root?: string
  readonly at?: readonly string[]
  readonly atFile?: string
  readonly json?: true
  readonly budget: string
}

/** Prints one budget: at its headline frequencies or exactly where the call asks, as a table or as data. */
export async function show(options: ShowOptions, io: Io): Promise<ExitCode> {
  const points = pointsAsked(options, io)
  const outcome = await assessTarget(targetNamed(projectAround(options.root, io), options.budget, io))
  if (outcome.assessment !== null) io.out(await textOf(outcome.assessment, points, options, io))
  return reportOutcomes([outcome], io)
}
