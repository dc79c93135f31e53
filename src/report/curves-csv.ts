import type { Assessment, Bands } from '../model/assessment.js'
import type { Points } from '../model/points.js'

interface Column {
  readonly title: string
  readonly cell: (index: number) => string
}

/**
 * All curves on the engine's own points as CSV (RFC 4180, `\n` at line ends): frequency, the anchor's name and the offset
 * from it, then one-sided amplitude densities in SI of the total, its standard uncertainty (combined, and its statistical
 * and systematic part) where it was computed, the added noise, every line, source and limit. A signed
 * line is given as its power density, since it has no root where it is negative. Numbers have the fewest digits that read
 * back to the same double.
 */
export function curvesCsv({ evaluation, bands, unit }: Assessment): string {
  const { points, total, added, lines, sources, limits } = evaluation
  const powerUnit = powerUnitOf(unit)
  const amplitude = (name: string, psd: Float64Array): Column => ({
    title: `${name} (${unit})`,
    cell: index => numberCell(amplitudeOf(psd[index], total[index])),
  })
  const columns: readonly Column[] = [
    ...pointColumns(points),
    amplitude('total', total),
    ...(bands === null ? [] : bandColumns(bands, unit)),
    amplitude('added', added),
    ...lines.map(line =>
      line.signed
        ? { title: `line ${line.id} (${powerUnit})`, cell: (index: number) => numberCell(line.psd[index]) }
        : amplitude(`line ${line.id}`, line.psd),
    ),
    ...sources.map(source => amplitude(`source ${source.id}`, source.psd)),
    ...limits.map(limit => amplitude(`limit ${limit.id}`, limit.psd)),
  ]
  const rows = [columns.map(column => textCell(column.title)).join(',')]
  for (let i = 0; i < points.frequency.length; i++) rows.push(columns.map(column => column.cell(i)).join(','))
  return `${rows.join('\n')}\n`
}

function bandColumns({ combined, statistical, systematic }: Bands, unit: string): readonly Column[] {
  const column = (name: string, values: Float64Array): Column => ({
    title: `total ${name} (${unit})`,
    cell: index => numberCell(values[index]),
  })
  return [
    column('standard uncertainty', combined),
    column('statistical uncertainty', statistical),
    column('systematic uncertainty', systematic),
  ]
}

/** Rounding can leave a source that vanishes a hair below zero; more than that is refused with its number. */
function amplitudeOf(psd: number, total: number): number {
  if (psd < 0 && psd > -1e-12 * total) return 0
  if (psd < 0) throw new RangeError(`a curve holds the power density ${psd}, which has no root`)
  return Math.sqrt(psd)
}

function pointColumns({ frequency, anchor, offset, anchors }: Points): readonly Column[] {
  return [
    { title: 'frequency (Hz)', cell: index => numberCell(frequency[index]) },
    { title: 'anchor', cell: index => textCell(anchor[index] < 0 ? 'none' : anchors[anchor[index]].id) },
    { title: 'offset (Hz)', cell: index => numberCell(offset[index]) },
  ]
}

/** `N/√Hz` → `N²/Hz`, `m/s²/√Hz` → `(m/s²)²/Hz`, `1/√Hz` → `1/Hz`. */
export function powerUnitOf(unit: string): string {
  const base = unit.replace(/\/√Hz$/, '')
  if (base === '1') return '1/Hz'
  return `${/^\w+$/.test(base) ? base : `(${base})`}²/Hz`
}

function numberCell(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError(`a curve holds ${value}, which no file may state`)
  return String(value)
}

/** A text that a spreadsheet might run as a formula is quoted behind an apostrophe. */
export function textCell(text: string): string {
  const safe = /^[=+\-@\t\r]/.test(text) ? `'${text}` : text
  return /[",\n\r']/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe
}
