import { existsSync, statSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import type { Browser, BrowserContext } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openBrowser } from './chromium.js'
import { buildDemoSite, type DemoSite } from './demo-site.js'
import { figures, overflow, visit, type Window } from './visit.js'

const desk: Window = { width: 1280, height: 900 }
const dark: Window = { ...desk, scheme: 'dark' }
const phone: Window = { width: 390, height: 844 }

let site: DemoSite
let browser: Browser
let context: BrowserContext

beforeAll(async () => {
  site = buildDemoSite()
  browser = await openBrowser()
  context = await browser.newContext()
})

afterAll(async () => {
  await browser?.close()
  site?.remove()
})

const open = async (page: string, window: Window, where = context) =>
  await visit(where, join(site.folder, page), window)

/** Opens every page in turn and keeps what `look` finds wrong, under the page's name. */
async function overAllPages(look: (page: string) => Promise<unknown>): Promise<Record<string, unknown>> {
  const found: Record<string, unknown> = {}
  expect(site.pages.length).toBeGreaterThanOrEqual(site.sensors.length + 1)
  for (const page of site.pages) found[page] = await look(page)
  return found
}

const everywhere = (value: unknown) => Object.fromEntries(site.pages.map(page => [page, value]))

describe('the demo site, opened from its folder', () => {
  it('has a front page and a report of every budget', () => {
    expect(site.sensors.length).toBeGreaterThanOrEqual(3)
    expect(site.pages).toContain('index.html')
    for (const sensor of site.sensors) expect(site.pages).toContain(`${sensor}/draft/index.html`)
  })

  it.each([
    ['wide', desk],
    ['dark', dark],
    ['narrow', phone],
  ])('opens every page without a complaint, a request or a missing file: %s', async (_name, window) => {
    const seen = await overAllPages(async name => {
      const { page, complaints, outgoing, missing } = await open(name, window)
      await page.close()
      return { complaints, outgoing, missing }
    })
    expect(seen).toEqual(everywhere({ complaints: [], outgoing: [], missing: [] }))
  })

  it('never scrolls sideways on a telephone', async () => {
    const seen = await overAllPages(async name => {
      const { page } = await open(name, phone)
      const pixels = await overflow(page)
      await page.close()
      return pixels
    })
    expect(seen).toEqual(everywhere(0))
  })

  it('leads only to files and places that exist', async () => {
    const seen = await overAllPages(async name => {
      const { page } = await open(name, desk)
      const targets = await page.$$eval('a[href]', all => all.map(link => (link as HTMLAnchorElement).href))
      const anchors = await page.$$eval('[id]', all => all.map(one => one.id))
      const here = page.url()
      await page.close()
      return targets.filter(target => target.startsWith('file:') && leadsNowhere(target, here, anchors))
    })
    expect(seen).toEqual(everywhere([]))
  })

  it.each([
    ['wide', desk, 600],
    ['narrow', phone, 250],
  ])('shows the figure of every report: %s', async (_name, window, width) => {
    for (const sensor of site.sensors) {
      const { page } = await open(`${sensor}/draft/index.html`, window)
      const [largest] = [...(await figures(page))].sort((a, b) => b.width * b.height - a.width * a.height)
      expect(largest.width, sensor).toBeGreaterThan(width)
      expect(largest.height, sensor).toBeGreaterThan(150)
      // The total, a limit and at least two contributions.
      expect(largest.curves, sensor).toBeGreaterThanOrEqual(4)
      expect(largest.labels, sensor).toBeGreaterThanOrEqual(6)
      await page.close()
    }
  })

  it('shows a small curve of every sensor on the front page', async () => {
    const { page } = await open('index.html', desk)
    const drawn = (await figures(page)).filter(figure => figure.curves > 0 && figure.width > 50 && figure.height > 20)
    expect(drawn.length).toBeGreaterThanOrEqual(site.sensors.length)
    await page.close()
  })

  it('sets the equations of a report', async () => {
    for (const sensor of site.sensors) {
      const { page } = await open(`${sensor}/draft/index.html`, desk)
      const heights = await page.$$eval('.katex', all => all.map(one => one.getBoundingClientRect().height))
      expect(heights.filter(height => height > 8).length, sensor).toBeGreaterThanOrEqual(4)
      expect(await page.locator('.katex-error').count(), sensor).toBe(0)
      await page.close()
    }
  })

  it('needs no scripts', async () => {
    const without = await browser.newContext({ javaScriptEnabled: false })
    for (const sensor of site.sensors) {
      const page = await without.newPage()
      await page.goto(`file://${join(site.folder, sensor, 'draft', 'index.html')}`)
      expect(await page.locator('svg').first().isVisible(), sensor).toBe(true)
      expect(await page.locator('h1').first().innerText(), sensor).not.toBe('')
    }
    await without.close()
  })
})

function leadsNowhere(target: string, here: string, anchors: readonly string[]): boolean {
  const url = new URL(target)
  const anchor = decodeURIComponent(url.hash.slice(1))
  url.hash = ''
  const file = fileURLToPath(url)
  if (!existsSync(file) || !statSync(file).isFile()) return true
  return url.href === here.replace(/#.*/, '') && anchor !== '' && !anchors.includes(anchor)
}
