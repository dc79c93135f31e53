import { describe, expect, it } from 'vitest'
import type { Assessment } from '../../src/model/assessment.js'
import { besideText, densityText, partsText } from '../../src/report/numbers.js'
import { decibelText, marginText } from '../../src/report/margins.js'
import { reportView } from '../../src/report/view.js'
import { uncertainAssessment } from './uncertain-fixture.js'

const plain = (text: string): string => text.replaceAll('\u00a0', ' ')
const assessment = uncertainAssessment()
const view = reportView(assessment)

describe('digits', () => {
  it.each([
    [9.451e-18, 0.21e-18, '9.5(2) aN/√Hz'],
    [9.451e-18, 0.15e-18, '9.45(15) aN/√Hz'],
    [9.451e-18, 0, '9.45 aN/√Hz'],
    [9.451e-18, 12e-18, '9(12) aN/√Hz'],
    [9.451e-18, 4e-21, '9.45 aN/√Hz'],
    [9.451e-18, NaN, '9.45 aN/√Hz'],
  ])('%s ± %s is %s', (value, uncertainty, text) => expect(plain(densityText(value, 'N/√Hz', uncertainty))).toBe(text))

  it.each([
    [10.62, 0.2, '10.6(2) dB', '10.6(2) dB above'],
    [-10.62, 0.15, '−10.62(15) dB', '10.62(15) dB below'],
    [10.62, 3, '11(3) dB', '11(3) dB above'],
    [10.62, 0.0001, '10.6 dB', '10.6 dB above'],
    [0.02, 0.2, '0.0(2) dB', 'within 0.2 dB of'],
    [-0.4, 12, '0(12) dB', 'within 12 dB of'],
  ])('a margin of %s ± %s dB is %s, in words %s', (value, uncertainty, text, words) => {
    expect(plain(decibelText(value, uncertainty))).toBe(text)
    expect(plain(marginText(value, uncertainty))).toBe(words)
  })

  it('set both kinds apart, in the unit of the value', () => {
    const spread = { statistical: 0.15e-18, systematic: 0.14e-18, combined: 0.21e-18 }
    expect(plain(partsText(9.45e-18, 'N/√Hz', spread))).toBe('0.15 aN/√Hz statistical, 0.14 aN/√Hz systematic')
    expect(partsText(9.45e-18, 'N/√Hz', { ...spread, systematic: 0 })).toBe('')
    expect(plain(besideText(4e-22, 9.45e-18, 'N/√Hz'))).toBe('0.00040 aN/√Hz')
    expect(plain(besideText(1.2e-5, 0.5, ''))).toBe('1.2 × 10⁻⁵')
  })
})

describe('the headline numbers', () => {
  it('carry their standard uncertainty', () => {
    expect(plain(view.opening.sentence)).toBe(
      'Best 15.8(8) aN/√Hz at 1.2431 MHz, 17.3(2) dB above the standard quantum limit, set by thermal (91 %).',
    )
    expect(view.headlines.map(each => [each.id, plain(each.value)])).toEqual([
      ['best', '15.8(8) aN/√Hz'],
      ['reference', '16.3(8) aN/√Hz'],
      ['total-margin', '9.2(2) dB above'],
      ['added-margin', '0.32(10) dB above'],
      ['largest', 'Thermal'],
      ['band', '3.19 kHz'],
      ['occupancy-fundamental', '26(2)'],
    ])
    expect(plain(view.headlines[0].note)).toBe('at 1.2431 MHz; 0.47 aN/√Hz statistical, 0.63 aN/√Hz systematic')
    expect(view.relativeSpread.replace('\u00a0', ' ')).toBe('5.0 %')
  })

  it('carry it in the tables of contributions', () => {
    expect(plain(view.total.value)).toBe('16.3(8) aN/√Hz')
    expect(view.contributions.map(row => plain(row.value))).toEqual([
      '15.1(15) aN/√Hz',
      '4.8(5) aN/√Hz',
      '4.2(4) aN/√Hz',
      '2.0(2) aN/√Hz',
      '−2.5(3) aN/√Hz',
    ])
  })

  it('stand beside both kinds of their uncertainty', () => {
    expect(
      view.uncertain?.spreads.map(row => [row.label, row.value, row.statistical, row.systematic].map(plain)),
    ).toEqual([
      ['Best sensitivity', '15.8(8) aN/√Hz', '0.47 aN/√Hz', '0.63 aN/√Hz'],
      ['At the reference frequency', '16.3(8) aN/√Hz', '0.49 aN/√Hz', '0.65 aN/√Hz'],
      ['Margin of the total', '9.2(2) dB', '0.12 dB', '0.16 dB'],
      ['Margin of the added noise', '0.32(10) dB', '0.060 dB', '0.080 dB'],
      ['Final occupancy of fundamental', '26(2)', '1.2', '1.6'],
    ])
  })
})

describe('what each value does', () => {
  it('is told by its slope, its part and its share of the variance, largest first', () => {
    expect(
      view.uncertain?.rows.map(({ id, written, elasticity, change, share, bar }) =>
        [id, written, elasticity, change, share, String(bar)].map(plain),
      ),
    ).toEqual([
      ['fundamental.temperature', '4.1(1) K', '1 % → 0.43 %', '0.65 aN/√Hz', '64.0 %', '64'],
      ['mass', '3.1(2) ng', '1 % → −0.50 %', '0.49 aN/√Hz', '36.0 %', '36'],
    ])
    expect(view.uncertain?.small).toBe(1)
  })

  it('leaves to the correlations what the values by themselves do not bring', () => {
    const rootShares = assessment.rootShares.map(each => ({ ...each, change: each.change * Math.SQRT2 }))
    expect(plain(reportView({ ...assessment, rootShares }).uncertain?.correlations ?? '')).toBe('−100 %')
  })

  it('is nothing where nothing is uncertain', () => {
    const { best } = assessment.headlines
    const exact = { ...best, asdSpread: { statistical: 0, systematic: 0, combined: 0 } }
    const headlines = { ...assessment.headlines, best: exact, reference: null }
    expect(reportView({ ...assessment, headlines, rootShares: [] }).uncertain).toBeNull()
  })
})

describe('evidence', () => {
  it('tells the share of the variance that assumed values bring, and what it cannot know', () => {
    const roots = assessment.budget.roots.map(root => (root.id === 'mass' ? { ...root, evidence: 'assumed' } : root))
    const { evidence } = reportView({ ...assessment, budget: { ...assessment.budget, roots } })
    expect(evidence.assumedVariance).toBeCloseTo(0.36, 12)
    expect(evidence.sentences.map(plain)).toEqual([
      '100 % of the total power at 1.2435 MHz lies in contributions that use a value of their own marked as assumed.',
      'Of 11 values in the file, 4 are assumed, 2 rest on a stated source and 5 state no evidence.',
      'The assumed values bring 36.0 % of the variance of the total.',
      'Of the assumed values, 3 state no uncertainty.',
    ])
    expect(evidence.definition).toContain('A contribution counts as resting on an assumption where')
  })

  it('links a key to the bibliography, where it stands once, behind the references of the laws', () => {
    const row = view.parameters.find(each => each.id === 'fundamental.temperature')
    expect(row?.evidence).toEqual({ note: '', assumed: false, number: view.bibliography.length })
    expect(view.bibliography.at(-1)).toMatchObject({
      text: 'A. Nobody, Ringdowns, J. Invented 3, 14 (2025)',
      link: 'https://doi.org/10.1234/abc',
    })
  })

  it('prints a work once that the laws and the budget cite under one key, and twice where the key means another', () => {
    const withText = (text: string) => {
      const citations = [{ key: 'callen-welton-1951', text, link: '10.1103/PhysRev.83.34' }]
      return reportView({ ...assessment, budget: { ...assessment.budget, citations } }).bibliography
    }
    const same = withText('H. B. Callen and T. A. Welton, Irreversibility, Phys. Rev. 83, 34 (1951)')
    expect(same).toHaveLength(view.bibliography.length - 1)
    expect(same[0].link).toBe('https://doi.org/10.1103/PhysRev.83.34')
    expect(withText('A. Nobody, Another work (2001)')).toHaveLength(view.bibliography.length)
  })

  it('says so where no assumed value is uncertain', () => {
    const roots = assessment.budget.roots.map(root => ({ ...root, uncertainty: 0 }))
    const { evidence } = reportView({ ...assessment, budget: { ...assessment.budget, roots } })
    expect(evidence.sentences.at(-1)).toBe(
      'No assumed value states an uncertainty, so that none counts in the variance.',
    )
  })

  it('makes no link of an address that is none', () => {
    const linked = (link: string | null) => {
      const citations = [{ key: 'ring', text: 'A', link }]
      return reportView({ ...assessment, budget: { ...assessment.budget, citations } }).bibliography.at(-1)?.link
    }
    expect(['javascript:alert(1)', 'data:text/html,x', null, 'HTTPS://example.org'].map(linked)).toEqual([
      ...['', '', ''],
      'HTTPS://example.org',
    ])
  })
})

describe('parameters', () => {
  it('state how their uncertainty is spread', () => {
    expect(view.parameters.find(row => row.id === 'mass')?.dispersion).toBe('normal, systematic')
    expect(view.parameters.find(row => row.id === 'cavity.pump.power')?.dispersion).toBe('')
  })

  it('that are inherited stand last, with the file that holds them', () => {
    expect(view.parameters.slice(-2).map(row => [row.id, row.place, row.inherited])).toEqual([
      ['fundamental.temperature', 'budgets/shared/cryostat.yaml:7', true],
      ['spring', 'budgets/shared/cryostat.yaml:12', true],
    ])
  })

  it('that are derived show their expression and its value', () => {
    const row = view.parameters.at(-1)
    expect(row).toMatchObject({ derived: true, written: '= mass * (2*pi*fundamental.frequency)^2', uncertainty: '' })
    expect(plain(row?.si ?? '')).toBe('189.088')
  })

  it('that share a cause are listed', () => {
    expect(view.correlations.map(row => [row.one, row.other, row.coefficient, row.place])).toEqual([
      ['mass', 'fundamental.temperature', '−0.5', 'budgets/shared/cryostat.yaml:20'],
    ])
  })
})

describe('variants', () => {
  it('stand below the budget as it is, with what they change', () => {
    expect(view.variants.map(row => [row.title, plain(row.best), row.requirements])).toEqual([
      ['As it is', '15.8(8) aN/√Hz', '2 of 4 missed'],
      ['cold: one kelvin', '15.8(8) aN/√Hz', ''],
    ])
    expect(view.variants[1].changes).toEqual(['fundamental.temperature: 4.1(1) K → 1 K'])
    expect(reportView({ ...assessment, variants: [] }).variants).toEqual([])
  })
})

describe('a readout without back-action', () => {
  const warning = { ...assessment.warnings[0], code: 'no-back-action' }
  const silent: Assessment = { ...assessment, warnings: [warning] }

  it('has no margins, and a reason for it', () => {
    const without = reportView(silent)
    expect(without.opening.sentence).not.toContain('quantum limit')
    expect(without.headlines.map(each => each.id)).not.toContain('total-margin')
    expect(without.headlines.find(each => each.id === 'margins')).toMatchObject({
      value: 'left out',
      note: 'the file does not say how the readout disturbs the motion',
    })
    expect(without.facts).toContainEqual({
      label: 'Margins to quantum limits',
      value: 'left out: no back-action in it',
    })
    expect(without.uncertain?.spreads.map(row => row.label)).not.toContain('Margin of the total')
    expect(without.variants.map(row => row.margin)).toEqual(['', '9.2(2)\u00a0dB'])
  })
})
