import { execFileSync } from 'node:child_process'
import { mkdirSync, mkdtempSync, rmSync, symlinkSync, truncateSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { FileRefusal } from '../../src/budget/file-source.js'
import { formatProblem } from '../../src/budget/format-problem.js'
import { NodeFiles } from '../../src/budget/node-files.js'
import { findProject } from '../../src/budget/project.js'
import { readBudget } from '../../src/budget/read-budget.js'
import { small } from '../budget/read.js'

let outer = ''
let root = ''

beforeAll(() => {
  outer = mkdtempSync(join(tmpdir(), 'floorbook-files-'))
  root = join(outer, 'project')
  mkdirSync(join(root, 'budgets/tern/data'), { recursive: true })
  mkdirSync(join(root, '.git'))
  writeFileSync(join(outer, 'secret.csv'), '1e6,1\n2e6,1\n')
  writeFileSync(join(root, 'budgets/tern/budget.yaml'), small)
  writeFileSync(join(root, 'budgets/tern/data/good.csv'), '1e6,1\n2e6,1\n')
  symlinkSync(join(outer, 'secret.csv'), join(root, 'budgets/tern/data/link.csv'))
  symlinkSync('good.csv', join(root, 'budgets/tern/data/inner-link.csv'))
  symlinkSync(outer, join(root, 'budgets/tern/out'))
  execFileSync('mkfifo', [join(root, 'budgets/tern/data/pipe.csv')])
  writeFileSync(join(root, 'budgets/tern/data/huge.csv'), '')
  truncateSync(join(root, 'budgets/tern/data/huge.csv'), 32 * 1024 * 1024 + 1)
})

afterAll(() => {
  rmSync(outer, { recursive: true, force: true })
})

function codeOf(path: string): string {
  try {
    new NodeFiles(root).read(path)
  } catch (error) {
    if (error instanceof FileRefusal) return error.code
    throw error
  }
  return 'read'
}

describe('files of a project', () => {
  it.each([
    ['budgets/tern/data/good.csv', 'read'],
    ['budgets/../budgets/tern/./data/good.csv', 'read'],
    ['budgets/tern/data/none.csv', 'missing'],
    ['budgets/tern/budget.yaml/x', 'missing'],
    ['../secret.csv', 'outside'],
    ['budgets/../../secret.csv', 'outside'],
    ['/etc/passwd', 'outside'],
    ['C:/secret.csv', 'outside'],
    ['budgets\\..\\secret.csv', 'outside'],
    ['budgets/tern/data/good.csv\0.yaml', 'outside'],
    ['', 'outside'],
    ['budgets/tern/data/link.csv', 'outside'],
    ['budgets/tern/data/inner-link.csv', 'outside'],
    ['budgets/tern/out/secret.csv', 'outside'],
    ['budgets/tern/data', 'not-regular'],
    ['budgets/tern/data/pipe.csv', 'not-regular'],
    ['budgets/tern/data/huge.csv', 'too-large'],
  ])('%s: %s', (path, code) => {
    expect(codeOf(path)).toBe(code)
  })

  it('does not list through a link', () => {
    expect(() => new NodeFiles(root).list('budgets/tern/out')).toThrow('links are not followed')
  })

  it('tells a table behind a link at the line that names it', () => {
    const noise = (file: string) =>
      `contributions:\n  stray: { kind: force-noise, into: drum, table: { file: ${file}, units: [Hz, N/√Hz] } }\n`
    for (const [file, reason] of [
      ['data/link.csv', 'is a link, and links are not followed'],
      ['out/secret.csv', 'is reached through a link, and links are not followed'],
      ['data/pipe.csv', 'is not a regular file'],
      ['../../../secret.csv', 'must be a path from the folder of this file that stays inside the project'],
    ] as const) {
      writeFileSync(join(root, 'budgets/tern/budget.yaml'), small + noise(file))
      const project = findProject({ cwd: root })
      const told = project === null ? [] : readBudget(project, 'tern').problems.map(formatProblem)
      expect(told).toEqual([expect.stringMatching(/^budgets\/tern\/budget\.yaml:18:58: /)])
      expect(told[0]).toContain(reason)
    }
    writeFileSync(join(root, 'budgets/tern/budget.yaml'), small)
  })
})

describe('the project', () => {
  it('is found from a folder inside it, not above its git root', () => {
    expect(findProject({ cwd: join(root, 'budgets/tern/data') })?.root).toBe(root)
    mkdirSync(join(outer, 'budgets'), { recursive: true })
    mkdirSync(join(outer, 'other/.git'), { recursive: true })
    expect(findProject({ cwd: join(outer, 'other') })).toBeNull()
    expect(findProject({ cwd: join(outer, 'other'), root: '../project' })?.root).toBe(root)
    expect(findProject({ cwd: root, root: 'budgets' })).toBeNull()
  })

  it('refuses names of folders that a page or a file system needs', () => {
    const names = ['draft', 'Catalogue', 'tern ', 'a..b', '.hidden', '-x', 'Tern', 'con', 'plover']
    for (const name of names) {
      mkdirSync(join(root, 'budgets', name), { recursive: true })
      writeFileSync(join(root, 'budgets', name, 'budget.yaml'), small)
    }
    const project = findProject({ cwd: root })
    expect(project?.sensors).toEqual(['Tern', 'plover'])
    const told = (project?.problems ?? []).map(formatProblem)
    expect(told).toHaveLength(8)
    expect(told.find(line => line.startsWith('budgets/tern/'))).toContain(
      'the folders `Tern` and `tern` differ only in case; rename one',
    )
    expect(told.find(line => line.startsWith('budgets/draft/'))).toContain('is a name that the site needs for itself')
    for (const name of names) rmSync(join(root, 'budgets', name), { recursive: true })
  })

  it.each([
    ['', { title: 'Noise budgets', subtitle: null, output: 'site' }, []],
    [
      'title: Shore birds\nsubtitle: Group\noutput: public/site\n',
      { title: 'Shore birds', subtitle: 'Group', output: 'public/site' },
      [],
    ],
    [
      'output: ../elsewhere\n',
      { output: 'site' },
      [
        'budgets/site.yaml:1:9: `../elsewhere` cannot be the site’s folder; choose a new folder inside the project, such as `site`',
      ],
    ],
    [
      'output: budgets\n',
      { output: 'site' },
      [
        'budgets/site.yaml:1:9: `budgets` cannot be the site’s folder; choose a new folder inside the project, such as `site`',
      ],
    ],
    [
      'titel: x\n',
      { title: 'Noise budgets' },
      ['budgets/site.yaml:1:1: unknown key `titel`; allowed are `title`, `subtitle`, `output`; did you mean `title`?'],
    ],
  ])('reads its settings %j', (text, settings, told) => {
    writeFileSync(join(root, 'budgets/site.yaml'), text)
    const project = findProject({ cwd: root })
    expect(project?.site).toMatchObject(settings)
    expect(project?.problems.map(formatProblem)).toEqual(told)
    rmSync(join(root, 'budgets/site.yaml'))
  })
})
