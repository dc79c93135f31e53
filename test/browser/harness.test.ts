import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { BrowserContext } from 'playwright-core'
import { openBrowser } from './chromium.js'
import { figures, overflow, visit, type Visit } from './visit.js'

const folder = mkdtempSync(join(tmpdir(), 'floorbook-pages-'))
const policy = `default-src 'none'; script-src 'self'; style-src 'self'; img-src 'self'`
let context: BrowserContext

/** Opens a page with this body; the page's own policy comes first. */
async function open(body: string, withPolicy = true): Promise<Visit> {
  const head = withPolicy ? `<meta http-equiv="Content-Security-Policy" content="${policy}">` : ''
  const file = join(folder, 'page.html')
  writeFileSync(
    file,
    `<!doctype html><html lang="en"><head><meta charset="utf-8">${head}<title>p</title></head><body>${body}`,
  )
  return await visit(context, file, { width: 390, height: 800 })
}

beforeAll(async () => {
  context = await (await openBrowser()).newContext()
})

afterAll(async () => {
  await context?.browser()?.close()
  rmSync(folder, { recursive: true, force: true })
})

describe('what the browser tests look for', () => {
  it('finds nothing to complain about on a plain page', async () => {
    const seen = await open('<p>fine</p>')
    expect(seen).toMatchObject({ complaints: [], outgoing: [], missing: [] })
    expect(await overflow(seen.page)).toBe(0)
    expect(await figures(seen.page)).toEqual([])
  })

  it('notices what breaks the policy', async () => {
    const { complaints } = await open('<p style="color: red">inline</p>')
    expect(complaints.join('\n')).toContain('style-src')
  })

  it('notices an exception and a message', async () => {
    const { complaints } = await open('<script>console.error("said"); throw new Error("thrown")</script>', false)
    expect(complaints).toEqual(['said', 'thrown'])
  })

  it('notices a request that leaves the page, and a file that is gone', async () => {
    const { outgoing, missing } = await open('<img src="http://site.example/a.png"><img src="gone.png">', false)
    expect(outgoing).toEqual(['http://site.example/a.png'])
    expect(missing.some(url => url.endsWith('/gone.png'))).toBe(true)
  })

  it('notices a page wider than the window', async () => {
    const { page } = await open('<table width="500"><tr><td>wide</td></tr></table>')
    expect(await overflow(page)).toBeGreaterThan(100)
  })

  it('counts curves that are drawn and none that are not', async () => {
    const line = '<path d="M0 0L90 40" fill="none" stroke="#000"/>'
    const { page } = await open(
      `<svg width="100" height="50">${line}<path d="M0 0L90 40" fill="none"/><path d="M0 0L90 40" fill="none" stroke="#000" visibility="hidden"/><text x="5" y="20">total</text></svg>`,
    )
    expect(await figures(page)).toEqual([{ width: 100, height: 50, curves: 1, labels: 1 }])
  })
})
