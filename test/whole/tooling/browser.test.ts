import { chmodSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { findBrowser, stepsToInstall } from '../../../.ci/browser.mjs'
import { throwaway } from '../folder.js'

describe('the search for a browser', () => {
  it('takes the first on the path', () => {
    const folder = throwaway({ 'a/readme': '', 'b/chromium': '#!/bin/sh\n' })
    chmodSync(join(folder, 'b/chromium'), 0o755)
    expect(findBrowser({ PATH: `${folder}/a:${folder}/b` })).toBe(join(folder, 'b/chromium'))
  })

  it('takes the one that is named, and no other in its place', () => {
    const folder = throwaway({ mine: '#!/bin/sh\n' })
    expect(findBrowser({ PATH: process.env.PATH, CHROME_PATH: join(folder, 'gone') })).toBe(null)
    chmodSync(join(folder, 'mine'), 0o755)
    expect(findBrowser({ PATH: '', CHROME_PATH: join(folder, 'mine') })).toBe(join(folder, 'mine'))
  })
})

describe('the installation of a browser', () => {
  const update = ['apt-get', 'update']
  const install = ['apt-get', 'install', '-y', 'chromium']

  it('is left to Debian where the machine may be changed', () => {
    expect(stepsToInstall({ platform: 'linux', root: true, env: {} })).toEqual([update, install])
    expect(stepsToInstall({ platform: 'linux', root: false, env: { CI: 'true' } })).toEqual([
      ['sudo', '-n', ...update],
      ['sudo', '-n', ...install],
    ])
  })

  it('is left to the person elsewhere', () => {
    expect(stepsToInstall({ platform: 'linux', root: false, env: {} })).toEqual([])
    expect(stepsToInstall({ platform: 'darwin', root: true, env: { CI: 'true' } })).toEqual([])
    expect(stepsToInstall({ platform: 'linux', root: true, env: { CHROME_PATH: '/gone' } })).toEqual([])
  })
})
