import type { Declaration, Field, Fields } from '../catalogue/declaration.js'
import { declarations } from '../catalogue/declarations.js'
import { referenceText } from './catalogue.js'

/** One field of a kind, its path written as in a budget file. */
export interface FieldRow {
  readonly path: string
  readonly holds: string
  readonly symbol: string
  readonly meaning: string
  readonly need: string
}

/** A page of the catalogue. */
export interface KindView {
  readonly kind: string
  readonly role: 'component' | 'contribution'
  readonly nature: string
  readonly title: string
  readonly summary: string
  readonly equations: Declaration['equations']
  readonly symbols: readonly { readonly tex: string; readonly meaning: string }[]
  readonly fields: readonly FieldRow[]
  readonly rules: readonly string[]
  readonly references: readonly string[]
  readonly validity: string
}

const natures: readonly { readonly nature: Declaration['nature']; readonly title: string }[] = [
  { nature: 'mechanical', title: 'What moves' },
  { nature: 'field', title: 'Fields that sense the motion' },
  { nature: 'chain', title: 'On the way to the detector' },
  { nature: 'detector', title: 'Detectors and readouts' },
  { nature: 'noise', title: 'Contributions of their own' },
]

/** Kinds of one nature. */
export interface KindGroup {
  readonly id: string
  readonly title: string
  readonly kinds: readonly KindView[]
}

/** Every kind, grouped along the signal's way and sorted by its word within a group. */
export function kindGroups(): readonly KindGroup[] {
  const sorted = [...declarations.values()].toSorted((a, b) => (a.kind < b.kind ? -1 : 1))
  return natures.map(({ nature, title }) => ({
    id: nature,
    title,
    kinds: sorted.filter(declaration => declaration.nature === nature).map(kindView),
  }))
}

function kindView(declaration: Declaration): KindView {
  const { kind, role, nature, title, summary, equations, validity } = declaration
  return {
    ...{ kind, role, nature, title, summary, equations, validity },
    symbols: Object.entries(declaration.symbols).map(([tex, meaning]) => ({ tex, meaning })),
    fields: fieldRows(declaration.fields, ''),
    rules: ruleTexts(declaration, ''),
    references: declaration.references.map(referenceText),
  }
}

function fieldRows(fields: Fields, prefix: string): readonly FieldRow[] {
  return Object.entries(fields).flatMap(([name, field]) => {
    const path = `${prefix}${name}`
    return [fieldRow(path, field), ...innerRows(path, field)]
  })
}

function innerRows(path: string, field: Field): readonly FieldRow[] {
  if (field.type === 'group') return fieldRows(field.fields, `${path}.`)
  if (field.type === 'map') return fieldRows(field.fields, `${path}.<name>.`)
  return []
}

function fieldRow(path: string, field: Field): FieldRow {
  return {
    path,
    holds: holdsText(field),
    symbol: field.type === 'quantity' ? (field.symbol ?? '') : '',
    meaning: field.meaning,
    need: needText(field),
  }
}

function holdsText(field: Field): string {
  const texts: { readonly [type in Field['type']]: (field: never) => string } = {
    quantity: (f: Extract<Field, { type: 'quantity' }>) => `${f.dimension.replaceAll('-', ' ')}${rangeWord(f.range)}`,
    choice: (f: Extract<Field, { type: 'choice' }>) => f.options.join(' or '),
    name: (f: Extract<Field, { type: 'name' }>) => `name of a ${f.of}`,
    key: (f: Extract<Field, { type: 'key' }>) => `one of ${f.of}`,
    map: () => 'groups by name',
    group: () => 'group',
    weights: () => 'weights by mode',
    density: (f: Extract<Field, { type: 'density' }>) => `${f.of} density, or a table`,
  }
  return texts[field.type](field as never)
}

function rangeWord(range: string): string {
  return range === 'any'
    ? ''
    : `, ${range.replace('positive-fraction', 'over 0 up to 1').replace('fraction', '0 to 1')}`
}

function needText(field: Field): string {
  if (field.required) return 'required'
  return 'default' in field && field.default !== undefined ? field.default : 'optional'
}

/** `exactly one of coupling, g0`, for the kind and every group below it. */
function ruleTexts(
  holder: { readonly fields: Fields; readonly exclusive?: Declaration['exclusive'] },
  prefix: string,
): readonly string[] {
  const own = (holder.exclusive ?? []).map(
    rule => `${rule.need} of ${rule.keys.map(key => `${prefix}${key}`).join(', ')}`,
  )
  const inner = Object.entries(holder.fields).flatMap(([name, field]) => {
    if (field.type === 'group') return ruleTexts(field, `${prefix}${name}.`)
    return field.type === 'map' ? ruleTexts(field, `${prefix}${name}.<name>.`) : []
  })
  return [...own, ...inner]
}
