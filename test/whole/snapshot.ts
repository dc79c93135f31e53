import { createHash } from 'node:crypto'
import { existsSync, readFileSync, readdirSync } from 'node:fs'
import { join, relative } from 'node:path'

/** Every file below a folder with a digest of its bytes; empty where there is no folder. */
export function snapshot(folder: string): Readonly<Record<string, string>> {
  if (!existsSync(folder)) return {}
  const files = readdirSync(folder, { recursive: true, withFileTypes: true }).filter(entry => entry.isFile())
  const pairs = files.map(entry => {
    const path = join(entry.parentPath, entry.name)
    return [relative(folder, path), createHash('sha256').update(readFileSync(path)).digest('hex')] as const
  })
  return Object.fromEntries(pairs)
}
