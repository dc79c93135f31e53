import type { Declaration, Field, Fields } from '../catalogue/declaration.js'
import { declarations } from '../catalogue/declarations.js'
import { EngineFault } from '../model/problem.js'
import { budgetSchema, formatVersion, isSpread } from './schema.js'
import type { Starter, StarterClaim, StarterEntry, StarterValue } from './starter.js'

const widest = 110

/**
 * The first budget of a sensor as a file. What each key means stands above it in the catalogue's words; what else a kind
 * could say stands below as a comment; every value is marked as assumed. `site` is the folder of the built site, which
 * holds the schema.
 */
export function starterText(starter: Starter, sensor: string, site = 'site'): string {
  const { title, measurand, readout, band, reference } = starter
  const lines = [
    // Editors with YAML support look for the schema where this line says.
    `# yaml-language-server: $schema=../../${site}/schema/budget-${formatVersion}.json`,
    ...remark(
      `${title}: a first draft for \`${sensor}\`. Every number is assumed: replace it by your own, with its uncertainty in ` +
        'brackets (3.1(2) ng), and say under `evidence` what it rests on.',
      0,
    ),
    `format: ${formatVersion}`,
    `title: ${title}`,
    'revision: "0.1"',
    '# What the total is referred to, the detector whose record is read, and where.',
    `measurand: ${measurand}`,
    `readout: ${readout}`,
    `band: ${band}`,
    `reference: ${reference}`,
    '',
    'components:',
    ...separated(Object.entries(starter.components).map(([id, entry]) => entryLines(id, entry))),
    '',
    '# The lines of the budget: noises of the components by name, and sources of their own.',
    'contributions:',
    ...Object.entries(starter.contributions).flatMap(([id, line]) =>
      'kind' in line ? entryLines(id, line) : [claimLine(id, line)],
    ),
  ]
  return `${lines.join('\n')}\n`
}

function separated(groups: readonly (readonly string[])[]): string[] {
  return groups.flatMap((group, index) => (index === 0 ? group : ['', ...group]))
}

function claimLine(id: string, { title, of, part }: StarterClaim): string {
  return `  ${id}: { of: ${of}, ${part === undefined ? '' : `part: ${part}, `}title: ${title} }`
}

function entryLines(id: string, { note, kind, fields }: StarterEntry): string[] {
  const declaration = declarations.get(kind)
  if (declaration === undefined) throw new EngineFault(`a starter names the kind ${kind}, which the catalogue lacks`)
  return [
    ...remark(note ?? `${declaration.title}.`, 2),
    `  ${id}:`,
    `    kind: ${kind}`,
    ...groupLines(spelledOut(declaration), fields, { indent: 4, path: `${id}.${kind}` }),
    ...furtherLines(declaration, fields),
  ]
}

interface Spot {
  readonly indent: number
  readonly path: string
}

/** A field named `density` as the keys that the schema spreads over its kind. */
function spelledOut({ kind, fields }: Declaration): Fields {
  return Object.fromEntries(
    Object.entries(fields).flatMap(([key, field]): [string, Field][] =>
      isSpread(key, field)
        ? ['density', 'exponent', 'reference'].map(name => [name, { ...field, meaning: schemaMeaning(kind, name) }])
        : [[key, field]],
    ),
  )
}

function schemaMeaning(kind: string, key: string): string {
  type Kinds = Record<string, { properties: Record<string, { description: string }> } | undefined>
  return (budgetSchema()['definitions'] as Kinds)[`kind-${kind}`]?.properties[key]?.description ?? key
}

function groupLines(fields: Fields, given: { readonly [key: string]: StarterValue }, spot: Spot): string[] {
  const stray = Object.keys(given).find(key => !(key in fields))
  if (stray !== undefined) throw new EngineFault(`a starter states ${spot.path}.${stray}, which the catalogue lacks`)
  return Object.entries(fields).flatMap(([key, field]) => {
    const value = given[key]
    const below = { indent: spot.indent, path: `${spot.path}.${key}` }
    return value === undefined ? [] : [...remark(field.meaning, spot.indent), ...fieldLines(key, field, value, below)]
  })
}

function fieldLines(key: string, field: Field, value: StarterValue, spot: Spot): string[] {
  const margin = ' '.repeat(spot.indent)
  if (typeof value === 'string') return [`${margin}${key}: ${isNumber(field) ? assumed(value) : value}`]
  const inside = { indent: spot.indent + 2, path: spot.path }
  return [`${margin}${key}:`, ...nestedLines(field, value, inside)]
}

function nestedLines(field: Field, value: { readonly [key: string]: StarterValue }, spot: Spot): string[] {
  if (field.type === 'group') return groupLines(field.fields, value, spot)
  if (field.type === 'map') return mapLines(field.fields, value, spot)
  return Object.entries(value).map(([name, weight]) => `${' '.repeat(spot.indent)}${name}: ${word(weight)}`)
}

/** What each key means is said once, above the names that a person chose. */
function mapLines(fields: Fields, value: { readonly [name: string]: StarterValue }, spot: Spot): string[] {
  const margin = ' '.repeat(spot.indent)
  const given = Object.values(value).flatMap(each => Object.keys(each))
  const meanings = Object.entries(fields).flatMap(([key, field]) =>
    given.includes(key) ? remark(`${key}: ${field.meaning}`, spot.indent) : [],
  )
  return [...meanings, ...Object.entries(value).map(([name, each]) => `${margin}${name}: ${inline(fields, each)}`)]
}

function inline(fields: Fields, value: StarterValue): string {
  const keys = typeof value === 'string' ? [] : Object.entries(value)
  const given = keys.map(([key, each]) => `${key}: ${isNumber(fields[key]) ? assumed(word(each)) : word(each)}`)
  return `{ ${given.join(', ')} }`
}

/** What else the kind can be told, one line a field. */
function furtherLines(declaration: Declaration, given: { readonly [key: string]: StarterValue }): string[] {
  const further = Object.entries(declaration.fields).filter(([key, field]) => !(key in given) && !isSpread(key, field))
  if (further.length === 0) return []
  const lines = further.flatMap(([key, { meaning }]) => {
    const instead = declaration.exclusive?.find(({ keys }) => keys.includes(key))?.keys.find(each => each in given)
    return remark(`  ${key}${instead === undefined ? '' : ` (instead of ${instead})`}: ${meaning}`, 4)
  })
  return ['    # It can also have', ...lines]
}

function isNumber(field: Field | undefined): boolean {
  return field?.type === 'quantity' || field?.type === 'density' || field?.type === 'group'
}

function assumed(value: string): string {
  return `{ value: ${value}, evidence: assumed }`
}

function word(value: StarterValue): string {
  if (typeof value === 'string') return value
  throw new EngineFault('a starter has a group where a word is wanted')
}

/** Comment lines of bounded width. */
function remark(text: string, indent: number): string[] {
  const lead = /^ */.exec(text)?.[0] ?? ''
  const lines: string[] = []
  let line = ''
  for (const each of text.trim().split(' ')) {
    if (line !== '' && indent + lead.length + line.length + each.length + 3 > widest) {
      lines.push(line)
      line = each
    } else line = line === '' ? each : `${line} ${each}`
  }
  return [...lines, line].map(each => `${' '.repeat(indent)}# ${lead}${each}`)
}
