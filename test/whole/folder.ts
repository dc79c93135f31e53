import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { dirname, join } from 'node:path'
import { onTestFinished } from 'vitest'

/** Writes files into a folder, by path below it. */
export function writeFiles(folder: string, files: Readonly<Record<string, string>>): void {
  for (const [name, text] of Object.entries(files)) {
    mkdirSync(dirname(join(folder, name)), { recursive: true })
    writeFileSync(join(folder, name), text)
  }
}

/** A folder of the running test's own, removed when it ends. */
export function throwaway(files: Readonly<Record<string, string>>): string {
  const folder = mkdtempSync(join(tmpdir(), 'floorbook-test-'))
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }))
  writeFiles(folder, files)
  return folder
}
