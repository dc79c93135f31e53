import MarkdownIt from 'markdown-it'

const allowed = /^(?:https?|mailto):/i

const markdown = new MarkdownIt({ html: false, linkify: false, typographer: false })
markdown.validateLink = url => allowed.test(url.trim())
// Pictures would be requests that leave the page.
markdown.disable('image')

/** A writer's summary or note as HTML: raw HTML stays text, links to http, https and mailto only, no pictures. */
export function markdownHtml(text: string): string {
  return markdown.render(text)
}
