// Finds a Chromium or Chrome for the browser tests, and on a machine of its own (root, or CI) installs Debian's.
import { spawnSync } from 'node:child_process'
import { accessSync, constants, statSync } from 'node:fs'
import { delimiter, join } from 'node:path'
import { fileURLToPath } from 'node:url'

const names = ['chromium', 'chromium-browser', 'google-chrome-stable', 'google-chrome', 'chrome', 'microsoft-edge']

const places = [
  '/usr/lib/chromium/chromium',
  '/snap/bin/chromium',
  '/opt/google/chrome/chrome',
  '/Applications/Chromium.app/Contents/MacOS/Chromium',
  '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
  'C:\\Program Files\\Google\\Chrome\\Application\\chrome.exe',
  'C:\\Program Files (x86)\\Google\\Chrome\\Application\\chrome.exe',
]

export const howToInstall =
  'no Chromium or Chrome found for the browser tests: install one (Debian, Ubuntu: apt-get install -y chromium; ' +
  'macOS: brew install --cask chromium) or name one in CHROME_PATH'

/** @param {string} file */
function runnable(file) {
  try {
    accessSync(file, constants.X_OK)
    return statSync(file).isFile()
  } catch {
    return false
  }
}

/**
 * The program's path, or null.
 * @param {NodeJS.ProcessEnv} env
 */
export function findBrowser(env = process.env) {
  const named = env.CHROME_PATH
  if (named !== undefined && named !== '') return runnable(named) ? named : null
  const folders = (env.PATH ?? '').split(delimiter).filter(folder => folder !== '')
  const onPath = names.flatMap(name => folders.map(folder => join(folder, name)))
  return [...onPath, ...places].find(runnable) ?? null
}

/** @param {readonly string[]} words */
function run(words) {
  const root = process.getuid?.() === 0
  const [program, ...rest] = root ? words : ['sudo', '-n', ...words]
  return spawnSync(program, rest, {
    stdio: ['ignore', 2, 2],
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
  }).status
}

/** Installs a browser where none is found and the machine may be changed; says how to where it may not. */
export function ensureBrowser() {
  if (findBrowser() !== null) return
  const mayInstall = process.platform === 'linux' && (process.getuid?.() === 0 || Boolean(process.env.CI))
  if (mayInstall && !process.env.CHROME_PATH) {
    console.error('Installing Chromium for the browser tests …')
    if (run(['apt-get', 'update']) === 0) run(['apt-get', 'install', '-y', '--no-install-recommends', 'chromium'])
  }
  if (findBrowser() === null) console.error(howToInstall)
}

if (process.argv[1] === fileURLToPath(import.meta.url)) ensureBrowser()
