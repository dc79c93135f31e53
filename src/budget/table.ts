import type { Slot, Table } from '../model/budget.js'
import type { Place } from '../model/problem.js'
import { toDeclared } from '../quantity/declared.js'
import { QuantityError } from '../quantity/error.js'
import { parseQuantity } from '../quantity/parse.js'
import { textOf } from './amount.js'
import { readBand } from './band.js'
import { folderOf } from './compose-files.js'
import { readLayout, type Layout } from './curve-layout.js'
import { mostRows } from './curve-lines.js'
import { scalesPower } from './curve-meaning.js'
import { curveOf, type Curve } from './curve-numbers.js'
import { readReading, type CurveReading, type CurveSpot } from './curve-reading.js'
import { readRows, type CurveRows } from './curve-rows.js'
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

/** A table as a density names it. */
export interface TableRead {
  readonly table: number
  readonly scale: { readonly factor: Slot; readonly power: boolean } | null
}

interface Source {
  readonly path: string
  /** As the budget writes it. */
  readonly written: string
  readonly place: Place
}

/** Reads tables of densities from files as instruments write them. */
export class TableReader {
  readonly tables: Table[] = []
  /** By path and layout: many lines may name one file. */
  readonly #read = new Map<string, CurveRows>()
  #rows = 0

  constructor(
    readonly data: DataFolder,
    readonly band: Band | null,
    readonly issues: Issues,
  ) {}

  /** Null where the table is refused, which has been said. */
  read(tree: Tree, spot: CurveSpot): TableRead | null {
    const source = this.#source(child(tree, 'file'))
    const layout = readLayout(tree, this.issues)
    const frequency = this.#frequency(child(tree, 'units'))
    const reading = readReading(tree, spot)
    const keepTree = child(tree, 'keep')
    const keep = keepTree === undefined ? null : readBand(keepTree, this.issues)
    if (source === null || layout === null || frequency === null || reading === null) return null
    if (keepTree !== undefined && keep === null) return null
    const sorted = textOf(child(tree, 'order')) === 'any'
    const rows = this.#rowsOf(source, layout)
    const curve = rows === null ? null : this.#curve(source, curveOf(rows, { frequency, reading, keep, sorted }))
    if (curve === null) return null
    const table = { file: source.path, place: source.place, ...curve, ...statedOf(tree) }
    if (!this.#covers(table)) return null
    return { table: this.tables.push(table) - 1, scale: scaleOf(reading, spot) }
  }

  /** A path is meant from the folder of the file in which it stands. */
  #source(tree: Tree | undefined): Source | null {
    const written = textOf(tree)
    if (tree === undefined || written === null) return null
    const path = joinInside(folderOf(tree.place.file), written)
    if (path !== null) return { path, written, place: tree.place }
    this.issues.error(
      'file',
      tree.place,
      `${quoted(written)} must be a path from the folder of this file that stays inside the project`,
    )
    return null
  }

  #frequency(units: Tree | undefined): number | null {
    const tree = units?.type === 'list' ? units.items[0] : undefined
    const text = textOf(tree)
    if (tree?.type !== 'scalar' || text === null) return null
    try {
      return toDeclared(parseQuantity(`1 ${text}`), 'frequency').value
    } catch (error) {
      if (!(error instanceof QuantityError)) throw error
      this.issues.error('quantity', placeWithin(tree, Math.max(0, error.offset - 2)), error.message)
      return null
    }
  }

  #rowsOf(source: Source, layout: Layout): CurveRows['rows'] | null {
    const key = JSON.stringify([
      source.path,
      { ...layout, columns: layout.columns?.map(({ word, number }) => [word, number]) },
    ])
    const known = this.#read.get(key)
    const text = known === undefined ? this.#text(source) : ''
    if (text === null) return null
    const { rows, faults, mapping } = known ?? readRows(text, layout)
    // A fault of the mapping is not kept: it is said at each table that makes it.
    if (mapping === null) this.#read.set(key, { rows, faults, mapping })
    else this.issues.error('table-layout', mapping.place, mapping.message)
    this.#tell(source, faults)
    if (mapping !== null || faults.length > 0) return null
    this.#rows += rows.length
    if (this.#rows <= mostRows) return rows
    this.issues.error(
      'table',
      source.place,
      `the tables of one budget have at most ${mostRows} rows in all; thin them out`,
    )
    return null
  }

  #text({ path, written, place }: Source): string | null {
    try {
      return new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(this.data.files.read(path))
    } catch (error) {
      const reason =
        error instanceof FileRefusal ? error.message : error instanceof TypeError ? 'is not UTF-8 text' : null
      if (reason === null) throw error
      this.issues.error('file', place, `the file ${quoted(written)} ${reason}`)
      return null
    }
  }

  #tell({ path }: Source, faults: CurveRows['faults']): void {
    for (const { line, column, message } of faults) this.issues.error('table', { file: path, line, column }, message)
  }

  #curve(source: Source, curve: ReturnType<typeof curveOf>): Curve | null {
    if (!('psd' in curve)) {
      this.#tell(source, curve)
      return null
    }
    if (curve.psd.length >= 2) return curve
    const count = curve.psd.length === 1 ? 'one row' : 'no rows'
    this.issues.error('table', source.place, `${quoted(source.path)} has ${count} to read; a table needs two`)
    return null
  }

  #covers({ file, place, frequency, outside }: Table): boolean {
    const first = frequency[0] ?? NaN
    const last = frequency[frequency.length - 1] ?? NaN
    if (outside !== 'refuse' || this.band === null || (first <= this.band.low && last >= this.band.high)) return true
    this.issues.error(
      'table-band',
      place,
      `${quoted(file)} goes from ${first} Hz to ${last} Hz, but the band from ${this.band.low} Hz to ${this.band.high} Hz; narrow the band, or say how the table goes on: \`outside: constant\` or \`outside: slope\``,
    )
    return false
  }
}

function statedOf(tree: Tree): Pick<Table, 'averages' | 'outside'> {
  const averages = Number(textOf(child(tree, 'averages')) ?? NaN)
  const outside = textOf(child(tree, 'outside'))
  return {
    averages: Number.isInteger(averages) && averages > 0 ? averages : null,
    outside: outside === 'constant' || outside === 'slope' ? outside : 'refuse',
  }
}

function scaleOf({ scale }: CurveReading, { of }: CurveSpot): TableRead['scale'] {
  return scale === null ? null : { factor: scale, power: scalesPower(of) }
}
