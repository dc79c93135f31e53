import type {
  ChoiceField,
  Exclusive,
  Field,
  Fields,
  GroupField,
  MapField,
  NameField,
  QuantityField,
} from '../catalogue/declaration.js'
import type { Parameters, Slot } from '../model/budget.js'
import { EngineFault, type Place } from '../model/problem.js'
import { parseQuantity } from '../quantity/parse.js'
import { textOf } from './amount.js'
import type { DensityReader } from './density.js'
import type { Directory } from './directory.js'
import type { Issues } from './issues.js'
import { idFault } from './names.js'
import { suggestion } from './nearest.js'
import { quoted } from './quoted.js'
import { isSpread } from './schema.js'
import { child, type Tree } from './tree.js'
import { useAs } from './use.js'
import type { Values } from './values.js'

type Parameter = Parameters[string]

/** What is read along the declared fields of a kind. */
export interface FieldsRead {
  readonly parameters: Parameters
  /** By path below the owner, for everything that the file states. */
  readonly places: ReadonlyMap<string, Place>
  /** False where something in it is wrong or missing: what is then computed from it means nothing. */
  readonly sound: boolean
}

export interface Owner {
  readonly id: string
  readonly tree: Tree
  readonly place: Place
}

/** Reads the fields of components and contributions as their declarations say. */
export class FieldReader {
  constructor(
    readonly values: Values,
    readonly densities: DensityReader,
    readonly directory: Directory,
    readonly issues: Issues,
  ) {}

  read(owner: Owner, fields: Fields, exclusive: readonly Exclusive[] = []): FieldsRead {
    const walk = new Walk(this, owner)
    const before = this.issues.errors
    const parameters = walk.group(owner.tree, { path: '', place: owner.place, fields, exclusive })
    const complete = Object.entries(fields).every(([key, field]) => field.required !== true || key in parameters)
    return { parameters, places: walk.places, sound: complete && this.issues.errors === before }
  }
}

interface Group {
  /** Below the owner; empty for the owner itself. */
  readonly path: string
  readonly place: Place
  readonly fields: Fields
  readonly exclusive: readonly Exclusive[]
}

class Walk {
  readonly places = new Map<string, Place>()

  constructor(
    readonly reader: FieldReader,
    readonly owner: Owner,
  ) {}

  group(tree: Tree, group: Group): Parameters {
    const read = Object.create(null) as Record<string, Parameter>
    this.#judgeExclusive(tree, group)
    for (const [key, field] of Object.entries(group.fields)) {
      const path = group.path === '' ? key : `${group.path}.${key}`
      const value = isSpread(key, field) ? this.#spread(tree, group, path) : this.#stated(tree, key, field, path)
      const settled = value ?? defaultOf(field)
      if (settled !== null) read[key] = settled
    }
    return read
  }

  #spread(tree: Tree, group: Group, path: string): Parameter | null {
    const field = group.fields['density']
    if (field?.type !== 'density') return null
    for (const key of ['density', 'exponent', 'reference', 'table', 'expression']) this.#note(tree, key, key)
    return this.reader.densities.read(tree, field.of, { path: `${this.owner.id}.${path}`, place: group.place })
  }

  #stated(tree: Tree, key: string, field: Field, path: string): Parameter | null {
    const value = this.#note(tree, key, path)
    return value === undefined ? null : this.#field(value, field, path)
  }

  /** Keeps the place of a stated field. */
  #note(tree: Tree, key: string, path: string): Tree | undefined {
    const entry = tree.type === 'map' ? tree.entries.get(key) : undefined
    if (entry !== undefined) this.places.set(path, entry.value.type === 'scalar' ? entry.value.place : entry.keyPlace)
    return entry?.value
  }

  #field(tree: Tree, field: Field, path: string): Parameter | null {
    switch (field.type) {
      case 'quantity':
        return this.#quantity(tree, field, path)
      case 'choice':
        return this.#choice(tree, field)
      case 'name':
        return this.#name(tree, field)
      case 'key':
        return this.#key(tree, field.of)
      case 'weights':
        return this.#weights(tree, path)
      case 'map':
        return this.#map(tree, field, path)
      case 'group':
        return this.#nested(tree, field, path)
      case 'density':
        return this.reader.densities.read(tree, field.of, {
          path: `${this.owner.id}.${path}`,
          place: this.places.get(path) ?? this.owner.place,
        })
    }
  }

  #quantity(tree: Tree, field: QuantityField, path: string): Slot | null {
    const spot = { path: `${this.owner.id}.${path}`, range: field.range }
    return this.reader.values.read(tree, useAs(field.dimension), spot)?.slot ?? null
  }

  #choice(tree: Tree, field: ChoiceField): string | null {
    const word = textOf(tree)
    return word !== null && field.options.includes(word) ? word : null
  }

  #name(tree: Tree, field: NameField): string | null {
    const word = textOf(tree)
    if (word === null) return null
    const fault = this.reader.directory.fault(word, field.of)
    if (fault !== null) this.reader.issues.error('unknown-name', tree.place, fault)
    return fault === null ? word : null
  }

  #key(tree: Tree, of: string): string | null {
    const word = textOf(tree)
    const map = child(this.owner.tree, of)
    if (word === null || map?.type !== 'map') return null
    if (map.entries.has(word)) return word
    const keys = [...map.entries.keys()]
    const message = `\`${of}\` of \`${this.owner.id}\` has no \`${word.slice(0, 60)}\`; there are ${keys
      .slice(0, 12)
      .map(key => `\`${key}\``)
      .join(', ')}${suggestion(word, keys)}`
    this.reader.issues.error('unknown-name', tree.place, message)
    return null
  }

  #weights(tree: Tree, path: string): ReadonlyMap<string, Slot> | null {
    if (tree.type !== 'map') return null
    const read = new Map<string, Slot>()
    let largest = 0
    for (const { key, keyPlace, value } of tree.entries.values()) {
      const fault = this.reader.directory.fault(key, 'mode')
      if (fault !== null) this.reader.issues.error('unknown-name', keyPlace, fault)
      const spot = { path: `${this.owner.id}.${path}.${key}`, range: 'any' as const }
      const given = this.reader.values.read(value, useAs('number'), spot)
      if (given === null) return null
      this.places.set(`${path}.${key}`, value.type === 'scalar' ? value.place : keyPlace)
      largest = Math.max(largest, Math.abs(given.value))
      read.set(key, given.slot)
    }
    if (largest === 0 && tree.entries.size > 0)
      this.reader.issues.error(
        'range',
        this.places.get(path) ?? tree.place,
        'every weight is 0, so that nothing is sensed; give one mode a weight',
      )
    return read
  }

  #map(tree: Tree, field: MapField, path: string): ReadonlyMap<string, Parameters> | null {
    if (tree.type !== 'map') return null
    const read = new Map<string, Parameters>()
    for (const { key, keyPlace, value } of tree.entries.values()) {
      const below = `${path}.${key}`
      this.places.set(below, keyPlace)
      const fault = idFault(key)
      if (fault !== null) this.reader.issues.error('name', keyPlace, `${quoted(key)} ${fault}`)
      if (value.type !== 'map') continue
      read.set(
        key,
        this.group(value, {
          path: below,
          place: keyPlace,
          fields: field.fields,
          exclusive: field.exclusive ?? [],
        }),
      )
    }
    return read
  }

  #nested(tree: Tree, field: GroupField, path: string): Parameters | null {
    const place = this.places.get(path) ?? tree.place
    const { shorthand, fields } = field
    if (shorthand === undefined)
      return tree.type === 'map' ? this.group(tree, { path, place, fields, exclusive: field.exclusive ?? [] }) : null
    if (tree.type === 'map' && child(tree, 'value') === undefined)
      return this.group(tree, { path, place, fields, exclusive: field.exclusive ?? [] })
    const short = fields[shorthand]
    if (short?.type !== 'quantity') throw new EngineFault(`the shorthand ${shorthand} is no quantity`)
    const slot = this.#quantity(tree, short, path)
    if (slot === null) return null
    const read = Object.create(null) as Record<string, Parameter>
    for (const [key, each] of Object.entries(fields)) {
      const settled = key === shorthand ? slot : defaultOf(each)
      if (settled !== null) read[key] = settled
    }
    return read
  }

  #judgeExclusive(tree: Tree, group: Group): void {
    if (tree.type !== 'map') return
    for (const { keys, need } of group.exclusive) {
      const given = keys.flatMap(key => tree.entries.get(key) ?? [])
      const both = keys.map(key => `\`${key}\``).join(' or ')
      const owner = group.path === '' ? this.owner.id : `${this.owner.id}.${group.path}`
      if (given.length === 0 && need === 'exactly one')
        this.reader.issues.error('missing-key', group.place, `\`${owner}\` needs ${both}`)
      const second = given[1]
      if (second !== undefined)
        this.reader.issues.error(
          'exclusive',
          second.keyPlace,
          `\`${owner}\` has ${given.map(entry => `\`${entry.key}\``).join(' and ')}; keep one of them`,
        )
    }
  }
}

const defaults = new Map<Field, Slot>()

/** The default that a declaration states, in the canonical unit; null where there is none. */
function defaultOf(field: Field): Slot | string | null {
  if (field.type === 'choice') return field.default ?? null
  if (field.type !== 'quantity' || field.default === undefined) return null
  const known = defaults.get(field)
  if (known !== undefined) return known
  const slot = { constant: useAs(field.dimension)(parseQuantity(field.default)).value }
  defaults.set(field, slot)
  return slot
}
