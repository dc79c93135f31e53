export default {
  pagination: { data: 'broken', size: 1, alias: 'broken_page' },
  permalink: data => `/${data.broken_page.path}`,
  eleventyComputed: { up: data => data.broken_page.up },
}
