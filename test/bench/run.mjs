// Measures what a person waits for, each as a whole process: the budgets of budgets/ built, and one of them shown.
// Prints medians; the time of an empty Node process stands beside them, since it is part of both.
import { spawnSync } from 'node:child_process'
import { existsSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'

const root = join(fileURLToPath(import.meta.url), '..', '..', '..')
const command = join(root, 'dist', 'cli', 'main.js')
const runs = 5

/**
 * Seconds that one run of Node takes; a run that fails is no measurement.
 * @param {readonly string[]} words
 */
function seconds(words) {
  const start = performance.now()
  const { status, stderr } = spawnSync(process.execPath, words, { cwd: root, encoding: 'utf8' })
  const end = performance.now()
  if (status !== 0) throw new Error(`node ${words.join(' ')} ended with ${status}: ${stderr}`)
  return (end - start) / 1000
}

/** @param {readonly number[]} values */
function median(values) {
  return values.toSorted((a, b) => a - b)[(values.length - 1) / 2]
}

/**
 * @param {string} name
 * @param {readonly string[]} words
 */
function measure(name, words) {
  seconds(words)
  const times = Array.from({ length: runs }, () => seconds(words))
  const range = `${Math.min(...times).toFixed(3)} to ${Math.max(...times).toFixed(3)}`
  console.log(`${name.padEnd(34)} ${median(times).toFixed(3)} s   (${runs} runs, ${range})`)
}

function main() {
  const budgets = join(root, 'budgets')
  const sensors = readdirSync(budgets).filter(name => existsSync(join(budgets, name, 'budget.yaml')))
  measure('empty Node process', ['-e', ''])
  measure(`build of ${sensors.length} budgets`, [command, 'build'])
  for (const sensor of sensors) measure(`show ${sensor}`, [command, 'show', sensor])
  measure('check of all', [command, 'check'])
}

main()
