import { join, relative } from 'node:path'
import { createTypesetter, type Typesetter } from '../report/typeset.js'
import { assetFiles } from './assets.js'
import type { SiteInput } from './input.js'
import { configureEleventy, pagesFolder, type EleventyConfig, type EleventyInput } from './eleventy.js'
import { packageFolder } from './package-folder.js'
import { sitePages } from './pages.js'
import { sideFiles } from './side-files.js'

/** Path below the site, with forward slashes → content. */
export type SiteFiles = ReadonlyMap<string, string | Uint8Array>

/** Every file of the site, in memory: nothing is written before all of it is known to render. */
export async function renderSite(input: SiteInput): Promise<{ readonly files: SiteFiles; readonly pages: number }> {
  const typesetter = createTypesetter()
  const pages = sitePages(input)
  const rendered = await renderPages(config => configureEleventy(config, pages, typesetter))
  const files = new Map([...rendered, ...(await otherFiles(input, typesetter))])
  return { files, pages: rendered.size }
}

/** All that is no page. Call it once the pages are rendered: the styles follow from what they typeset. */
export async function otherFiles(input: SiteInput, typesetter: Typesetter): Promise<SiteFiles> {
  return new Map<string, string | Uint8Array>([...sideFiles(input), ...(await assetFiles(typesetter.styles()))])
}

/** Runs Eleventy without letting it write; it is loaded here, because loading alone takes a quarter of a second. */
async function renderPages(configure: (config: EleventyConfig) => EleventyInput): Promise<ReadonlyMap<string, string>> {
  const { default: Eleventy } = await import('@11ty/eleventy')
  const output = 'rendered-in-memory'
  const eleventy = new Eleventy(pagesFolder(), output, {
    quietMode: true,
    configPath: relative(process.cwd(), join(packageFolder, '.eleventy.js')),
    config: (config: EleventyConfig) => {
      config.configureSite = configure
    },
  })
  eleventy.disableLogger()
  const pages = await eleventy.toJSON()
  return new Map(pages.map(page => [pathOf(page.url), page.content]))
}

/** `/tern/draft/` → `tern/draft/index.html`. */
export function pathOf(url: string | false): string {
  return String(url).replace(/^\//, '').replace(/(^|\/)$/, '$1index.html')
}
