import { execFileSync } from 'node:child_process'
import { describe, expect, it } from 'vitest'
import { dateOf } from '../../src/cli/date.js'
import { throwaway } from '../whole/folder.js'

const { PATH } = process.env

describe('the date of a build', () => {
  it('is what SOURCE_DATE_EPOCH says, in UTC', () => {
    expect(dateOf('.', { PATH, SOURCE_DATE_EPOCH: '1772323199' })).toBe('2026-02-28')
    expect(dateOf('.', { PATH, SOURCE_DATE_EPOCH: '1772323200' })).toBe('2026-03-01')
  })

  it('is that of the commit, in UTC', () => {
    const folder = throwaway({ a: '' })
    const who = ['-c', 'user.name=A', '-c', 'user.email=a@example.org']
    const env = { PATH, GIT_COMMITTER_DATE: '2026-03-01T01:30:00+0200', GIT_AUTHOR_DATE: '2020-01-01T00:00:00Z' }
    execFileSync('git', ['init', '-q'], { cwd: folder, env })
    execFileSync('git', [...who, 'commit', '-q', '--allow-empty', '-m', 'first'], { cwd: folder, env })
    expect(dateOf(folder, { PATH })).toBe('2026-02-28')
    expect(dateOf(folder, { PATH, GIT_DIR: '/nowhere' })).toBe('2026-02-28')
  })

  it('is unknown outside git', () => {
    expect(dateOf(throwaway({ a: '' }), { PATH })).toBe(null)
    expect(dateOf(throwaway({ a: '' }), { PATH: '' })).toBe(null)
  })
})
