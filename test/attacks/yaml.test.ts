import { describe, expect, it } from 'vitest'
import { formatProblem } from '../../src/budget/format-problem.js'
import { readYaml } from '../../src/budget/yaml.js'
import { changed, lines, read } from '../budget/read.js'
import { fastest } from './fastest.js'

const bytes = (text: string) => new TextEncoder().encode(text)
const told = (text: string) => readYaml('f', bytes(text)).problems.map(formatProblem)
const repeat = (count: number, piece: (index: number) => string) =>
  Array.from({ length: count }, (_, i) => piece(i)).join('')

const bombs: Readonly<Record<string, string>> = {
  '50,000 keys': repeat(50_000, i => `${i.toString(36)}:\n`),
  '20,000 keys in brackets': `{${repeat(20_000, i => `k${i}: 1, `)}}`,
  'a quarter of a million brackets': '['.repeat(250_000),
  '60,000 open maps': '{a: '.repeat(60_000),
  '120,000 nested lists on a line': '- '.repeat(120_000),
  '120,000 explicit keys': '? '.repeat(120_000),
  '690 levels of indentation': repeat(690, i => `${' '.repeat(i)}a:\n`),
  '2,700 levels of lists': repeat(90, i => `${' '.repeat(i * 60)}${'- '.repeat(29)}-\n`),
  '20,000 aliases': `a: &a 1\n${repeat(20_000, i => `k${i}: *a\n`)}`,
  '16,000 anchors': repeat(16_000, i => `k${i}: &b${i} 1\n`),
  '80,000 empty keys': `a:\n${': \n'.repeat(80_000)}`,
  '60,000 documents': '---\n'.repeat(60_000),
  '250,000 commas': `[${','.repeat(250_000)}`,
  '80,000 tags': '!a '.repeat(80_000),
  '100,000 broken escapes': `a: "${'\\u'.repeat(100_000)}"`,
  '33 million values through aliases': `a: &a [${repeat(100, () => 'x, ')}]\n${repeat(5, i => `k${i}: &${'bcdef'[i]} [${repeat(4, () => `*${'abcde'[i]}, `)}]\n`).slice(0, -1)}\n`,
  '257 kB': `a: ${'x'.repeat(257 * 1024)}`,
}

describe('a YAML bomb', () => {
  it.each(Object.entries(bombs))('%s is refused with a place, within a second', (_name, text) => {
    const { tree, problems } = readYaml('f', bytes(text))
    expect(fastest(() => readYaml('f', bytes(text)))).toBeLessThan(1000)
    expect(tree).toBeNull()
    expect(problems.length).toBeGreaterThan(0)
    for (const { place } of problems) expect([place.line >= 1, place.column >= 1]).toEqual([true, true])
  })

  it('is refused where aliases multiply to more values than are read', () => {
    const text = `a: &a [${'x, '.repeat(100)}]\nb: &b [*a, *a, *a, *a, *a, *a]\nc: &c [*b, *b, *b, *b, *b, *b]\nd: [*c, *c, *c, *c, *c, *c]\n`
    expect(told(text)).toEqual([
      expect.stringMatching(/^f:4:\d+: the file, its aliases written out, holds more than 20000 values$/),
    ])
  })

  it('may come near the bounds and is then read', () => {
    const deep = `${'['.repeat(29)}x${']'.repeat(29)}`
    expect(readYaml('f', bytes(`a: ${deep}`)).tree).not.toBeNull()
    expect(readYaml('f', bytes(repeat(500, i => `k${i}: 1\n`))).tree).not.toBeNull()
    expect(told(repeat(501, i => `k${i}: 1\n`))).toEqual(['f:1:1: a map has at most 500 keys; this one has 501'])
  })
})

describe('YAML that says something else than it shows', () => {
  it.each([
    ['a directive', '%YAML 1.1\n---\na: 1\n', 'f:1:1: a line that begins with `%` is a YAML directive'],
    ['a language tag', 'a: !!js/function "x"\n', 'f:1:4: a word that begins with `!` is a YAML tag'],
    ['a merge', 'b: { <<: { a: 1 } }\n', 'f:1:6: the merge key `<<` is not allowed'],
    ['reversed text', 'a: x\u202ey\n', 'f:1:5: the character U+202E cannot be seen'],
    ['reversed text by an escape', 'a: "x\\u202ey"\n', 'f:1:4: the text holds a character that cannot be seen'],
    ['a terminal’s escape', 'a: x\u001b[2J\n', 'f:1:5: the character U+001B cannot be seen'],
    ['a zero byte', 'a: x\0\n', 'f:1:5: the character U+0000 cannot be seen'],
    ['a hidden line end', 'a: 1\u2028b: 2\n', 'f:1:5: the character U+2028 cannot be seen'],
    ['a lone carriage return', 'a: 1\rb: 2\n', 'f:1:5: the character U+000D cannot be seen'],
    ['a key without width', 'a\u200b: 1\n', 'f:1:2: the character U+200B cannot be seen'],
    ['two spellings of one key', '\u00e9: 1\ne\u0301: 2\n', 'f:2:1: the key `e\u0301` stands twice'],
    ['an alias inside its anchor', 'a: &a [*a]\n', 'f:1:8: no anchor `&a` stands before this alias'],
    ['a key that is a list', '[a, b]: 1\n', 'f:1:1: a key must be a word'],
  ])('%s is refused', (_name, text, start) => {
    const { tree } = readYaml('f', bytes(text))
    expect(tree).toBeNull()
    expect(told(text)[0]?.startsWith(start), told(text)[0]).toBe(true)
  })

  it('is refused when it is not UTF-8', () => {
    expect(readYaml('f', Uint8Array.of(0x61, 0x3a, 0x20, 0xff)).problems.map(formatProblem)).toEqual([
      'f:1:1: the file is not UTF-8 text; save it in that encoding',
    ])
  })

  it('keeps words that other readers turn into numbers, dates or truth', () => {
    for (const word of ['yes', 'on', 'NO', 'true', '0x1F', '1_000', '12:30:45', '.nan', '1e400', '2026-12-01', '0o17'])
      expect(readYaml('f', bytes(`a: ${word}\n`)).tree).toMatchObject({
        entries: new Map([['a', { value: { text: word } }]]),
      })
  })
})

describe('hostile names and numbers in a budget', () => {
  it.each(['__proto__', 'constructor', 'toString', 'hasOwnProperty', 'prototype', 'valueOf'])('%s is no id', name => {
    const pairs = [
      ['  drum:', `  ${name}:`],
      ['mode: drum', `mode: ${name}`],
      ['modes: { drum', `modes: { ${name}`],
    ] as const
    const result = read(changed(...pairs))
    expect(result.budget).toBeNull()
    expect(lines(result).some(line => line.startsWith(`budget.yaml:8:3: \`${name}\` is`))).toBe(true)
    expect(({} as Record<string, unknown>)['kind']).toBeUndefined()
  })

  it.each(['__proto__', 'constructor', 'toString'])('%s is no kind, key or parameter', name => {
    expect(lines(read(changed(['kind: homodyne', `kind: ${name}`])))[0]).toContain(`\`${name}\` is no kind`)
    expect(lines(read(changed(['title: Membrane', `title: Membrane\n${name}: 1`])))[0]).toContain(
      `unknown key \`${name}\``,
    )
    expect(lines(read(changed(['mass: 3.1(2) ng', `mass: ${name}`])))[0]).toContain(
      `no parameter is called \`${name}\``,
    )
    expect(lines(read(changed(['cavity.back', `cavity.${name}`])))[0]).toMatch(
      /^budget\.yaml:16:38: `cavity(?:` has no port|\.\w+` is no name of a port)/,
    )
    expect(lines(read(changed(['port: front', `port: ${name}`])))[0]).toMatch(/is no name|has no/)
  })

  it.each([
    '1e400',
    '-1e400',
    '1e-400',
    '.inf',
    '-.inf',
    '.nan',
    'NaN',
    'Infinity',
    '0x10',
    '1_000',
    '1e99999999999',
    '9'.repeat(400),
    '٣',
  ])('the number %s is refused at its place', number => {
    const result = read(changed(['quality: 2.4e7', `quality: ${number}`]))
    expect(result.budget).toBeNull()
    expect(lines(result)[0]).toMatch(/^budget\.yaml:8:\d+: /)
  })

  it('shows control characters of a file’s name as escapes', () => {
    const place = { file: 'a\u001b[31m\n.yaml', line: 1, column: 1 }
    expect(formatProblem({ severity: 'error', code: 'x', place, message: 'bad\u202e\u0007' })).toBe(
      'a\\u{1b}[31m\\u{a}.yaml:1:1: bad\\u{202e}\\u{7}',
    )
  })
})
