import { closeSync, constants, fstatSync, lstatSync, openSync, readdirSync, readSync, realpathSync } from 'node:fs'
import type { Dirent, Stats } from 'node:fs'
import { join, sep } from 'node:path'
import { FileRefusal, joinInside, type Entry, type FileSource } from './file-source.js'

const largest = 32 * 1024 * 1024

/** Never waits for a pipe or a device, and never follows a link in the last part of the path. */
const openFlags = constants.O_RDONLY | (constants.O_NOFOLLOW ?? 0) | (constants.O_NONBLOCK ?? 0)

/** Files below one folder of the disk; links are refused wherever they stand below it, also such that stay inside. */
export class NodeFiles implements FileSource {
  readonly #root: string
  hurried = false

  constructor(root: string) {
    this.#root = realpathSync(root)
  }

  read(path: string): Uint8Array {
    const full = this.#locate(path)
    const descriptor = open(full)
    try {
      const stats = fstatSync(descriptor)
      refuseUnlessRegular(stats)
      this.#refuseLinks(full, stats)
      return readAll(descriptor, stats.size)
    } finally {
      closeSync(descriptor)
    }
  }

  list(path: string): readonly Entry[] {
    const full = path === '' ? this.#root : this.#locate(path)
    let found: Dirent[]
    try {
      if (realpathSync(full) !== full) throw new FileRefusal('outside', 'is a link, and links are not followed')
      found = readdirSync(full, { withFileTypes: true })
    } catch (error) {
      throw refusal(error)
    }
    return found.map(entry).sort((a, b) => (a.name < b.name ? -1 : 1))
  }

  #locate(path: string): string {
    const inside = joinInside('', path)
    if (inside === null) throw new FileRefusal('outside', 'lies outside the project')
    return join(this.#root, ...inside.split('/'))
  }

  /** The path must lead, without any link, to the very file that was opened. */
  #refuseLinks(full: string, opened: Stats): void {
    const real = realpathSync(full)
    if (real !== full || !real.startsWith(this.#root + sep))
      throw new FileRefusal('outside', 'is reached through a link, and links are not followed')
    const named = lstatSync(real)
    if (named.ino !== opened.ino || named.dev !== opened.dev)
      throw new FileRefusal('unreadable', 'changed while it was read')
  }
}

function open(full: string): number {
  try {
    return openSync(full, openFlags)
  } catch (error) {
    throw refusal(error)
  }
}

function refuseUnlessRegular(stats: Stats): void {
  if (!stats.isFile()) throw new FileRefusal('not-regular', 'is not a regular file')
  if (stats.size > largest)
    throw new FileRefusal('too-large', `has ${stats.size} bytes, and at most ${largest} (32 MB) are read`)
}

function readAll(descriptor: number, size: number): Uint8Array {
  const bytes = new Uint8Array(size)
  let filled = 0
  while (filled < size) {
    const count = readSync(descriptor, bytes, filled, size - filled, null)
    if (count === 0) return bytes.subarray(0, filled)
    filled += count
  }
  return bytes
}

function entry(found: Dirent): Entry {
  return { name: found.name, nature: found.isFile() ? 'file' : found.isDirectory() ? 'folder' : 'other' }
}

function refusal(error: unknown): FileRefusal {
  if (error instanceof FileRefusal) return error
  const code = error instanceof Error && 'code' in error ? String(error.code) : ''
  if (code === 'ENOENT' || code === 'ENOTDIR') return new FileRefusal('missing', 'does not exist')
  if (code === 'ELOOP') return new FileRefusal('outside', 'is a link, and links are not followed')
  if (code === 'ENXIO') return new FileRefusal('not-regular', 'is not a regular file')
  return new FileRefusal('unreadable', `cannot be read (${code === '' ? 'unknown reason' : code})`)
}
