import Table from 'cli-table3'
import pc from 'picocolors'
import { visible } from '../budget/format-problem.js'
import type { TextTable } from '../report/terminal.js'

/** Two spaces stand between columns, and no lines are drawn. */
const drawn = 'top top-mid top-left top-right bottom bottom-mid bottom-left bottom-right left left-mid mid mid-mid'
const chars = { ...Object.fromEntries(`${drawn} right right-mid`.split(' ').map(name => [name, ''])), middle: '  ' }

/** The table as lines of text, in colour only where a terminal shows it. */
export function printedTable({ head, rows, numeric }: TextTable, color: boolean): string {
  const { bold, dim } = pc.createColors(color)
  const table = new Table({
    chars,
    style: { head: [], border: [], 'padding-left': 0, 'padding-right': 0 },
    colAligns: head.map((_, column) => (numeric.includes(column) ? 'right' : 'left')),
  })
  table.push(head.map(cell => dim(visible(cell))))
  for (const [index, row] of rows.entries())
    table.push(row.map(cell => (index === 0 ? bold(visible(cell)) : visible(cell))))
  const lines = table.toString().split('\n')
  return `${lines.map(line => line.trimEnd()).join('\n')}\n`
}
