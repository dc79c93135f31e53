import { randomInt } from 'node:crypto'
import { linkSync, lstatSync, mkdirSync, readdirSync, rmSync, rmdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { quoted } from '../budget/quoted.js'
import { CallError } from './call-error.js'

/**
 * Writes `budgets/<sensor>/budget.yaml`, whole or not at all, and never over anything: the text is complete in a file
 * beside the folder before it gets its name, by a link, which no file that is there already lets happen.
 */
export function writeNew(budgets: string, sensor: string, text: string): void {
  const folder = join(budgets, sensor)
  refuseTaken(budgets, sensor)
  const draft = join(budgets, `.new-${sensor}-${randomInt(2 ** 47)}`)
  const isOurs = !exists(folder)
  try {
    writeFileSync(draft, text, { flag: 'wx', flush: true })
    if (isOurs) mkdirSync(folder)
    linkSync(draft, join(folder, 'budget.yaml'))
  } catch (error) {
    if (isOurs && exists(folder)) rmdirSync(folder)
    throw error
  } finally {
    rmSync(draft, { force: true })
  }
}

function refuseTaken(budgets: string, sensor: string): void {
  const shown = `budgets/${sensor}`
  const twin = readdirSync(budgets).find(name => name !== sensor && name.toLowerCase() === sensor.toLowerCase())
  if (twin !== undefined)
    throw new CallError(`\`${sensor}\` and ${quoted(twin)} differ only in case; choose another name`)
  const folder = join(budgets, sensor)
  if (!exists(folder)) return
  if (!lstatSync(folder).isDirectory())
    throw new CallError(`\`${shown}\` is there and is no folder; choose another name`)
  if (exists(join(folder, 'budget.yaml')))
    throw new CallError(`\`${shown}/budget.yaml\` is there already and is left as it is; choose another name`)
}

/** A link that leads nowhere is there too. */
function exists(path: string): boolean {
  return lstatSync(path, { throwIfNoEntry: false }) !== undefined
}
