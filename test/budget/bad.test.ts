import { readdirSync, readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'
import { formatProblem } from '../../src/budget/format-problem.js'
import { NodeFiles } from '../../src/budget/node-files.js'
import { readBudgetFile } from '../../src/budget/read-budget.js'

// One table for all wording: `[code] file:line:column: message`, in the order of the files. Every line of it was read by
// a person; when a message changes on purpose, change its line.
const folder = fileURLToPath(new URL('bad', import.meta.url))
const table = readFileSync(`${folder}/expected.txt`, 'utf8').trimEnd().split('\n')
const names = readdirSync(folder).filter(name => name.endsWith('.yaml'))
const files = new NodeFiles(folder)

/** Lines about a data file stand with the budget that names it. */
function expectedFor(name: string): string[] {
  const data = name === 'table-rows.yaml' ? 'data/rows.csv' : '(none)'
  return table.filter(line => line.includes(`] ${name}:`) || line.includes(`] ${data}:`))
}

describe('a bad budget file', () => {
  it('has lines in the table, and every line a file', () => {
    expect(names.flatMap(expectedFor).sort()).toEqual([...table].sort())
    expect(names.filter(name => expectedFor(name).length === 0)).toEqual([])
  })

  it.each(names)('%s is told with place, value and remedy', name => {
    const { budget, problems } = readBudgetFile(files, { sensor: 'drum', folder: '', name })
    expect(problems.map(problem => `[${problem.code}] ${formatProblem(problem)}`)).toEqual(expectedFor(name))
    expect(budget === null).toBe(problems.some(problem => problem.severity === 'error'))
  })
})
