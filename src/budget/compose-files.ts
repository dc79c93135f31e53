import type { Place } from '../model/problem.js'
import { FileRefusal, joinInside, type FileSource } from './file-source.js'
import type { Issues } from './issues.js'
import { quoted } from './quoted.js'
import type { Tree, TreeScalar } from './tree.js'
import { readYaml } from './yaml.js'

/** Of all files of one budget together; a single one is bounded where it is read. */
const mostFiles = 30
const mostBytes = 1024 * 1024
const mostNodes = 40_000

/** The folder of a file, empty for the root. */
export function folderOf(file: string): string {
  return file.slice(0, Math.max(0, file.lastIndexOf('/')))
}

/** The YAML files that one budget is made of, each read once. */
export class ComposeFiles {
  readonly #trees = new Map<string, Tree | null>()
  #bytes = 0
  #nodes = 0

  constructor(
    readonly files: FileSource,
    readonly issues: Issues,
  ) {}

  /** A file that no other names; null where it cannot be read, which has been said. */
  first(file: string): Tree | null {
    return this.#read(file, { place: { file, line: 1, column: 1 }, written: null })
  }

  /** The path that a scalar means, from the root; null where it is none, which has been said. */
  pathOf(scalar: TreeScalar): string | null {
    const { text, place } = scalar
    const path = joinInside(folderOf(place.file), text)
    if (path === null)
      this.issues.error(
        'file',
        place,
        `${quoted(text)} must be a path from the folder of this file that stays inside the project`,
      )
    else if (!/\.ya?ml$/.test(path))
      this.issues.error(
        'file',
        place,
        `${quoted(text)} is no YAML file; name the file itself, such as \`../tern/budget.yaml\``,
      )
    else return path
    return null
  }

  /** The file at a path that `scalar` names. */
  named(path: string, scalar: TreeScalar): Tree | null {
    return this.#read(path, { place: scalar.place, written: scalar.text })
  }

  #read(path: string, by: { readonly place: Place; readonly written: string | null }): Tree | null {
    const known = this.#trees.get(path)
    if (known !== undefined) return known
    const tree = this.#parse(path, by)
    this.#trees.set(path, tree)
    return tree
  }

  #parse(path: string, { place, written }: { readonly place: Place; readonly written: string | null }): Tree | null {
    if (this.#trees.size >= mostFiles) return this.#tooMuch(place, `consist of more than ${mostFiles}`)
    let bytes: Uint8Array
    try {
      bytes = this.files.read(path)
    } catch (error) {
      if (!(error instanceof FileRefusal)) throw error
      this.issues.error('file', place, `the file ${written === null ? '' : `${quoted(written)} `}${error.message}`)
      return null
    }
    this.#bytes += bytes.length
    if (this.#bytes > mostBytes) return this.#tooMuch(place, `hold more than ${mostBytes} bytes (1 MB) in all`)
    const { tree, problems } = readYaml(path, bytes)
    for (const problem of problems) this.issues.add(problem)
    if (tree !== null) this.#nodes += countNodes(tree)
    if (this.#nodes > mostNodes) return this.#tooMuch(place, `hold more than ${mostNodes} values in all`)
    return tree
  }

  #tooMuch(place: Place, what: string): null {
    this.issues.error('too-large', place, `the files of this budget, with this one, ${what}`)
    return null
  }
}

/** With aliases written out; the reader has bounded it for a single file. */
function countNodes(tree: Tree): number {
  if (tree.type === 'scalar') return 1
  const below = tree.type === 'list' ? tree.items : [...tree.entries.values()].map(entry => entry.value)
  return below.reduce((sum, each) => sum + countNodes(each), 1)
}
