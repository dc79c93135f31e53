import { partHeads, partSections } from './compose-part.js'
import { budgetSchema, type Schema } from './schema.js'

/** What a file says itself, also when it builds on others. */
const own = ['format', 'title', 'revision']

/**
 * The schema of a budget file for editors: that of a whole budget, or, for a file with `from` or `include`, one in which
 * everything may be left out or taken away.
 */
export function editorSchema(): Schema {
  const { $schema, $id, title, type, properties, definitions, ...whole } = budgetSchema()
  const buildsOnOthers = { type: 'object', anyOf: [{ required: ['from'] }, { required: ['include'] }] }
  return {
    $schema,
    $id,
    title,
    type,
    if: buildsOnOthers,
    then: { type, properties: partialRoot(properties as Schema), required: own, additionalProperties: false },
    else: { type, properties, ...whole },
    definitions: { ...(definitions as Schema), ...partialDefinitions(definitions as Schema) },
  }
}

/** The schema of a shared part for editors. */
export function partSchema(): Schema {
  const { $schema, $id, properties, definitions } = budgetSchema()
  const kept: readonly string[] = [...partHeads, ...partSections]
  const root = Object.fromEntries(
    Object.entries(partialRoot(properties as Schema)).filter(([key]) => kept.includes(key)),
  )
  return {
    $schema,
    $id: String($id).replace('budget', 'part'),
    title: 'Part that several noise budgets share',
    type: 'object',
    properties: root,
    required: ['format'],
    additionalProperties: false,
    definitions: partialDefinitions(definitions as Schema),
  }
}

function partialRoot(properties: Schema): Schema {
  const entries = Object.entries(properties).map(([key, schema]): [string, unknown] => [
    key,
    own.includes(key) ? schema : partial(schema as Schema),
  ])
  return Object.fromEntries(entries)
}

function partialDefinitions(definitions: Schema): Schema {
  const partials = Object.entries(definitions).map(([name, schema]): [string, unknown] => [
    `partial-${name}`,
    partial(schema as Schema),
  ])
  return Object.fromEntries(partials)
}

/** Keys of a schema that hold conditions: what they require is asked, not demanded. */
const conditions: ReadonlySet<string> = new Set([
  'if',
  'not',
  'propertyNames',
  'const',
  'pattern',
  'description',
  'title',
])

/**
 * The same schema with nothing required and `null` allowed everywhere. Alternatives that exclude each other are not
 * judged: one may stand in another file.
 */
function partial(schema: Schema): Schema {
  const byKind = schema['discriminator'] === undefined ? schema['then'] : schema
  if (isSchema(byKind) && byKind['discriminator'] !== undefined) return kindOrAny(byKind, schema['else'])
  const result: Record<string, unknown> = {}
  for (const [key, value] of Object.entries(schema)) {
    if (['required', 'allOf', 'minProperties', 'minItems'].includes(key)) continue
    if (key === '$ref') result[key] = String(value).replace('#/definitions/', '#/definitions/partial-')
    else if (key === 'type') result[key] = [...new Set([value, 'null'].flat())]
    else if (key === 'enum') result[key] = [...(value as unknown[]), null]
    else if (key === 'properties') result[key] = eachOf(value as Schema)
    else result[key] = conditions.has(key) || !isSchema(value) ? value : partial(value)
  }
  return result
}

function eachOf(properties: Schema): Schema {
  return Object.fromEntries(Object.entries(properties).map(([key, value]) => [key, partial(value as Schema)]))
}

function isSchema(value: unknown): value is Schema {
  return typeof value === 'object' && value !== null && !Array.isArray(value)
}

/** An entry that states its kind is judged by it; another one by the keys of all kinds, and of what has no kind. */
function kindOrAny(byKind: Schema, kindless: unknown): Schema {
  const kinds = byKind['oneOf'] as readonly Schema[]
  return {
    if: { type: 'object', required: ['kind'] },
    then: { oneOf: kinds.map(partial) },
    else: { type: ['object', 'null'], ...anyKey([...kinds, ...(isSchema(kindless) ? [kindless] : [])]) },
  }
}

/** Every key of several kinds; one that means different things in two of them may hold either. */
function anyKey(kinds: readonly Schema[]): Schema {
  const { definitions } = budgetSchema()
  const found = new Map<string, Map<string, Schema>>()
  for (const { $ref } of kinds) {
    const { properties } = (definitions as Record<string, Schema>)[String($ref).replace('#/definitions/', '')] ?? {}
    for (const [key, value] of Object.entries((properties ?? {}) as Record<string, Schema>)) {
      if (key === 'kind') continue
      const meanings = found.get(key) ?? new Map<string, Schema>()
      found.set(key, meanings.set(JSON.stringify({ ...value, description: '' }), partial(value)))
    }
  }
  const properties = [...found].map(([key, meanings]): [string, Schema] => {
    const [first = {}, ...more] = meanings.values()
    return [key, more.length === 0 ? first : { anyOf: [first, ...more] }]
  })
  return { properties: Object.fromEntries(properties), additionalProperties: false }
}

/** The files for editors by name, as they are published and shipped. */
export function schemaFiles(): ReadonlyMap<string, string> {
  const file = (schema: Schema): [string, string] => [String(schema['$id']), `${JSON.stringify(schema, null, 2)}\n`]
  return new Map([file(editorSchema()), file(partSchema())])
}
