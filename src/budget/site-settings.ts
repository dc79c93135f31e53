import { textOf } from './amount.js'
import { FileRefusal, joinInside, type FileSource } from './file-source.js'
import type { Issues } from './issues.js'
import { suggestion } from './nearest.js'
import { quoted } from './quoted.js'
import { child, type Tree } from './tree.js'
import { readYaml } from './yaml.js'

/** What `budgets/site.yaml` says; every key may be left out. */
export interface SiteSettings {
  readonly title: string
  readonly subtitle: string | null
  /** Folder of the site, from the project's root. */
  readonly output: string
}

export const defaultSite: SiteSettings = { title: 'Noise budgets', subtitle: null, output: 'site' }

const file = 'budgets/site.yaml'
const keys = ['title', 'subtitle', 'output']

/** The site's settings, defaults where the file or a key is missing; null where the file cannot be read, which has been said. */
export function readSite(files: FileSource, issues: Issues): SiteSettings | null {
  let bytes: Uint8Array
  try {
    bytes = files.read(file)
  } catch (error) {
    if (!(error instanceof FileRefusal)) throw error
    if (error.code !== 'missing') issues.error('file', { file, line: 1, column: 1 }, `the file ${error.message}`)
    return error.code === 'missing' ? defaultSite : null
  }
  const { tree, problems } = readYaml(file, bytes)
  for (const problem of problems) issues.add(problem)
  return tree === null ? null : settings(tree, issues)
}

function settings(tree: Tree, issues: Issues): SiteSettings | null {
  if (tree.type === 'scalar' && tree.text === '') return defaultSite
  if (tree.type !== 'map') {
    issues.error('type', tree.place, `the site’s settings are a map of \`title\`, \`subtitle\` and \`output\``)
    return null
  }
  for (const { key, keyPlace, value } of tree.entries.values()) {
    if (!keys.includes(key))
      issues.error(
        'unknown-key',
        keyPlace,
        `unknown key ${quoted(key)}; allowed are \`title\`, \`subtitle\`, \`output\`${suggestion(key, keys)}`,
      )
    else if (textOf(value) === null || (textOf(value) ?? '').length > 500)
      issues.error('type', value.place, `${quoted(key)} must be text of at most 500 characters`)
  }
  const output = outputOf(child(tree, 'output'), issues)
  const text = (key: string) => textOf(child(tree, key))
  return { title: text('title') ?? defaultSite.title, subtitle: text('subtitle'), output }
}

/** A folder that `build` replaces as a whole: it must not be one that holds the project's own files. */
function outputOf(tree: Tree | undefined, issues: Issues): string {
  const written = textOf(tree)
  if (tree === undefined || written === null) return defaultSite.output
  const folder = joinInside('', written)
  const own = ['budgets', 'src', 'templates', 'test', 'dist', 'node_modules', '.git', '.ci', '.floorbook']
  const first = folder?.split('/')[0] ?? ''
  if (folder !== null && !own.includes(first.toLowerCase())) return folder
  issues.error(
    'output',
    tree.place,
    `${quoted(written)} cannot be the site’s folder; choose a new folder inside the project, such as \`site\``,
  )
  return defaultSite.output
}
