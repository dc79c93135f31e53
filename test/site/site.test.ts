import { posix } from 'node:path'
import { beforeAll, describe, expect, it } from 'vitest'
import type { SiteInput } from '../../src/site/input.js'
import { renderSite, type SiteFiles } from '../../src/site/render.js'
import { fixtureAssessment } from '../report/fixture.js'
import { uncertainAssessment } from '../report/uncertain-fixture.js'

const message = '`mas` is no key of a resonator; the nearest is `mass` <b>&'
const problem = {
  severity: 'error',
  code: 'unknown-key',
  place: { file: 'budgets/whimbrel/budget.yaml', line: 3, column: 5 },
  message,
} as const

const input: SiteInput = {
  project: { root: '/nowhere', title: 'Sensors <of> the shore', subtitle: 'drafts & records', date: '2026-03-14' },
  results: [
    { sensor: 'tern', assessment: fixtureAssessment('tern'), problems: [] },
    { sensor: 'plover', assessment: uncertainAssessment('plover'), problems: [] },
    { sensor: 'avocet', assessment: fixtureAssessment('avocet'), problems: [] },
    { sensor: 'whimbrel', assessment: null, problems: [problem] },
  ],
}

let files: SiteFiles = new Map()
let pages: ReadonlyMap<string, string> = new Map()
beforeAll(async () => {
  files = (await renderSite(input)).files
  pages = new Map([...files].flatMap(([path, content]) => (path.endsWith('.html') ? [[path, String(content)]] : [])))
})

const page = (path: string): string => pages.get(path) ?? ''
/** What a reader sees: no tags, entities read. */
const text = (html: string): string =>
  html
    .replace(/<(style|script|svg|math)\b.*?<\/\1>/gs, ' ')
    .replaceAll('<wbr>', '')
    .replace(/<[^>]*>/g, ' ')
    .replace(/&#(\d+);/g, (_, code: string) => String.fromCodePoint(Number(code)))
    .replaceAll('&lt;', '<')
    .replaceAll('&gt;', '>')
    .replaceAll('&quot;', '"')
    .replaceAll('&amp;', '&')
    .replace(/[\s\u00a0]+/g, ' ')

describe('the site', () => {
  it('has every page at its address', () => {
    const expected = ['index.html', 'catalogue/index.html', 'conventions/index.html', 'tern/draft/index.html']
    for (const path of [...expected, 'tern/2.1/index.html', 'avocet/draft/index.html', 'whimbrel/draft/index.html'])
      expect([...pages.keys()]).toContain(path)
    for (const name of ['curves.csv', 'curves.json', 'figure.svg'])
      for (const revision of ['draft', '2.1']) expect([...files.keys()]).toContain(`tern/${revision}/${name}`)
    expect([...files.keys()]).toEqual(expect.arrayContaining(['schema/budget-1.json', 'schema/part-1.json']))
    expect([...pages.keys()].filter(path => path.startsWith('whimbrel/'))).toEqual(['whimbrel/draft/index.html'])
  })

  it('is the same, byte for byte, however often and in whatever order it is built', async () => {
    const again = await renderSite({ ...input, results: input.results.toReversed() })
    expect([...again.files.keys()].toSorted()).toEqual([...files.keys()].toSorted())
    for (const [path, content] of again.files)
      expect(Buffer.from(content).equals(Buffer.from(files.get(path) ?? '')), path).toBe(true)
  })

  it('shows no undefined, NaN, infinity or object', () => {
    for (const [path, html] of pages) {
      expect(text(html), path).not.toMatch(/\b(undefined|NaN|Infinity|null)\b|\[object/)
      expect(html, path).not.toMatch(/="[^"]*\b(undefined|NaN|Infinity)\b/)
    }
  })

  it('tells nothing of the machine that built it', () => {
    for (const [path, content] of files) {
      if (typeof content !== 'string') continue
      expect(content, path).not.toContain(process.cwd())
      expect(content, path).not.toContain(process.version)
      expect(content, path).not.toContain('/nowhere')
    }
  })

  it('links only to files and anchors that are there, relatively and by file name', () => {
    for (const [path, html] of pages) {
      for (const [, link] of html.matchAll(/\s(?:href|src)="([^"]*)"/g)) {
        if (/^(https?|mailto):/.test(link)) continue
        const [file, anchor] = link.split('#')
        const target = file === '' ? path : posix.join(posix.dirname(path), file)
        expect(link, path).not.toMatch(/^[/]|^[a-z]+:/)
        expect(files.has(target), `${path} → ${link}`).toBe(true)
        if (anchor !== undefined) expect(page(target), `${path} → ${link}`).toContain(` id="${anchor}"`)
      }
    }
  })

  it('refers from its styles only to files that are there', () => {
    for (const [path, content] of files) {
      if (!path.endsWith('.css')) continue
      for (const [, link] of String(content).matchAll(/url\(([^)]*)\)/g))
        expect(files.has(posix.join(posix.dirname(path), link)), `${path} → ${link}`).toBe(true)
    }
  })

  it('has no id twice, no inline style, no script, and the policy first', () => {
    for (const [path, html] of pages) {
      const ids = [...html.matchAll(/ id="([^"]*)"/g)].map(match => match[1])
      expect(new Set(ids).size, path).toBe(ids.length)
      expect(html, path).not.toMatch(/<[^>]* style=/)
      expect(html, path).not.toMatch(/<script|<[^>]* on[a-z]+=/)
      expect(html, path).toMatch(/<head>\n<meta http-equiv="Content-Security-Policy" content="default-src 'none'; /)
    }
  })

  it('orders its headings without a gap, under one h1', () => {
    for (const [path, html] of pages) {
      const levels = [...html.matchAll(/<h([1-6])[\s>]/g)].map(match => Number(match[1]))
      expect(levels[0], path).toBe(1)
      expect(levels.filter(level => level === 1), path).toHaveLength(1)
      levels.forEach((level, i) => expect(level, path).toBeLessThanOrEqual((levels[i - 1] ?? 0) + 1))
    }
  })

  it('shows requirements on the report and on the front page', () => {
    expect(text(page('index.html'))).toContain('Requirements 2 of 4 missed')
    const html = text(page('plover/draft/index.html'))
    expect(html).toContain('proposal as promised Total below 20 aN/√Hz 16.3(5) aN/√Hz at 1.2435 MHz met by 1.8 dB')
    expect(html).toContain('missed by 3.5 dB, 15 standard uncertainties')
    expect(text(page('tern/draft/index.html'))).not.toContain('Requirements')
  })

  it('shows what is uncertain, with bars, and links evidence to the bibliography', () => {
    const html = page('plover/draft/index.html')
    expect(html.match(/<path class="bar-share" d="M0 0h(64|36)v6H0z"\/>/g)).toHaveLength(2)
    expect(text(html)).toContain('fundamental.temperature 4.1(1) K 1 % → 0.43 % 0.65 aN/√Hz 64.0 %')
    const row = html.slice(html.indexOf('id="root-fundamental.temperature"'))
    const number = /href="#reference-(\d+)"/.exec(row)?.[1] ?? 'none'
    expect(text(html)).toContain('A. Nobody, Ringdowns, J. Invented 3, 14 (2025) https://doi.org/10.1234/abc')
    expect(html).toContain(`<li id="reference-${number}">A. Nobody, Ringdowns`)
    expect(text(page('tern/draft/index.html'))).toContain('so that none of these numbers has one')
  })

  it('draws the band of the total and the variants, also in the figure that stands alone', () => {
    for (const path of ['plover/draft/index.html', 'plover/draft/figure.svg']) {
      expect(String(files.get(path)), path).toContain('class="figure-spread figure-fill"')
      expect(String(files.get(path)), path).toContain('cold: one kelvin')
    }
    expect(page('tern/draft/index.html')).not.toContain('figure-spread')
  })

  it('makes every sideways scroll box reachable and named', () => {
    const boxes = page('tern/draft/index.html').match(/<div class="scroll[^>]*>/g) ?? []
    expect(boxes.length).toBeGreaterThan(8)
    expect(new Set(boxes).size).toBe(boxes.length)
    for (const box of boxes) expect(box).toMatch(/role="region" aria-label="[^"]+" tabindex="0"/)
  })

  it('has a style rule for every class that stands for an inline style', () => {
    const sheet = String(files.get('assets/katex.css'))
    const used = new Set([...pages.values()].flatMap(html => html.match(/\bt[0-9a-f]{8}\b/g) ?? []))
    expect(used.size).toBeGreaterThan(10)
    for (const name of used) expect(sheet).toContain(`.${name}.${name}.${name}.${name}{`)
  })
})

describe('a project without budgets', () => {
  it('has a front page that says what a budget is', async () => {
    const empty = await renderSite({ ...input, results: [] })
    expect(text(String(empty.files.get('index.html')))).toContain('There is no budget yet.')
    expect([...empty.files.keys()].filter(path => path.endsWith('/draft/index.html'))).toEqual([])
  })
})

describe('text of strangers', () => {
  it('stays text', () => {
    const html = page('tern/draft/index.html')
    expect(html).toContain('<h1>Membrane &lt;force&gt; sensor &amp; window</h1>')
    expect(html).not.toContain('<b>power</b>')
    expect(text(html)).toContain('<b>power</b> & more at the window')
    expect(page('whimbrel/draft/index.html')).not.toContain('<b>')
    expect(text(page('whimbrel/draft/index.html'))).toContain(`budgets/whimbrel/budget.yaml:3:5: ${message}`)
    expect(text(page('index.html'))).toContain('Sensors <of> the shore')
  })

  it('links to http, https and mailto only', () => {
    const html = page('tern/draft/index.html')
    expect(html).toContain('<a href="https://example.org/note">the note</a>')
    expect(html).not.toMatch(/href="javascript/i)
  })

  it('is no template', async () => {
    const assessment = fixtureAssessment('tern')
    const budget = { ...assessment.budget, title: 'on fire=1 {{ 7 * 191 }}{% raw %}', summary: '---js\n{{ 7 * 191 }}' }
    const { files: rendered } = await renderSite({
      ...input,
      results: [{ sensor: 'tern', assessment: { ...assessment, budget }, problems: [] }],
    })
    const html = String(rendered.get('tern/draft/index.html'))
    expect(text(html)).toContain('on fire=1 {{ 7 * 191 }}{% raw %}')
    expect(html).not.toContain('1337')
  })
})
