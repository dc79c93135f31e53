import type { Place, Problem } from '../model/problem.js'

/** What a YAML file says, with the place of everything and every scalar's own text. */
export type Tree = TreeScalar | TreeMap | TreeList

export interface TreeScalar {
  readonly type: 'scalar'
  readonly place: Place
  /** The text as written, quotes removed: `2.10`, `1e400`, `yes`; empty where nothing stands. */
  readonly text: string
  /** A word without quotes; only such a word may be a number or nothing at all. */
  readonly plain: boolean
  /** Columns between `place` and the first character of `text` where both lie on one line; null where they cannot be told. */
  readonly indent: number | null
}

export interface TreeMap {
  readonly type: 'map'
  readonly place: Place
  /** In the order of the file; keys are unique. */
  readonly entries: ReadonlyMap<string, TreeEntry>
}

export interface TreeEntry {
  readonly key: string
  readonly keyPlace: Place
  readonly value: Tree
}

export interface TreeList {
  readonly type: 'list'
  readonly place: Place
  readonly items: readonly Tree[]
}

/** A YAML file as a tree, with what is wrong in it. */
export interface YamlFile {
  /** Null where the file cannot be read as one tree. */
  readonly tree: Tree | null
  readonly problems: readonly Problem[]
}

const numeral = /^[+-]?(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d+)?$/

/** The plain value that a schema judges: maps without prototype, numerals as numbers, everything else as its text. */
export function plainValue(tree: Tree): unknown {
  if (tree.type === 'list') return tree.items.map(plainValue)
  if (tree.type === 'scalar') return scalarValue(tree)
  const value = Object.create(null) as Record<string, unknown>
  for (const entry of tree.entries.values()) value[entry.key] = plainValue(entry.value)
  return value
}

function scalarValue(scalar: TreeScalar): unknown {
  if (!scalar.plain) return scalar.text
  if (scalar.text === '' || scalar.text === '~' || scalar.text === 'null') return null
  return numeral.test(scalar.text) && Number.isFinite(Number(scalar.text)) ? Number(scalar.text) : scalar.text
}

/** The value under a key, or undefined where there is no map or no such key. */
export function child(tree: Tree | undefined, key: string): Tree | undefined {
  return tree?.type === 'map' ? tree.entries.get(key)?.value : undefined
}

/** The place at `offset` characters into a scalar's text; the scalar's own place where that cannot be told. */
export function placeWithin(scalar: TreeScalar, offset: number): Place {
  if (scalar.indent === null || offset < 0 || offset > scalar.text.length) return scalar.place
  return { ...scalar.place, column: scalar.place.column + scalar.indent + offset }
}
