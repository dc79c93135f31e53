import { parse } from 'csv-parse/sync'
import { describe, expect, it } from 'vitest'
import { curvesCsv, powerUnitOf, textCell } from '../../src/report/curves-csv.js'
import { curvesJson } from '../../src/report/curves-json.js'
import { fixtureAssessment } from './fixture.js'
import { uncertainAssessment } from './uncertain-fixture.js'

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

  it('states the standard uncertainty of the total and its two kinds, where it was computed', () => {
    const uncertain = parse(curvesCsv(uncertainAssessment()))
    expect(uncertain[0].slice(3, 8)).toEqual([
      'total (N/√Hz)',
      'total standard uncertainty (N/√Hz)',
      'total statistical uncertainty (N/√Hz)',
      'total systematic uncertainty (N/√Hz)',
      'added (N/√Hz)',
    ])
    expect(uncertain.slice(1).map(row => Number(row[4]))).toEqual(
      [...evaluation.total].map(psd => 0.05 * Math.sqrt(psd)),
    )
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

  it('has null for uncertainties that were not computed', () => {
    expect(data['curves']).toMatchObject({ standard_uncertainty: null })
    expect(data).toMatchObject({ requirements: [], variants: [], derived: [], correlations: [], citations: [] })
  })

  it('gives all that is uncertain, required, varied, derived and cited', () => {
    const all = JSON.parse(curvesJson(uncertainAssessment()))
    const part = (share: number) => [...evaluation.total].map(psd => share * Math.sqrt(psd))
    expect(all.curves.standard_uncertainty).toEqual({
      combined: part(0.05),
      statistical: part(0.03),
      systematic: part(0.04),
    })
    expect(all.headlines.best.asdSpread.combined).toBeCloseTo(0.05 * all.headlines.best.asd, 30)
    expect(all.at_reference.line_spreads.map((each: { line: string }) => each.line)).toEqual(
      evaluation.lines.map(line => line.id),
    )
    expect(all.root_shares[0]).toMatchObject({ root: 'fundamental.temperature', elasticity: 0.43 })
    expect(all.requirements[0]).toMatchObject({ id: 'proposal', wanted: 2e-17, value: 1.63e-17, met: true })
    expect(all.requirements[3]).toMatchObject({ value: null, spread: null, met: false })
    expect(all.derived).toEqual([
      expect.objectContaining({ id: 'spring', roots: ['mass', 'fundamental.frequency'], value: expect.any(Number) }),
    ])
    expect(all.correlations).toEqual([
      { roots: ['mass', 'fundamental.temperature'], coefficient: -0.5, place: 'budgets/shared/cryostat.yaml:20:3' },
    ])
    expect(all.citations[0].key).toBe('ring')
    expect(all.variants[0]).toMatchObject({ id: 'cold', title: 'one kelvin' })
    expect(all.variants[0].curves.total).toEqual([...evaluation.total].map(psd => psd / 4))
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
