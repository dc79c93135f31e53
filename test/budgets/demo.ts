import { fileURLToPath } from 'node:url'
import { NodeFiles } from '../../src/budget/node-files.js'
import { formatProblem } from '../../src/budget/format-problem.js'
import { openProject } from '../../src/budget/project.js'
import { readBudget } from '../../src/budget/read-budget.js'
import { assess, evaluateAtFrequencies } from '../../src/engine/assess.js'
import type { Assessment } from '../../src/model/assessment.js'
import type { Budget } from '../../src/model/budget.js'

export const files = new NodeFiles(fileURLToPath(new URL('../../', import.meta.url)))

/** Folders of `budgets/` that hold a sensor. */
export const sensors: readonly string[] = openProject('', files).sensors

export function demoBudget(sensor: string): Budget {
  const { budget, problems } = readBudget({ files }, sensor)
  if (budget === null) throw new Error(problems.map(formatProblem).join('\n'))
  return budget
}

const assessed = new Map<string, Assessment>()

export function demo(sensor: string): Assessment {
  const known = assessed.get(sensor)
  if (known !== undefined) return known
  const assessment = assess(demoBudget(sensor))
  assessed.set(sensor, assessment)
  return assessment
}

/** Amplitude density of a line, or of the total, at one frequency in Hz. */
export function asdOf(sensor: string, line: string, frequency: number): number {
  const evaluation = evaluateAtFrequencies(demoBudget(sensor), [frequency])
  const psd = line === 'total' ? evaluation.total : evaluation.lines.find(each => each.id === line)?.psd
  if (psd === undefined) throw new Error(`${sensor} has no line ${line}`)
  return Math.sqrt(psd[0])
}

/** The line that is largest around a frequency in Hz. */
export function largestAt(sensor: string, frequency: number): string | undefined {
  return demo(sensor).headlines.dominance.find(({ from, to }) => from <= frequency && frequency <= to)?.line
}
