import { NodeFiles } from '../../budget/node-files.js'
import { visible } from '../../budget/format-problem.js'
import type { Assessment } from '../../model/assessment.js'
import type { Evaluation } from '../../model/evaluation.js'
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

/** So many frequencies stand side by side with all contributions; of more, the largest contribution is told. */
const sideBySide = 3

/** Prints one budget: at its reference frequency or exactly where the call asks, as a table or as data. */
export async function show(options: ShowOptions, io: Io): Promise<ExitCode> {
  const points = pointsAsked(options, io)
  const project = projectAround(options.root, io)
  // A table prints no works cited.
  if (project?.files instanceof NodeFiles) project.files.hurried = options.json !== true
  const target = targetNamed(project, options.budget, io)
  // The published file has uncertainties at every point; a table shows none of them.
  const outcome = await assessTarget(target, options.json ? 'report' : 'glance')
  const { assessment } = outcome
  if (assessment !== null) {
    const asked = points === null ? null : await evaluated(assessment, points)
    io.out(options.json ? await asData(assessment, asked) : await asTable(assessment, asked, io))
  }
  return reportOutcomes([outcome], io)
}

/** Null where the call names no frequency. */
function pointsAsked({ at, atFile }: ShowOptions, io: Io): Float64Array | null {
  if (at === undefined && atFile === undefined) return null
  const ofFile = atFile === undefined ? [] : frequenciesIn(atFile, io.cwd)
  return pointsOf([...frequenciesOf(at ?? []), ...ofFile])
}

async function evaluated({ budget }: Assessment, points: Float64Array): Promise<Evaluation> {
  const { evaluateAtFrequencies } = await import('../../engine/assess.js')
  return evaluateAtFrequencies(budget, points)
}

/** The published file; where frequencies are asked for, its curves stand on them. */
async function asData(assessment: Assessment, asked: Evaluation | null): Promise<string> {
  const { curvesJson } = await import('../../report/curves-json.js')
  // The uncertainty at every point belongs to the engine's own points.
  return curvesJson(asked === null ? assessment : { ...assessment, evaluation: asked, bands: null })
}

async function asTable(assessment: Assessment, asked: Evaluation | null, io: Io): Promise<string> {
  const { tableByFrequency, tableByLine, terminalHeading } = await import('../../report/terminal.js')
  const { printedTable } = await import('../table.js')
  const evaluation = asked ?? assessment.atReference
  const many = evaluation.points.frequency.length > sideBySide
  const table = many ? tableByFrequency(assessment, evaluation) : tableByLine(assessment, evaluation)
  const heading = terminalHeading(assessment).map(line => `${visible(line)}\n`)
  return `${heading.join('')}\n${printedTable(table, io.color)}`
}
