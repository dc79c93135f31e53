// Eleventy's configuration: pages from templates/pages, output to site. `floorbook build` sets `configureSite` and takes
// the pages from memory, to publish them whole; `npx @11ty/eleventy` renders the project that it is started in.
export default async function (eleventyConfig) {
  const configure = eleventyConfig.configureSite ?? (await import('./dist/site/direct.js')).configureDirect
  const { input } = await configure(eleventyConfig)
  return { dir: { input, output: 'site' } }
}
