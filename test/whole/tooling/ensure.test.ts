import { describe, expect, it } from 'vitest'
import { installed } from '../../../.ci/ensure.mjs'
import { throwaway } from '../folder.js'

const lock = (packages: object) => JSON.stringify({ lockfileVersion: 3, packages })
const one = { version: '1.0.0', integrity: 'sha512-a' }
const wanted = lock({ '': {}, 'node_modules/one': one, 'node_modules/other': { ...one, optional: true } })

function project(found: object | null, files: Record<string, string> = { 'node_modules/one/package.json': '{}' }) {
  const hidden: Record<string, string> = found === null ? {} : { 'node_modules/.package-lock.json': lock(found) }
  return throwaway({ 'package-lock.json': wanted, ...hidden, ...files })
}

describe('the look whether packages must be installed', () => {
  it('is content with the packages of the lock, an optional one missing', () => {
    expect(installed(project({ 'node_modules/one': one }))).toBe(true)
  })

  it('notices a fresh clone', () => {
    expect(installed(project(null, {}))).toBe(false)
  })

  it('notices another version, another content and a package too many', () => {
    expect(installed(project({ 'node_modules/one': { ...one, version: '1.0.1' } }))).toBe(false)
    expect(installed(project({ 'node_modules/one': { ...one, integrity: 'sha512-b' } }))).toBe(false)
    expect(installed(project({ 'node_modules/one': one, 'node_modules/left': one }))).toBe(false)
  })

  it('notices a package whose folder is gone', () => {
    expect(installed(project({ 'node_modules/one': one }, {}))).toBe(false)
  })

  it('notices a damaged list', () => {
    expect(installed(throwaway({ 'package-lock.json': wanted, 'node_modules/.package-lock.json': '{"pack' }))).toBe(
      false,
    )
  })
})
