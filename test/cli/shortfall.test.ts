import { describe, expect, it } from 'vitest'
import type { Io } from '../../src/cli/io.js'
import { reportOutcomes, type Outcome } from '../../src/cli/outcome.js'
import { shortfalls } from '../../src/cli/shortfall.js'
import type { Assessment, RequirementResult } from '../../src/model/assessment.js'
import { fixtureAssessment } from '../report/fixture.js'

const place = { file: 'budgets/tern/budget.yaml', line: 31, column: 3 }
const spread = { statistical: 0, systematic: 0, combined: 0 }

function result(of: string, value: number, wanted: number, met: boolean): RequirementResult {
  const requirement = {
    id: 'proposal',
    of,
    where: null,
    bound: 'below',
    value: wanted,
    text: '',
    about: null,
    place,
  } as const
  return { requirement, title: null, value, spread, frequency: of.startsWith('occupancy') ? null : 1.243e6, met }
}

const withResults = (...requirements: RequirementResult[]): Assessment => ({ ...fixtureAssessment(), requirements })

describe('a requirement', () => {
  it.each([
    ['total', 2.31e-17, 2e-17, '`total` is 23.1 aN/√Hz at 1.243 MHz, but must be below 20.0 aN/√Hz'],
    ['margin.standard', 4.06, 3, '`margin.standard` is 4.1 dB at 1.243 MHz, but must be below 3.0 dB'],
    ['occupancy.drum', 1.5, 0.5, '`occupancy.drum` is 1.50 quanta, but must be below 0.500 quanta'],
  ])('that %s misses is told with both numbers', (of, value, wanted, text) => {
    expect(shortfalls(withResults(result(of, value, wanted, false)))).toEqual([
      { severity: 'error', code: 'requirement-missed', place, message: `requirement \`proposal\` is missed: ${text}` },
    ])
  })

  it('that is met is not told', () => {
    expect(shortfalls(withResults(result('total', 1e-17, 2e-17, true)))).toEqual([])
  })
})

describe('the exit code', () => {
  const target = { name: 'tern', file: place.file, read: () => ({ budget: null, problems: [] }) }
  const outcomeOf = (assessment: Assessment): Outcome => ({ target, assessment, failure: null, problems: [] })
  const refused: Outcome = {
    target,
    assessment: null,
    failure: { code: 2, problems: [], lines: ['refused'] },
    problems: [],
  }
  const met = outcomeOf(withResults(result('total', 1e-17, 2e-17, true)))
  const missed = outcomeOf(withResults(result('total', 3e-17, 2e-17, false)))

  it.each([
    ['0 where all is met', [met], 0, ''],
    [
      '1 where a budget falls short',
      [met, missed],
      1,
      'budgets/tern/budget.yaml:31:3: requirement `proposal` is missed: ',
    ],
    ['the highest of several', [missed, refused, met], 2, 'refused\n'],
  ])('is %s', (_name, outcomes, code, text) => {
    let err = ''
    const io = { err: (line: string) => void (err += line) } as Io
    expect(reportOutcomes(outcomes, io)).toBe(code)
    expect(err).toContain(text)
  })
})
