import type { ErrorObject } from 'ajv'
import type { Place, Problem } from '../model/problem.js'
import { idFault } from './names.js'
import { suggestion } from './nearest.js'
import { follow, headPlace, type Pointed } from './pointer.js'
import { quoted } from './quoted.js'
import type { Tree } from './tree.js'

/** A complaint of the schema as a problem: the value, what would be right, the nearest word, at its place in the file. */
export function problemOf(error: ErrorObject, root: Tree): Problem {
  const pointed = follow(root, error.instancePath)
  const tell = tellers[error.keyword] ?? tellOther
  return { severity: 'error', ...tell(error, pointed) }
}

interface Told {
  readonly code: string
  readonly place: Place
  readonly message: string
}

type Teller = (error: ErrorObject, pointed: Pointed) => Told

const tellers: { readonly [keyword: string]: Teller } = {
  additionalProperties: tellUnknownKey,
  required: tellMissing,
  discriminator: tellKind,
  enum: tellChoice,
  const: tellConstant,
  type: tellType,
  pattern: tellPattern,
  propertyNames: tellName,
  maxLength: tellLength,
  minLength: tellLength,
  minProperties: tellCount,
  maxProperties: tellCount,
  minItems: tellCount,
  maxItems: tellCount,
  minimum: tellRange,
  maximum: tellRange,
}

function parameter(error: ErrorObject, key: string): unknown {
  return (error.params as Record<string, unknown>)[key]
}

/** What the schema says about an error, as a word: the unknown key, the missing one. */
export function parameterOf(error: ErrorObject, key: string): string {
  return word(parameter(error, key))
}

function word(value: unknown): string {
  return typeof value === 'string' || typeof value === 'number' ? String(value) : ''
}

/** What stands at the place, as the file has it. */
function found(pointed: Pointed): string {
  if (pointed.tree.type === 'scalar') return quoted(pointed.tree.text)
  return pointed.tree.type === 'map' ? 'a map' : 'a list'
}

/** `pump`, or `this file` at the root. */
function holder(pointed: Pointed): string {
  const key = pointed.path.at(-1)
  return key === undefined ? 'a budget' : quoted(key)
}

/** The keys that the schema at an error allows. */
export function keysOf(error: ErrorObject): string[] {
  const schema = error.parentSchema as { properties?: Record<string, unknown> } | undefined
  return Object.keys(schema?.properties ?? {})
}

function listed(words: readonly string[]): string {
  return words.map(each => `\`${each}\``).join(', ')
}

function tellUnknownKey(error: ErrorObject, pointed: Pointed): Told {
  const key = parameterOf(error, 'additionalProperty')
  const entry = pointed.tree.type === 'map' ? pointed.tree.entries.get(key) : undefined
  const place = entry?.keyPlace ?? headPlace(pointed)
  const keys = keysOf(error)
  const message = `unknown key ${quoted(key)} in ${holder(pointed)}; allowed are ${listed(keys)}${suggestion(key, keys)}`
  return { code: 'unknown-key', place, message }
}

function tellMissing(error: ErrorObject, pointed: Pointed): Told {
  const key = parameterOf(error, 'missingProperty')
  const schema = error.parentSchema as { properties?: Record<string, { description?: string }> } | undefined
  const meaning = schema?.properties?.[key]?.description
  const explained = meaning === undefined ? '' : ` (${meaning})`
  return {
    code: 'missing-key',
    place: headPlace(pointed),
    message: `${holder(pointed)} needs the key \`${key}\`${explained}`,
  }
}

function tellKind(error: ErrorObject, pointed: Pointed): Told {
  const schema = error.parentSchema as { oneOf?: readonly { $ref?: string }[] } | undefined
  const kinds = (schema?.oneOf ?? []).map(each => (each.$ref ?? '').replace('#/definitions/kind-', ''))
  const entry = pointed.tree.type === 'map' ? pointed.tree.entries.get('kind') : undefined
  if (entry === undefined)
    return {
      code: 'missing-key',
      place: headPlace(pointed),
      message: `${holder(pointed)} needs the key \`kind\`: one of ${listed(kinds)}`,
    }
  const given = entry.value.type === 'scalar' ? entry.value.text : ''
  const shown = entry.value.type === 'scalar' ? quoted(given) : 'this'
  return {
    code: 'unknown-kind',
    place: entry.value.place,
    message: `${shown} is no kind; allowed are ${listed(kinds)}${suggestion(given, kinds)}`,
  }
}

function tellChoice(error: ErrorObject, pointed: Pointed): Told {
  const options = (parameter(error, 'allowedValues') as unknown[]).map(word)
  const given = pointed.tree.type === 'scalar' ? pointed.tree.text : ''
  const message = `${found(pointed)} is not allowed for ${holder(pointed)}; allowed are ${listed(options)}${suggestion(given, options)}`
  return { code: 'choice', place: pointed.tree.place, message }
}

function tellConstant(error: ErrorObject, pointed: Pointed): Told {
  const wanted = parameterOf(error, 'allowedValue')
  const message = `${found(pointed)} is not allowed for ${holder(pointed)}; write \`${wanted}\``
  return { code: pointed.path.at(-1) === 'format' ? 'format' : 'choice', place: pointed.tree.place, message }
}

const typeWords: { readonly [type: string]: string } = {
  object: 'a map of keys',
  string: 'text',
  number: 'a number',
  integer: 'a whole number',
  array: 'a list',
}

function tellType(error: ErrorObject, pointed: Pointed): Told {
  const types = [parameter(error, 'type')].flat().map(word)
  const isQuantity = types.includes('object') && types.includes('string')
  const keys = types.length === 1 && types[0] === 'object' ? keysOf(error) : []
  const wanted = isQuantity
    ? 'a quantity such as `3.1(2) ng`'
    : types.includes('string') && types.includes('number')
      ? 'text'
      : types.map(type => typeWords[type] ?? type).join(' or ')
  const within = keys.length > 0 ? ` (${listed(keys)})` : ''
  const place = pointed.tree.type === 'scalar' ? pointed.tree.place : headPlace(pointed)
  const message = `${holder(pointed)} must be ${wanted}${within}; here stands ${found(pointed)}`
  return { code: 'type', place, message }
}

function tellPattern(_error: ErrorObject, pointed: Pointed): Told {
  const key = pointed.path.at(-1)
  const place = pointed.tree.place
  if (key === 'revision')
    return {
      code: 'revision',
      place,
      message: `${found(pointed)} is no revision; write dotted numbers such as \`2.1\``,
    }
  if (key === 'measured')
    return { code: 'date', place, message: `${found(pointed)} is no date; write year, month and day: \`2026-11-30\`` }
  const text = pointed.tree.type === 'scalar' ? pointed.tree.text : ''
  const reason = text.includes('.')
    ? 'is no name of a port or noise; write it like `cavity.back`, of a–z, 0–9 and _'
    : (idFault(text) ?? 'is no name')
  return { code: 'name', place, message: `${found(pointed)} ${reason}` }
}

function tellName(error: ErrorObject, pointed: Pointed): Told {
  const key = parameterOf(error, 'propertyName')
  const entry = pointed.tree.type === 'map' ? pointed.tree.entries.get(key) : undefined
  const place = entry?.keyPlace ?? headPlace(pointed)
  return { code: 'name', place, message: `${quoted(key)} ${idFault(key) ?? 'is no name'}` }
}

function tellLength(error: ErrorObject, pointed: Pointed): Told {
  const limit = parameterOf(error, 'limit')
  const length = pointed.tree.type === 'scalar' ? pointed.tree.text.length : 0
  const message =
    error.keyword === 'minLength'
      ? `nothing stands in ${holder(pointed)}; write something or leave the key out`
      : `${holder(pointed)} has ${length} characters; at most ${limit} are allowed`
  return { code: 'length', place: pointed.tree.place, message }
}

function tellCount(error: ErrorObject, pointed: Pointed): Told {
  const limit = parameterOf(error, 'limit')
  const bound = error.keyword.startsWith('min') ? `at least ${limit}` : `at most ${limit}`
  const things = error.keyword.endsWith('Items') ? 'items' : 'entries'
  return {
    code: 'count',
    place: headPlace(pointed),
    message: `${holder(pointed)} must have ${bound} ${limit === '1' ? things.replace(/ies$/, 'y').replace(/s$/, '') : things}`,
  }
}

function tellRange(error: ErrorObject, pointed: Pointed): Told {
  const limit = parameterOf(error, 'limit')
  const bound = error.keyword === 'minimum' ? `at least ${limit}` : `at most ${limit}`
  return {
    code: 'range',
    place: pointed.tree.place,
    message: `${found(pointed)} is out of range for ${holder(pointed)}; it must be ${bound}`,
  }
}

function tellOther(error: ErrorObject, pointed: Pointed): Told {
  return {
    code: 'shape',
    place: headPlace(pointed),
    message: `${holder(pointed)} ${error.message ?? 'is not as it should be'}`,
  }
}
