import type { Issues } from './issues.js'
import { suggestion } from './nearest.js'
import { quoted } from './quoted.js'
import { child, type Tree, type TreeEntry, type TreeMap } from './tree.js'

/**
 * Lays one tree over another: maps are merged key by key, everything else replaces what stands below; a plain `~` or
 * `null` takes the key away. Keys keep the order of the tree below, new ones follow. Every node keeps its own place.
 *
 * Two kinds of map do not simply merge. A component or line of another `kind` replaces the old one, whose fields belong to
 * the old kind. A new `value`, bare or not, does not inherit `evidence`, `measured` or anything else that was said of the old number,
 * only `about`, which says what it is.
 */
export function mergeMaps(below: TreeMap, above: TreeMap, issues: Issues): TreeMap {
  const entries = new Map(below.entries)
  for (const entry of above.entries.values()) {
    const { key, value } = entry
    const old = below.entries.get(key)
    if (!isDeletion(value)) entries.set(key, old === undefined ? entry : mergeEntry(old, entry, issues))
    else if (old === undefined) complain(entry, below, issues)
    else entries.delete(key)
  }
  return { type: 'map', place: above.place, entries }
}

/** `~` or `null` without quotes; a key behind which nothing stands is a slip, not a wish to delete. */
export function isDeletion(tree: Tree): boolean {
  return tree.type === 'scalar' && tree.plain && (tree.text === '~' || tree.text === 'null')
}

function mergeEntry(old: TreeEntry, entry: TreeEntry, issues: Issues): TreeEntry {
  const [below, above] = [old.value, quantityOver(old.value, entry)]
  if (above.type !== 'map' || below.type !== 'map' || isOtherKind(below, above)) return entry
  return { ...entry, value: mergeMaps(inherited(below, above), above, issues) }
}

/** A bare quantity over an explained one counts as `{ value }`. */
function quantityOver(below: Tree, { keyPlace, value }: TreeEntry): Tree {
  if (value.type !== 'scalar' || value.text === '' || child(below, 'value') === undefined) return value
  return { type: 'map', place: value.place, entries: new Map([['value', { key: 'value', keyPlace, value }]]) }
}

function isOtherKind(below: TreeMap, above: TreeMap): boolean {
  const [old, kind] = [child(below, 'kind'), child(above, 'kind')]
  return kind?.type === 'scalar' && !isDeletion(kind) && (old?.type !== 'scalar' || old.text !== kind.text)
}

/**
 * What a map takes over from the one below it. No name that a person chooses is `value`: it marks a quantity. The name of
 * a parameter takes over nothing, because all that is said of a parameter stands with it.
 */
function inherited(below: TreeMap, above: TreeMap): TreeMap {
  const value = child(above, 'value')
  if (value === undefined || !below.entries.has('value')) return below
  const isName = value.type === 'scalar' && /^[A-Za-z_]\w*$/.test(value.text)
  const kept = isName ? ['value'] : ['value', 'about']
  return { ...below, entries: new Map([...below.entries].filter(([key]) => kept.includes(key))) }
}

function complain({ key, value }: TreeEntry, below: TreeMap, issues: Issues): void {
  const keys = [...below.entries.keys()]
  const known = keys
    .slice(0, 12)
    .map(each => `\`${each}\``)
    .join(', ')
  const there = keys.length === 0 ? 'nothing' : known + (keys.length > 12 ? ' …' : '')
  issues.error(
    'nothing-deleted',
    value.place,
    `\`${(value.type === 'scalar' ? value.text : '').slice(0, 4)}\` takes a key away, but what stands below has no ${quoted(key)}; it has ${there}${suggestion(key, keys)}`,
  )
}
