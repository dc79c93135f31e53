import { createHash } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import type { SiteFiles } from './render.js'

/** Name of the manifest within a site. */
export const manifestName = '.manifest.json'

/** Path below the site → SHA-256 of the file, in hexadecimal. */
export type Manifest = ReadonlyMap<string, string>

export function manifestOf(files: SiteFiles): Manifest {
  const paths = [...files.keys()].toSorted()
  return new Map(paths.map(path => [path, createHash('sha256').update(files.get(path) ?? '').digest('hex')]))
}

export function manifestText(manifest: Manifest): string {
  return `${JSON.stringify({ format: 1, files: Object.fromEntries(manifest) }, null, 1)}\n`
}

/** The manifest of a published site; null where there is none or it cannot be read. */
export async function readManifest(folder: string): Promise<Manifest | null> {
  try {
    const { files } = JSON.parse(await readFile(join(folder, manifestName), 'utf8')) as { files: Record<string, string> }
    return new Map(Object.entries(files))
  } catch {
    return null
  }
}
