import { readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { starters } from '../../src/budget/starters.js'
import { good } from './budgets.js'
import { throwaway } from './folder.js'
import { floorbook } from './process.js'
import { snapshot } from './snapshot.js'

const laser = `format: 1
title: Laser
parameters:
  laser: { value: 282 THz, about: laser, evidence: assumed }
`
const sharing = good.replace('282 THz', 'laser').replace('readout:', 'include: ../shared/laser.yaml\nreadout:')
const colder = `format: 1
title: Colder membrane
revision: 0.1
from: ../tern/budget.yaml
components: { fundamental: { temperature: 20 mK } }
variants:
  better: { title: Q ten times higher, changes: { fundamental.quality: 2.4e7 } }
`
const project = (part = laser) =>
  throwaway({
    'budgets/shared/laser.yaml': part,
    'budgets/tern/budget.yaml': sharing,
    'budgets/tern-cold/budget.yaml': colder,
  })

describe('a project whose budgets share files', () => {
  it('is checked: every sensor, and none that is only a part', () => {
    const { code, out, err } = floorbook(project(), 'check')
    expect({ code, err }).toEqual({ code: 0, err: '' })
    expect(
      out
        .trimEnd()
        .split('\n')
        .map(line => line.split(':')[0]),
    ).toEqual(['tern', 'tern-cold'])
  })

  it('says a fault of a shared file once, and where it stands', () => {
    const { code, out, err } = floorbook(project(laser.replace('value: 282 THz', 'value: 282 THzz')), 'check')
    expect({ code, out }).toEqual({ code: 2, out: '' })
    expect(err.split('\n')).toHaveLength(2)
    expect(err).toMatch(/^budgets\/shared\/laser\.yaml:4:23: [^\n]*`THzz`[^\n]*\n$/)
  })

  it('is built, with pages for sensors alone', () => {
    const folder = project()
    expect(floorbook(folder, 'build')).toMatchObject({ code: 0, err: '' })
    const names = Object.keys(snapshot(join(folder, 'site')))
    expect(names).toEqual(
      expect.arrayContaining(['tern-cold/draft/index.html', 'schema/budget-1.json', 'schema/part-1.json']),
    )
    expect(names.filter(name => /^shared|laser/.test(name))).toEqual([])
  })
})

describe('a new sensor', () => {
  it('is written, checked, shown and built by the commands alone', () => {
    const folder = throwaway({ 'budgets/.keep': '' })
    for (const name of starters.keys())
      expect(floorbook(folder, 'new', `my-${name}`, '--like', name)).toMatchObject({ code: 0, err: '' })
    expect(floorbook(folder, 'check').code).toBe(0)
    expect(floorbook(folder, 'show', 'my-drum')).toMatchObject({ code: 0, err: '' })
    expect(floorbook(folder, 'build').code).toBe(0)
    const [first = ''] = readFileSync(join(folder, 'budgets/my-drum/budget.yaml'), 'utf8').split('\n')
    const schema = join(folder, 'budgets/my-drum', first.replace('# yaml-language-server: $schema=', ''))
    expect(JSON.parse(readFileSync(schema, 'utf8'))).toMatchObject({ $id: 'budget-1.json' })
  })

  it('is never written over', () => {
    const folder = throwaway({ 'budgets/tern/budget.yaml': good })
    writeFileSync(join(folder, 'budgets/notes.txt'), '')
    const before = snapshot(folder)
    expect(floorbook(folder, 'new', 'tern', '--like', 'drum').code).toBe(2)
    expect(snapshot(folder)).toEqual(before)
  })
})
