import { readdir, readFile } from 'node:fs/promises'
import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'
import { figureCss } from '../figure/figure-css.js'
import { packageFolder } from './package-folder.js'

const require = createRequire(import.meta.url)

/** Faces that pages use; each is a file of its package and a name below `assets/fonts/`. */
const fontFiles = [
  ['@fontsource-variable/literata', 'literata-latin-wght-normal.woff2'],
  ['@fontsource-variable/literata', 'literata-latin-wght-italic.woff2'],
  ['@fontsource-variable/literata', 'literata-latin-ext-wght-normal.woff2'],
  ['@fontsource-variable/literata', 'literata-greek-wght-normal.woff2'],
  ['@fontsource-variable/commissioner', 'commissioner-latin-wght-normal.woff2'],
  ['@fontsource-variable/commissioner', 'commissioner-latin-ext-wght-normal.woff2'],
  ['@fontsource-variable/commissioner', 'commissioner-greek-wght-normal.woff2'],
  ['@fontsource-variable/open-sans', 'open-sans-math-wght-normal.woff2'],
] as const

/** Styles and fonts: the package's own, KaTeX's, and the rules that stand for KaTeX's inline styles. */
export async function assetFiles(typesetStyles: string): Promise<ReadonlyMap<string, string | Uint8Array>> {
  const files = new Map<string, string | Uint8Array>()
  const folder = join(packageFolder, 'templates', 'assets')
  for (const name of (await readdir(folder)).toSorted()) files.set(`assets/${name}`, await readFile(join(folder, name)))
  files.set('assets/figure.css', figureCss())
  for (const [name, file] of fontFiles)
    files.set(`assets/fonts/${file}`, await readFile(join(packageOf(name), 'files', file)))
  for (const [path, content] of await katexFiles(typesetStyles)) files.set(path, content)
  return files
}

/** KaTeX's sheet with only the woff2 faces, so that no page refers to a file that is not there. */
async function katexFiles(typesetStyles: string): Promise<ReadonlyMap<string, string | Uint8Array>> {
  const folder = dirname(require.resolve('katex/dist/katex.min.css'))
  const sheet = await readFile(join(folder, 'katex.min.css'), 'utf8')
  const lean = sheet
    .replace(/,\s*url\([^)]*\.(?:woff|ttf)\)\s*format\("(?:woff|truetype)"\)/g, '')
    .replaceAll('url(fonts/', 'url(fonts/katex/')
  const files = new Map<string, string | Uint8Array>([['assets/katex.css', `${lean}\n${typesetStyles}`]])
  for (const name of (await readdir(join(folder, 'fonts'))).toSorted())
    if (name.endsWith('.woff2')) files.set(`assets/fonts/katex/${name}`, await readFile(join(folder, 'fonts', name)))
  return files
}

function packageOf(name: string): string {
  return dirname(require.resolve(`${name}/package.json`))
}
