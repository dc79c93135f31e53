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

const open = async (page: string, window: Window) => await visit(context, join(site.folder, page), window)

interface Look {
  readonly complaints: readonly string[]
  readonly outgoing: readonly string[]
  readonly missing: readonly string[]
  /** Pixels by which the page is wider than the window. */
  readonly overflow: number
  /** Links to files or places that do not exist. */
  readonly dead: readonly string[]
}

async function look(name: string, window: Window): Promise<Look> {
  const { page, complaints, outgoing, missing } = await open(name, window)
  const links = await page.$$eval('a[href]', all => all.map(link => (link as HTMLAnchorElement).href))
  const anchors = await page.$$eval('[id]', all => all.map(one => one.id))
  const here = page.url()
  const wider = await overflow(page)
  await page.close()
  const dead = links.filter(link => link.startsWith('file:') && leadsNowhere(link, here, anchors))
  return { complaints, outgoing, missing, overflow: wider, dead }
}

describe('the demo site, opened from its folder', () => {
  it('has a front page and a report of every budget', () => {
    expect(site.sensors.length).toBeGreaterThanOrEqual(3)
    expect(site.pages).toContain('index.html')
    for (const sensor of site.sensors) expect(site.pages).toContain(`${sensor}/draft/index.html`)
  })

  it.each([
    ['on a desk', desk],
    ['in the dark', dark],
    ['on a telephone', phone],
  ])(
    'opens every page %s: no complaint, request, missing file, dead link or sideways scroll',
    async (_name, window) => {
      const seen: Record<string, Look> = {}
      for (const page of site.pages) seen[page] = await look(page, window)
      const clean: Look = { complaints: [], outgoing: [], missing: [], overflow: 0, dead: [] }
      expect(seen).toEqual(Object.fromEntries(site.pages.map(page => [page, clean])))
    },
  )

  it.each([
    ['wide', desk, 600],
    ['narrow', phone, 250],
  ])('shows the figure of every report: %s', async (_name, window, width) => {
    for (const sensor of site.sensors) {
      const { page } = await open(`${sensor}/draft/index.html`, window)
      // The first picture is the answer; it stands above all others.
      const [figure] = (await figures(page)).filter(one => one.width > width && one.height > 150)
      // The total, a limit and at least two contributions, with their names and the axes' numbers.
      expect(figure?.curves, sensor).toBeGreaterThanOrEqual(4)
      expect(figure?.labels, sensor).toBeGreaterThanOrEqual(10)
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
