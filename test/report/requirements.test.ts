import { describe, expect, it } from 'vitest'
import type { RequirementResult } from '../../src/model/assessment.js'
import { requirementLine, requirementRows, requirementStatus } from '../../src/report/requirements.js'
import { results, uncertainAssessment } from './uncertain-fixture.js'

const plain = (text: string): string => text.replaceAll('\u00a0', ' ')
const assessment = uncertainAssessment()
const rows = requirementRows(assessment)

function rowOf(result: RequirementResult) {
  return requirementRows({ ...assessment, requirements: [result] })[0]
}

describe('requirements', () => {
  it('show what is wanted, what was found, and where', () => {
    expect(rows.map(({ what, bound, number, where }) => [what, bound, number, where].map(plain))).toEqual([
      ['Total', 'below 20 aN/√Hz', '16.3(5) aN/√Hz', 'at 1.2435 MHz'],
      ['Shot', 'below 300 aN/√Hz', '450(10) aN/√Hz', 'from 1.2 to 1.3 MHz, worst at 1.3 MHz'],
      ['Final occupancy of fundamental', 'below 30', '26(2)', ''],
      ['Margin to the limit other', 'below 3 dB', 'no such number here', 'at 1.2435 MHz'],
    ])
  })

  it('say by how much they are met or missed', () => {
    expect(rows.map(({ met, distance }) => [met, plain(distance)])).toEqual([
      [true, 'by 1.8 dB, 7.4 standard uncertainties'],
      [false, 'by 3.5 dB, 15 standard uncertainties'],
      [true, 'by 3.6 quanta, 1.8 standard uncertainties'],
      [false, ''],
    ])
  })

  it('count decibels of a margin as they are, and say nothing of uncertainties that are not there', () => {
    const spread = { statistical: 0, systematic: 0, combined: 0 }
    const requirement = { ...results[0].requirement, of: 'margin.sql', value: 3, text: '3 dB' }
    const row = rowOf({ ...results[0], title: 'Standard quantum limit', requirement, value: 9.25, spread })
    expect([row.what, plain(row.number), plain(row.distance)]).toEqual([
      'Margin to the standard quantum limit',
      '9.3 dB',
      'by 6.3 dB',
    ])
  })

  it('keep the digits of a near miss', () => {
    const row = rowOf({ ...results[0], value: 20.01e-18, met: false })
    expect(plain(row.distance)).toBe('by 4.3 × 10⁻³ dB, 0.02 standard uncertainties')
    expect(rowOf({ ...results[0], value: 20e-18 }).distance).toBe('exactly')
  })

  it('fit one line of a terminal', () => {
    expect(rows.slice(0, 2).map(requirementLine)).toEqual([
      'proposal: met by 1.8 dB, 7.4 standard uncertainties: total 16.3(5) aN/√Hz at 1.2435 MHz, wanted below 20 aN/√Hz',
      'edge: missed by 3.5 dB, 15 standard uncertainties: shot 450(10) aN/√Hz from 1.2 to 1.3 MHz, worst at 1.3 MHz, wanted below 300 aN/√Hz',
    ])
  })

  it('are summed up for a list of sensors', () => {
    const status = (requirements: readonly RequirementResult[]) => requirementStatus({ ...assessment, requirements })
    expect(status(results)).toEqual({ text: '2 of 4 missed', met: false })
    expect(status([results[0], results[2]])).toEqual({ text: 'all 2 met', met: true })
    expect(status([results[0]])).toEqual({ text: 'met', met: true })
    expect(status([])).toBeNull()
  })
})
