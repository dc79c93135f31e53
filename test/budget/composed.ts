import { formatProblem } from '../../src/budget/format-problem.js'
import { readBudget, type BudgetRead } from '../../src/budget/read-budget.js'
import type { Budget, Root } from '../../src/model/budget.js'
import { MemoryFiles } from './memory-files.js'
import { small } from './read.js'

/** A budget that builds on `small`, which lies in `budgets/drum/budget.yaml`. */
export const head = `format: 1
title: Colder membrane
revision: 0.1
from: ../drum/budget.yaml
`

export const base = { 'budgets/drum/budget.yaml': small }

/** Reads `budgets/tern/budget.yaml` of a project that exists only in the test. */
export function readTern(files: Readonly<Record<string, string>>): BudgetRead {
  return readBudget({ files: new MemoryFiles(files) }, 'tern')
}

/** The budget of files that must be good: what `small` says, and what `text` says over it. */
export function tern(text: string, more: Readonly<Record<string, string>> = {}): Budget {
  const { budget, problems } = readTern({ ...base, 'budgets/tern/budget.yaml': text, ...more })
  if (budget === null) throw new Error(problems.map(formatProblem).join('\n'))
  return budget
}

export function root(budget: Budget, id: string): Root {
  const found = budget.roots.find(each => each.id === id)
  if (found === undefined) throw new Error(`no root ${id}; there are ${budget.roots.map(each => each.id).join(' ')}`)
  return found
}
