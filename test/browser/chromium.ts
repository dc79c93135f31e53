import { chromium, type Browser } from 'playwright-core'
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

/** The browser of this machine with a new profile; without one the tests fail and say how to get it. */
export async function openBrowser(): Promise<Browser> {
  const executablePath = findBrowser()
  if (executablePath === null) throw new Error(howToInstall)
  return await chromium.launch({ executablePath, headless: true, args: quiet })
}
