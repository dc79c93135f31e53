import { FileRefusal, type Entry, type FileSource } from '../../src/budget/file-source.js'

/** Files that exist only in a test. */
export class MemoryFiles implements FileSource {
  readonly #files: ReadonlyMap<string, Uint8Array>

  constructor(files: Readonly<Record<string, string | Uint8Array>>) {
    this.#files = new Map(
      Object.entries(files).map(([path, text]) => [
        path,
        typeof text === 'string' ? new TextEncoder().encode(text) : text,
      ]),
    )
  }

  read(path: string): Uint8Array {
    const bytes = this.#files.get(path)
    if (bytes === undefined) throw new FileRefusal('missing', 'does not exist')
    return bytes
  }

  list(path: string): readonly Entry[] {
    const below = path === '' ? '' : `${path}/`
    const names = new Map<string, Entry>()
    for (const file of this.#files.keys()) {
      if (!file.startsWith(below)) continue
      const [name = '', ...rest] = file.slice(below.length).split('/')
      names.set(name, { name, nature: rest.length > 0 ? 'folder' : 'file' })
    }
    if (names.size === 0) throw new FileRefusal('missing', 'does not exist')
    return [...names.values()].sort((a, b) => (a.name < b.name ? -1 : 1))
  }
}
