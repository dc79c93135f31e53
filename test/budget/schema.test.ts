import { Ajv } from 'ajv'
import { describe, expect, it } from 'vitest'
import { parse } from 'yaml'
import { declarations } from '../../src/catalogue/declarations.js'
import { budgetSchema, type Schema } from '../../src/budget/schema.js'
import { example, small } from './read.js'

const schema = budgetSchema()

/** As an editor reads it: draft-07 alone, values typed by YAML, no discriminator. */
function editor() {
  const ajv = new Ajv({
    allErrors: true,
    strict: true,
    strictRequired: false,
    allowUnionTypes: true,
    keywords: ['discriminator'],
  })
  return ajv.compile(schema)
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
    for (const text of [example, small]) expect([validate(parse(text)), validate.errors]).toEqual([true, null])
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
