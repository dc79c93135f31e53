import { relative, join } from 'node:path'
import nunjucks from 'nunjucks'
import { markdownHtml } from '../report/markdown.js'
import type { Typesetter } from '../report/typeset.js'
import { packageFolder } from './package-folder.js'
import type { SitePages } from './pages.js'

/** The part of Eleventy's configuration object that is used here; Eleventy ships no types. */
export interface EleventyConfig {
  /** Set by the build, read by `.eleventy.js`. */
  configureSite?: (config: EleventyConfig) => EleventyInput
  readonly ignores: { delete(glob: string): boolean }
  setUseGitIgnore(use: boolean): void
  setQuietMode(quiet: boolean): void
  setLibrary(language: string, library: unknown): void
  setFrontMatterParsingOptions(options: object): void
  setTemplateFormats(formats: readonly string[]): void
  addGlobalData(name: string, data: unknown): void
  on(event: 'eleventy.after', callback: (event: FinishedBuild) => Promise<void>): void
}

/** What Eleventy tells at its end. */
export interface FinishedBuild {
  readonly directories: { readonly output: string }
  readonly results: readonly { readonly url: string | false; readonly content: string }[]
}

/** What `.eleventy.js` has to know. */
export interface EleventyInput {
  /** Folder of the pages. */
  readonly input: string
}

/** Folder of the pages, relative to the working directory as Eleventy wants it. */
export function pagesFolder(): string {
  return relative(process.cwd(), join(packageFolder, 'templates', 'pages'))
}

/**
 * Tells Eleventy what to render and how. Templates come from the package only: Eleventy's own Nunjucks would also look
 * into the working directory, where a stranger's files lie.
 */
export function configureEleventy(
  config: EleventyConfig,
  pages: SitePages,
  typesetter: Typesetter,
): EleventyInput {
  config.setUseGitIgnore(false)
  config.ignores.delete('**/node_modules/**')
  config.setQuietMode(true)
  config.setTemplateFormats(['njk'])
  config.setFrontMatterParsingOptions({ engines: refusedEngines })
  config.setLibrary('njk', nunjucksEnvironment(typesetter))
  for (const [name, value] of Object.entries(pages)) config.addGlobalData(name, value)
  return { input: pagesFolder() }
}

const refuse = (): never => {
  throw new Error('templates carry no front matter')
}
const refusedEngines = Object.fromEntries(
  ['js', 'javascript', 'json', 'yaml', 'toml', 'coffee'].map(name => [name, refuse]),
)

function nunjucksEnvironment(typesetter: Typesetter): nunjucks.Environment {
  const loader = new nunjucks.FileSystemLoader(join(packageFolder, 'templates'), { noCache: true })
  const environment = new nunjucks.Environment(loader, {
    autoescape: true,
    throwOnUndefined: true,
    trimBlocks: true,
    lstripBlocks: true,
  })
  const trusted = (html: string): nunjucks.runtime.SafeString => new nunjucks.runtime.SafeString(html)
  environment.addFilter('display', (tex: string) => trusted(typesetter.display(tex)))
  environment.addFilter('tex', (tex: string) => trusted(typesetter.inline(tex)))
  environment.addFilter('prose', (text: string) => trusted(inlineMath(text, typesetter)))
  environment.addFilter('markdown', (text: string) => trusted(markdownHtml(text)))
  environment.addFilter('svg', (text: string) => trusted(onlySvg(text)))
  return environment
}

/** Escaped text in which `$…$` is typeset; used for the declarations' meanings. */
function inlineMath(text: string, typesetter: Typesetter): string {
  return text
    .split('$')
    .map((piece, index) => (index % 2 === 1 ? typesetter.inline(piece) : escapeHtml(piece)))
    .join('')
}

function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, character => `&#${character.charCodeAt(0)};`)
}

/** Pictures are made by `figure` alone; this stands guard should anything else ever reach the filter. */
function onlySvg(text: string): string {
  const tags = text.match(/<[^>]*>/g) ?? []
  const strange = tags.find(tag => !/^<\/?(svg|title|desc|path|text|tspan|circle)[\s>]/.test(tag) || /\s(on\w+|href)=/.test(tag))
  if (tags[0]?.startsWith('<svg') !== true || strange !== undefined) throw new Error(`no picture of ours: ${strange ?? text.slice(0, 40)}`)
  return text
}
