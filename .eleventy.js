// Eleventy's configuration, for the project's own build and for `npx @11ty/eleventy` alike. The build hands over how to
// configure with the configuration object; started directly, Eleventy renders the budgets of the project that it is started in.
export default async function (eleventyConfig) {
  const configure = eleventyConfig.configureSite ?? (await import('./dist/site/direct.js')).configureDirect
  return configure(eleventyConfig)
}
