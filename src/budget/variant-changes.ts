import { isDeletion, mergeMaps } from './compose-merge.js'
import type { Issues } from './issues.js'
import { suggestion } from './nearest.js'
import { quoted } from './quoted.js'
import { child, type Tree, type TreeEntry, type TreeMap } from './tree.js'

const sections = ['parameters', 'components', 'contributions', 'requirements'] as const

/** Keys of a budget that hold no map and may be changed. */
const plainKeys: ReadonlySet<string> = new Set(['readout', 'reference', 'correlations'])

/** Why a key of a budget stays as it is in every variant. */
const kept: ReadonlyMap<string, string> = new Map([
  ...['format', 'title', 'summary', 'about', 'revision', 'variants', 'from', 'include'].map((key): [string, string] => [
    key,
    'belongs to the budget as a whole',
  ]),
  ...['measurand', 'band'].map((key): [string, string] => [key, 'is shared by all curves that are drawn together']),
])

/**
 * Lays the changes of a variant over a budget. A change is written as `path: value`; the path begins with the id of a
 * parameter, component or line, as in `cavity.pump.power`, or with a section, as in `components.shield`, and every step of
 * it but the last must be there. The value replaces or merges as it does over another file; `~` takes away.
 */
export function applyChanges(root: TreeMap, changes: TreeMap, issues: Issues): TreeMap {
  const paths: string[] = []
  let changed = root
  for (const entry of changes.entries.values()) {
    const path = pathOf(entry, root, issues)
    if (path === null) continue
    const written = path.join('.')
    const other = paths.find(each => `${each}.`.startsWith(`${written}.`) || `${written}.`.startsWith(`${each}.`))
    if (other === undefined) changed = mergeMaps(changed, overlay(path, entry), issues)
    else
      issues.error(
        'changed-twice',
        entry.keyPlace,
        `${quoted(entry.key)} changes what another line of this variant changes too; keep one of them`,
      )
    paths.push(written)
  }
  return changed
}

/** The keys from the root to what changes, or null where there is no such way, which has been said. */
function pathOf(entry: TreeEntry, root: TreeMap, issues: Issues): readonly string[] | null {
  const { key, keyPlace } = entry
  const path = fromRoot(entry, root)
  const refuse = (code: string, message: string): null => {
    issues.error(code, keyPlace, message)
    return null
  }
  if (path === null) return refuse('unknown-name', unknown(key, root))
  const reason = path.length === 1 ? kept.get(path[0] ?? '') : undefined
  if (reason !== undefined) return refuse('not-changed', `${quoted(key)} ${reason}; a variant cannot change it`)
  let tree: Tree | undefined = root
  for (const [index, step] of path.slice(0, -1).entries()) {
    const next: Tree | undefined = child(tree, step)
    const isSection = index === 0 && path.length === 2
    if (next === undefined && !isSection) return refuse('unknown-name', noSuchStep(path.slice(0, index), step, tree))
    tree = next
  }
  if (path.length > 2 && tree?.type !== 'map')
    return refuse('unknown-name', `${quoted(key)} leads into a plain value; change ${quoted(parent(key))} as a whole`)
  return path
}

function fromRoot({ key, value }: TreeEntry, root: TreeMap): readonly string[] | null {
  const steps = key.split('.')
  const [first = '', ...rest] = steps
  if (steps.includes('')) return null
  if (sections.some(section => section === first)) return steps
  if (plainKeys.has(first) && rest.length === 0 && value.type !== 'map') return steps
  const section = sections.slice(0, 3).find(each => child(child(root, each), first) !== undefined)
  if (section !== undefined) return [section, ...steps]
  return kept.has(first) ? [first] : null
}

/** A map at every step; all of them stand where the path is written. */
function overlay(path: readonly string[], { keyPlace, value }: TreeEntry): TreeMap {
  const [first = '', ...rest] = path
  const below: Tree = rest.length === 0 ? value : overlay(rest, { key: '', keyPlace, value })
  return { type: 'map', place: keyPlace, entries: new Map([[first, { key: first, keyPlace, value: below }]]) }
}

function unknown(key: string, root: TreeMap): string {
  const [first = '', ...rest] = key.split('.')
  const ids = sections.slice(0, 3).flatMap(section => idsOf(child(root, section)))
  const meant = suggestion(first, ids)
  const example = `a change begins with the id of one, such as \`${[ids[0] ?? 'drum', ...rest].join('.')}\``
  return `no parameter, component or line is called ${quoted(first)}${meant === '' ? `; ${example}` : meant}`
}

function noSuchStep(before: readonly string[], step: string, tree: Tree | undefined): string {
  const holder = before.filter((each, index) => index > 0 || !sections.some(section => section === each)).join('.')
  const ids = idsOf(tree)
  const there = ids.length === 0 ? 'it is a plain value' : `there ${ids.length === 1 ? 'is' : 'are'} ${listed(ids)}`
  return `${holder === '' ? 'this budget' : quoted(holder)} has no ${quoted(step)}; ${there}${suggestion(step, ids)}`
}

function listed(ids: readonly string[]): string {
  const shown = ids.slice(0, 12).map(id => `\`${id}\``)
  return shown.join(', ') + (ids.length > 12 ? ' …' : '')
}

function idsOf(tree: Tree | undefined): string[] {
  return tree?.type === 'map'
    ? [...tree.entries.values()].filter(each => !isDeletion(each.value)).map(each => each.key)
    : []
}

function parent(key: string): string {
  return key.slice(0, key.lastIndexOf('.'))
}
