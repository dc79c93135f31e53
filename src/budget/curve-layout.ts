import type { Place } from '../model/problem.js'
import { textOf } from './amount.js'
import { mostCells, separators, type Separator } from './curve-cells.js'
import type { Issues } from './issues.js'
import { child, type Tree, type TreeScalar } from './tree.js'

/** How the rows of a file are written, as the budget states it. */
export interface Layout {
  readonly skip: number
  /** The line, counted from 1, that holds the names of the columns; null where columns are numbered. */
  readonly header: number | null
  readonly remarks: readonly string[]
  readonly separator: Separator
  /** Of frequency and density; null where a row has these two cells and no others. */
  readonly columns: readonly [Column, Column] | null
}

/** A number counted from 1, or a name in the header. */
export interface Column {
  readonly word: string
  readonly number: number | null
  readonly place: Place
}

/** Reads `skip`, `header`, `remarks`, `separator` and `columns`; null where they do not fit, which has been said. */
export function readLayout(table: Tree, issues: Issues): Layout | null {
  const columns = columnsOf(child(table, 'columns'))
  const named = columns?.find(column => column.number === null)
  const headerTree = child(table, 'header')
  const stated = wholeOf(headerTree)
  const skip = wholeOf(child(table, 'skip')) ?? (named === undefined ? 0 : (stated ?? 1))
  const layout = {
    skip,
    remarks: remarksOf(child(table, 'remarks')),
    separator: separatorOf(child(table, 'separator')),
  }
  const fault = headerFault({ named, headerTree, stated, skip }) ?? columnsFault(columns)
  if (fault === null) return { ...layout, columns, header: named === undefined ? null : (stated ?? skip) }
  issues.error('table-layout', fault.place, fault.message)
  return null
}

interface Fault {
  readonly place: Place
  readonly message: string
}

interface Header {
  readonly named: Column | undefined
  readonly headerTree: Tree | undefined
  readonly stated: number | null
  readonly skip: number
}

function headerFault({ named, headerTree, stated, skip }: Header): Fault | null {
  if (headerTree !== undefined && named === undefined)
    return {
      place: headerTree.place,
      message: '`header` is the line with the names of columns, but `columns` names none; delete one or name the other',
    }
  if (named === undefined) return null
  if (headerTree !== undefined && stated !== null && (stated < 1 || stated > skip))
    return {
      place: headerTree.place,
      message: `the header in line ${stated} must be one of the lines that \`skip\` passes over, 1 to ${skip}`,
    }
  if (skip > 0) return null
  const message = `\`${named.word}\` is the name of a column, but \`skip: 0\` leaves no line for names; skip the header`
  return { place: named.place, message }
}

function columnsFault(columns: Layout['columns']): Fault | null {
  if (columns === null) return null
  for (const { number, place } of columns)
    if (number !== null && !(number >= 1 && number <= mostCells))
      return { place, message: `there is no column ${number}; columns are counted from 1 to ${mostCells}` }
  const [first, second] = columns
  if (first.word !== second.word) return null
  return {
    place: second.place,
    message: `frequency and density are both taken from column \`${first.word}\`; name the column of each`,
  }
}

function columnsOf(tree: Tree | undefined): Layout['columns'] {
  if (tree?.type !== 'list' || tree.items.length !== 2) return null
  const [first, second] = tree.items.flatMap(item => (item.type === 'scalar' ? [columnOf(item)] : []))
  return first === undefined || second === undefined ? null : [first, second]
}

function columnOf({ text, plain, place }: TreeScalar): Column {
  return { word: text, number: plain && /^\d{1,6}$/.test(text) ? Number(text) : null, place }
}

function wholeOf(tree: Tree | undefined): number | null {
  const text = textOf(tree)
  return text !== null && /^\d{1,6}$/.test(text) ? Number(text) : null
}

function remarksOf(tree: Tree | undefined): readonly string[] {
  const marks = (tree?.type === 'list' ? tree.items : [tree]).flatMap(item => textOf(item) ?? [])
  return marks.length === 0 ? ['#'] : marks
}

function separatorOf(tree: Tree | undefined): Separator {
  return separators.find(separator => separator === textOf(tree)) ?? 'comma'
}
