import { spawnSync } from 'node:child_process'
import { symlinkSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { describe, expect, it } from 'vitest'
import { throwaway } from '../folder.js'

const good = "import { expect, it } from 'vitest'\nit('holds', () => expect(1).toBe(1))\n"

/** Runs the project's test command on another folder of tests; the last line and the exit code. */
function run(files: Record<string, string>) {
  const folder = throwaway({ 'package.json': '{"type":"module"}', ...files })
  symlinkSync(resolve('node_modules'), join(folder, 'node_modules'), 'junction')
  const { stdout, status } = spawnSync(process.execPath, [resolve('.ci/test.mjs'), '--root', folder], {
    encoding: 'utf8',
    env: { ...process.env, VITEST: undefined, VITEST_MODE: undefined, VITEST_POOL_ID: undefined },
  })
  return { line: stdout.trimEnd().split('\n').at(-1), status }
}

describe('the counted line', () => {
  it('counts what passed', () => {
    expect(run({ 'a.test.js': good, 'b.test.js': good })).toEqual({ line: '2 passed, 0 failed', status: 0 })
  })

  it('counts a failed test', () => {
    const bad = good.replace('toBe(1)', 'toBe(2)')
    expect(run({ 'a.test.js': good, 'b.test.js': bad })).toEqual({ line: '1 passed, 1 failed', status: 1 })
  })

  it('counts a file that does not load', () => {
    expect(run({ 'a.test.js': good, 'b.test.js': 'import "./gone.js"\n' })).toEqual({
      line: '1 passed, 1 failed',
      status: 1,
    })
  })

  it('counts a skipped test as failed', () => {
    const skipped = good.replace("it('holds'", "it['skip']('holds'")
    expect(run({ 'a.test.js': good, 'b.test.js': skipped })).toEqual({ line: '1 passed, 1 failed', status: 1 })
  })

  it('counts a failing hook and the test that did not run for it', () => {
    const hook = `${good}\nimport { beforeAll } from 'vitest'\nbeforeAll(() => { throw new Error('no') })\n`
    expect(run({ 'a.test.js': good, 'b.test.js': hook })).toEqual({ line: '1 passed, 2 failed', status: 1 })
  })

  it('counts an error outside tests', () => {
    const late = `${good}\nvoid Promise.reject(new Error('late'))\n`
    expect(run({ 'a.test.js': late })).toEqual({ line: '1 passed, 1 failed', status: 1 })
  })

  it('is red without tests', () => {
    expect(run({ 'readme.md': '' })).toEqual({ line: '0 passed, 1 failed', status: 1 })
  })
})
