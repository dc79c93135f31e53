import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import type { Io } from '../../src/cli/io.js'
import { outputOf, projectAround, projectOf } from '../../src/cli/project.js'
import { targetNamed, targetsInside } from '../../src/cli/targets.js'
import { throwaway } from '../whole/folder.js'

const ioIn = (cwd: string): Io => ({
  out: () => undefined,
  err: () => undefined,
  cwd,
  columns: null,
  color: false,
  interrupted: () => Promise.resolve(),
})

const budgets = { 'budgets/tern/budget.yaml': '', 'budgets/avocet/budget.yaml': '', 'budgets/shared/parts.yaml': '' }

describe('the budgets of a call', () => {
  it('are all of the project, sorted, shared parts left out', () => {
    const io = ioIn(throwaway(budgets))
    expect(targetsInside(projectOf(undefined, io), [], io).map(target => target.name)).toEqual(['avocet', 'tern'])
  })

  it('are those that it names, in its order, each once', () => {
    const folder = throwaway(budgets)
    const io = ioIn(folder)
    const names = ['tern', 'budgets/tern', 'budgets/tern/budget.yaml', join(folder, 'budgets/tern'), 'avocet']
    const targets = targetsInside(projectOf(undefined, io), names, io)
    expect(targets.map(({ name, file }) => ({ name, file }))).toEqual([
      { name: 'tern', file: 'budgets/tern/budget.yaml' },
      { name: 'avocet', file: 'budgets/avocet/budget.yaml' },
    ])
  })

  it('are found from a folder below the project', () => {
    const folder = throwaway(budgets)
    const io = ioIn(join(folder, 'budgets', 'avocet'))
    const project = projectOf(undefined, io)
    expect(project.root).toBe(folder)
    for (const name of ['.', 'budget.yaml', '../avocet', 'avocet']) {
      expect(targetNamed(project, name, io)).toMatchObject({ name: 'avocet', file: 'budgets/avocet/budget.yaml' })
    }
  })

  it('may lie outside of every project', () => {
    const io = ioIn(throwaway({ 'trial/budget.yaml': '', 'other.yaml': '' }))
    expect(projectAround(undefined, io)).toBe(null)
    expect(targetNamed(null, 'trial', io)).toMatchObject({ name: 'trial', file: 'trial/budget.yaml' })
    expect(targetNamed(null, 'other.yaml', io)).toMatchObject({ name: 'other', file: 'other.yaml' })
  })

  it('that are published lie inside', () => {
    const io = ioIn(throwaway({ ...budgets, 'trial/budget.yaml': '' }))
    const project = projectOf(undefined, io)
    expect(() => targetsInside(project, ['trial'], io)).toThrow(
      'no budget is called `trial`; there are `avocet`, `tern`',
    )
  })

  it.each([
    ['trn', 'no budget is called `trn`; there are `avocet`, `tern`; did you mean `tern`?'],
    ['shared', 'no budget is called `shared`; there are `avocet`, `tern`'],
    ['', 'no budget is called ``; there are `avocet`, `tern`'],
    ['a\0b', 'no budget is called `a\0b`; there are `avocet`, `tern`'],
    ['../../../etc/passwd/x', 'no budget is called `../../../etc/passwd/x`; there are `avocet`, `tern`'],
  ])('are refused with the names that there are: %j', (name, message) => {
    const io = ioIn(throwaway(budgets))
    expect(() => targetNamed(projectOf(undefined, io), name, io)).toThrow(message)
  })
})

describe('the project of a call', () => {
  it('is the one that --root names', () => {
    const folder = throwaway({ ...budgets, 'budgets/site.yaml': 'output: public/reports\n' })
    const project = projectOf(folder, ioIn(throwaway({ a: '' })))
    expect(project.root).toBe(folder)
    expect(outputOf(project)).toBe(join(folder, 'public', 'reports'))
  })

  it('is refused where there is none', () => {
    const io = ioIn(throwaway({ a: '' }))
    expect(() => projectOf(undefined, io)).toThrow(
      'no folder `budgets` here or above; make one, go to a project or name it with --root',
    )
    expect(() => projectOf('gone', io)).toThrow('--root: `gone` holds no folder `budgets`; name the folder that does')
  })
})
