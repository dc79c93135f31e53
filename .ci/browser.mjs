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

/**
 * The commands that install Debian's Chromium; none where the machine is a person's own, or where a browser was named.
 * @param {{ platform: string, root: boolean, env: NodeJS.ProcessEnv }} machine
 */
export function stepsToInstall({ platform, root, env }) {
  const own = !root && !env.CI
  if (platform !== 'linux' || own || env.CHROME_PATH) return []
  const steps = [
    ['apt-get', 'update'],
    ['apt-get', 'install', '-y', 'chromium'],
  ]
  return root ? steps : steps.map(step => ['sudo', '-n', ...step])
}

/** @param {readonly string[]} words */
function succeeds([program, ...rest]) {
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' }
  return spawnSync(program, rest, { stdio: ['ignore', 2, 2], env }).status === 0
}

/** Installs a browser where none is found and the machine may be changed; says how to where it may not. */
export function ensureBrowser() {
  if (findBrowser() !== null) return
  const steps = stepsToInstall({ platform: process.platform, root: process.getuid?.() === 0, env: process.env })
  if (steps.length > 0) console.error('Installing Chromium for the browser tests …')
  steps.every(succeeds)
  if (findBrowser() === null) console.error(howToInstall)
}

if (process.argv[1] === fileURLToPath(import.meta.url)) ensureBrowser()
