import type { Place } from '../model/problem.js'
import type { ComposeFiles } from './compose-files.js'
import { Gathered } from './compose-gather.js'
import { mergeMaps } from './compose-merge.js'
import { partOf } from './compose-part.js'
import type { Issues } from './issues.js'
import { quoted } from './quoted.js'
import { child, type Tree, type TreeEntry, type TreeMap, type TreeScalar } from './tree.js'

/** So many files may build on each other, one after the other. */
const longestChain = 10

/** What a budget says of itself and never takes over from another. */
const own: ReadonlySet<string> = new Set(['format', 'title', 'revision', 'summary', 'about'])

/**
 * The whole of a budget from the files that it is made of: below everything what `from` names, over it the shared parts
 * under `include`, over them what the file itself says. Every node keeps the place where it stands. Null where a file of
 * them cannot be read, which has been said.
 */
export function compose(file: string, files: ComposeFiles, issues: Issues): Tree | null {
  const tree = files.first(file)
  if (tree?.type !== 'map') return tree
  return new Composition(files, issues).whole(tree, [file])
}

/** Files on the way from the budget to the one that is read, that one included. */
type Way = readonly string[]

class Composition {
  /** By path: several parts may include one and the same. */
  readonly #read = new Map<string, TreeMap | null>()

  constructor(
    readonly files: ComposeFiles,
    readonly issues: Issues,
  ) {}

  /** Null where something below cannot be read. */
  whole(tree: TreeMap, way: Way): TreeMap | null {
    const from = tree.entries.get('from')
    const include = tree.entries.get('include')
    if (from === undefined && include === undefined) return tree
    const base = from === undefined ? nothing(tree.place) : this.#base(from, way)
    const parts = include === undefined ? nothing(tree.place) : this.#parts(include, way)
    if (base === null || parts === null) return null
    const below = mergeMaps(base, parts, this.issues)
    return mergeMaps(
      below,
      without(tree, key => key === 'from' || key === 'include'),
      this.issues,
    )
  }

  #base({ keyPlace, value }: TreeEntry, way: Way): TreeMap | null {
    if (value.type !== 'scalar' || value.text === '') {
      const message = '`from` must be the path of one budget file, such as `../tern/budget.yaml`'
      this.issues.error('type', value.type === 'scalar' ? value.place : keyPlace, message)
      return null
    }
    const path = this.files.pathOf(value)
    if (path === null || !this.#allows(path, way, value.place)) return null
    const tree = this.#open(path, value)
    const whole = tree === null ? null : this.whole(tree, [...way, path])
    return whole === null ? null : without(whole, key => own.has(key))
  }

  /** Several parts side by side: none may say what another one says. */
  #parts({ keyPlace, value }: TreeEntry, way: Way): TreeMap | null {
    const items = value.type === 'list' ? value.items : [value]
    if (items.length === 0 || !items.every(item => item.type === 'scalar' && item.text !== '')) {
      const message = '`include` must be the path of a shared part or a list of them: `[../shared/cryostat.yaml]`'
      this.issues.error('type', value.type === 'scalar' ? value.place : keyPlace, message)
      return null
    }
    const gathered = new Gathered(value.place, this.issues)
    let complete = true
    for (const item of items) {
      const part = item.type === 'scalar' ? this.#part(item, way) : null
      if (part === null) complete = false
      else if (item.type === 'scalar') gathered.add(part, item)
    }
    return complete ? gathered.tree() : null
  }

  #part(scalar: TreeScalar, way: Way): TreeMap | null {
    const path = this.files.pathOf(scalar)
    if (path === null || !this.#allows(path, way, scalar.place)) return null
    const known = this.#read.get(path)
    if (known !== undefined) return known
    const tree = this.#open(path, scalar)
    const part = tree === null ? null : this.#wholePart(tree, [...way, path])
    this.#read.set(path, part)
    return part
  }

  #wholePart(tree: TreeMap, way: Way): TreeMap | null {
    const part = partOf(tree, this.issues)
    if (part === null) return null
    const include = tree.entries.get('include')
    const below = include === undefined ? nothing(part.place) : this.#parts(include, way)
    return below === null ? null : mergeMaps(below, part, this.issues)
  }

  #open(path: string, scalar: TreeScalar): TreeMap | null {
    const tree = this.files.named(path, scalar)
    if (tree === null) return null
    if (tree.type === 'map') return this.#hasFormat(tree) ? tree : null
    this.issues.error('type', tree.place, 'this file must be a map of keys, the first of which is `format: 1`')
    return null
  }

  #allows(path: string, way: Way, place: Place): boolean {
    const start = way.indexOf(path)
    if (start >= 0) {
      const circle = [...way.slice(start), path].map(each => quoted(each)).join(' builds on ')
      this.issues.error('circle', place, `${circle}: take one of these paths out`)
      return false
    }
    if (way.length <= longestChain) return true
    this.issues.error(
      'chain',
      place,
      `more than ${longestChain} files build on each other up to here; join some of them`,
    )
    return false
  }

  /** Of the budget itself the schema says it. */
  #hasFormat(tree: TreeMap): boolean {
    const format = child(tree, 'format')
    if (format?.type === 'scalar' && format.text === '1') return true
    const message =
      format === undefined ? 'this file needs the key `format`; write `format: 1`' : '`format` must be `1`'
    this.issues.error(format === undefined ? 'missing-key' : 'format', format?.place ?? tree.place, message)
    return false
  }
}

function nothing(place: Place): TreeMap {
  return { type: 'map', place, entries: new Map() }
}

function without(tree: TreeMap, dropped: (key: string) => boolean): TreeMap {
  return { ...tree, entries: new Map([...tree.entries].filter(([key]) => !dropped(key))) }
}
