import type { Place } from '../model/problem.js'
import { cellsOf, type Cell, type Separator } from './curve-cells.js'
import type { Column, Layout } from './curve-layout.js'
import { linesOf, rowLinesOf, type FileFault, type FileLine } from './curve-lines.js'
import { suggestion } from './nearest.js'
import { quoted } from './quoted.js'

/** The two cells of a row that count. */
export interface CurveRow {
  readonly line: number
  readonly frequency: Cell
  readonly density: Cell
}

/** A fault of the mapping: its place in the budget. */
export interface MappingFault {
  readonly place: Place
  readonly message: string
}

export interface CurveRows {
  readonly rows: readonly CurveRow[]
  /** Of the file, the first few. */
  readonly faults: readonly FileFault[]
  readonly mapping: MappingFault | null
}

/** More faults of one file than these tell nobody anything. */
export const mostFaults = 5

/** The rows of a text, each with the two cells that the layout points at. */
export function readRows(text: string, layout: Layout): CurveRows {
  const lines = linesOf(text)
  if ('message' in lines) return { rows: [], faults: [lines], mapping: null }
  const found = rowLinesOf(lines, layout)
  if ('message' in found) return { rows: [], faults: [found], mapping: null }
  const indices = indicesOf(layout, lines)
  if (indices !== null && 'message' in indices)
    return 'place' in indices
      ? { rows: [], faults: [], mapping: indices }
      : { rows: [], faults: [indices], mapping: null }
  const rows: CurveRow[] = []
  const faults: FileFault[] = []
  for (const line of found) {
    const row = rowOf(line, layout.separator, indices)
    if (!('message' in row)) rows.push(row)
    else if (faults.push(row) >= mostFaults) break
  }
  return { rows, faults, mapping: null }
}

type Indices = readonly [number, number]

function indicesOf(layout: Layout, lines: readonly FileLine[]): Indices | MappingFault | FileFault | null {
  if (layout.columns === null) return null
  const names = layout.header === null ? [] : namesOf(layout, lines)
  if ('message' in names) return names
  const [first, second] = layout.columns.map(column => indexOf(column, names))
  if (first === undefined || second === undefined) return null
  if (typeof first !== 'number') return first
  return typeof second === 'number' ? [first, second] : second
}

/** The names in the header, whatever mark of a remark stands in front of them. */
function namesOf({ header, remarks, separator }: Layout, lines: readonly FileLine[]): readonly Cell[] | FileFault {
  const number = header ?? 1
  const text = lines[number - 1]?.text ?? ''
  const mark = remarks.find(each => text.trimStart().startsWith(each)) ?? ''
  const cells = cellsOf(text.slice(text.indexOf(mark) + mark.length), separator)
  return 'message' in cells ? { line: number, ...cells } : cells
}

function indexOf({ word, number, place }: Column, names: readonly Cell[]): number | MappingFault {
  if (number !== null) return number - 1
  const found = names.flatMap((name, index) => (name.text === word ? [index] : []))
  const [index] = found
  if (found.length > 1)
    return {
      place,
      message: `${found.length} columns are called ${quoted(word)}; give the number of the one that is meant`,
    }
  if (index !== undefined) return index
  const known = names.slice(0, 12).map(name => quoted(name.text))
  const message = `no column is called ${quoted(word)}; the header has ${known.join(', ')}${names.length > 12 ? ' …' : ''}`
  return {
    place,
    message: `${message}${suggestion(
      word,
      names.map(name => name.text),
    )}`,
  }
}

function rowOf(line: FileLine, separator: Separator, indices: Indices | null): CurveRow | FileFault {
  const cells = cellsOf(line.text, separator)
  if ('message' in cells) return { line: line.number, ...cells }
  const [frequency, density] = (indices ?? [0, 1]).map(index => cells[index])
  const complete = frequency !== undefined && density !== undefined
  if (complete && (indices !== null || cells.length === 2)) return { line: line.number, frequency, density }
  return { line: line.number, column: 1, message: countFault(line.text, { cells, separator, indices }) }
}

interface Counted {
  readonly cells: readonly Cell[]
  readonly separator: Separator
  readonly indices: Indices | null
}

const words = { comma: 'a comma', semicolon: 'a semicolon', tab: 'a tab', spaces: 'spaces' }

function countFault(text: string, { cells, separator, indices }: Counted): string {
  const have = cells.length === 1 ? 'one cell' : `${cells.length} cells`
  const other = otherSeparator(text, separator)
  const hint = other === null ? '' : `; if ${words[other]} parts its cells, state \`separator: ${other}\``
  if (indices !== null) return `this row has ${have}, but column ${Math.max(...indices) + 1} is wanted${hint}`
  if (cells.length === 1)
    return `this row has one cell; frequency and density are two, with ${words[separator]} between them${hint}`
  const choice = hint === '' ? '; say which two with `columns`, such as `columns: [1, 3]`' : hint
  return `this row has ${have}; frequency and density are two${choice}`
}

/** What seems to stand between the cells instead. */
function otherSeparator(text: string, separator: Separator): Separator | null {
  const seen = text.trim()
  const found: readonly (readonly [Separator, boolean])[] = [
    ['semicolon', seen.includes(';')],
    ['tab', seen.includes('\t') && separator !== 'spaces'],
    ['comma', seen.includes(',') && separator !== 'semicolon'],
    ['spaces', / /.test(seen) && !seen.includes(',')],
  ]
  return found.find(([name, fits]) => fits && name !== separator)?.[0] ?? null
}
