// Runs every test once and ends in one line, `412 passed, 0 failed`, counted from the run. Arguments go to vitest.
import { spawnSync } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { ensureBrowser } from './browser.mjs'

const here = join(fileURLToPath(import.meta.url), '..')

/** @param {string} file */
function counted(file) {
  try {
    return /** @type {{ passed: number, failed: number }} */ (JSON.parse(readFileSync(file, 'utf8')))
  } catch {
    // Vitest ended before its reporter was called: the run itself is what failed.
    return { passed: 0, failed: 1 }
  }
}

function main() {
  ensureBrowser()
  const folder = mkdtempSync(join(tmpdir(), 'floorbook-counts-'))
  const counts = join(folder, 'counts.json')
  const vitest = join(here, '..', 'node_modules', 'vitest', 'vitest.mjs')
  const reporters = ['--reporter=default', `--reporter=${join(here, 'reporter.mjs')}`]
  const run = spawnSync(process.execPath, [vitest, 'run', ...reporters, ...process.argv.slice(2)], {
    stdio: 'inherit',
    env: { ...process.env, FLOORBOOK_COUNTS: counts },
  })
  const { passed, failed } = counted(counts)
  rmSync(folder, { recursive: true, force: true })
  // A run that vitest itself calls bad is never counted as clean.
  const shown = failed === 0 && (run.status !== 0 || passed === 0) ? 1 : failed
  console.log(`${passed} passed, ${shown} failed`)
  process.exitCode = shown === 0 ? 0 : 1
}

main()
