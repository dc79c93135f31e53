import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ComposeFiles } from '../../src/budget/compose-files.js'
import { compose } from '../../src/budget/compose.js'
import { Issues } from '../../src/budget/issues.js'
import { plainValue } from '../../src/budget/tree.js'
import { head, readTern, root, tern } from './composed.js'
import { MemoryFiles } from './memory-files.js'

type Value = string | { [key: string]: Value }

const word = fc.constantFrom('a', 'b', 'c', 'd')
/** Maps of words; `kind` and `value`, which merge by rules of their own, are no keys here. */
const { map } = fc.letrec<{ map: { [key: string]: Value }; value: Value }>(tie => ({
  value: fc.oneof({ maxDepth: 3 }, word, tie('map')),
  map: fc.dictionary(word, tie('value'), { maxKeys: 4 }),
}))

/** The same in a few lines and without places: what the composition must come to. */
function merged(below: Value | undefined, above: Value): Value {
  if (below === undefined || typeof below === 'string' || typeof above === 'string') return above
  const result: { [key: string]: Value } = { ...below }
  for (const [key, value] of Object.entries(above)) result[key] = merged(result[key], value)
  return result
}

function composed(files: Readonly<Record<string, { [key: string]: Value }>>, top: string): unknown {
  const texts = Object.entries(files).map(([name, value]) => [name, JSON.stringify({ format: 1, ...value })])
  const issues = new Issues()
  const memory = new MemoryFiles(Object.fromEntries(texts) as Record<string, string>)
  const tree = compose(top, new ComposeFiles(memory, issues), issues)
  expect(issues.sorted()).toEqual([])
  return tree === null ? null : JSON.parse(JSON.stringify(plainValue(tree)))
}

describe('composition', () => {
  it('lays files over each other, the top one last', () => {
    const property = fc.property(fc.array(map, { minLength: 1, maxLength: 5 }), layers => {
      const files = layers.map((layer, i) => [`f${i}.yaml`, i === 0 ? layer : { from: `f${i - 1}.yaml`, ...layer }])
      const expected = layers.reduce<Value>((below, above) => merged(below, above), {})
      expect(composed(Object.fromEntries(files), `f${layers.length - 1}.yaml`)).toEqual({
        format: 1,
        ...(expected as object),
      })
    })
    fc.assert(property, { numRuns: 300 })
  })

  it('of shared parts with different ids does not depend on their order', () => {
    const property = fc.property(map, map, (a, b) => {
      const part = (prefix: string, ids: { [key: string]: Value }) => ({
        parameters: Object.fromEntries(Object.entries(ids).map(([key, value]) => [`${prefix}${key}`, value])),
      })
      const files = { 'a.yaml': part('a', a), 'b.yaml': part('b', b) }
      const one = composed({ ...files, 'top.yaml': { include: ['a.yaml', 'b.yaml'] as never } }, 'top.yaml')
      const other = composed({ ...files, 'top.yaml': { include: ['b.yaml', 'a.yaml'] as never } }, 'top.yaml')
      expect(one).toEqual(other)
    })
    fc.assert(property, { numRuns: 100 })
  })
})

describe('what a stranger sends', () => {
  const told = (files: Readonly<Record<string, string>>) =>
    readTern(files).problems.map(({ code, place, message }) => `${code} ${place.file}:${place.line} ${message}`)

  it('may consist of 30 files', () => {
    const part = (i: number) => [`budgets/shared/p${i}.yaml`, `format: 1\nparameters: { p${i}: 1 K }\n`]
    const including = (count: number) =>
      `format: 1\ninclude: [${Array.from({ length: count }, (_, i) => `../shared/p${i}.yaml`).join(', ')}]\n`
    const files = Object.fromEntries(Array.from({ length: 40 }, (_, i) => part(i))) as Record<string, string>
    expect(told({ ...files, 'budgets/tern/budget.yaml': including(29) }).join()).not.toContain('too-large')
    expect(told({ ...files, 'budgets/tern/budget.yaml': including(30) })).toEqual([
      'too-large budgets/tern/budget.yaml:2 the files of this budget, with this one, consist of more than 30',
    ])
  })

  it('may hold 1 MB and 40000 values', () => {
    const including = `format: 1\ninclude: [${[1, 2, 3, 4, 5].map(i => `${i}.yaml`).join(', ')}]\n`
    const remarks = `# ${'x'.repeat(97)}\n`.repeat(2400)
    const heavy = (i: number) => `format: 1\n${remarks}parameters: { p${i}: 1 K }\n`
    const row = `[${Array(450).fill('1').join(', ')}]`
    const long = (i: number) => `format: 1\nparameters: { p${i}: [${Array(20).fill(row).join(', ')}] }\n`
    const five = (text: (i: number) => string) =>
      Object.fromEntries([1, 2, 3, 4, 5].map(i => [`budgets/tern/${i}.yaml`, text(i)]))
    const top = { 'budgets/tern/budget.yaml': including }
    expect(told({ ...top, ...five(heavy) })).toEqual([
      'too-large budgets/tern/budget.yaml:2 the files of this budget, with this one, hold more than 1048576 bytes (1 MB) in all',
    ])
    expect(told({ ...top, ...five(long) })).toContain(
      'too-large budgets/tern/budget.yaml:2 the files of this budget, with this one, hold more than 40000 values in all',
    )
  })

  it('is read in no time, however parts include each other', () => {
    const layer = (i: number) => {
      const below = i === 0 ? [] : [`include: [${['a', 'b', 'c'].map(id => `${id}${i - 1}.yaml`).join(', ')}]`]
      return ['a', 'b', 'c'].map(id => [
        `budgets/tern/${id}${i}.yaml`,
        ['format: 1', ...below, `parameters: { ${id}${i}: 1 K }`, ''].join('\n'),
      ])
    }
    const files = Object.fromEntries(Array.from({ length: 9 }, (_, i) => layer(i)).flat()) as Record<string, string>
    const start = performance.now()
    const budget = tern(
      `${head}include: [a8.yaml, b8.yaml, c8.yaml]\nparameters: { q: 1e7 }\ncomponents: { drum: { quality: q } }\n`,
      files,
    )
    expect(performance.now() - start).toBeLessThan(2000)
    expect(root(budget, 'q').value).toBe(1e7)
    expect(budget.warnings).toEqual([])
  })

  it('of any kind is a budget, or is refused with a place', () => {
    const good =
      'format: 1\ninclude: [part.yaml]\nparameters: { base: { value: 4 K, about: x } }\ncomponents: { drum: { temperature: base, quality: ~ } }\n'
    const part = 'format: 1\ntitle: Part\nparameters: { warm: 295 K }\n'
    const cut = fc.tuple(
      fc.nat({ max: good.length }),
      fc.nat({ max: 8 }),
      fc.constantFrom('', '~', ': ', '- ', '{', '}', '[', '../', '\n', 'value'),
    )
    const mutated = (text: string, [at, drop, put]: readonly [number, number, string]) =>
      text.slice(0, at) + put + text.slice(at + drop)
    const property = fc.property(cut, cut, (a, b) => {
      const { budget, problems } = readTern({
        'budgets/tern/budget.yaml': head.replace('../drum/budget.yaml', 'base.yaml'),
        'budgets/tern/base.yaml': mutated(good, a),
        'budgets/tern/part.yaml': mutated(part, b),
      })
      const errors = problems.filter(({ severity }) => severity === 'error')
      expect(budget === null).toBe(errors.length > 0)
      for (const { place } of errors) expect(place.file).toMatch(/^budgets\/tern\/(budget|base|part)\.yaml$/)
      for (const { place } of errors) expect(place.line).toBeGreaterThan(0)
    })
    fc.assert(property, { numRuns: 300 })
  })
})
