import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { scanBibtex } from '../../src/budget/bibtex.js'
import { changed, read } from '../budget/read.js'
import { fastest } from './fastest.js'

const citing = changed(['temperature: 4.1 K', 'temperature: { value: 4.1 K, evidence: key }'])
const good =
  '@string{j = "Journal"}\n@article{key, author = {A, B. and C, D.}, title = {On {it}}, journal = j, year = 2000}\n'

describe('hostile bibliographies', () => {
  it('are read or refused with a place, whatever is changed in a good one', () => {
    const piece = fc.constantFrom(
      ...'@{}()"#,=\\$%&~^_ \n',
      '@string{',
      'key',
      '\\textit{',
      '$^{',
      '<script>',
      '__proto__',
    )
    const change = fc.record({ at: fc.nat(200), drop: fc.nat(8), insert: piece })
    fc.assert(
      fc.property(fc.array(change, { minLength: 1, maxLength: 4 }), changes => {
        let text = good
        for (const { at, drop, insert } of changes) text = text.slice(0, at) + insert + text.slice(at + drop)
        const { budget, problems } = read(citing, { 'references.bib': text })
        expect(budget === null).toBe(problems.length > 0)
        for (const { place } of problems) expect(place.file).toMatch(/^(?:budget\.yaml|references\.bib)$/)
        for (const citation of budget?.citations ?? []) expect(citation.text.length).toBeLessThanOrEqual(1500)
      }),
      { numRuns: 800, seed: 20261201 },
    )
  })

  it.each([
    ['braces that are never closed', `@misc{key, title = ${'{'.repeat(1_000_000)}`],
    ['a million at signs', '@'.repeat(1_000_000)],
    ['heads without end', '@a{'.repeat(300_000)],
    ['many entries', '@misc{a, title={b}}\n'.repeat(50_000)],
    ['many entries of one key', '@misc{key, title={b}}\n'.repeat(4_000)],
    [
      'strings that need each other',
      Array.from({ length: 3000 }, (_, i) => `@string{s${i} = s${i + 1} # s${i + 2}}`).join('\n') +
        '@misc{key, title = s0}',
    ],
    ['many authors', `@misc{key, author = {${'A and '.repeat(3_000)}B}}`],
    ['spaces', `@misc{key${' '.repeat(900_000)}}`],
    ['words', `@misc{key, ${'a = b # '.repeat(100_000)}c}`],
  ])('cost little: %s', (_name, text) => {
    const { problems, budget } = read(citing, { 'references.bib': text })
    expect(budget === null).toBe(problems.length > 0)
    expect(fastest(() => read(citing, { 'references.bib': `${text} ` }))).toBeLessThan(500)
  })

  it('keep to what they hold', () => {
    const { entries, strings } = scanBibtex('references.bib', new TextEncoder().encode(good))
    expect([[...entries.keys()], [...strings.keys()]]).toEqual([['key'], ['j']])
  })
})
