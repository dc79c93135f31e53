import type { Place } from '../model/problem.js'
import type { Issues } from './issues.js'
import type { TreeEntry, TreeMap, TreeScalar } from './tree.js'

/** The ids of several shared parts, section by section. */
export class Gathered {
  readonly #sections = new Map<string, { readonly entry: TreeEntry; readonly ids: Map<string, TreeEntry> }>()

  constructor(
    readonly place: Place,
    readonly issues: Issues,
  ) {}

  /** A part that two others include brings the same entry twice, which is one. */
  add(part: TreeMap, by: TreeScalar): void {
    for (const entry of part.entries.values()) {
      if (entry.value.type !== 'map') continue
      const section = this.#sections.get(entry.key) ?? { entry, ids: new Map<string, TreeEntry>() }
      this.#sections.set(entry.key, section)
      for (const each of entry.value.entries.values()) {
        const first = section.ids.get(each.key)
        if (first !== undefined && first.keyPlace !== each.keyPlace) this.#clash(first, each, by)
        section.ids.set(each.key, each)
      }
    }
  }

  #clash(first: TreeEntry, second: TreeEntry, by: TreeScalar): void {
    const [one, two] = [first, second].map(({ keyPlace }) => `${keyPlace.file}:${keyPlace.line}`)
    const message = `\`${first.key}\` stands in two shared parts, at ${one} and at ${two}; rename one, or include only one of them`
    this.issues.error('included-twice', by.place, message)
  }

  tree(): TreeMap {
    const entries = [...this.#sections.values()].map(({ entry, ids }): [string, TreeEntry] => [
      entry.key,
      { ...entry, value: { type: 'map', place: entry.value.place, entries: ids } },
    ])
    return { type: 'map', place: this.place, entries: new Map(entries) }
  }
}
