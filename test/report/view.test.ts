import { describe, expect, it } from 'vitest'
import type { Assessment } from '../../src/model/assessment.js'
import { reportView } from '../../src/report/view.js'
import { fixtureAssessment } from './fixture.js'

const assessment = fixtureAssessment()
const view = reportView(assessment)
/** Non-breaking spaces are asked for in the pages and are in the way here. */
const plain = (text: string): string => text.replaceAll('\u00a0', ' ')

describe('the opening', () => {
  it('says how good, where, how far from the limit, and what sets it', () => {
    expect(plain(view.opening.sentence)).toBe(
      'Best 15.8 aN/√Hz at 1.2431 MHz, 17.3 dB above the standard quantum limit, set by thermal (91 %).',
    )
    expect(view.opening.sentence).toBe(`Best ${view.opening.value} ${view.opening.rest}`)
  })

  it('names the lines that make up three quarters between them', () => {
    const shares = [
      { line: 'shot', share: 0.5 },
      { line: 'thermal', share: 0.3 },
      { line: 'stray', share: 0.2 },
    ]
    expect(plain(sentence({ shares }))).toContain('set by shot (50 %) and thermal (30 %).')
  })

  it('says below, at, or nothing of a limit, as it is', () => {
    expect(plain(sentence({ totalMargin: -2.04 }))).toContain(', 2.0 dB below the standard quantum limit,')
    expect(plain(sentence({ totalMargin: 0.02 }))).toContain(', at the standard quantum limit,')
    expect(sentence({ totalMargin: null })).not.toContain('limit')
  })

  function sentence(best: Partial<Assessment['headlines']['best']>): string {
    const headlines = { ...assessment.headlines, best: { ...assessment.headlines.best, ...best } }
    return reportView({ ...assessment, headlines }).opening.sentence
  }
})

describe('the headline numbers', () => {
  it('answer in the order of the questions', () => {
    expect(view.headlines.map(each => [each.label, plain(each.value)])).toEqual([
      ['Best sensitivity', '15.8 aN/√Hz'],
      ['At the reference frequency', '16.3 aN/√Hz'],
      ['Margin of the total', '9.2 dB above'],
      ['Margin of the added noise', '0.3 dB above'],
      ['Largest contribution', 'Thermal'],
      ['Half-power band', '3.19 kHz'],
      ['Final occupancy of fundamental', '26.4'],
    ])
  })

  it('leave out what was not computed', () => {
    const modes = assessment.modes.map(mode => ({ ...mode, finalOccupancy: null }))
    const headlines = { ...assessment.headlines, reference: null }
    const ids = reportView({ ...assessment, modes, headlines }).headlines.map(each => each.id)
    expect(ids).toEqual(['best', 'total-margin', 'added-margin', 'largest', 'band'])
  })
})

describe('the tables', () => {
  it('say what dominates where', () => {
    expect(view.bands.map(band => [plain(band.range), band.title])).toEqual([
      ['1.2000 to 1.2413 MHz', 'Shot'],
      ['1.2413 to 1.2445 MHz', 'Thermal'],
      ['1.2445 to 1.3000 MHz', 'Shot'],
    ])
  })

  it('list every contribution, largest first, a negative correlation with its sign', () => {
    expect(view.contributions.map(row => [row.id, plain(row.value), plain(row.share), row.enters])).toEqual([
      ['thermal', '15.1 aN/√Hz', '85.6 %', 'fundamental (bath)'],
      ['shot', '4.81 aN/√Hz', '8.7 %', 'cavity (front); detector (loss)'],
      ['back_action', '4.22 aN/√Hz', '6.7 %', 'cavity (front)'],
      ['stray', '2.00 aN/√Hz', '1.5 %', 'stray'],
      ['shot_back_action', '−2.53 aN/√Hz', '−2.4 %', 'cavity (front)'],
    ])
  })

  it('give every value of the file as written, in SI, with uncertainty, evidence and line', () => {
    expect(view.parameters).toHaveLength(assessment.budget.roots.length)
    const row = view.parameters.find(each => each.id === 'mass')
    expect(row).toMatchObject({ written: '3.1(2) ng', evidence: { note: 'finite elements' }, place: 'budget.yaml:10' })
    expect(plain(row?.si ?? '')).toBe('3.1 × 10⁻¹² kg')
    expect(plain(row?.uncertainty ?? '')).toBe('2 × 10⁻¹³ kg')
  })
})

describe('a day of measurement', () => {
  it('is not said twice', () => {
    const row = (evidence: string) => {
      const roots = assessment.budget.roots.map(root =>
        root.id === 'fundamental.quality' ? { ...root, evidence } : root,
      )
      return reportView({ ...assessment, budget: { ...assessment.budget, roots } }).parameters[2]
    }
    expect(row('lab book 12').measured).toBe('2026-03-14')
    expect(row('ringdown 2026-03-14').measured).toBe('')
  })
})

describe('the equation cards', () => {
  const card = (id: string) => view.cards.find(each => each.id === id)

  it('stand one a line', () => {
    expect(view.cards.map(each => each.id)).toEqual(assessment.evaluation.lines.map(line => line.id))
  })

  it('put the numbers into a bath’s equation', () => {
    const [equation] = card('thermal')?.equations ?? []
    expect(equation.name).toBe('viscous bath')
    expect(equation.numbers).toEqual([
      'S_F = 4\\hbar\\left(6.87\\times 10^{4}+\\tfrac12\\right)(2\\pi\\cdot 1.2435\\,\\mathrm{MHz})(2\\pi\\cdot 1.243\\,\\mathrm{MHz})\\,\\frac{3.10\\,\\mathrm{ng}}{2.4\\times 10^{7}} = \\left(15.1\\,\\mathrm{aN}/\\sqrt{\\mathrm{Hz}}\\right)^2',
    ])
  })

  it('say an equation once, with the numbers of each source', () => {
    const twin = { ...assessment.atReference.lines[0], of: ['fundamental.bath', 'fundamental.bath'] }
    const lines = [twin, ...assessment.atReference.lines.slice(1)]
    const doubled = reportView({ ...assessment, atReference: { ...assessment.atReference, lines } })
    expect(doubled.cards[0].equations).toEqual(card('thermal')?.equations)
  })

  it('print no numbers where these do not give the curve', () => {
    const sources = assessment.atReference.sources.map(source =>
      source.id === 'fundamental.bath' ? { ...source, own: source.own.map(value => 1.01 * value) } : source,
    )
    const changed = reportView({ ...assessment, atReference: { ...assessment.atReference, sources } })
    expect(changed.cards.find(each => each.id === 'thermal')?.equations[0].numbers).toEqual([])
  })

  it('show own density, transfer and product of every source or part', () => {
    expect(card('shot')?.terms.map(term => [term.own, term.transfer, term.product].map(plain))).toEqual([
      ['½ quantum', '(6.09 aN/√Hz)² per quantum', '(4.30 aN/√Hz)²'],
      ['½ quantum', '(3.04 aN/√Hz)² per quantum', '(2.15 aN/√Hz)²'],
    ])
    expect(card('thermal')?.terms.map(term => [term.own, term.transfer, term.product].map(plain))).toEqual([
      ['(15.1 aN/√Hz)²', '1', '(15.1 aN/√Hz)²'],
    ])
  })

  it('give symbols their values, ports by name', () => {
    expect(card('back_action')?.symbolsBefore).toEqual([{ id: 'shot', title: 'Shot' }])
    const symbols = card('shot')
      ?.symbols.flatMap(group => group.rows)
      .map(symbol => [symbol.tex, symbol.value, symbol.root])
    expect(symbols).toContainEqual(['\\kappa_{\\mathrm{front}}', '600 kHz', 'cavity.ports.front.rate'])
    expect(symbols).toContainEqual(['\\Delta', '0 Hz', ''])
  })

  it('cite what is in the bibliography', () => {
    for (const each of view.cards)
      for (const number of each.citations)
        expect(view.bibliography[number - 1].key).toBe(each.references[each.citations.indexOf(number)])
    expect(view.bibliography[0].text).toBe('H. B. Callen, T. A. Welton, Phys. Rev. 83, 34 (1951)')
  })
})

describe('evidence and care', () => {
  it('counts what rests on assumed values', () => {
    expect(view.evidence.sentences.map(plain)[1]).toBe(
      'Of 11 values in the file, 4 are assumed, 2 rest on a stated source and 5 state no evidence.',
    )
    const roots = assessment.budget.roots.map(root => ({
      ...root,
      evidence: root.id === 'stray.density' ? 'assumed' : null,
    }))
    const lines = assessment.budget.lines.map(line => ({ ...line, evidence: null }))
    const { evidence } = reportView({ ...assessment, budget: { ...assessment.budget, roots, lines } })
    const stray = assessment.atReference.lines.find(line => line.id === 'stray')
    expect(evidence.assumedShare).toBeCloseTo((stray?.psd[0] ?? 0) / assessment.atReference.total[0], 12)
  })

  it('warns of lasers and cryogens where the file has them, and not elsewhere', () => {
    expect(view.cautions.map(caution => caution.id)).toEqual(['laser', 'cryogen'])
    const roots = assessment.budget.roots.map(root => {
      if (root.id === 'cavity.frequency') return { ...root, value: 6e9 }
      return root.dimension === 'temperature' ? { ...root, value: 293 } : root
    })
    expect(reportView({ ...assessment, budget: { ...assessment.budget, roots } }).cautions).toEqual([])
  })

  it('repeats each warning once, with its place', () => {
    const budget = { ...assessment.budget, warnings: assessment.warnings }
    expect(reportView({ ...assessment, budget }).warnings).toEqual([
      'budgets/fixture/budget.yaml:31:3: the detuning is left out; 0 Hz is taken',
    ])
  })
})
