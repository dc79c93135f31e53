import { describe, expect, it } from 'vitest'
import { declarations } from '../../src/catalogue/declarations.js'
import { markdownHtml } from '../../src/report/markdown.js'
import { createTypesetter } from '../../src/report/typeset.js'

describe('typeset', () => {
  it('gives HTML and MathML without an inline style', () => {
    const html = createTypesetter().display('S = \\frac{\\sqrt{x}}{2}')
    expect(html).toContain('<math xmlns="http://www.w3.org/1998/Math/MathML" display="block">')
    expect(html).not.toContain('style=')
  })

  it('keeps every declaration of a style in its sheet', () => {
    const typesetter = createTypesetter()
    expect(typesetter.styles()).toBe('')
    typesetter.inline('x_1')
    expect(typesetter.styles()).toMatch(/^\.(t[0-9a-f]{8})\.\1\.\1\.\1\{height:[\d.]+em/m)
  })

  it('has one sheet whatever the order', () => {
    const sheet = (tex: readonly string[]): string => {
      const typesetter = createTypesetter()
      tex.forEach(each => typesetter.display(each))
      return typesetter.styles()
    }
    expect(sheet(['a^2', '\\frac12', '\\sqrt x'])).toBe(sheet(['\\sqrt x', 'a^2', '\\frac12']))
  })

  it.each([
    ['\\undefined', 'Undefined control sequence'],
    ['\\href{javascript:alert(1)}{x}', 'an equation may not use \\href'],
    ['\\includegraphics{x.png}', 'an equation may not use \\includegraphics'],
    ['\\text{µ}', 'unknownSymbol'],
  ])('refuses %s', (tex, reason) => {
    const render = () => createTypesetter().inline(tex)
    expect(render).toThrow(reason)
  })

  it('forgets definitions between calls', () => {
    const typesetter = createTypesetter()
    typesetter.inline('\\gdef\\mine{x}\\mine')
    expect(() => typesetter.inline('\\mine')).toThrow('Undefined control sequence')
  })

  it.each([...declarations.values()])('knows every sign of $kind', declaration => {
    const typesetter = createTypesetter()
    for (const { tex } of declaration.equations) expect(typesetter.display(tex)).toContain('class="katex')
    for (const tex of Object.keys(declaration.symbols)) expect(typesetter.inline(tex)).toContain('class="katex')
  })
})

describe('markdown', () => {
  it('keeps raw HTML as text', () => {
    expect(markdownHtml('a <img src=x onerror=alert(1)> b')).toBe('<p>a &lt;img src=x onerror=alert(1)&gt; b</p>\n')
  })

  it.each(['javascript:alert(1)', 'data:text/html,x', 'file:///etc/passwd', 'vbscript:x', ' javascript:x', '//host/x'])(
    'makes no link to %s',
    url => {
      expect(markdownHtml(`[x](${url})`)).not.toContain('<a ')
      expect(markdownHtml(`<${url.trim()}>`)).not.toContain('<a ')
    },
  )

  it('loads no picture', () => {
    expect(markdownHtml('![x](https://example.org/x.png)')).not.toContain('<img')
  })

  it.each(['https://example.org/a', 'http://example.org', 'mailto:someone@example.org'])('links to %s', url => {
    expect(markdownHtml(`[x](${url})`)).toContain(`<a href="${url}">x</a>`)
  })
})
