import { link, readFile, rename, rm, writeFile } from 'node:fs/promises'
import { setTimeout } from 'node:timers/promises'
import type { Owner } from './owner.js'
import { freshPath, type Workshop } from './workshop.js'

const patience = 60_000
const pause = 20

/**
 * Runs `work` while no other process holds the lock of this target. A lock whose process no longer runs is taken over.
 * Rejects after a minute of waiting for a process that does run.
 */
export async function withLock<T>(workshop: Workshop, work: () => Promise<T>): Promise<T> {
  const claim = freshPath(workshop, 'claim')
  await writeFile(claim, JSON.stringify(workshop.owner))
  try {
    await takeLock(workshop, claim)
  } finally {
    await rm(claim, { force: true })
  }
  try {
    return await work()
  } finally {
    await rm(workshop.lock, { force: true })
  }
}

/** A hard link is created only where no file is, and appears with its content complete. */
async function takeLock(workshop: Workshop, claim: string): Promise<void> {
  for (const end = Date.now() + patience; ; ) {
    try {
      await link(claim, workshop.lock)
      return
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error
    }
    const text = await readFile(workshop.lock, 'utf8').catch(() => null)
    if (text !== null && !workshop.alive(ownerOf(text))) await removeStale(workshop, text)
    else if (Date.now() > end)
      throw new Error(`another build (process ${text === null ? '?' : ownerOf(text).pid}) holds ${workshop.lock}`)
    else await setTimeout(pause)
  }
}

function ownerOf(text: string): Owner {
  const value = JSON.parse(text) as Partial<Owner>
  return { pid: value.pid ?? 0, started: value.started ?? '' }
}

/**
 * Two processes may both find the same stale lock, and the slower one must not remove the lock that the faster one has
 * taken since: the lock is moved aside, read again, and put back where it was not the stale one.
 */
async function removeStale(workshop: Workshop, stale: string): Promise<void> {
  const aside = freshPath(workshop, 'claim')
  try {
    await rename(workshop.lock, aside)
  } catch {
    return
  }
  const moved = await readFile(aside, 'utf8')
  if (moved !== stale) await link(aside, workshop.lock).catch(() => undefined)
  await rm(aside, { force: true })
}
