import { copyFile, link, mkdir, readdir, readFile, writeFile } from 'node:fs/promises'
import { dirname, join, relative, sep } from 'node:path'
import { Refusal } from '../model/problem.js'
import { manifestName, manifestOf, manifestText, readManifest } from './manifest.js'
import type { SiteFiles } from './render.js'

/** Kept in a target because it keeps the folder itself in git. */
const placeholder = '.gitkeep'

/** Every file below a folder, relative, with forward slashes; empty where there is no folder. */
export async function filesBelow(folder: string): Promise<readonly string[]> {
  const entries = await readdir(folder, { recursive: true, withFileTypes: true }).catch(() => [])
  return entries
    .filter(entry => !entry.isDirectory())
    .map(entry => relative(folder, join(entry.parentPath, entry.name)).split(sep).join('/'))
    .toSorted()
}

/** Refuses a target with files in it that no build of ours has made, because publishing would take them away. */
export async function refuseForeignFiles(target: string, shown: string): Promise<void> {
  const known = (await readManifest(target)) ?? new Map<string, string>()
  const foreign = (await filesBelow(target)).filter(
    path => path !== placeholder && path !== manifestName && !known.has(path),
  )
  if (foreign.length === 0) return
  const message = `\`${foreign[0]}\`${foreign.length > 1 ? ` and ${foreign.length - 1} more files` : ''} in the output folder ${foreign.length > 1 ? 'were' : 'was'} not made by a build; move them away or choose another output folder`
  throw new Refusal([{ severity: 'error', code: 'foreign-files', place: { file: shown, line: 1, column: 1 }, message }])
}

/** Whether the target already holds exactly these files. */
export async function isPublished(files: SiteFiles, target: string): Promise<boolean> {
  const wanted = [...files.keys(), manifestName].toSorted()
  const there = (await filesBelow(target)).filter(path => path !== placeholder)
  if (there.length !== wanted.length || there.some((path, i) => path !== wanted[i])) return false
  const manifest = manifestText(manifestOf(files))
  if ((await readFile(join(target, manifestName), 'utf8').catch(() => '')) !== manifest) return false
  for (const [path, content] of files) if (!(await holds(join(target, path), content))) return false
  return true
}

/** Writes the whole site into an empty folder; a file that the old site holds with the same bytes is linked instead. */
export async function stageSite(files: SiteFiles, stage: string, old: string): Promise<void> {
  await mkdir(stage)
  for (const folder of new Set([...files.keys()].map(path => dirname(path))))
    await mkdir(join(stage, folder), { recursive: true })
  for (const [path, content] of files) await stageFile(join(stage, path), content, join(old, path))
  await copyFile(join(old, placeholder), join(stage, placeholder)).catch(() => undefined)
  await writeFile(join(stage, manifestName), manifestText(manifestOf(files)))
}

async function stageFile(path: string, content: string | Uint8Array, old: string): Promise<void> {
  if ((await holds(old, content)) && (await tryLink(old, path))) return
  await writeFile(path, content, { flag: 'wx' })
}

async function holds(path: string, content: string | Uint8Array): Promise<boolean> {
  const bytes = await readFile(path).catch(() => null)
  return bytes !== null && bytes.equals(typeof content === 'string' ? Buffer.from(content) : content)
}

async function tryLink(from: string, to: string): Promise<boolean> {
  return link(from, to).then(
    () => true,
    () => false,
  )
}
