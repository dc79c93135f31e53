import type { Place } from '../model/problem.js'
import type { Tree, TreeEntry } from './tree.js'

/** What a JSON pointer leads to in a tree. */
export interface Pointed {
  readonly tree: Tree
  /** The entry that holds it; null at the root and in lists. */
  readonly entry: TreeEntry | null
  /** The keys on the way. */
  readonly path: readonly string[]
}

export function follow(root: Tree, pointer: string): Pointed {
  let pointed: Pointed = { tree: root, entry: null, path: [] }
  for (const part of pointer.split('/').slice(1)) {
    const key = part.replaceAll('~1', '/').replaceAll('~0', '~')
    const next = step(pointed, key)
    if (next === null) return pointed
    pointed = next
  }
  return pointed
}

function step(from: Pointed, key: string): Pointed | null {
  const path = [...from.path, key]
  if (from.tree.type === 'map') {
    const entry = from.tree.entries.get(key)
    return entry === undefined ? null : { tree: entry.value, entry, path }
  }
  const item = from.tree.type === 'list' ? from.tree.items[Number(key)] : undefined
  return item === undefined ? null : { tree: item, entry: null, path }
}

/** Where a complaint about a whole map belongs: at the key that names it. */
export function headPlace(pointed: Pointed): Place {
  return pointed.entry?.keyPlace ?? pointed.tree.place
}
