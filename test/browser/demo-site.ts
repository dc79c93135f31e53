import { execFileSync } from 'node:child_process'
import { cpSync, existsSync, mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, relative, resolve, sep } from 'node:path'

export interface DemoSite {
  readonly folder: string
  /** Every page, by its path below the folder with forward slashes. */
  readonly pages: readonly string[]
  /** Folder names of the budgets. */
  readonly sensors: readonly string[]
  remove(): void
}

/** The site of the demo budgets, built by the command into a folder of its own, so that a person's site stays as it is. */
export function buildDemoSite(): DemoSite {
  const root = mkdtempSync(join(tmpdir(), 'floorbook-demo-'))
  cpSync('budgets', join(root, 'budgets'), { recursive: true })
  const env = { ...process.env, SOURCE_DATE_EPOCH: '1772323200' }
  execFileSync(process.execPath, [resolve('dist/cli/main.js'), 'build', '--root', root], { env, stdio: 'pipe' })
  const folder = join(root, 'site')
  const files = readdirSync(folder, { recursive: true, withFileTypes: true })
  const pages = files.filter(entry => entry.isFile() && entry.name.endsWith('.html'))
  return {
    folder,
    pages: pages.map(entry => relative(folder, join(entry.parentPath, entry.name)).split(sep).join('/')).sort(),
    sensors: readdirSync(join(root, 'budgets'))
      .filter(name => existsSync(join(root, 'budgets', name, 'budget.yaml')))
      .sort(),
    remove: () => rmSync(root, { recursive: true, force: true }),
  }
}
