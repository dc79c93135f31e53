import { describe, expect, it } from 'vitest'
import type { Variant } from '../../src/model/budget.js'
import { formatProblem } from '../../src/budget/format-problem.js'
import { Refusal } from '../../src/model/problem.js'
import { assess } from '../../src/engine/assess.js'
import { head, root, tern } from './composed.js'
import { good, small } from './read.js'

const requirement = 'requirements: { proposal: { of: total, at: 1.243 MHz, below: 20 aN/√Hz } }\n'

function variant(changes: string, before = ''): Variant {
  const text = `${small}${before}variants:\n  cold:\n    title: Q ten times higher\n    changes:\n${changes.replace(/^/gm, '      ')}\n`
  const [only] = good(text).variants
  if (only === undefined) throw new Error('no variant was read')
  return only
}

describe('a variant', () => {
  it('is a budget of its own, with its changes over the rest', () => {
    const { id, title, about, budget, place } = variant('drum.quality: 2.4e8\ncavity.pump.power: 1 µW')
    expect({ id, title, about }).toEqual({ id: 'cold', title: 'Q ten times higher', about: null })
    expect(place).toMatchObject({ line: 18, column: 3 })
    expect(root(budget, 'drum.quality')).toMatchObject({ value: 2.4e8, text: '2.4e8', place: { line: 21 } })
    expect(root(budget, 'cavity.pump.power').value).toBeCloseTo(1e-6, 15)
    expect(root(budget, 'drum.mass').place).toMatchObject({ line: 8 })
    expect(budget).toMatchObject({ sensor: 'tern', title: 'Membrane', revision: '2.10', variants: [] })
  })

  it('leaves the budget as it is', () => {
    const without = good(small)
    const { variants, ...budget } = good(`${small}variants: { cold: { changes: { drum.quality: 1e9 } } }\n`)
    expect(variants.map(({ id, title }) => [id, title])).toEqual([['cold', 'cold']])
    expect({ ...budget, variants: [] }).toEqual(without)
  })

  it('is computed like a budget: ten times the quality is a tenth of the bath', () => {
    const text = `${small}contributions: { thermal: { of: drum.bath } }\nvariants: { q: { changes: { drum.quality: 2.4e8 } } }\n`
    const budget = good(text)
    const thermal = (of: typeof budget) =>
      assess(of).atReference.lines.find(line => line.id === 'thermal')?.psd[0] ?? NaN
    const [changed] = budget.variants
    const reference = { reference: 1.243e6 }
    expect(
      thermal({ ...budget, ...reference }) / thermal({ ...(changed?.budget ?? budget), ...reference }),
    ).toBeCloseTo(10, 3)
  })

  it('is named where its working point is refused', () => {
    const budget = good(`${small}variants: { blue: { changes: { cavity.pump.detuning: 1.2 MHz } } }\n`)
    const refused = (): unknown => {
      try {
        return assess(budget)
      } catch (error) {
        return error instanceof Refusal ? error.problems.map(formatProblem) : error
      }
    }
    expect(refused()).toEqual([expect.stringMatching(/^budget\.yaml:\d+:\d+: variant `blue`: .*unstable/)])
  })

  it.each([
    ['by the path of an id', 'drum.quality: 2.4e8'],
    ['by the path of a section', 'components.drum.quality: 2.4e8'],
    ['by a map under an id', 'drum: { quality: 2.4e8 }'],
    ['by a map under a section', 'components: { drum: { quality: 2.4e8 } }'],
  ])('can be written %s', (_how, changes) => {
    expect(root(variant(changes).budget, 'drum.quality').value).toBe(2.4e8)
  })

  it('changes parameters, takes lines away and adds some', () => {
    const before = 'parameters: { base: 4 K }\ncontributions: { heat: { of: drum.bath } }\n'
    const { budget } = variant(
      'base: 20 mK\ndrum.temperature: base\nheat: ~\ncontributions.stray: { kind: force-noise, into: drum, density: 1 aN/√Hz }',
      before,
    )
    expect(root(budget, 'base').value).toBeCloseTo(0.02, 12)
    expect(budget.lines.map(line => line.id)).toEqual(['stray'])
  })

  it('can add to a section that the budget does not have', () => {
    const { budget } = variant('parameters.base: 20 mK\ndrum.temperature: base')
    expect(root(budget, 'base').value).toBeCloseTo(0.02, 12)
  })

  it('can read another detector, whatever that is called', () => {
    const { budget } = variant('components.readout: { kind: sideband, reads: cavity.back }\nreadout: readout')
    expect(budget.readout).toBe('readout')
  })

  it('has no requirements but its own', () => {
    const text = `${small}${requirement}variants: { a: { changes: { drum.quality: 1e9 } } }\n`
    const [first] = good(text).variants
    expect(first?.budget.requirements).toEqual([])
    expect(first?.budget.warnings.filter(warning => /requirement/.test(warning.message))).toEqual([])
  })

  it('is inherited like everything else, and taken away like everything else', () => {
    const more = { 'budgets/drum/budget.yaml': `${small}variants: { q: { changes: { drum.quality: 1e9 } } }\n` }
    const inherited = tern(`${head}components: { drum: { mass: 1 ng } }\n`, more)
    expect(inherited.variants.map(({ id, budget }) => [id, root(budget, 'drum.mass').value])).toEqual([['q', 1e-12]])
    expect(tern(`${head}variants: { q: ~ }\n`, more).variants).toEqual([])
  })
})
