export default {
  pagination: { data: 'kinds', size: 1, alias: 'kind_page' },
  permalink: data => `/${data.kind_page.path}`,
  eleventyComputed: { up: data => data.kind_page.up },
}
