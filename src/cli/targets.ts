import { statSync } from 'node:fs'
import { join, relative, resolve, sep } from 'node:path'
import { suggestion } from '../budget/nearest.js'
import { readBudgetAt, type Project } from '../budget/project.js'
import { readBudget, type BudgetRead } from '../budget/read-budget.js'
import { CallError } from './call-error.js'
import type { Io } from './io.js'
import { projectOf } from './project.js'

/** One budget that a call is about. */
export interface Target {
  /** The folder's name. */
  readonly name: string
  /** As a person would type it. */
  readonly file: string
  readonly read: () => BudgetRead
}

/** All budgets of a project, or those that the call names. */
export function targetsInside(project: Project, names: readonly string[], io: Io): readonly Target[] {
  if (names.length === 0) return project.sensors.map(sensor => targetOf(project, sensor))
  const sensors = new Set(names.map(name => sensorNamed(project, name, io) ?? refuseUnknown(project, name)))
  return [...sensors].map(sensor => targetOf(project, sensor))
}

/** One budget by its name, or by a path to its folder or file, which may lie outside every project. */
export function targetNamed(project: Project | null, name: string, io: Io): Target {
  const sensor = project === null ? null : sensorNamed(project, name, io)
  if (project !== null && sensor !== null) return targetOf(project, sensor)
  const file = fileAt(name, io)
  if (file !== null) return { name: nameOf(file), file: relative(io.cwd, file), read: () => readBudgetAt(file) }
  return refuseUnknown(project ?? projectOf(undefined, io), name)
}

function targetOf(project: Project, sensor: string): Target {
  const file = `budgets/${sensor}/budget.yaml`
  return { name: sensor, file, read: () => readBudget(project, sensor) }
}

function sensorNamed(project: Project, name: string, io: Io): string | null {
  if (project.sensors.includes(name)) return name
  const file = fileAt(name, io)
  if (file === null) return null
  const [folder, sensor, budget, ...more] = relative(project.root, file).split(sep)
  const inside = folder === 'budgets' && budget === 'budget.yaml' && more.length === 0
  return inside && sensor !== undefined && project.sensors.includes(sensor) ? sensor : null
}

/** The budget file that a path means, or null where nothing stands there. */
function fileAt(name: string, io: Io): string | null {
  const path = resolve(io.cwd, name)
  const nature = natureOf(path)
  if (nature !== 'folder') return nature === 'file' ? path : null
  const inside = join(path, 'budget.yaml')
  return natureOf(inside) === 'file' ? inside : null
}

/** A path that cannot be looked at, whatever the reason, holds nothing. */
function natureOf(path: string): 'file' | 'folder' | null {
  try {
    const status = statSync(path)
    return status.isFile() ? 'file' : status.isDirectory() ? 'folder' : null
  } catch {
    return null
  }
}

function nameOf(file: string): string {
  const parts = file.split(sep)
  const last = parts[parts.length - 1]
  return last === 'budget.yaml' && parts.length > 1 ? parts[parts.length - 2] : last.replace(/\.ya?ml$/, '')
}

function refuseUnknown(project: Project, name: string): never {
  const shown = project.sensors.slice(0, 12).map(sensor => `\`${sensor}\``)
  const more = project.sensors.length > shown.length ? ' …' : ''
  const choice =
    shown.length === 0
      ? 'the project has none yet'
      : `there ${shown.length === 1 ? 'is' : 'are'} ${shown.join(', ')}${more}`
  throw new CallError(`no budget is called \`${name}\`; ${choice}${suggestion(name, project.sensors)}`)
}
