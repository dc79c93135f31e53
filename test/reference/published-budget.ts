import { fileURLToPath } from 'node:url'
import { formatProblem } from '../../src/budget/format-problem.js'
import { NodeFiles } from '../../src/budget/node-files.js'
import { readBudgetFile } from '../../src/budget/read-budget.js'
import type { Budget } from '../../src/model/budget.js'

const files = new NodeFiles(fileURLToPath(new URL('budgets', import.meta.url)))

/** A budget of `test/reference/budgets`, read through the border like any other; its problems are the error. */
export function publishedBudget(sensor: string): Budget {
  const { budget, problems } = readBudgetFile(files, { sensor, folder: sensor, name: 'budget.yaml' })
  if (budget === null || problems.length > 0) throw new Error(problems.map(formatProblem).join('\n'))
  return budget
}
