import { CsvError, parse } from 'csv-parse/sync'
import type { DensityField } from '../catalogue/declaration.js'
import type { Table } from '../model/budget.js'
import type { Place } from '../model/problem.js'
import { toDeclared, toDensity } from '../quantity/declared.js'
import { QuantityError } from '../quantity/error.js'
import { parseQuantity } from '../quantity/parse.js'
import { textOf } from './amount.js'
import { FileRefusal, joinInside, type FileSource } from './file-source.js'
import type { Issues } from './issues.js'
import { quoted } from './quoted.js'
import { child, placeWithin, type Tree } from './tree.js'

const mostRows = 200_000

/** Where the data files of a budget are looked for, and the band that a table must cover. */
export interface DataFolder {
  readonly files: FileSource
  /** The budget's folder, from the root. */
  readonly folder: string
}

export interface Band {
  readonly low: number
  readonly high: number
}

interface Columns {
  readonly frequency: number
  readonly density: number
  readonly power: boolean
}

/** A row as the CSV library gives it, with the line it ends in. */
interface Row {
  readonly record: readonly string[]
  readonly info: { readonly lines: number }
}

/** Reads tables of densities from CSV files. */
export class TableReader {
  readonly tables: Table[] = []

  constructor(
    readonly data: DataFolder,
    readonly band: Band | null,
    readonly issues: Issues,
  ) {}

  /** Index of the table, or null where it is refused, which has been said. */
  read(tree: Tree, of: DensityField['of']): number | null {
    const fileTree = child(tree, 'file')
    const file = textOf(fileTree)
    const columns = this.#columns(child(tree, 'units'), of)
    if (fileTree === undefined || file === null || columns === null) return null
    const path = joinInside(this.data.folder, file)
    if (path === null) {
      this.issues.error(
        'file',
        fileTree.place,
        `${quoted(file)} must be a path from the budget’s folder that stays inside the project`,
      )
      return null
    }
    const text = this.#text(path, file, fileTree.place)
    if (text === null) return null
    const skip = Number(textOf(child(tree, 'skip')) ?? 0)
    const rows = this.#rows(text, Number.isInteger(skip) ? skip : 0, path)
    const table = rows === null ? null : this.#table(rows, columns, { file: path, place: fileTree.place })
    if (table === null || !this.#covers(table)) return null
    return this.tables.push(table) - 1
  }

  #columns(units: Tree | undefined, of: DensityField['of']): Columns | null {
    if (units?.type !== 'list' || units.items.length !== 2) return null
    const frequency = this.#unit(units.items[0], text => toDeclared(parseQuantity(`1 ${text}`), 'frequency').value)
    const density = this.#unit(units.items[1], text => toDensity(parseQuantity(text === '1' ? '1' : `1 ${text}`), of))
    if (frequency === null || density === null) return null
    return { frequency, density: density.value, power: density.power }
  }

  #unit<Result>(tree: Tree | undefined, meaning: (text: string) => Result): Result | null {
    const text = textOf(tree)
    if (tree?.type !== 'scalar' || text === null) return null
    try {
      return meaning(text)
    } catch (error) {
      if (!(error instanceof QuantityError)) throw error
      this.issues.error('quantity', placeWithin(tree, Math.max(0, error.offset - 2)), error.message)
      return null
    }
  }

  #text(path: string, written: string, place: Place): string | null {
    try {
      return new TextDecoder('utf-8', { fatal: true }).decode(this.data.files.read(path))
    } catch (error) {
      const reason =
        error instanceof FileRefusal ? error.message : error instanceof TypeError ? 'is not UTF-8 text' : null
      if (reason === null) throw error
      this.issues.error('file', place, `the file ${quoted(written)} ${reason}`)
      return null
    }
  }

  #rows(text: string, skip: number, file: string): string[][] | null {
    try {
      const records: unknown = parse(text, {
        comment: '#',
        comment_no_infix: true,
        from_line: skip + 1,
        skip_empty_lines: true,
        trim: true,
        relax_column_count: true,
        to: mostRows + 1,
        max_record_size: 10_000,
        info: true,
      })
      return (records as readonly Row[]).map(({ record, info }) => [String(info.lines), ...record])
    } catch (error) {
      if (!(error instanceof CsvError)) throw error
      const line = Number((error as { lines?: unknown }).lines)
      const place = { file, line: Number.isFinite(line) && line > 0 ? line : 1, column: 1 }
      this.issues.error('table', place, `this line is no CSV: ${error.message.split('\n')[0] ?? ''}`)
      return null
    }
  }

  #table(rows: readonly string[][], columns: Columns, from: { file: string; place: Place }): Table | null {
    if (rows.length < 2 || rows.length > mostRows) {
      this.issues.error(
        'table',
        from.place,
        `${quoted(from.file)} has ${rows.length > mostRows ? 'more than ' + mostRows : rows.length} rows; a table has 2 to ${mostRows}`,
      )
      return null
    }
    const frequency = new Float64Array(rows.length)
    const psd = new Float64Array(rows.length)
    let faults = 0
    for (const [index, row] of rows.entries()) {
      const place = { file: from.file, line: Number(row[0]), column: 1 }
      const fault = rowFault(row) ?? fill(row, columns, { frequency, psd, index })
      if (fault === null) continue
      this.issues.error('table', place, fault)
      if (++faults >= 5) return null
    }
    return faults > 0 ? null : { ...from, frequency, psd }
  }

  #covers(table: Table): boolean {
    const first = table.frequency[0] ?? NaN
    const last = table.frequency[table.frequency.length - 1] ?? NaN
    if (this.band === null || (first <= this.band.low && last >= this.band.high)) return true
    this.issues.error(
      'table-band',
      table.place,
      `${quoted(table.file)} goes from ${first} Hz to ${last} Hz, but the band from ${this.band.low} Hz to ${this.band.high} Hz; a table is never extrapolated: add rows or narrow the band`,
    )
    return false
  }
}

const decimal = /^[+-]?(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d{1,4})?$/

/** What is wrong with the cells of a row, whose first entry is its line. */
function rowFault(row: readonly string[]): string | null {
  const cells = row.slice(1)
  if (cells.length !== 2) return `this row has ${cells.length} cells; frequency and density are two`
  for (const cell of cells) {
    if (cell === '') return 'this row has an empty cell; an empty cell is not 0: write the number or delete the row'
    if (!decimal.test(cell)) return `${quoted(cell)} is no number; write it with a decimal point, such as \`2.5e-18\``
  }
  return null
}

interface Target {
  readonly frequency: Float64Array
  readonly psd: Float64Array
  readonly index: number
}

function fill(row: readonly string[], columns: Columns, { frequency, psd, index }: Target): string | null {
  const f = Number(row[1]) * columns.frequency
  const level = Number(row[2]) * columns.density
  const power = columns.power ? level : level * level
  if (!(f > 0 && Number.isFinite(f))) return `the frequency ${quoted(row[1] ?? '')} must be greater than 0 and finite`
  if (!(power > 0 && Number.isFinite(power)))
    return `the density ${quoted(row[2] ?? '')} must be greater than 0 and finite`
  const before = index === 0 ? 0 : (frequency[index - 1] ?? 0)
  frequency[index] = f
  psd[index] = power
  if (f === before) return `the frequency ${quoted(row[1] ?? '')} stands in two rows; keep one`
  if (f < before) return `the frequency ${quoted(row[1] ?? '')} is below the row before it; sort the rows`
  return null
}
