import type { Budget } from '../model/budget.js'
import type { Problem } from '../model/problem.js'
import { ComposeFiles } from './compose-files.js'
import { compose } from './compose.js'
import type { FileSource } from './file-source.js'
import { Issues } from './issues.js'
import { resolve } from './resolve.js'
import type { Tree } from './tree.js'
import { validateShape } from './validate.js'
import { readVariants } from './variant.js'

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
  const tree = compose(file, new ComposeFiles(files, issues), issues)
  if (tree === null) return { budget: null, problems: issues.sorted() }
  const read = (whole: Tree, into: Issues): Budget | null => {
    into.nextStage()
    validateShape(whole, into)
    into.nextStage()
    return resolve(whole, { sensor, file, data: { files, folder } }, into)
  }
  const budget = read(tree, issues)
  const variants = readVariants(tree, read, issues)
  return { budget: issues.failed || budget === null ? null : { ...budget, variants }, problems: issues.sorted() }
}
