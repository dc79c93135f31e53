import type { Assessment, Bands, RequirementResult, Spread } from '../../src/model/assessment.js'
import type { Correlation, Derived, Requirement } from '../../src/model/budget.js'
import { fixtureAssessment } from './fixture.js'

const shared = { file: 'budgets/shared/cryostat.yaml', line: 7, column: 3 }

/** Independent parts: 3 and 4 make 5. */
function spread(unit: number): Spread {
  return { statistical: 3 * unit, systematic: 4 * unit, combined: 5 * unit }
}

function bandsOf(total: Float64Array): Bands {
  const part = (share: number) => total.map(psd => share * Math.sqrt(psd))
  return { statistical: part(0.03), systematic: part(0.04), combined: part(0.05) }
}

const requirement = (id: string, of: string, value: number, text: string): Requirement => ({
  ...{ id, of, value, text },
  where: of.startsWith('occupancy.') ? null : { at: 1.2435e6 },
  bound: 'below',
  about: id === 'proposal' ? 'as promised' : null,
  place: { file: 'budgets/fixture/budget.yaml', line: 60, column: 3 },
})

/** One met, one missed by a band, one of an occupancy, one that has no number here. */
export const results: readonly RequirementResult[] = [
  {
    ...{ requirement: requirement('proposal', 'total', 20e-18, '20 aN/√Hz'), title: 'Total', value: 16.3e-18 },
    ...{ spread: spread(0.1e-18), frequency: 1.2435e6, met: true },
  },
  {
    requirement: {
      ...requirement('edge', 'shot', 300e-18, '300 aN/√Hz'),
      where: { from: 1.2e6, to: 1.3e6 },
    },
    ...{ title: 'Shot', value: 450e-18, spread: spread(2e-18), frequency: 1.3e6, met: false },
  },
  {
    ...{ requirement: requirement('cold', 'occupancy.fundamental', 30, '30'), title: 'fundamental', value: 26.4 },
    ...{ spread: spread(0.4), frequency: null, met: true },
  },
  {
    ...{ requirement: requirement('none', 'margin.other', 3, '3 dB'), title: null, value: NaN },
    ...{ spread: { statistical: NaN, systematic: NaN, combined: NaN }, frequency: null, met: false },
  },
]

const derived: Derived = {
  id: 'spring',
  text: '= mass * (2*pi*fundamental.frequency)^2',
  dimension: 'number',
  formula: { roots: [0, 1], value: values => values[0] * (2 * Math.PI * values[1]) ** 2, over: () => undefined },
  about: 'of the fundamental mode',
  evidence: null,
  place: { ...shared, line: 12 },
}

const correlation: Correlation = { roots: [0, 3], coefficient: -0.5, place: { ...shared, line: 20 } }

/** The textbook assessment with everything about it uncertain, required, varied, derived, inherited and cited. */
export function uncertainAssessment(sensor = 'fixture'): Assessment {
  const plain = fixtureAssessment(sensor)
  const { evaluation, atReference, headlines, modes } = plain
  const at = <T extends { asd: number }>(each: T) => ({
    ...each,
    ...{ asdSpread: spread(0.01 * each.asd), totalMarginSpread: spread(0.04), addedMarginSpread: spread(0.02) },
  })
  const reference = Math.sqrt(atReference.total[0])
  const uncertain: Assessment = {
    ...plain,
    budget: {
      ...plain.budget,
      roots: plain.budget.roots.map(root =>
        root.id === 'fundamental.temperature' ? { ...root, evidence: 'ring', place: shared } : root,
      ),
      derived: [derived],
      correlations: [correlation],
      citations: [{ key: 'ring', text: 'A. Nobody, Ringdowns, J. Invented 3, 14 (2025)', link: '10.1234/abc' }],
    },
    headlines: { ...headlines, best: at(headlines.best), reference: at(headlines.reference!) },
    bands: bandsOf(evaluation.total),
    lineSpreads: atReference.lines.map(line => spread(0.02 * Math.sqrt(Math.abs(line.psd[0])))),
    rootShares: [
      { root: 3, elasticity: 0.43, change: 0.04 * reference },
      { root: 0, elasticity: -0.5, change: 0.03 * reference },
      { root: 9, elasticity: null, change: 1e-5 * reference },
    ],
    requirements: results,
    modes: modes.map(mode => ({ ...mode, finalOccupancySpread: spread(0.4) })),
  }
  return { ...uncertain, variants: [{ id: 'cold', title: 'one kelvin', assessment: colder(uncertain) }] }
}

function colder(plain: Assessment): Assessment {
  const roots = plain.budget.roots.map(root =>
    root.id === 'fundamental.temperature' ? { ...root, value: 1, text: '1 K' } : root,
  )
  const total = plain.evaluation.total.map(psd => psd / 4)
  return {
    ...plain,
    budget: { ...plain.budget, roots },
    evaluation: { ...plain.evaluation, total },
    bands: bandsOf(total),
    requirements: [],
  }
}
