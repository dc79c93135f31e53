import { mkdir, stat, writeFile } from 'node:fs/promises'
import { dirname, join } from 'node:path'
import { findProject, type Project } from '../budget/project.js'
import { readBudget } from '../budget/read-budget.js'
import { assess } from '../engine/assess.js'
import { Refusal } from '../model/problem.js'
import { createTypesetter } from '../report/typeset.js'
import type { SensorResult, SiteInput } from './input.js'
import { configureEleventy, type EleventyConfig, type EleventyInput } from './eleventy.js'
import { manifestName, manifestOf, manifestText, readManifest } from './manifest.js'
import { sitePages } from './pages.js'
import { otherFiles, pathOf, type SiteFiles } from './render.js'

/**
 * For Eleventy started by itself: the project around the working directory. Eleventy then writes the pages one after the
 * other, so that a run that is stopped leaves a part of them; `floorbook build` publishes whole.
 */
export async function configureDirect(config: EleventyConfig, cwd = process.cwd()): Promise<EleventyInput> {
  const project = findProject({ cwd })
  if (project === null) throw new Error('no folder `budgets` here or above; start it inside a project')
  const input: SiteInput = {
    project: { root: project.root, ...project.site, date: null },
    results: project.sensors.map(sensor => resultOf(project, sensor)),
  }
  const typesetter = createTypesetter()
  config.on('eleventy.after', async ({ directories, results }) => {
    const pages = new Map(results.map(page => [pathOf(page.url), page.content]))
    await writeBeside(pages, await otherFiles(input, typesetter), directories.output)
  })
  return configureEleventy(config, sitePages(input), typesetter)
}

function resultOf(project: Project, sensor: string): SensorResult {
  const { budget, problems } = readBudget(project, sensor)
  if (budget === null) return { sensor, assessment: null, problems }
  try {
    return { sensor, assessment: assess(budget), problems }
  } catch (error) {
    if (error instanceof Refusal) return { sensor, assessment: null, problems: error.problems }
    throw error
  }
}

/** Writes what is no page, and a manifest of everything, pages of former builds included, so that `build` knows its own. */
async function writeBeside(pages: SiteFiles, others: SiteFiles, output: string): Promise<void> {
  for (const [path, content] of others) {
    await mkdir(dirname(join(output, path)), { recursive: true })
    await writeFile(join(output, path), content)
  }
  const manifest = new Map(manifestOf(new Map([...pages, ...others])))
  for (const [path, digest] of (await readManifest(output)) ?? []) {
    const kept = await stat(join(output, path)).catch(() => null)
    if (kept !== null && !manifest.has(path)) manifest.set(path, digest)
  }
  await writeFile(join(output, manifestName), manifestText(manifest))
}
