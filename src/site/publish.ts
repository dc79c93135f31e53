import { readFile, rm } from 'node:fs/promises'
import { basename } from 'node:path'
import { withLock } from './lock.js'
import type { SiteFiles } from './render.js'
import { isPublished, refuseForeignFiles, stageSite } from './stage.js'
import { recoverSwap, swap } from './swap.js'
import { clearLeftovers, freshPath, openWorkshop, type WorkshopOptions } from './workshop.js'

/**
 * Publishes a site whole or not at all: readers find the old one or the new one, also when a build is killed, the disk is
 * full or two builds run at once. Files that did not change keep their bytes and their times.
 *
 * Rejects with a `Refusal` where the target holds files that no build has made.
 */
export async function publish(files: SiteFiles, outputDir: string, options: WorkshopOptions = {}): Promise<void> {
  await recoverSite(outputDir, options)
  await refuseForeignFiles(outputDir, basename(outputDir))
  if (await isPublished(files, outputDir)) return
  const workshop = await openWorkshop(outputDir, options)
  const stage = freshPath(workshop, 'stage')
  try {
    await stageSite(files, stage, workshop.target)
    await workshop.reached('staged')
    await withLock(workshop, async () => {
      await recoverSwap(workshop)
      await refuseForeignFiles(workshop.target, basename(outputDir))
      await swap(workshop, stage)
    })
  } catch (error) {
    await rm(stage, { recursive: true, force: true })
    throw error
  }
}

/** Finishes or undoes what a killed build has left; every command that touches a site begins with it. */
export async function recoverSite(outputDir: string, options: WorkshopOptions = {}): Promise<void> {
  const workshop = await openWorkshop(outputDir, options)
  await withLock(workshop, async () => {
    if ((await readFile(workshop.journal, 'utf8').catch(() => null)) !== null) await recoverSwap(workshop)
    await clearLeftovers(workshop)
  })
}
