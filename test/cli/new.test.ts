import { existsSync, readFileSync, readdirSync, symlinkSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { starterText } from '../../src/budget/starter-text.js'
import { starters } from '../../src/budget/starters.js'
import { throwaway } from '../whole/folder.js'
import { snapshot } from '../whole/snapshot.js'
import { call } from './fake-io.js'

const project = (files: Record<string, string> = {}) => throwaway({ 'budgets/notes.txt': '', ...files })

describe('new', () => {
  it('writes a budget, says where, and leaves nothing else', async () => {
    const folder = project()
    const { code, out, err } = await call(['new', 'tern', '--like', 'membrane'], folder)
    expect({ code, err }).toEqual({ code: 0, err: '' })
    expect(out).toBe(
      'budgets/tern/budget.yaml is written; every value in it is assumed.\n' +
        'Next: floorbook check tern; floorbook show tern; floorbook serve\n',
    )
    const starter = starters.get('membrane')
    expect(readFileSync(join(folder, 'budgets/tern/budget.yaml'), 'utf8')).toBe(starter && starterText(starter, 'tern'))
    expect(readdirSync(join(folder, 'budgets')).toSorted()).toEqual(['notes.txt', 'tern'])
  })

  it.each([...starters.keys()])('writes a %s that check finds right', async name => {
    const folder = project()
    await call(['new', 'tern', '--like', name], folder)
    const { code, out, err } = await call(['check'], folder)
    expect(code).toBe(0)
    expect(out).toMatch(/^tern: \d/)
    expect(err.split('\n').filter(line => !/warning: back-action missing/.test(line))).toEqual([''])
  })

  it('joins data that lie in the folder already', async () => {
    const folder = project({ 'budgets/tern/data/floor.csv': '1,2\n' })
    expect(await call(['new', 'tern', '--like', 'drum'], folder)).toMatchObject({ code: 0 })
    expect(readdirSync(join(folder, 'budgets/tern')).toSorted()).toEqual(['budget.yaml', 'data'])
  })

  it('writes below --root', async () => {
    const folder = project()
    const { code, out } = await call(['--root', 'p', 'new', 'tern', '--like', 'drum'], throwaway({ 'p/budgets/x': '' }))
    expect({ code, out }).toMatchObject({ code: 0, out: expect.stringMatching(/^p\/budgets\/tern\/budget\.yaml /) })
    expect(existsSync(join(folder, 'budgets/tern'))).toBe(false)
  })

  it('lists its kinds', async () => {
    const { code, out } = await call(['new', '--help'], '.')
    expect(code).toBe(0)
    for (const name of starters.keys()) expect(out).toMatch(new RegExp(`^  ${name} +\\w`, 'm'))
  })

  const unfit =
    'is no name of a sensor: use letters, digits, `.`, `-` and `_`, and begin and end with a letter or digit'
  const kinds = '`membrane`, `drum`, `mirror`, `accelerometer`, `cantilever`, `particle`'
  const taken = 'budgets/tern/budget.yaml'

  it.each([
    [['new', 'tern'], "required option '--like <kind>' not specified"],
    [['new', '--like', 'drum'], "missing required argument 'sensor'"],
    [
      ['new', 'gull', '--like', 'membran'],
      `--like: \`membran\` is no kind of sensor; there are ${kinds}; did you mean \`membrane\`?`,
    ],
    [['new', 'gull', '--like', 'constructor'], `--like: \`constructor\` is no kind of sensor; there are ${kinds}`],
    [['new', '../gull', '--like', 'drum'], `\`../gull\` ${unfit}`],
    [['new', '/gull', '--like', 'drum'], `\`/gull\` ${unfit}`],
    [['new', 'a/b', '--like', 'drum'], `\`a/b\` ${unfit}`],
    [['new', '..', '--like', 'drum'], `\`..\` ${unfit}`],
    [['new', '.git', '--like', 'drum'], `\`.git\` ${unfit}`],
    [['new', '', '--like', 'drum'], `nothing ${unfit}`],
    [['new', 'gull\n\u001b[31m', '--like', 'drum'], `\`gull \\u{1b}[31m\` ${unfit}`],
    [
      ['new', 'Catalogue', '--like', 'drum'],
      '`Catalogue` is a name that the site needs for itself; call the sensor something else',
    ],
    [['new', 'Tern', '--like', 'drum'], '`Tern` and `tern` differ only in case; choose another name'],
    [['new', 'tern', '--like', 'drum'], `\`${taken}\` is there already and is left as it is; choose another name`],
    [['new', 'notes.txt', '--like', 'drum'], '`budgets/notes.txt` is there and is no folder; choose another name'],
    [['new', 'link', '--like', 'drum'], '`budgets/link` is there and is no folder; choose another name'],
  ])('refuses in one line and writes nothing: %j', async (words, line) => {
    const folder = project({ [taken]: 'mine' })
    symlinkSync('nowhere', join(folder, 'budgets/link'))
    const before = snapshot(folder)
    expect(await call(words, folder)).toEqual({ code: 2, out: '', err: `floorbook: ${line}\n` })
    expect(snapshot(folder)).toEqual(before)
  })

  it('needs a project', async () => {
    expect(await call(['new', 'tern', '--like', 'drum'], throwaway({ x: '' }))).toMatchObject({
      code: 2,
      err: 'floorbook: no folder `budgets` here or above; make one, go to a project or name it with --root\n',
    })
  })
})
