import type { DensityField } from '../catalogue/declaration.js'
import type { Table } from '../model/budget.js'
import type { Place } from '../model/problem.js'
import { toDeclared, toDensity } from '../quantity/declared.js'
import { QuantityError } from '../quantity/error.js'
import { parseQuantity } from '../quantity/parse.js'
import { textOf } from './amount.js'
import { cellsFault, mostRows, readCsv, type CsvFault, type CsvRow } from './csv.js'
import { folderOf } from './compose-files.js'
import { FileRefusal, joinInside, type FileSource } from './file-source.js'
import type { Issues } from './issues.js'
import { quoted } from './quoted.js'
import { child, placeWithin, type Tree } from './tree.js'

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

/** Reads tables of densities from CSV files. */
export class TableReader {
  readonly tables: Table[] = []
  /** By path and lines skipped: many lines may name one file. */
  readonly #read = new Map<string, readonly CsvRow[] | CsvFault>()
  #rows = 0

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
    const path = joinInside(folderOf(fileTree.place.file), file)
    if (path === null) {
      this.issues.error(
        'file',
        fileTree.place,
        `${quoted(file)} must be a path from the folder of this file that stays inside the project`,
      )
      return null
    }
    const rows = this.#rowsOf(path, child(tree, 'skip'), { written: file, place: fileTree.place })
    if (rows === null) return null
    const table = this.#table(rows, columns, { file: path, place: fileTree.place })
    if (table === null || !this.#covers(table)) return null
    return this.tables.push(table) - 1
  }

  #rowsOf(path: string, skipTree: Tree | undefined, from: { written: string; place: Place }): readonly CsvRow[] | null {
    const skip = Number(textOf(skipTree) ?? 0)
    const key = `${skip} ${path}`
    const known = this.#read.get(key)
    const text = known === undefined ? this.#text(path, from.written, from.place) : ''
    if (text === null) return null
    const rows = known ?? readCsv(text, Number.isInteger(skip) ? skip : 0)
    this.#read.set(key, rows)
    if ('message' in rows) {
      this.issues.error('table', { file: path, line: rows.line, column: 1 }, rows.message)
      return null
    }
    this.#rows += rows.length
    if (this.#rows <= mostRows) return rows
    this.issues.error(
      'table',
      from.place,
      `the tables of one budget have at most ${mostRows} rows in all; thin them out`,
    )
    return null
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

  #table(rows: readonly CsvRow[], columns: Columns, from: { file: string; place: Place }): Table | null {
    if (rows.length < 2) {
      const count = rows.length === 1 ? 'one row' : 'no rows'
      this.issues.error('table', from.place, `${quoted(from.file)} has ${count}; a table needs two`)
      return null
    }
    const frequency = new Float64Array(rows.length)
    const psd = new Float64Array(rows.length)
    let faults = 0
    for (const [index, row] of rows.entries()) {
      const fault = cellsFault(row, index === 0) ?? fill(row, columns, { frequency, psd, index })
      if (fault === null) continue
      this.issues.error('table', { file: from.file, line: row.line, column: 1 }, fault)
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

interface Target {
  readonly frequency: Float64Array
  readonly psd: Float64Array
  readonly index: number
}

function fill({ cells }: CsvRow, columns: Columns, { frequency, psd, index }: Target): string | null {
  const [frequencyText = '', densityText = ''] = cells
  const f = Number(frequencyText) * columns.frequency
  const level = Number(densityText) * columns.density
  const power = columns.power ? level : level * level
  if (!(f > 0 && Number.isFinite(f))) return `the frequency ${quoted(frequencyText)} must be greater than 0 and finite`
  if (!(level > 0 && power > 0 && Number.isFinite(power)))
    return `the density ${quoted(densityText)} must be greater than 0 and finite`
  const before = index === 0 ? 0 : (frequency[index - 1] ?? 0)
  frequency[index] = f
  psd[index] = power
  if (f === before) return `the frequency ${quoted(frequencyText)} stands in two rows; keep one`
  if (f < before) return `the frequency ${quoted(frequencyText)} is below the row before it; sort the rows`
  return null
}
