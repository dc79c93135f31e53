import type { Cell } from './curve-cells.js'
import type { FileFault } from './curve-lines.js'
import { powerDensity, type CurveReading } from './curve-reading.js'
import { mostFaults, type CurveRow } from './curve-rows.js'
import { quoted } from './quoted.js'

/** What the cells of a table's rows mean. */
export interface CurveNumbers {
  /** One of the first column's unit in Hz. */
  readonly frequency: number
  readonly reading: CurveReading
  /** Rows outside are passed over, whatever their second cell holds. */
  readonly keep: { readonly low: number; readonly high: number } | null
  /** Rows may stand in any order and are sorted. */
  readonly sorted: boolean
}

export interface Curve {
  readonly frequency: Float64Array
  readonly psd: Float64Array
}

interface Point {
  readonly row: CurveRow
  readonly f: number
  readonly psd: number
}

/** Two ascending columns of the rows, or the first few faults of the file. */
export function curveOf(rows: readonly CurveRow[], numbers: CurveNumbers): Curve | readonly FileFault[] {
  const points: Point[] = []
  const faults: FileFault[] = []
  for (const row of rows) {
    const point = pointOf(row, numbers, row === rows[0])
    if (point === null) continue
    if (!('message' in point)) points.push(point)
    else if (faults.push(point) >= mostFaults) return faults
  }
  if (numbers.sorted) points.sort((a, b) => a.f - b.f || a.row.line - b.row.line)
  for (const [index, point] of points.entries()) {
    const fault = orderFault(points[index - 1], point)
    if (fault !== null && faults.push(fault) >= mostFaults) break
  }
  if (faults.length > 0) return faults
  return { frequency: Float64Array.from(points, ({ f }) => f), psd: Float64Array.from(points, ({ psd }) => psd) }
}

/** Null for a row that is passed over. */
function pointOf(row: CurveRow, numbers: CurveNumbers, isFirst: boolean): Point | FileFault | null {
  const { frequency, density, line } = row
  const { keep } = numbers
  const frequencyFault = cellFault(frequency, isFirst ? line : null)
  if (frequencyFault !== null) return { line, column: frequency.column, message: frequencyFault }
  const f = Number(frequency.text) * numbers.frequency
  if (keep !== null && (f < keep.low || f > keep.high)) return null
  if (!(f > 0 && Number.isFinite(f))) {
    const remedy = f <= 0 && keep === null ? '; `keep` passes over rows outside a stretch, such as `1 Hz to 1 MHz`' : ''
    const message = `the frequency ${quoted(frequency.text)} must be greater than 0 and finite${remedy}`
    return { line, column: frequency.column, message }
  }
  const densityFault = cellFault(density, isFirst ? line : null)
  if (densityFault !== null) return { line, column: density.column, message: densityFault }
  const x = Number(density.text)
  const psd = powerDensity(x, numbers.reading)
  if ((x > 0 || numbers.reading.unit.level) && psd > 0 && Number.isFinite(psd)) return { row, f, psd }
  return { line, column: density.column, message: rangeFault(density.text, numbers.reading.unit.level) }
}

function rangeFault(text: string, level: boolean): string {
  if (level) return `the level ${quoted(text)} is beyond the numbers that are read`
  return `the density ${quoted(text)} must be greater than 0 and finite`
}

const decimal = /^[+-]?(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d{1,4})?$/

/** What is wrong with a cell; null for a number. A first row in `line` may be a headline. */
function cellFault({ text }: Cell, line: number | null): string | null {
  if (decimal.test(text)) return null
  if (text === '')
    return 'this cell is empty, which is not 0; `keep` can leave out its frequency, or correct the export of the file'
  if (/^[+-]?\d+,\d+(?:[eE][+-]?\d+)?$/.test(text))
    return `${quoted(text)} has a decimal comma; only decimal points are read, so export the file with points`
  if (/^[+-]?(?:nan|inf(?:inity)?|∞)$/i.test(text))
    return `${quoted(text)} is no finite number; \`keep\` can leave out its frequency`
  const remedy = line === null ? ', such as `2.5e-18`' : `; if this is a headline, pass over it with \`skip: ${line}\``
  return `${quoted(text)} is no number with a decimal point${remedy}`
}

function orderFault(before: Point | undefined, { row, f }: Point): FileFault | null {
  if (before === undefined || f > before.f) return null
  const { text, column } = row.frequency
  const message =
    f === before.f
      ? `the frequency ${quoted(text)} stands in line ${before.row.line} already; a table has one row for each frequency`
      : `the frequency ${quoted(text)} is below that of line ${before.row.line}; state \`order: any\` where rows are to be sorted`
  return { line: row.line, column, message }
}
