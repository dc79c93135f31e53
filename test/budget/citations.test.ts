import { describe, expect, it } from 'vitest'
import { formatProblem } from '../../src/budget/format-problem.js'
import { readBudgetFile } from '../../src/budget/read-budget.js'
import { citationLink, citationText } from '../../src/budget/citation-text.js'
import type { Citation } from '../../src/model/budget.js'
import { MemoryFiles } from './memory-files.js'
import { small } from './read.js'

const callen =
  '@article{callen-welton-1951,\n  author = {Callen, Herbert B. and Welton, Theodore A.},\n  title = {Irreversibility and Generalized Noise},\n  journal = {Physical Review},\n  volume = 83,\n  pages = {34--40},\n  year = 1951,\n  doi = {10.1103/PhysRev.83.34},\n}\n'

function readWith(evidence: string, bibliographies: Readonly<Record<string, string | Uint8Array>>) {
  const text = small.replace('temperature: 4.1 K', `temperature: { value: 4.1 K, evidence: ${evidence} }`)
  const files = new MemoryFiles({ 'budgets/tern/budget.yaml': text, ...bibliographies })
  return readBudgetFile(files, { sensor: 'tern', folder: 'budgets/tern', name: 'budget.yaml' })
}

function cite(evidence: string, bibliography: string): readonly Citation[] {
  const { budget, problems } = readWith(evidence, { 'budgets/references.bib': bibliography })
  if (budget === null) throw new Error(problems.map(formatProblem).join('\n'))
  return budget.citations
}

function told(evidence: string, bibliography: string | Uint8Array): string[] {
  return readWith(evidence, { 'budgets/references.bib': bibliography }).problems.map(
    problem => `[${problem.code}] ${formatProblem(problem)}`,
  )
}

describe('evidence', () => {
  it('of one word is a key, printed in the one style', () => {
    expect(cite('callen-welton-1951', callen)).toEqual([
      {
        key: 'callen-welton-1951',
        text: 'H. B. Callen, T. A. Welton, Irreversibility and Generalized Noise, Physical Review 83, 34–40 (1951), doi:10.1103/PhysRev.83.34',
        link: 'https://doi.org/10.1103/PhysRev.83.34',
      },
    ])
  })

  it.each(['assumed', 'two words'])('`%s` is no key', evidence => {
    expect(readWith(evidence, {}).budget?.citations).toEqual([])
  })

  it('is looked up beside the budget first, then in the folders above', () => {
    const beside = { 'budgets/tern/references.bib': '@misc{own, title = {Beside}}' }
    const above = { 'budgets/references.bib': '@misc{own, title = {Above}}\n@misc{other, title = {Shared}}' }
    const texts = (key: string) => readWith(key, { ...beside, ...above }).budget?.citations.map(({ text }) => text)
    expect([texts('own'), texts('other')]).toEqual([['Beside'], ['Shared']])
  })

  it('needs a bibliography where it is a key', () => {
    expect(readWith('wavemeter', {}).problems.map(formatProblem)).toEqual([
      'budgets/tern/budget.yaml:8:122: `wavemeter` is one word and so a key of `references.bib`, but no such file lies beside this one or above it; a note has several words',
    ])
  })
})

describe('the style of citations', () => {
  it.each([
    [
      '@book{k, author = {Braginsky, V. B. and Khalili, F. Ya.}, title = {Quantum Measurement}, publisher = {University Press}, year = 1992}',
      'V. B. Braginsky, F. Ya. Khalili, Quantum Measurement, University Press (1992)',
    ],
    [
      '@phdthesis{k, author = {von Neumann, Jean-Pierre}, title = {On it}, school = {Some School}, year = 2001}',
      'J.-P. von Neumann, On it, PhD thesis, Some School (2001)',
    ],
    [
      '@techreport{k, author = {{The Group}}, title = {On it}, institution = {The House}, number = 7, year = 2020}',
      'The Group, On it, The House, report 7 (2020)',
    ],
    [
      '@inproceedings{k, author = {Doe, J.}, title = {On it}, booktitle = {Talks}, pages = {3}, year = 2001}',
      'J. Doe, On it, in Talks, 3 (2001)',
    ],
    ['@misc{k, title = {Only a title}, url = {https://example.org/a}}', 'Only a title'],
    [
      '@article{k, author = {A, B. and others}, title = {The {SQL} of $^{3}$He, {\\"o} \\& \\textit{more}}, journal = j, volume = 1, year = 2000}\n@string{j = "Journal"}',
      'B. A et al., The SQL of ³He, ö & more, Journal 1 (2000)',
    ],
    [
      `@article{k, author = {${['A', 'B', 'C', 'D', 'E', 'F', 'G'].map(name => `${name}, X.`).join(' and ')}}, title = {Many}, year = 2000}`,
      'X. A et al., Many (2000)',
    ],
  ])('%s', (entry, expected) => {
    expect(cite('k', entry)[0]?.text).toBe(expected)
  })

  it('links to a DOI or an address of the web, and to nothing else', () => {
    expect(citationLink({ DOI: 'https://doi.org/10.1000/182' })).toBe('https://doi.org/10.1000/182')
    expect(citationLink({ URL: 'https://example.org/a?b=c' })).toBe('https://example.org/a?b=c')
    for (const URL of ['javascript:alert(1)', 'data:text/html,x', '//example.org', 'https://exa mple.org', 'file:///x'])
      expect(citationLink({ URL })).toBeNull()
    expect(citationLink({ DOI: '10.1000/"><script>' })).toBeNull()
  })

  it('leaves tags of the library out and keeps other text as text', () => {
    expect(citationText({ title: '<i>x</i> <span class="nocase">SQL</span> <script>' })).toBe('x SQL <script>')
  })
})

describe('a bad bibliography', () => {
  it.each([
    [
      'twice',
      `${callen}${callen}`,
      '[bibtex] budgets/references.bib:10:1: the key `callen-welton-1951` stands twice in this file, first in line 1; rename one',
    ],
    [
      'an undefined string',
      callen.replace('{Physical Review}', 'pr'),
      '[bibtex] budgets/references.bib:4:13: no `@string` is called `pr`; define it, or put the text in braces',
    ],
    [
      'not closed',
      callen.replace(/}\n$/, ''),
      '[bibtex] budgets/references.bib:1:1: this `@article` is not closed; its last bracket is missing',
    ],
    [
      'a missing comma',
      callen.replace('},\n  title', '}\n  title'),
      '[bibtex] budgets/references.bib:3:3: the entry `callen-welton-1951` is no BibTeX that can be read here; look for a missing comma or brace',
    ],
    [
      'nothing in it',
      '@misc{callen-welton-1951, year = 1951}',
      '[bibtex] budgets/references.bib:1:1: the entry `callen-welton-1951` has neither author nor title',
    ],
    [
      'too large',
      ' '.repeat(1024 * 1024 + 1),
      '[too-large] budgets/references.bib:1:1: the file has 1048577 bytes; at most 1048576 (1024 kB) are read',
    ],
    [
      'other bytes',
      Uint8Array.of(0x40, 0xff),
      '[not-utf8] budgets/references.bib:1:1: the file is not UTF-8 text; save it in that encoding',
    ],
    [
      'a hidden character',
      callen.replace('Noise', 'No\u202eise'),
      '[hidden-character] budgets/references.bib:3:46: the character U+202E cannot be seen and is not allowed; delete it',
    ],
    [
      'deep braces',
      `@misc{callen-welton-1951, title = {${'{'.repeat(40)}x${'}'.repeat(40)}}}`,
      '[bibtex] budgets/references.bib:1:1: this entry is longer than 20000 characters or has braces in more than 30 braces',
    ],
    [
      'long',
      `@misc{callen-welton-1951, title = {${'x'.repeat(20_000)}}}`,
      '[bibtex] budgets/references.bib:1:1: this entry is longer than 20000 characters or has braces in more than 30 braces',
    ],
  ])('%s', (_name, bibliography, expected) => {
    expect(told('callen-welton-1951', bibliography)).toEqual([expected])
  })

  it('is no matter of a budget that cites nothing of it', () => {
    expect(told('assumed', '@article{')).toEqual([])
    expect(
      told('callen-welton-1951', `${callen}@misc{a, title = b}\n@misc{c, title = {d}}@misc{c, title = {e}}`),
    ).toEqual([])
  })

  it('has remarks, preambles and entries in round brackets', () => {
    const text = `% a remark with {braces\n@comment{ x @misc{callen-welton-1951, title = {no}} }\n@preamble{"\\newcommand{x}"}\n@misc(callen-welton-1951, title = "A {"} in quotes")\n`
    expect(cite('callen-welton-1951', text)[0]?.text).toBe('A " in quotes')
  })
})
