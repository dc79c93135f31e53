import type { SiteInput } from './input.js'
import { publish } from './publish.js'
import { renderSite } from './render.js'

export type { SensorResult, SiteInput, SiteProject } from './input.js'

/**
 * Renders the whole site and publishes it to `outputDir`, whole or not at all.
 *
 * Rejects with a `Refusal` where the target holds files that were not made here, and leaves the old site untouched on
 * every other error.
 */
export async function buildSite(
  input: SiteInput & { readonly outputDir: string },
): Promise<{ readonly pages: number; readonly outputDir: string }> {
  const { files, pages } = await renderSite(input)
  await publish(files, input.outputDir)
  return { pages, outputDir: input.outputDir }
}
