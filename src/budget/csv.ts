import { CsvError, parse } from 'csv-parse/sync'
import { quoted } from './quoted.js'

export const mostRows = 100_000
/** Blank lines and remarks included. */
const mostLines = 2 * mostRows
const longestLine = 1000
const mostCells = 10

/** A row of cells with the line it stands in. */
export interface CsvRow {
  readonly line: number
  readonly cells: readonly string[]
}

/** Why a text is no table of cells: the line and a sentence. */
export interface CsvFault {
  readonly line: number
  readonly message: string
}

interface Parsed {
  readonly record: readonly string[]
  readonly info: { readonly lines: number }
}

/** Rows of a CSV text behind `skip` lines; lines that begin with `#` and empty lines are passed over. */
export function readCsv(text: string, skip: number): readonly CsvRow[] | CsvFault {
  const unbounded = refuseUnbounded(text)
  if (unbounded !== null) return unbounded
  try {
    const records: unknown = parse(text, {
      bom: true,
      comment: '#',
      comment_no_infix: true,
      from_line: skip + 1,
      skip_empty_lines: true,
      trim: true,
      relax_column_count: true,
      to: mostRows + 1,
      info: true,
    })
    return (records as readonly Parsed[]).map(({ record, info }) => ({ line: info.lines, cells: record }))
  } catch (error) {
    if (!(error instanceof CsvError)) throw error
    const lines: unknown = error['lines']
    const line = typeof lines === 'number' && lines > 0 ? lines : 1
    return { line, message: 'this line is no CSV: a quotation mark is not closed, or stands inside a cell' }
  }
}

/** The library takes a minute for a file of commas: lines and cells are bounded before it sees them. */
function refuseUnbounded(text: string): CsvFault | null {
  let line = 1
  let start = 0
  let commas = 0
  for (let at = 0; at < text.length; at++) {
    const code = text.charCodeAt(at)
    if (code === 0x2c) commas++
    if (at - start > longestLine) return { line, message: `this line is longer than ${longestLine} characters` }
    if (commas >= mostCells && !text.startsWith('#', start))
      return { line, message: `this row has more than ${mostCells} cells; frequency and density are two` }
    if (code !== 0x0a) continue
    if (++line > mostLines) return { line, message: `the file has more than ${mostLines} lines` }
    start = at + 1
    commas = 0
  }
  return null
}

const decimal = /^[+-]?(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d{1,4})?$/

/** What is wrong with the cells of a row; null for two numbers. */
export function cellsFault({ cells }: CsvRow, isFirst: boolean): string | null {
  if (cells.length === 1) return 'this row has one cell; frequency and density are two, with a comma between them'
  if (cells.length !== 2) return `this row has ${cells.length} cells; frequency and density are two`
  for (const cell of cells) {
    if (cell === '') return 'this row has an empty cell; an empty cell is not 0: write the number or delete the row'
    if (decimal.test(cell)) continue
    const remedy = isFirst ? '; if this is a headline, pass over it with `skip: 1`' : ', such as `2.5e-18`'
    return `${quoted(cell)} is no number with a decimal point${remedy}`
  }
  return null
}
