import { pathToFileURL } from 'node:url'
import type { BrowserContext, Page } from 'playwright-core'

/** What a person would notice, or never notice, while a page opens. */
export interface Visit {
  readonly page: Page
  /** Errors and warnings on the console, exceptions and violations of the content policy. */
  readonly complaints: readonly string[]
  /** Addresses asked for that are not files. */
  readonly outgoing: readonly string[]
  /** Files asked for that could not be read. */
  readonly missing: readonly string[]
}

export interface Window {
  readonly width: number
  readonly height: number
  readonly scheme?: 'light' | 'dark'
}

/** Opens a file of the site as a double click would, watching everything from before its first byte. */
export async function visit(context: BrowserContext, file: string, window: Window): Promise<Visit> {
  const page = await context.newPage()
  const complaints: string[] = []
  const outgoing: string[] = []
  const missing: string[] = []
  page.on('console', message => {
    if (message.type() === 'error' || message.type() === 'warning') complaints.push(message.text())
  })
  page.on('pageerror', error => complaints.push(error.message))
  page.on('requestfailed', request => missing.push(request.url()))
  await page.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', event => {
      console.error(`policy: ${event.violatedDirective} ${event.blockedURI}`)
    })
  })
  await page.route('**/*', async route => {
    const url = route.request().url()
    if (/^(file|data|blob|about):/.test(url)) return await route.continue()
    outgoing.push(url)
    return await route.abort()
  })
  await page.setViewportSize({ width: window.width, height: window.height })
  await page.emulateMedia({ colorScheme: window.scheme ?? 'light' })
  await page.goto(pathToFileURL(file).href, { waitUntil: 'load' })
  await page.evaluate(() => document.fonts.ready.then(() => undefined))
  return { page, complaints, outgoing, missing }
}

/** By how many pixels the page is wider than the window. */
export function overflow(page: Page): Promise<number> {
  return page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)
}

export interface SeenFigure {
  readonly width: number
  readonly height: number
  /** Drawn curves: paths with a visible stroke that are longer than a tenth of the figure's width. */
  readonly curves: number
  readonly labels: number
}

/** Every picture of the page as it is drawn, not as it is written. */
export function figures(page: Page): Promise<readonly SeenFigure[]> {
  return page.$$eval('svg', all =>
    all.map(svg => {
      const box = svg.getBoundingClientRect()
      const drawn = [...svg.querySelectorAll('path')].filter(path => {
        const style = getComputedStyle(path)
        const shown = style.display !== 'none' && style.visibility === 'visible' && Number(style.opacity) > 0
        const size = path.getBoundingClientRect()
        return (
          shown && style.stroke !== 'none' && Number.parseFloat(style.strokeWidth) > 0 && size.width > box.width / 10
        )
      })
      const labels = [...svg.querySelectorAll('text')].filter(text => text.getBoundingClientRect().width > 0)
      return { width: box.width, height: box.height, curves: drawn.length, labels: labels.length }
    }),
  )
}
