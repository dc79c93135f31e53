import type { Budget } from '../model/budget.js'
import type { Problem } from '../model/problem.js'
import { FileRefusal, type FileSource } from './file-source.js'
import { Issues } from './issues.js'
import { resolve } from './resolve.js'
import { validateShape } from './validate.js'
import { readYaml } from './yaml.js'

export interface BudgetRead {
  /** Null where a problem is an error. */
  readonly budget: Budget | null
  /** In the order of the file, warnings included. */
  readonly problems: readonly Problem[]
}

/** Reads the budget of one sensor of a project. Whatever the files hold, it returns and does not throw. */
export function readBudget(project: { readonly files: FileSource }, sensor: string): BudgetRead {
  return readBudgetFile(project.files, { sensor, folder: `budgets/${sensor}`, name: 'budget.yaml' })
}

/** A budget file anywhere below the root of a source. */
export interface BudgetAddress {
  readonly sensor: string
  /** From the root, with forward slashes; empty for the root itself. */
  readonly folder: string
  readonly name: string
}

export function readBudgetFile(files: FileSource, { sensor, folder, name }: BudgetAddress): BudgetRead {
  const file = folder === '' ? name : `${folder}/${name}`
  const issues = new Issues()
  const tree = readTree(files, file, issues)
  if (tree === null) return { budget: null, problems: issues.sorted() }
  validateShape(tree, issues)
  issues.nextStage()
  const budget = resolve(tree, { sensor, file, data: { files, folder } }, issues)
  return { budget: issues.failed ? null : budget, problems: issues.sorted() }
}

function readTree(files: FileSource, file: string, issues: Issues): ReturnType<typeof readYaml>['tree'] {
  let bytes: Uint8Array
  try {
    bytes = files.read(file)
  } catch (error) {
    if (!(error instanceof FileRefusal)) throw error
    issues.error('file', { file, line: 1, column: 1 }, `the file ${error.message}`)
    return null
  }
  const { tree, problems } = readYaml(file, bytes)
  for (const problem of problems) issues.add(problem)
  return tree
}
