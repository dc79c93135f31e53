import { readdirSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it, vi } from 'vitest'
import { writeNew } from '../../src/cli/write-new.js'
import { throwaway } from '../whole/folder.js'

const full = Object.assign(new Error('ENOSPC: no space left on device, link'), { code: 'ENOSPC', syscall: 'link' })

vi.mock('node:fs', async original => ({
  ...(await original<typeof import('node:fs')>()),
  linkSync: () => {
    throw full
  },
}))

describe('a disk that is full', () => {
  it.each([
    ['no folder', { 'budgets/notes.txt': '' }, ['notes.txt']],
    ['the folder that was there', { 'budgets/tern/data.csv': '' }, ['tern', 'tern/data.csv']],
  ])('leaves %s behind', (_what, files: Record<string, string>, left) => {
    const budgets = join(throwaway(files), 'budgets')
    expect(() => writeNew(budgets, 'tern', 'format: 1\n')).toThrow(full)
    expect(readdirSync(budgets, { recursive: true, encoding: 'utf8' }).map(String).sort()).toEqual(left)
  })
})
