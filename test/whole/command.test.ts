import { existsSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { good, misspelt, placeOf, unstable, wrongUnit } from './budgets.js'
import { throwaway } from './folder.js'
import { floorbook, shell } from './process.js'
import { snapshot } from './snapshot.js'

const project = (budgets: Record<string, string>, more: Record<string, string> = {}) =>
  throwaway({
    ...Object.fromEntries(Object.entries(budgets).map(([name, text]) => [`budgets/${name}/budget.yaml`, text])),
    ...more,
  })

/** Every line of stderr is `file:line:column: message`, and none is a stack trace. */
const lineForm = /^budgets\/\w+\/budget\.yaml:\d+:\d+: \P{Cc}+$/u

describe('check', () => {
  it('says one line for a budget that is right', () => {
    const { code, out, err } = floorbook(project({ tern: good }), 'check')
    expect({ code, err }).toEqual({ code: 0, err: '' })
    expect(out).toMatch(/^tern: \d[^\n]* aN\/√Hz at 1\.24[^\n]*\n$/u)
  })

  it.each([
    ['a misspelt key', misspelt, 'qualtiy', ['qualtiy', 'quality']],
    ['a wrong unit', wrongUnit, '90 kW', ['90 kW', 'Hz']],
    ['an unstable working point', unstable, 'pump:', ['unstable']],
    ['YAML that is none', good.replace('readout: detector', 'readout: ['), 'band:', []],
  ])('names file, line, column, value and remedy of %s', (_name, text, at, words) => {
    const folder = project({ tern: text })
    const before = snapshot(folder)
    const { code, out, err } = floorbook(folder, 'check')
    expect({ code, out }).toEqual({ code: 2, out: '' })
    for (const line of err.trimEnd().split('\n')) expect(line).toMatch(lineForm)
    expect(err).toContain(`budgets/tern/budget.yaml:${placeOf(text, at).split(':')[0]}:`)
    for (const word of words) expect(err).toContain(word)
    expect(snapshot(folder)).toEqual(before)
  })

  it('goes on after a budget that is wrong', () => {
    const { code, out, err } = floorbook(project({ avocet: misspelt, tern: good }), 'check')
    expect(code).toBe(2)
    expect(out).toMatch(/^tern: \d/)
    expect(err).toMatch(/^budgets\/avocet\/budget\.yaml:/)
  })

  it('gives the same as JSON', () => {
    const { code, out } = floorbook(project({ avocet: misspelt, tern: good }), 'check', '--json')
    expect(code).toBe(2)
    const [line, column] = placeOf(misspelt, 'qualtiy').split(':').map(Number)
    const [first, second] = JSON.parse(out) as Record<string, unknown>[]
    expect(first).toMatchObject({
      budget: 'avocet',
      exitCode: 2,
      reference: null,
      fault: null,
      problems: expect.arrayContaining([
        expect.objectContaining({
          severity: 'error',
          code: 'unknown-key',
          file: 'budgets/avocet/budget.yaml',
          line,
          column,
        }),
      ]),
    })
    expect(second).toMatchObject({ budget: 'tern', exitCode: 0, reference: { unit: 'N/√Hz', asd: expect.any(Number) } })
  })

  it('takes a budget by its name, its folder and its file', () => {
    const folder = project({ tern: good, avocet: misspelt }, { 'elsewhere/budget.yaml': good })
    for (const name of [
      'tern',
      'budgets/tern',
      './budgets/tern/',
      'budgets/tern/budget.yaml',
      join(folder, 'budgets/tern'),
    ]) {
      const { code, out } = floorbook(folder, 'check', name)
      expect({ name, code, start: /^tern: \d/.test(out) }).toEqual({ name, code: 0, start: true })
    }
    expect(floorbook(folder, 'check', 'elsewhere')).toMatchObject({ code: 0, err: '' })
  })

  it('finds the project from below it and by --root', () => {
    const folder = project({ tern: good })
    expect(floorbook(join(folder, 'budgets', 'tern'), 'check')).toMatchObject({ code: 0 })
    expect(floorbook(throwaway({ a: '' }), '--root', folder, 'check', 'tern')).toMatchObject({ code: 0 })
    expect(floorbook(throwaway({ a: '' }), 'check', '--root', folder)).toMatchObject({ code: 0 })
  })

  it.each([
    [['check', 'trn'], /trn.*tern/],
    [['check', '../../gone/budget.yaml'], /gone/],
    [['check', '--root', 'gone'], /gone/],
  ])('refuses %j in one line', (words, message) => {
    const { code, out, err } = floorbook(project({ tern: good }), ...words)
    expect({ code, out }).toEqual({ code: 2, out: '' })
    expect(err).toMatch(/^floorbook: [^\n]+\n$/)
    expect(err).toMatch(message)
  })

  it('refuses to run where there is no project', () => {
    const { code, err } = floorbook(throwaway({ a: '' }), 'check')
    expect(code).toBe(2)
    expect(err).toMatch(/^floorbook: [^\n]*budgets[^\n]*\n$/)
  })
})

describe('show', () => {
  it('prints total, contributions and shares', () => {
    const { code, out, err } = floorbook(project({ tern: good }), 'show', 'tern')
    expect({ code, err }).toEqual({ code: 0, err: '' })
    for (const word of ['total', 'Thermal', 'Stray', '2.00 aN/√Hz', '100 %', '1.243 MHz', 'Standard quantum limit'])
      expect(out).toContain(word)
  })

  it('evaluates exactly where it is asked to', () => {
    const folder = project({ tern: good }, { 'points.txt': '1.2431 MHz\n1243000.125\n' })
    const json = (...words: string[]) =>
      JSON.parse(floorbook(folder, 'show', 'tern', '--json', ...words).out) as {
        curves: { frequency: number[]; total: number[] }
      }
    const { curves } = json('--at', '1.2431 MHz', '9e5', '--at-file', 'points.txt')
    expect(curves.frequency).toEqual([9e5, 1243000.125, 1.2431e6])
    expect(curves.total).toHaveLength(3)
    expect(json('--at-file', 'points.txt').curves.total).toEqual(curves.total.slice(1))
  })

  it('prints what curves.json holds', () => {
    const folder = project({ tern: good })
    const { code, out } = floorbook(folder, 'show', 'tern', '--json')
    expect(code).toBe(0)
    expect(JSON.parse(out)).toMatchObject({ format: 1, sensor: 'tern', unit: { amplitude: 'N/√Hz' } })
  })

  it.each([
    [['show', 'tern', '--at', '3 ng'], '--at: `3 ng` is not a frequency'],
    [['show', 'tern', '--at-file', 'gone'], '--at-file: gone does not exist'],
    [['show', 'gull'], 'gull'],
  ])('refuses %j', (words, message) => {
    const { code, out, err } = floorbook(project({ tern: good }), ...words)
    expect({ code, out }).toEqual({ code: 2, out: '' })
    expect(err).toContain(message)
  })

  it('ends quietly when its reader stops', () => {
    const folder = project({ tern: good })
    expect(shell(folder, 'floorbook show tern --json | head -c 10 >/dev/null; echo "${PIPESTATUS[@]}"')).toEqual({
      code: 0,
      out: '0 0\n',
      err: '',
    })
    expect(shell(folder, 'floorbook show tern | head -1')).toMatchObject({ code: 0, err: '' })
  })
})

describe('build', () => {
  it('publishes and says where', () => {
    const folder = project({ tern: good })
    const { code, out, err } = floorbook(folder, 'build')
    expect({ code, err }).toEqual({ code: 0, err: '' })
    expect(out).toMatch(/^\d+ pages; the front page is site\/index\.html\n$/)
    for (const file of ['index.html', 'tern/draft/index.html', 'tern/draft/curves.csv', 'tern/draft/curves.json']) {
      expect(existsSync(join(folder, 'site', file)), file).toBe(true)
    }
  })

  it('publishes the good budgets and says why the others are refused', () => {
    const folder = project({ avocet: misspelt, tern: good, knot: unstable })
    const { code, err } = floorbook(folder, 'build')
    expect(code).toBe(2)
    for (const line of err.trimEnd().split('\n')) expect(line).toMatch(lineForm)
    const names = Object.keys(snapshot(join(folder, 'site')))
    expect(names).toContain('tern/draft/curves.csv')
    expect(names).toContain('avocet/draft/index.html')
    expect(names).not.toContain('avocet/draft/curves.csv')
    expect(names).not.toContain('knot/draft/curves.csv')
  })

  it('gives the same bytes twice', () => {
    const one = project({ tern: good })
    const other = project({ tern: good })
    floorbook(one, 'build')
    floorbook(other, 'build')
    const site = snapshot(join(one, 'site'))
    expect(Object.keys(site).length).toBeGreaterThan(3)
    expect(snapshot(join(other, 'site'))).toEqual(site)
  })

  it('writes nothing where the call is wrong', () => {
    const folder = project({ tern: good })
    expect(floorbook(folder, 'build', 'gull').code).toBe(2)
    expect(readdirSync(folder)).toEqual(['budgets'])
  })

  it('writes nothing into a folder that holds other files', () => {
    const folder = project({ tern: good }, { 'site/diary.txt': 'mine' })
    const { code, err } = floorbook(folder, 'build')
    expect(code).toBe(2)
    expect(err).toMatch(/^[^\n]*site[^\n]*\n$/)
    expect(Object.keys(snapshot(join(folder, 'site')))).toEqual(['diary.txt'])
  })
})
