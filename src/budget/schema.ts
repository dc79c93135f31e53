import type { Declaration, DensityField, Exclusive, Field, Fields } from '../catalogue/declaration.js'
import { declarations } from '../catalogue/declarations.js'
import { tableSchema } from './curve-schema.js'
import { distributions, effects } from './dispersion.js'
import { idPattern, revisionPattern } from './names.js'

/** A JSON Schema of the draft-07 subset that editors read best. */
export interface Schema {
  readonly [keyword: string]: unknown
}

export const formatVersion = 1

const name = { type: 'string', pattern: idPattern }
const text = { type: ['string', 'number'], minLength: 1, maxLength: 2000 }
const longText = { type: ['string', 'number'], minLength: 1, maxLength: 20_000 }
/** An expression may be longer than a quantity. */
const value = { type: ['string', 'number'], minLength: 1, maxLength: 1000 }
const short = { type: ['string', 'number'], minLength: 1, maxLength: 200 }
const reference = (definition: string): Schema => ({ $ref: `#/definitions/${definition}` })

/** What may stand around a quantity wherever one is allowed. */
const around = {
  value: { ...value, description: 'the quantity itself, 3.1(2) ng, or an expression: = sqrt(k/m)/(2*pi)' },
  about: { ...text, description: 'what it is' },
  evidence: {
    ...text,
    description: 'what it rests on: a key of references.bib (one word), a note (several), or `assumed`',
  },
  measured: {
    type: 'string',
    pattern: '^[0-9]{4}-[0-9]{2}-[0-9]{2}$',
    description: 'date of the measurement: 2026-11-30',
  },
  distribution: {
    enum: distributions,
    description:
      'what the uncertainty describes; behind ± stands the half width where it is rectangular or triangular, in brackets always the standard uncertainty',
  },
  effect: {
    enum: effects,
    description: 'statistical: repeating the measurement would average it down; systematic: it would not',
  },
}

const quantity: Schema = {
  type: ['string', 'number', 'object'],
  minLength: 1,
  maxLength: 1000,
  properties: around,
  required: ['value'],
  additionalProperties: false,
}

const densityKeys = {
  density: { ...reference('quantity'), description: 'level; its unit tells amplitude (N/√Hz) from power (N²/Hz)' },
  exponent: { ...reference('quantity'), description: 'exponent of the power density in frequency' },
  reference: { ...reference('quantity'), description: 'frequency at which the level holds' },
  expression: { ...value, description: 'the density by the frequency f: = (2 aN/√Hz)*sqrt((1 kHz)/f)' },
  table: reference('table'),
}

/** What every line of the budget may say about itself. */
const lineKeys = {
  title: { ...text, description: 'its name on pages' },
  about: { ...longText, description: 'what it is' },
  evidence: { ...text, description: 'what it rests on: a key of references.bib, a note, or `assumed`' },
}

/**
 * The schema of a budget file, from the catalogue's declarations alone; with `kinds`, of a file in which no others occur, which compiles in
 * a fraction of the time.
 */
export function budgetSchema(kinds?: ReadonlySet<string>): Schema {
  return {
    $schema: 'http://json-schema.org/draft-07/schema#',
    $id: `budget-${formatVersion}.json`,
    title: 'Noise budget of a mechanical sensor',
    type: 'object',
    properties: rootProperties(),
    required: ['format', 'title', 'revision', 'measurand', 'readout', 'band', 'components'],
    additionalProperties: false,
    definitions: definitions(kinds),
  }
}

function rootProperties(): Schema {
  return {
    format: { const: formatVersion, description: 'version of the file format, 1 today' },
    title: { ...text, description: 'its name on pages; each budget states its own' },
    summary: { ...longText, description: 'one paragraph for the head of the report' },
    about: { ...longText, description: 'notes on the sensor' },
    revision: {
      type: ['string', 'number'],
      pattern: revisionPattern,
      description: 'dotted numbers: 2.1; each budget states its own',
    },
    from: { ...short, type: 'string', description: 'path of a budget file that this one builds on' },
    include: { ...short, type: ['string', 'array'], items: short, maxItems: 20, description: 'paths of shared parts' },
    measurand: reference('measurand'),
    readout: { ...name, description: 'the detector whose record is read' },
    band: { ...short, type: 'string', description: 'where the budget is computed: 1.20 MHz to 1.30 MHz' },
    reference: { ...reference('quantity'), description: 'frequency at which headlines are given' },
    parameters: {
      ...userMap(reference('quantity')),
      description: 'named values that fields can use; `= …` derives one from others',
    },
    correlations: {
      type: 'array',
      maxItems: 200,
      items: correlation,
      description: 'pairs of parameters whose uncertainties share a cause',
    },
    components: { ...userMap(reference('component')), minProperties: 1, description: 'parts of the signal path' },
    contributions: { ...userMap(reference('contribution')), description: 'the lines of the budget' },
    requirements: { ...userMap(reference('requirement')), description: 'bounds that the budget must meet' },
    variants: {
      ...userMap(reference('variant')),
      maxProperties: 8,
      description: 'named sets of changes, drawn beside it',
    },
  }
}

function definitions(wanted: ReadonlySet<string> | undefined): Schema {
  const all = [...declarations.values()]
  const kinds = wanted === undefined ? all : withBothRoles(all, wanted)
  const result: Record<string, Schema> = { quantity, table: tableSchema, measurand, requirement, variant, claim }
  result['component'] = byKind(kinds.filter(kind => kind.role === 'component'))
  result['contribution'] = {
    if: { type: 'object', required: ['kind'] },
    then: byKind(kinds.filter(kind => kind.role === 'contribution')),
    else: reference('claim'),
  }
  for (const kind of kinds) result[`kind-${kind.kind}`] = kindSchema(kind)
  return result
}

/** The kinds wanted, and one of a role that is not among them: an empty choice is no schema. */
function withBothRoles(all: readonly Declaration[], wanted: ReadonlySet<string>): Declaration[] {
  return (['component', 'contribution'] as const).flatMap(role => {
    const ofRole = all.filter(kind => kind.role === role)
    const used = ofRole.filter(({ kind }) => wanted.has(kind))
    return used.length > 0 ? used : ofRole.slice(0, 1)
  })
}

const measurand: Schema = {
  type: 'object',
  description: 'what the total is referred to',
  properties: {
    quantity: { enum: ['force', 'acceleration', 'displacement', 'strain'], description: 'what is measured' },
    mode: { ...name, description: 'the one mode that is pushed' },
    at: { ...name, description: 'pushes as this component senses' },
    weights: { ...userMap(short), description: 'share of the push that each mode takes: { first: 1, second: -0.5 }' },
  },
  required: ['quantity'],
  additionalProperties: false,
}

const requirement: Schema = {
  type: 'object',
  properties: {
    of: { ...short, type: 'string', description: '`total`, a line, `margin.<limit>` or `occupancy.<mode>`' },
    at: { ...short, description: 'the frequency at which it must hold' },
    over: {
      ...short,
      type: 'string',
      description: 'a stretch of the band, all of which must meet it: 1.2 MHz to 1.3 MHz',
    },
    below: {
      ...short,
      description: 'greatest value: an amplitude density, decibels of a margin, or a number of quanta',
    },
    above: { ...short, description: 'least value, likewise' },
    about: { ...text, description: 'why it is required' },
  },
  required: ['of'],
  additionalProperties: false,
}

const variant: Schema = {
  type: 'object',
  properties: {
    title: { ...text, description: 'its name on pages' },
    about: { ...longText, description: 'what it asks' },
    changes: {
      type: 'object',
      minProperties: 1,
      maxProperties: 100,
      description: 'path and new value: { cavity.pump.power: 3 µW }; `~` takes away',
    },
  },
  required: ['changes'],
  additionalProperties: false,
}

const correlation: Schema = {
  type: 'object',
  properties: {
    between: { type: 'array', items: name, minItems: 2, maxItems: 2, description: 'two parameters: [mass, frequency]' },
    coefficient: { ...short, description: 'correlation coefficient, from -1 to 1' },
    about: { ...text, description: 'what they share' },
  },
  required: ['between', 'coefficient'],
  additionalProperties: false,
}

const claimed = { type: 'string', pattern: '^[a-z][a-z0-9_]{0,59}(?:\\.[a-z][a-z0-9_]{0,59})?$' }

const claim: Schema = {
  type: 'object',
  description: 'a line that gathers noises which the components bring',
  properties: {
    of: {
      type: ['string', 'array'],
      items: claimed,
      pattern: claimed.pattern,
      minItems: 1,
      maxItems: 100,
      description: 'noises that it gathers: cavity.front, or a component for all of its own',
    },
    part: { enum: ['imprecision', 'back-action', 'heating'], description: 'only this part of them' },
    ...lineKeys,
  },
  required: ['of'],
  additionalProperties: false,
}

/** `discriminator` makes a validator judge an entry by its own kind only; editors follow the constants. */
function byKind(kinds: readonly Declaration[]): Schema {
  return {
    type: 'object',
    discriminator: { propertyName: 'kind' },
    oneOf: kinds.map(kind => reference(`kind-${kind.kind}`)),
  }
}

function kindSchema(kind: Declaration): Schema {
  const own = groupSchema(kind.fields, kind.exclusive)
  const common = kind.role === 'contribution' ? lineKeys : {}
  return {
    ...own,
    title: kind.title,
    description: kind.summary,
    properties: { kind: { const: kind.kind }, ...(own['properties'] as Schema), ...common },
    required: ['kind', ...(own['required'] as string[])],
  }
}

function groupSchema(fields: Fields, exclusive: readonly Exclusive[] = []): Schema {
  const properties: Record<string, unknown> = {}
  const required: string[] = []
  for (const [key, field] of Object.entries(fields)) {
    if (isSpread(key, field)) Object.assign(properties, densityKeys)
    else properties[key] = { ...fieldSchema(field), description: field.meaning }
    if (field.required === true && !isSpread(key, field)) required.push(key)
  }
  const alternatives = exclusive.map(exclusiveSchema)
  const schema = { type: 'object', properties, required, additionalProperties: false }
  return alternatives.length === 0 ? schema : { ...schema, allOf: alternatives }
}

/** A density field that is itself named `density` spreads its keys over the kind. */
export function isSpread(key: string, field: Field): field is DensityField {
  return key === 'density' && field.type === 'density'
}

function exclusiveSchema(exclusive: Exclusive): Schema {
  const each = exclusive.keys.map(key => ({ type: 'object', required: [key] }))
  if (exclusive.need === 'exactly one') return { oneOf: each }
  return { not: { type: 'object', required: exclusive.keys } }
}

function fieldSchema(field: Field): Schema {
  switch (field.type) {
    case 'quantity':
      return reference('quantity')
    case 'choice':
      return { enum: field.options }
    case 'name':
      return { type: 'string', pattern: claimed.pattern }
    case 'key':
      return name
    case 'weights':
      return { ...userMap(reference('quantity')), minProperties: 1 }
    case 'map':
      return { ...userMap(groupSchema(field.fields, field.exclusive)), minProperties: 1 }
    case 'group':
      return field.shorthand === undefined
        ? groupSchema(field.fields, field.exclusive)
        : orQuantity(groupSchema(field.fields, field.exclusive))
    case 'density':
      return orQuantity({ type: 'object', properties: densityKeys, required: [], additionalProperties: false })
  }
}

/** A group for which a quantity may stand, bare or as `{ value, about, evidence, measured }`. */
function orQuantity(group: Schema): Schema {
  return {
    if: { type: 'object', not: { type: 'object', required: ['value'] } },
    then: group,
    else: reference('quantity'),
  }
}

function userMap(entry: Schema): Schema {
  return { type: 'object', propertyNames: { pattern: idPattern }, maxProperties: 200, additionalProperties: entry }
}
