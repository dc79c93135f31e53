import { describe, expect, it } from 'vitest'
import type { SourceCurve } from '../../src/model/evaluation.js'
import { termRow } from '../../src/report/terms.js'
import { fixtureAssessment } from './fixture.js'

const assessment = fixtureAssessment()
const one = (value: number) => Float64Array.of(value)
const plain = (text = ''): string => text.replaceAll('\u00a0', ' ')

/** A port with 1.5 quanta in all: half a quantum of vacuum, one of heat. */
const port: SourceCurve = {
  id: 'cavity.out',
  title: 'cavity out',
  family: 'imprecision',
  readout: true,
  owner: 'cavity',
  channel: 'out',
  own: one(1.5),
  ownUnit: 'quanta',
  psd: one(12e-36),
  vacuum: { imprecision: one(2e-36), backAction: one(3e-36), correlation: one(-1e-36) },
  heating: { imprecision: one(4e-36), backAction: one(6e-36), correlation: one(-2e-36) },
}
const at = (source: SourceCurve, unit = 'N/√Hz') => ({
  ...assessment,
  unit,
  atReference: { ...assessment.atReference, total: one(20e-36), sources: [source] },
})

describe('a source in a card', () => {
  it.each([
    ['cavity.out', '1.5 quanta', '(2.83 aN/√Hz)² per quantum', '(3.46 aN/√Hz)²', '60.0 %'],
    ['cavity.out imprecision', '½ quantum', '(2.00 aN/√Hz)² per quantum', '(1.41 aN/√Hz)²', '10.0 %'],
    ['cavity.out back-action', '½ quantum', '(2.45 aN/√Hz)² per quantum', '(1.73 aN/√Hz)²', '15.0 %'],
    ['cavity.out heating', '1 quantum', '(2.83 aN/√Hz)² per quantum', '(2.83 aN/√Hz)²', '40.0 %'],
  ])('%s: own density, transfer and product', (claim, own, transfer, product, share) => {
    const row = termRow(claim, at(port))
    expect([row?.own, row?.transfer, row?.product, row?.share].map(plain)).toEqual([own, transfer, product, share])
  })

  it('gives the transfer a unit where own density and measurand differ', () => {
    const force: SourceCurve = {
      ...{ id: 'm.bath', title: 'm bath', family: 'thermal', readout: false, owner: 'm', channel: 'bath' },
      ...{ own: one(4e-30), ownUnit: 'N²/Hz', psd: one(16e-24) },
    }
    const row = termRow('m.bath', at(force, 'm/s²/√Hz'))
    expect(plain(row?.own)).toBe('(2.00 fN/√Hz)²')
    expect(plain(row?.transfer)).toBe('(2.00 km/s²/N)²')
  })

  it('is left out where no such source is', () => {
    expect(termRow('nothing.there', at(port))).toBeNull()
  })
})
