import { join, relative } from 'node:path'
import { sensorFault } from '../../budget/names.js'
import { suggestion } from '../../budget/nearest.js'
import { quoted } from '../../budget/quoted.js'
import type { Starter } from '../../budget/starter.js'
import { starterText } from '../../budget/starter-text.js'
import { starters } from '../../budget/starters.js'
import { CallError } from '../call-error.js'
import { exitCodes, type ExitCode, type Io } from '../io.js'
import { projectOf } from '../project.js'
import { writeNew } from '../write-new.js'

export interface NewOptions {
  readonly root?: string
  /** Name of a starter. */
  readonly like: string
  readonly sensor: string
}

/** Writes the first budget of a sensor and says what to do next. */
export function newBudget({ root, like, sensor }: NewOptions, io: Io): ExitCode {
  const fault = sensorFault(sensor)
  if (fault !== null) throw new CallError(`${quoted(sensor)} ${fault}`)
  const starter = starterNamed(like)
  const project = projectOf(root, io)
  const budgets = join(project.root, 'budgets')
  writeNew(budgets, sensor, starterText(starter, sensor, project.site.output))
  const path = relative(io.cwd, join(budgets, sensor, 'budget.yaml')).replaceAll('\\', '/')
  io.out(`${path} is written; every value in it is assumed.\n`)
  io.out(`Next: floorbook check ${sensor}; floorbook show ${sensor}; floorbook serve\n`)
  return exitCodes.fine
}

function starterNamed(like: string): Starter {
  const starter = starters.get(like)
  if (starter !== undefined) return starter
  const names = [...starters.keys()]
  const known = names.map(name => `\`${name}\``).join(', ')
  throw new CallError(`--like: ${quoted(like)} is no kind of sensor; there are ${known}${suggestion(like, names)}`)
}
