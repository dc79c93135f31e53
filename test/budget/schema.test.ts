import { Ajv } from 'ajv'
import { describe, expect, it } from 'vitest'
import { parse } from 'yaml'
import { declarations } from '../../src/catalogue/declarations.js'
import { budgetSchema, type Schema } from '../../src/budget/schema.js'
import { example, small, spring } from './read.js'

const schema = budgetSchema()

/** As an editor reads it: draft-07 alone, values typed by YAML, no discriminator. */
const editor = once(() => {
  const ajv = new Ajv({
    allErrors: true,
    strict: true,
    strictRequired: false,
    allowUnionTypes: true,
    keywords: ['discriminator'],
  })
  return ajv.compile(schema)
})

function once<Result>(make: () => Result): () => Result {
  let made: { readonly result: Result } | null = null
  return () => (made ??= { result: make() }).result
}

function* subschemas(node: unknown, path = '#'): Generator<[string, Schema]> {
  if (typeof node !== 'object' || node === null) return
  if (!Array.isArray(node)) yield [path, node as Schema]
  for (const [key, below] of Object.entries(node)) yield* subschemas(below, `${path}/${key}`)
}

describe('the published schema', () => {
  it('is a valid draft-07 schema', () => {
    expect(new Ajv({ strict: false }).validateSchema(schema)).toBe(true)
  })

  it('accepts good budgets as an editor reads them', () => {
    const validate = editor()
    for (const text of [example, small, spring]) expect([validate(parse(text)), validate.errors]).toEqual([true, null])
  })

  it.each([
    ['an unknown key', 'quality: 2.4e7', 'qality: 2.4e7'],
    ['an unknown kind', 'kind: homodyne', 'kind: homodine'],
    ['both of two', 'coupling: 21 GHz/µm', 'coupling: 21 GHz/µm\n    g0: 20 Hz'],
    ['none of two', '    coupling: 21 GHz/µm\n', ''],
    ['a missing key', 'mass: 3.1(2) ng, ', ''],
    ['another format', 'format: 1', 'format: 2'],
    ['a nested key', 'port: front', 'prt: front'],
  ])('refuses %s as an editor reads it', (_name, from, to) => {
    expect(small).toContain(from)
    expect(editor()(parse(small.replace(from, to)))).toBe(false)
  })

  it.each([
    ['an unknown distribution', 'distribution: rectangular', 'distribution: uniform'],
    ['an unknown effect', 'effect: systematic', 'effect: random'],
    ['three correlated at once', '[k, m0]', '[k, m0, q0]'],
    ['a correlation without coefficient', ', coefficient: 0.8', ''],
    ['a requirement of nothing', 'of: total, ', ''],
    ['an unknown key of a requirement', 'below: 200 aN', 'under: 200 aN'],
  ])('refuses %s as an editor reads it', (_name, from, to) => {
    expect(spring).toContain(from)
    expect(editor()(parse(spring.replace(from, to)))).toBe(false)
  })

  it('explains every key that is no field of a kind to an editor', () => {
    const plain = ['quantity', 'requirement', 'claim', 'table', 'variant', 'measurand']
    const definitions = schema['definitions'] as Record<string, { properties: Record<string, Schema> }>
    const silent = [
      ['', schema as { properties: Record<string, Schema> }] as const,
      ...plain.map(name => [name, definitions[name]] as const),
    ].flatMap(([name, definition]) =>
      Object.entries(definition?.properties ?? {})
        .filter(([, node]) => node['description'] === undefined && node['$ref'] === undefined)
        .map(([key]) => `${name}.${key}`),
    )
    expect(silent).toEqual([])
  })

  it('has a definition of every kind, with the declared fields', () => {
    const definitions = schema['definitions'] as Record<string, { properties: Record<string, unknown> }>
    for (const { kind, fields } of declarations.values())
      expect(Object.keys(definitions[`kind-${kind}`]?.properties ?? {})).toEqual(
        expect.arrayContaining(['kind', ...Object.keys(fields)]),
      )
  })

  it('bounds every text, list and map', () => {
    const unbounded = [...subschemas(schema)].filter(([, node]) => {
      const types = [node['type']].flat()
      const text = types.includes('string') && node['maxLength'] === undefined && node['pattern'] === undefined
      const list = types.includes('array') && node['maxItems'] === undefined
      const map =
        node['additionalProperties'] !== undefined &&
        node['additionalProperties'] !== false &&
        node['maxProperties'] === undefined
      return text || list || map
    })
    expect(unbounded.map(([path]) => path)).toEqual([])
  })

  it('has no pattern with a repeat inside a repeat', () => {
    const patterns = [...subschemas(schema)].flatMap(([, node]) =>
      typeof node['pattern'] === 'string' ? [node['pattern']] : [],
    )
    expect(patterns.length).toBeGreaterThan(3)
    for (const pattern of patterns) expect(pattern).not.toMatch(/\([^()]*(?:\*|\+|\{\d*,\})[^()]*\)(?:\*|\+|\{\d*,\})/)
  })
})
