import type { Assessment } from '../model/assessment.js'
import type { Evaluation } from '../model/evaluation.js'
import { pointValue } from './contributions.js'
import { opening } from './headlines.js'
import { decibelText, hasBackAction } from './margins.js'
import { densityText, frequencyText, percentText } from './numbers.js'
import { familyTitles } from './titles.js'
import { spreadAtReference } from './uncertain-values.js'

/** A table of plain strings; the first row is its head. */
export interface TextTable {
  readonly head: readonly string[]
  readonly rows: readonly (readonly string[])[]
  /** Columns that hold numbers, to be set flush right. */
  readonly numeric: readonly number[]
}

/** What a terminal prints above the table: title and revision, then the opening sentence. */
export function terminalHeading(assessment: Assessment): readonly string[] {
  const { title, sensor, revision } = assessment.budget
  return [`${title} (${sensor}, revision ${revision})`, plain(opening(assessment).sentence)]
}

/**
 * The total, every contribution with its share, every limit and the margins at the points of an evaluation, one row each;
 * for a few frequencies. Lines are sorted by their power at the first of them.
 */
export function tableByLine(assessment: Assessment, at: Evaluation): TextTable {
  const { unit } = assessment
  const margins = hasBackAction(assessment)
  const doubt = uncertaintiesAt(assessment, at)
  const points = [...at.points.frequency.keys()]
  const cells = (label: string, family: string, cell: (i: number) => readonly [string, string]): readonly string[] =>
    [label, family, ...points.flatMap(cell)].map(plain)
  const lines = at.lines.toSorted((a, b) => b.psd[0] - a.psd[0])
  const rows = [
    cells('total', '', i => [densityText(Math.sqrt(at.total[i]), unit, doubt.total), percentText(1)]),
    ...lines.map(line =>
      cells(line.title, familyTitles[line.family], i => [
        pointValue(line, at, { unit, index: i, uncertainty: doubt.ofLine(line.id) }),
        percentText(line.psd[i] / at.total[i]),
      ]),
    ),
    ...at.limits.map(limit =>
      cells(limit.title, 'limit', i => [
        densityText(Math.sqrt(limit.psd[i]), unit),
        margins ? decibelText(10 * Math.log10(at.total[i] / limit.psd[i])) : '',
      ]),
    ),
  ]
  const head = ['', 'family', ...points.flatMap(i => [frequencyText(at.points.frequency[i], 9), 'share or margin'])]
  return { head: head.map(plain), rows, numeric: head.map((_, i) => i).slice(2) }
}

/** Standard uncertainties are known where the report's tables are taken, and not at frequencies that a call asks for. */
function uncertaintiesAt(assessment: Assessment, at: Evaluation): { total: number; ofLine(id: string): number } {
  if (at !== assessment.atReference) return { total: 0, ofLine: () => 0 }
  const spreads = new Map(at.lines.map(({ id }, k) => [id, assessment.lineSpreads[k]?.combined ?? 0]))
  return { total: spreadAtReference(assessment).combined, ofLine: id => spreads.get(id) ?? 0 }
}

/** One row a frequency: the total, the margin to the standard quantum limit, the largest contribution; for many of them. */
export function tableByFrequency(assessment: Assessment, at: Evaluation): TextTable {
  const limit = (hasBackAction(assessment) ? at.limits.find(each => each.id === 'sql')?.psd : null) ?? null
  const rows = [...at.points.frequency].map((frequency, i) => {
    const largest = at.lines.reduce((best, line) => (line.psd[i] > best.psd[i] ? line : best))
    return [
      frequencyText(frequency, 12),
      densityText(Math.sqrt(at.total[i]), assessment.unit),
      limit === null ? '' : decibelText(10 * Math.log10(at.total[i] / limit[i])),
      largest.title,
      percentText(largest.psd[i] / at.total[i]),
    ].map(plain)
  })
  return { head: ['frequency', 'total', 'above the SQL', 'largest', 'its share'], rows, numeric: [0, 1, 2, 4] }
}

/** Spaces that a terminal may break at, so that columns can be narrowed. */
function plain(text: string): string {
  return text.replaceAll('\u00a0', ' ')
}
