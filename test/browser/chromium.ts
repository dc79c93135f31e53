import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { chromium, type BrowserContext } from 'playwright-core'
import { findBrowser, howToInstall } from '../../.ci/browser.mjs'

const quiet = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

export interface OpenBrowser {
  readonly context: BrowserContext
  close(): Promise<void>
}

/** The browser of this machine with a profile of its own; without one the tests fail and say how to get it. */
export async function openBrowser(): Promise<OpenBrowser> {
  const executablePath = findBrowser()
  if (executablePath === null) throw new Error(howToInstall)
  const profile = mkdtempSync(join(tmpdir(), 'floorbook-profile-'))
  const context = await chromium.launchPersistentContext(profile, { executablePath, headless: true, args: quiet })
  return {
    context,
    close: async () => {
      await context.close()
      rmSync(profile, { recursive: true, force: true, maxRetries: 5 })
    },
  }
}
