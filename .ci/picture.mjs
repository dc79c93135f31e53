// Takes the README's picture of a report from the built site: npm run site, then node .ci/picture.mjs.
import { mkdir } from 'node:fs/promises'
import { join } from 'node:path'
import { fileURLToPath, pathToFileURL } from 'node:url'
import { chromium } from 'playwright-core'
import { findBrowser, howToInstall } from './browser.mjs'

const root = join(fileURLToPath(import.meta.url), '..', '..')
const executablePath = findBrowser()
if (executablePath === null) throw new Error(howToInstall)
const browser = await chromium.launch({ executablePath, args: ['--no-sandbox', '--disable-gpu'] })
const page = await browser.newPage({ viewport: { width: 1200, height: 1000 }, colorScheme: 'light' })
await page.goto(pathToFileURL(join(root, 'site', 'avocet', 'draft', 'index.html')).href)
await mkdir(join(root, 'templates', 'pictures'), { recursive: true })
await page.screenshot({ path: join(root, 'templates', 'pictures', 'report.png') })
await browser.close()
