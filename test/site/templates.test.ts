import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'

const folder = new URL('../../templates/', import.meta.url).pathname
const templates = readdirSync(folder, { recursive: true, encoding: 'utf8' })
  .filter(path => path.endsWith('.njk'))
  .toSorted()
const source = (path: string): string => readFileSync(join(folder, path), 'utf8')
/** Template code taken out, so that only HTML is left; output becomes the word VALUE. */
const html = (path: string): string =>
  source(path)
    .replace(/\{#.*?#\}/gs, '')
    .replace(/\{%.*?%\}/gs, '')
    .replace(/\{\{.*?\}\}/gs, 'VALUE')

describe('templates', () => {
  it('are all found', () => {
    expect(templates).toContain('layouts/page.njk')
    expect(templates.filter(path => path.startsWith('pages/'))).toHaveLength(6)
  })

  it.each(templates)('%s marks nothing as safe and switches no escaping off', path => {
    expect(source(path)).not.toMatch(/\|\s*safe\b/)
    expect(source(path)).not.toMatch(/autoescape/)
  })

  it.each(templates)('%s carries no front matter', path => {
    expect(source(path)).not.toMatch(/^\s*---/)
  })

  it.each(templates)('%s quotes every attribute', path => {
    for (const tag of html(path).match(/<[a-z][^<>]*>/gi) ?? []) {
      expect(tag.replace(/="[^"]*"/g, ''), tag).not.toContain('=')
      expect(tag.replace(/="[^"]*"/g, ''), tag).not.toContain('VALUE')
    }
  })

  it.each(templates)('%s has no inline style, script or handler', path => {
    expect(html(path)).not.toMatch(/\sstyle=|<style|\son[a-z]+=|javascript:/i)
    for (const script of html(path).match(/<script[^>]*>/gi) ?? []) expect(script).toContain('src="')
  })

  it.each(templates)('%s links relatively', path => {
    for (const [, target] of html(path).matchAll(/\s(?:href|src)="([^"]*)"/g))
      expect(target).not.toMatch(/^(?:[a-z]+:|\/)/i)
  })

  it('put the content policy before everything else in head', () => {
    expect(source('layouts/page.njk')).toMatch(/<head>\s*<meta http-equiv="Content-Security-Policy"/)
  })

  it('take pictures through the filter that looks at them, only where pictures are', () => {
    const uses = templates.filter(path => /\|\s*svg\b/.test(source(path)))
    expect(uses).toEqual(['pages/front.njk', 'partials/parts.njk'])
  })
})
