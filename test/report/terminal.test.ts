import { describe, expect, it } from 'vitest'
import { tableByFrequency, tableByLine, terminalHeading } from '../../src/report/terminal.js'
import { fixtureAssessment } from './fixture.js'
import { uncertainAssessment } from './uncertain-fixture.js'

const assessment = fixtureAssessment()

describe('tables for a terminal', () => {
  it('are headed by what the budget is and how good', () => {
    expect(terminalHeading(assessment)).toEqual([
      'Membrane <force> sensor & window (fixture, revision 2.1)',
      'Best 15.8 aN/√Hz at 1.2431 MHz, 17.3 dB above the standard quantum limit, set by thermal (91 %).',
    ])
  })

  it('list total, lines by power, and limits with the margin of the total', () => {
    expect(tableByLine(assessment, assessment.atReference)).toEqual({
      head: ['', 'family', '1.2435 MHz', 'share or margin'],
      rows: [
        ['total', '', '16.3 aN/√Hz', '100 %'],
        ['Thermal', 'thermal', '15.1 aN/√Hz', '85.6 %'],
        ['Shot', 'imprecision', '4.81 aN/√Hz', '8.7 %'],
        ['Back-action', 'back-action', '4.22 aN/√Hz', '6.7 %'],
        ['Stray forces', 'stray', '2.00 aN/√Hz', '1.5 %'],
        ['Shot–back-action correlation', 'correlation', '−2.53 aN/√Hz', '−2.4 %'],
        ['Standard quantum limit', 'limit', '5.66 aN/√Hz', '9.2 dB'],
        ['Zero-point noise', 'limit', '3.27 aN/√Hz', '14.0 dB'],
      ],
      numeric: [2, 3],
    })
  })

  it('turn round for many frequencies', () => {
    const { head, rows } = tableByFrequency(assessment, assessment.evaluation)
    expect(head).toEqual(['frequency', 'total', 'above the SQL', 'largest', 'its share'])
    expect(rows).toHaveLength(assessment.evaluation.points.frequency.length)
    expect(rows[0]).toEqual(['1.2 MHz', '408 aN/√Hz', '17.9 dB', 'Shot', '99.5 %'])
  })

  it('state uncertainties where they are known', () => {
    const uncertain = uncertainAssessment()
    const [total, thermal] = tableByLine(uncertain, uncertain.atReference).rows
    expect([total[2], thermal[2]]).toEqual(['16.3(8) aN/√Hz', '15.1(15) aN/√Hz'])
    expect(tableByLine(uncertain, assessment.atReference).rows[0][2]).toBe('16.3 aN/√Hz')
  })

  it('call a signed line negligible that is next to nothing', () => {
    const [first] = assessment.atReference.total
    const lines = assessment.atReference.lines.map(line =>
      line.signed ? { ...line, psd: Float64Array.of(-9e-7 * first) } : line,
    )
    const rows = tableByLine(assessment, { ...assessment.atReference, lines }).rows
    expect(rows.find(row => row[1] === 'correlation')?.[2]).toBe('negligible')
  })

  it('have no margins for a readout without back-action', () => {
    const warnings = [{ ...assessment.warnings[0], code: 'no-back-action' }]
    const silent = { ...assessment, warnings }
    expect(tableByFrequency(silent, assessment.atReference).rows[0][2]).toBe('')
    expect(tableByLine(silent, assessment.atReference).rows.at(-1)?.[3]).toBe('')
  })

  it('leave the margin empty where there is no standard quantum limit', () => {
    const at = { ...assessment.atReference, limits: [] }
    expect(tableByFrequency(assessment, at).rows[0][2]).toBe('')
  })
})
