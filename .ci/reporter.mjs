// A reporter for vitest that writes how many tests passed and failed to the file named in FLOORBOOK_COUNTS.
import { writeFileSync } from 'node:fs'

/**
 * A test that did not run has not passed: skipped and pending ones count as failed, and so does a file that fails to
 * load, a hook that fails and every error outside tests.
 * @param {Iterable<import('vitest/node').TestModule>} modules
 * @param {number} errorsOutside
 */
export function count(modules, errorsOutside) {
  let passed = 0
  let failed = errorsOutside
  for (const one of modules) {
    for (const test of one.children.allTests()) {
      if (test.result().state === 'passed') passed++
      else failed++
    }
    failed += one.errors().length
    for (const suite of one.children.allSuites()) failed += suite.errors().length
    if (one.state() === 'queued' || one.state() === 'pending') failed++
  }
  return { passed, failed }
}

export default class CountReporter {
  /**
   * @param {readonly import('vitest/node').TestModule[]} modules
   * @param {readonly unknown[]} errors
   */
  onTestRunEnd(modules, errors) {
    const file = process.env.FLOORBOOK_COUNTS
    if (file !== undefined) writeFileSync(file, JSON.stringify(count(modules, errors.length)))
  }
}
