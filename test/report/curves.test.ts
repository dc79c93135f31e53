import { parse } from 'csv-parse/sync'
import { describe, expect, it } from 'vitest'
import { curvesCsv, powerUnitOf, textCell } from '../../src/report/curves-csv.js'
import { curvesJson } from '../../src/report/curves-json.js'
import { fixtureAssessment } from './fixture.js'

const assessment = fixtureAssessment()
const { evaluation } = assessment

describe('curves.csv', () => {
  const rows = parse(curvesCsv(assessment))
  const column = (title: string): number[] => {
    const index = rows[0].indexOf(title)
    expect(index, title).toBeGreaterThanOrEqual(0)
    return rows.slice(1).map(row => Number(row[index]))
  }

  it('has a row a point and titles with units', () => {
    expect(rows).toHaveLength(evaluation.points.frequency.length + 1)
    expect(rows[0]).toEqual([
      ...['frequency (Hz)', 'anchor', 'offset (Hz)', 'total (N/√Hz)', 'added (N/√Hz)'],
      ...['line thermal (N/√Hz)', 'line shot (N/√Hz)', 'line back_action (N/√Hz)'],
      ...['line shot_back_action (N²/Hz)', 'line stray (N/√Hz)'],
      ...['source fundamental.bath (N/√Hz)', 'source cavity.front (N/√Hz)'],
      ...['source detector.loss (N/√Hz)', 'source stray (N/√Hz)', 'limit sql (N/√Hz)', 'limit zero_point (N/√Hz)'],
    ])
  })

  it('reads back to the same doubles', () => {
    expect(column('frequency (Hz)')).toEqual([...evaluation.points.frequency])
    expect(column('offset (Hz)')).toEqual([...evaluation.points.offset])
    expect(column('total (N/√Hz)')).toEqual([...evaluation.total].map(Math.sqrt))
    expect(column('limit sql (N/√Hz)')).toEqual([...evaluation.limits[0].psd].map(Math.sqrt))
  })

  it('keeps the sign of a correlation', () => {
    const values = column('line shot_back_action (N²/Hz)')
    expect(values).toEqual([...evaluation.lines[3].psd])
    expect(values.some(value => value < 0)).toBe(true)
  })

  it('names the anchor of each point', () => {
    expect(new Set(rows.slice(1).map(row => row[1]))).toEqual(new Set(['fundamental']))
  })

  it('refuses to state what is no number', () => {
    const total = evaluation.total.map((value, i) => (i === 7 ? NaN : value))
    expect(() => curvesCsv({ ...assessment, evaluation: { ...evaluation, total } })).toThrow('a curve holds NaN')
  })

  it('takes a hair below zero for zero, and no more', () => {
    const withLast = (psd: number) => {
      const [first, ...others] = evaluation.lines
      return curvesCsv({
        ...assessment,
        evaluation: { ...evaluation, lines: [{ ...first, psd: first.psd.map(() => psd) }, ...others] },
      })
    }
    const total = Math.min(...evaluation.total)
    expect(
      withLast(-1e-14 * total)
        .split('\n')[1]
        .split(',')[5],
    ).toBe('0')
    expect(() => withLast(-1e-6 * total)).toThrow('which has no root')
  })

  it('keeps a spreadsheet from running a text', () => {
    expect(['=1+1', '+1', '-1', '@x', '\tx'].map(textCell)).toEqual([`"'=1+1"`, `"'+1"`, `"'-1"`, `"'@x"`, `"'\tx"`])
    expect(textCell('a "b", c')).toBe('"a ""b"", c"')
    expect(textCell('total (N/√Hz)')).toBe('total (N/√Hz)')
  })

  it('squares units', () => {
    expect(['N/√Hz', 'm/s²/√Hz', 'm/√Hz'].map(powerUnitOf)).toEqual(['N²/Hz', '(m/s²)²/Hz', 'm²/Hz'])
  })
})

describe('curves.json', () => {
  const data = JSON.parse(curvesJson(assessment)) as Record<string, never>

  it('states format, engine, sidedness and units', () => {
    expect(data).toMatchObject({ format: 1, sidedness: 'one-sided', unit: { amplitude: 'N/√Hz', power: 'N²/Hz' } })
    expect(data['engine']).toMatch(/^\d+\.\d+\.\d+$/)
  })

  it('reads back to the same doubles, parts with their signs', () => {
    const curves = data['curves'] as { total: number[]; sources: { vacuum?: { correlation: number[] } }[] }
    expect(curves.total).toEqual([...evaluation.total])
    expect(curves.sources[1].vacuum?.correlation).toEqual([...(evaluation.sources[1].vacuum?.correlation ?? [])])
  })

  it('gives roots with the text and place of the file', () => {
    const roots = data['roots'] as { id: string; text: string; place: string; value: number }[]
    expect(roots[0]).toMatchObject({
      id: 'mass',
      text: '3.1(2) ng',
      value: 3.1e-12,
      place: 'budgets/fixture/budget.yaml:10:3',
    })
  })

  it('refuses to state what is no number', () => {
    const headlines = { ...assessment.headlines, halfPowerBand: { from: 1, to: Infinity } }
    expect(() => curvesJson({ ...assessment, headlines })).toThrow('to is Infinity')
  })
})
