import { readFile, rename, rm, stat, writeFile } from 'node:fs/promises'
import { freshPath, type Workshop } from './workshop.js'

/** What an interrupted swap was doing; absolute paths within the workshop. */
export interface Journal {
  readonly stage: string
  readonly old: string
}

/**
 * Puts a complete staged site in the target's place by two renames, because a rename onto a folder that is not empty
 * fails. The journal is written before the first and removed after the second, so that whoever comes next can tell how
 * far it went. Call it under the lock, after `recoverSwap`.
 */
export async function swap(workshop: Workshop, stage: string): Promise<void> {
  const { target, journal, reached } = workshop
  const old = freshPath(workshop, 'old')
  const draft = `${stage}.journal`
  await writeFile(draft, JSON.stringify({ stage, old } satisfies Journal))
  await rename(draft, journal)
  await reached('journal written')
  try {
    if (await exists(target)) await rename(target, old)
    await reached('old moved away')
    await rename(stage, target)
  } catch (error) {
    await putBack(workshop, { stage, old })
    throw error
  }
  await reached('new in place')
  await rm(journal, { force: true })
  await reached('journal removed')
  await rm(old, { recursive: true, force: true })
}

/** A rename that the system refuses (another file system, a folder in use) leaves the old site where it was. */
async function putBack({ target, journal }: Workshop, { old }: Journal): Promise<void> {
  if (!(await exists(target)) && (await exists(old))) await rename(old, target)
  await rm(journal, { force: true })
}

/**
 * Finishes or undoes a swap that was interrupted. With the target gone, the new site is put in place where it still
 * stands staged, else the old one is put back; with the target there, the swap either had not begun or was over.
 */
export async function recoverSwap({ target, journal }: Workshop): Promise<void> {
  const { stage, old } = await readJournal(journal)
  if (stage !== null && old !== null && !(await exists(target))) {
    if (await exists(stage)) await rename(stage, target)
    else if (await exists(old)) await rename(old, target)
  }
  await rm(journal, { force: true })
  for (const path of [stage, old]) if (path !== null) await rm(path, { recursive: true, force: true })
}

async function readJournal(path: string): Promise<Journal | { readonly stage: null; readonly old: null }> {
  const text = await readFile(path, 'utf8').catch(() => null)
  return text === null ? { stage: null, old: null } : (JSON.parse(text) as Journal)
}

async function exists(path: string): Promise<boolean> {
  return stat(path).then(
    () => true,
    () => false,
  )
}
