import { existsSync, statSync } from 'node:fs'
import { basename, dirname, join, relative, resolve, sep } from 'node:path'
import type { Problem } from '../model/problem.js'
import { FileRefusal, type FileSource } from './file-source.js'
import { Issues } from './issues.js'
import { sensorFault } from './names.js'
import { NodeFiles } from './node-files.js'
import { quoted } from './quoted.js'
import { readBudgetFile, type BudgetRead } from './read-budget.js'
import { defaultSite, readSite, type SiteSettings } from './site-settings.js'

/** A folder with `budgets/`, and what stands in it. */
export interface Project {
  /** Absolute path. */
  readonly root: string
  readonly files: FileSource
  readonly site: SiteSettings
  /** Folders below `budgets/` that hold a budget, sorted by code unit. */
  readonly sensors: readonly string[]
  /** What is wrong with the project itself: names of folders, the site's settings. */
  readonly problems: readonly Problem[]
}

/**
 * The project around a folder: the nearest ancestor with `budgets/`, not above the root of its git repository; `root`
 * names it instead. Null where there is none.
 */
export function findProject(from: { readonly cwd: string; readonly root?: string | undefined }): Project | null {
  const root = from.root === undefined ? nearestRoot(resolve(from.cwd)) : resolve(from.cwd, from.root)
  if (root === null || !isFolder(join(root, 'budgets'))) return null
  return openProject(root, new NodeFiles(root))
}

/** A project whose files come from elsewhere than the disk, such as a commit's tree. */
export function openProject(root: string, files: FileSource): Project {
  const issues = new Issues()
  const site = readSite(files, issues)
  const sensors = listSensors(files, issues)
  return { root, files, site: site ?? defaultSite, sensors, problems: issues.sorted() }
}

/** Reads a budget file outside `budgets/`, by its path on the disk; its data files lie below its git root, or its folder. */
export function readBudgetAt(path: string): BudgetRead {
  const full = resolve(path)
  const folder = dirname(full)
  if (!isFolder(folder)) return missing(path)
  const root = gitRoot(folder) ?? folder
  const name = basename(full)
  const sensor = name === 'budget.yaml' ? basename(folder) : name.replace(/\.ya?ml$/, '')
  return readBudgetFile(new NodeFiles(root), { sensor, folder: relative(root, folder).split(sep).join('/'), name })
}

function missing(path: string): BudgetRead {
  const place = { file: path, line: 1, column: 1 }
  return { budget: null, problems: [{ severity: 'error', code: 'file', place, message: 'the file does not exist' }] }
}

function nearestRoot(start: string): string | null {
  for (let folder = start; ; folder = dirname(folder)) {
    if (isFolder(join(folder, 'budgets'))) return folder
    if (existsSync(join(folder, '.git')) || dirname(folder) === folder) return null
  }
}

function gitRoot(start: string): string | null {
  for (let folder = start; ; folder = dirname(folder)) {
    if (existsSync(join(folder, '.git'))) return folder
    if (dirname(folder) === folder) return null
  }
}

function isFolder(path: string): boolean {
  return statSync(path, { throwIfNoEntry: false })?.isDirectory() ?? false
}

function listSensors(files: FileSource, issues: Issues): string[] {
  const sensors: string[] = []
  const folded = new Map<string, string>()
  for (const { name, nature } of list(files, 'budgets')) {
    if (nature === 'other')
      issues.error(
        'sensor-name',
        { file: `budgets/${name}`, line: 1, column: 1 },
        `${quoted(name)} is a link, and links are not followed`,
      )
    if (nature !== 'folder' || !list(files, `budgets/${name}`).some(entry => entry.name === 'budget.yaml')) continue
    const place = { file: `budgets/${name}/budget.yaml`, line: 1, column: 1 }
    const fault = sensorFault(name)
    const twin = folded.get(name.toLowerCase())
    if (fault !== null) issues.error('sensor-name', place, `the folder ${quoted(name)} ${fault}`)
    else if (twin !== undefined)
      issues.error(
        'sensor-name',
        place,
        `the folders ${quoted(twin)} and ${quoted(name)} differ only in case; rename one`,
      )
    else sensors.push(name)
    folded.set(name.toLowerCase(), name)
  }
  return sensors
}

function list(files: FileSource, path: string): ReturnType<FileSource['list']> {
  try {
    return files.list(path)
  } catch (error) {
    if (error instanceof FileRefusal) return []
    throw error
  }
}
