import { createHash } from 'node:crypto'
import katex from 'katex'

interface Typeset {
  readonly html: string
  /** Class name → declarations of the inline style that it replaces. */
  readonly rules: ReadonlyMap<string, string>
}

export interface Typesetter {
  /** TeX as HTML with MathML beside it, without one inline style. Throws on any TeX that KaTeX does not know. */
  display(tex: string): string
  inline(tex: string): string
  /** Style sheet for everything that this typesetter was given, sorted so that the order of pages does not show. */
  styles(): string
}

const cache = new Map<string, Typeset>()
const cacheLimit = 5000

/**
 * A typesetter for one build. Each distinct inline style of KaTeX becomes a class named by its content, because the
 * pages' content policy allows style sheets only. What was typeset before is remembered over builds.
 */
export function createTypesetter(): Typesetter {
  const used = new Map<string, string>()
  const take = (tex: string, display: boolean): string => {
    const entry = typeset(tex, display)
    for (const [name, body] of entry.rules) used.set(name, body)
    return entry.html
  }
  return { display: tex => take(tex, true), inline: tex => take(tex, false), styles: () => styleSheet(used) }
}

/** A class repeated four times outweighs every selector of KaTeX's own style sheet, as an inline style would. */
function styleSheet(rules: ReadonlyMap<string, string>): string {
  return [...rules]
    .toSorted(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, body]) => `${`.${name}`.repeat(4)}{${body}}\n`)
    .join('')
}

function typeset(tex: string, display: boolean): Typeset {
  const key = `${display ? 'd' : 'i'}${tex}`
  const known = cache.get(key)
  if (known !== undefined) return known
  const html = katex.renderToString(tex, {
    displayMode: display,
    output: 'htmlAndMathml',
    strict: 'error',
    trust: refuse,
    maxExpand: 200,
    macros: {},
  })
  const entry = withoutInlineStyles(html)
  if (cache.size >= cacheLimit) cache.clear()
  cache.set(key, entry)
  return entry
}

/** Left untrusted, a link or a picture would be typeset as its own source in red; an equation that holds one is wrong. */
function refuse({ command }: { readonly command: string }): never {
  throw new Error(`an equation may not use ${command}`)
}

/** KaTeX escapes its text, so a `style="` that stands in a tag is always KaTeX's own. */
function withoutInlineStyles(html: string): Typeset {
  const rules = new Map<string, string>()
  const rewritten = html.replace(/<[a-z][^<>]*>/g, tag => {
    const style = / style="([^"]*)"/.exec(tag)
    if (style === null) return tag
    const name = `t${createHash('sha256').update(style[1]).digest('hex').slice(0, 8)}`
    rules.set(name, style[1])
    const bare = tag.replace(style[0], '')
    return / class="/.test(bare)
      ? bare.replace(/ class="/, ` class="${name} `)
      : bare.replace(/^<([a-z]+)/, `<$1 class="${name}"`)
  })
  return { html: rewritten, rules }
}
