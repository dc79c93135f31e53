export default {
  pagination: { data: 'reports', size: 1, alias: 'report' },
  permalink: data => `/${data.report.path}`,
  eleventyComputed: { up: data => data.report.up },
}
