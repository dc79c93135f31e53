import { spawnSync } from 'node:child_process'
import { resolve } from 'node:path'
import { describe, expect, it } from 'vitest'
import { checkImports, importsOf } from '../../../.ci/check-imports.mjs'
import { throwaway } from '../folder.js'

const faults = (files: Record<string, string>) => checkImports(throwaway(files))

describe('check of the imports', () => {
  it('takes imports that point upwards, and types of the model from anywhere', () => {
    expect(
      faults({
        'physics/thermal.ts': "import type { Budget } from '../model/budget.js'\nexport const a = 1\n",
        'model/budget.ts': 'export interface Budget {}\n',
        'cli/main.ts': "import { a } from '../physics/thermal.js'\nimport { join } from 'node:path'\n",
      }),
    ).toEqual([])
  })

  it('refuses a room that uses one below it', () => {
    expect(faults({ 'engine/a.ts': "export const b = 1\nimport { x } from '../report/x.js'\n" })).toEqual([
      'src/engine/a.ts:2: engine must not import report, which stands below it',
    ])
  })

  it('refuses values of the model in the rooms above it', () => {
    expect(faults({ 'physics/a.ts': "import { Refusal } from '../model/problem.js'\n" })).toEqual([
      'src/physics/a.ts:1: physics must not import model, which stands below it',
    ])
  })

  it.each([
    ['figure', "import { readFileSync } from 'node:fs'"],
    ['browser', "import 'fs'"],
    ['quantity', "export * from 'path/posix'"],
    ['engine', "const fs = await import('node:fs')"],
    ['catalogue', "import {\n  join,\n} from 'node:path'"],
  ])('keeps %s free of Node', (room, text) => {
    const found = faults({ [`${room}/a.ts`]: `${text}\n` })
    expect(found).toHaveLength(1)
    expect(found[0]).toMatch(new RegExp(`^src/${room}/a\\.ts:1: ${room} must be free of Node and imports (node:)?\\w+`))
  })

  it('lets Node into the rooms that touch files', () => {
    expect(faults({ 'budget/a.ts': "import { readFileSync } from 'node:fs'\n" })).toEqual([])
  })

  it.each([
    "import { declaration } from '../catalogue/declarations/cavity.js'",
    "import '../catalogue/declarations.js'",
  ])('keeps declarations out of the engine: %s', text => {
    expect(faults({ 'engine/a.ts': `${text}\n` })[0]).toContain('the engine must not import catalogue/declarations')
  })

  it('refuses a circle, also one of types', () => {
    const found = faults({
      'model/a.ts': "import type { B } from './b.js'\n",
      'model/b.ts': "import type { C } from './c.js'\n",
      'model/c.ts': "export type { A } from './a.js'\n",
    })
    expect(found).toEqual(['src/model/a.ts:1: imports in a circle: model/a.ts → model/b.ts → model/c.ts → model/a.ts'])
  })

  it('refuses what lies in no room or outside', () => {
    expect(faults({ 'extra/a.ts': '', 'cli/b.ts': "import '../../test/x.js'\nimport '../extra/a.js'\n" })).toEqual([
      'src/cli/b.ts:1: imports ../../test/x.js, which lies outside src',
      'src/cli/b.ts:2: imports ../extra/a.js, which lies in no room',
      'src/extra/a.ts:1: lies in no room',
    ])
  })

  it('reads every form of import and none in a comment or a string', () => {
    const text = `// import a from './no-line.js'
/* import b from './no-block.js' */
const url = 'https://example.org/' ; import('./dynamic.js')
import './bare.js'
import type { T } from "./types.js"
import { type A, type B } from './only-types.js'
import c, { type D } from './mixed.js'
export { e } from './again.js'
`
    expect(importsOf(text)).toEqual([
      { specifier: './dynamic.js', typeOnly: false, line: 3 },
      { specifier: './bare.js', typeOnly: false, line: 4 },
      { specifier: './types.js', typeOnly: true, line: 5 },
      { specifier: './only-types.js', typeOnly: true, line: 6 },
      { specifier: './mixed.js', typeOnly: false, line: 7 },
      { specifier: './again.js', typeOnly: false, line: 8 },
    ])
  })

  it('is red as a command on a planted fault and where it reads nothing', () => {
    const run = (folder: string) => spawnSync(process.execPath, [resolve('.ci/check-imports.mjs'), folder])
    expect(run(throwaway({ 'src/cli/a.ts': '' })).status).toBe(0)
    expect(run(throwaway({ 'src/model/a.ts': "import '../cli/b.js'\n" })).status).toBe(1)
    expect(run(throwaway({ 'src/readme.md': '' })).stderr.toString()).toBe('no source files found\n')
    expect(run(throwaway({})).status).toBe(1)
  })
})
