import { join, relative } from 'node:path'
import type { Project } from '../../budget/project.js'
import type { SensorResult } from '../../site/build.js'
import { dateOf } from '../date.js'
import { worst, type ExitCode, type Io } from '../io.js'
import { assessAll, reportOutcomes, reportProblems, type Outcome } from '../outcome.js'
import { outputOf, projectOf } from '../project.js'
import { targetsInside } from '../targets.js'

export interface BuildOptions {
  readonly root?: string
  readonly budgets: readonly string[]
}

/** Publishes the good budgets, and for each that is refused a page that says why. */
export async function build(options: BuildOptions, io: Io): Promise<ExitCode> {
  return await publishProject(projectOf(options.root, io), options.budgets, io)
}

/**
 * The site always holds every budget, because its front page lists them all; names only choose what is told of. What is
 * wrong is printed after the site stands, so that it is what a person sees last.
 */
export async function publishProject(project: Project, names: readonly string[], io: Io): Promise<ExitCode> {
  const told = new Set(targetsInside(project, names, io).map(target => target.name))
  const outcomes = await assessAll(targetsInside(project, [], io), 'report')
  const { buildSite } = await import('../../site/build.js')
  const { pages, outputDir } = await buildSite({
    project: { root: project.root, ...siteWords(project), date: dateOf(project.root) },
    results: outcomes.map(resultOf),
    outputDir: outputOf(project),
  })
  io.out(`${pages} pages; the front page is ${fromHere(join(outputDir, 'index.html'), io)}\n`)
  return worst([
    reportProblems(project.problems, io),
    reportOutcomes(
      outcomes.filter(({ target }) => told.has(target.name)),
      io,
    ),
  ])
}

function siteWords({ site: { title, subtitle } }: Project): { title: string; subtitle: string | null } {
  return { title, subtitle }
}

/** A fault of the engine has no place in the file; its page names the file. */
function resultOf({ target, assessment, failure, problems }: Outcome): SensorResult {
  const sensor = target.name
  if (failure === null || failure.problems.length > 0) return { sensor, assessment, problems }
  const place = { file: target.file, line: 1, column: 1 }
  const faults = failure.lines.map(message => ({ severity: 'error', code: 'fault', place, message }) as const)
  return { sensor, assessment, problems: [...problems, ...faults] }
}

/** As a person would type it: relative where it lies below the working directory. */
function fromHere(path: string, io: Io): string {
  const name = relative(io.cwd, path)
  return name.startsWith('..') ? path : name.replaceAll('\\', '/')
}
