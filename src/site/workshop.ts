import { randomInt } from 'node:crypto'
import { mkdir, readdir, realpath, rm, writeFile } from 'node:fs/promises'
import { basename, dirname, join } from 'node:path'
import { isAlive, thisProcess, type Owner } from './owner.js'

/**
 * The folder beside a target in which its next version is built: on the same file system, so that a rename can put it in
 * place, and ignored by git.
 */
export interface Workshop {
  readonly target: string
  readonly folder: string
  readonly lock: string
  readonly journal: string
  readonly owner: Owner
  readonly alive: (owner: Owner) => boolean
  /** Called at each step of a publication, for tests that stop there. */
  readonly reached: (step: string) => Promise<void>
}

export type WorkshopOptions = Partial<Pick<Workshop, 'owner' | 'alive' | 'reached'>>

/** Opens the workshop of a target; the target need not exist. A target that is a link is followed. */
export async function openWorkshop(outputDir: string, options: WorkshopOptions = {}): Promise<Workshop> {
  const target = await realpath(outputDir).catch(() => outputDir)
  const folder = join(dirname(target), '.floorbook')
  const name = basename(target)
  await mkdir(folder, { recursive: true })
  await writeFile(join(folder, '.gitignore'), '*\n')
  return {
    target,
    folder,
    lock: join(folder, `${name}.lock`),
    journal: join(folder, `${name}.journal.json`),
    owner: thisProcess(),
    alive: isAlive,
    reached: () => Promise.resolve(),
    ...options,
  }
}

/** A path in the workshop that no other build uses: `site.stage-<pid>-<start>-<random>`. */
export function freshPath({ folder, target, owner }: Workshop, purpose: 'stage' | 'old' | 'claim'): string {
  return join(folder, `${basename(target)}.${purpose}-${owner.pid}-${owner.started}-${randomInt(2 ** 47)}`)
}

/** Removes what builds that no longer run have left; `keep` are paths that a journal still needs. */
export async function clearLeftovers(workshop: Workshop, keep: readonly string[] = []): Promise<void> {
  const prefix = `${basename(workshop.target)}.`
  for (const name of await readdir(workshop.folder)) {
    const match = name.startsWith(prefix)
      ? /^(?:stage|old|claim)-(\d+)-(\d*)-\d+$/.exec(name.slice(prefix.length))
      : null
    const path = join(workshop.folder, name)
    if (match === null || keep.includes(path)) continue
    if (!workshop.alive({ pid: Number(match[1]), started: match[2] })) await rm(path, { recursive: true, force: true })
  }
}
