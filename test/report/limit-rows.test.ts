import { expect, test } from 'vitest'
import { limitRows } from '../../src/report/limit-rows.js'
import { createTypesetter } from '../../src/report/typeset.js'
import { fixtureAssessment } from './fixture.js'

const assessment = fixtureAssessment()
const plain = (text: string): string => text.replaceAll('\u00a0', ' ')

/** The rows where total and added noise have the given ratios to the limit. */
function rowsAt(total: number, added: number, id: string = 'sql') {
  const limit = { ...assessment.atReference.limits[0], id }
  const at = assessment.atReference
  const [psd] = limit.psd
  const atReference = {
    ...at,
    limits: [limit],
    total: Float64Array.of(total * psd),
    added: Float64Array.of(added * psd),
  }
  return limitRows({ ...assessment, atReference })[0]
}

test('margins of total and added noise agree with the headline numbers', () => {
  const [row] = limitRows(assessment)
  expect([row.total, row.added].map(plain)).toEqual(['9.2 dB above', '0.3 dB above'])
})

test('says where the standard quantum limit is passed, and by how much', () => {
  const row = rowsAt(2, 0.5)
  expect([row.total, row.added].map(plain)).toEqual(['3.0 dB above', 'passed by 3.0 dB'])
  expect(plain(rowsAt(0.5, 0.5, 'zero_point').added)).toBe('3.0 dB below')
  expect(rowsAt(1, 0).added).toBe('none')
})

test('leaves margins out where the back-action is not known', () => {
  const place = { file: 'budget.yaml', line: 1, column: 1 }
  const warnings = [{ severity: 'warning', code: 'no-back-action', place, message: '' }] as const
  const [row] = limitRows({ ...assessment, warnings })
  expect([row.total, row.added]).toEqual(['left out', 'left out'])
})

test.each(['sql', 'correlation_limit', 'zero_point', 'energy_bound'])('%s has equations that can be typeset', id => {
  const { displacement, force } = rowsAt(1, 1, id)
  const typesetter = createTypesetter()
  for (const tex of [displacement, force]) expect(typesetter.inline(tex)).toContain('katex')
})
