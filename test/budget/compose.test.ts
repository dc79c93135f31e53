import { describe, expect, it } from 'vitest'
import { formatProblem } from '../../src/budget/format-problem.js'
import { base, head, readTern, root, tern } from './composed.js'
import { small } from './read.js'

const laser = `format: 1
title: Laser of the upper table
components:
  cavity: { kind: cavity, frequency: 282 THz }
`

describe('a budget that builds on another', () => {
  it('says what the other says, and what it says itself over it', () => {
    const budget = tern(`${head}components: { drum: { quality: 2.4e8 }, cavity: { pump: { power: 5 µW } } }\n`)
    expect(budget).toMatchObject({ sensor: 'tern', title: 'Colder membrane', revision: '0.1', readout: 'detector' })
    expect(budget.file).toBe('budgets/tern/budget.yaml')
    expect(budget.components.map(component => component.id)).toEqual(['drum', 'cavity', 'detector'])
    expect(root(budget, 'drum.quality')).toMatchObject({ value: 2.4e8, text: '2.4e8' })
    expect(root(budget, 'drum.mass')).toMatchObject({ value: 3.1e-12, uncertainty: 2e-13 })
    expect(root(budget, 'cavity.pump.power').value).toBeCloseTo(5e-6, 15)
  })

  it('knows in which file and line each value stands', () => {
    const budget = tern(`${head}components:\n  drum:\n    quality: 2.4e8\n`)
    expect(root(budget, 'drum.quality').place).toEqual({ file: 'budgets/tern/budget.yaml', line: 7, column: 14 })
    expect(root(budget, 'drum.mass').place).toEqual({ file: 'budgets/drum/budget.yaml', line: 8, column: 34 })
  })

  it('takes keys away with ~ and null, and puts new ones behind the old', () => {
    const text = `${head}contributions: { thermal: ~, stray: { kind: force-noise, into: drum, density: 1 aN/√Hz } }\n`
    const lines = '  thermal: { of: drum.bath }\n  shot: { of: cavity, part: imprecision }\n'
    const more = { 'budgets/drum/budget.yaml': `${small}contributions:\n${lines}` }
    expect(tern(text, more).lines.map(line => line.id)).toEqual(['shot', 'stray'])
    expect(tern(text.replace('~', 'null'), more).lines.map(line => line.id)).toEqual(['shot', 'stray'])
  })

  it('is not described by the words of the other', () => {
    const more = { 'budgets/drum/budget.yaml': `${small}summary: Ours.\nabout: Notes.\n` }
    expect(tern(head, more)).toMatchObject({ summary: null, about: null })
    expect(tern(`${head}summary: Mine.\n`, more)).toMatchObject({ summary: 'Mine.', about: null })
  })

  it.each(['2.4e8', '{ value: 2.4e8 }'])('does not rest a new value, %s, on the evidence of the old', value => {
    const old = '{ value: 2.4e7, about: decay, evidence: ringdown of May, measured: 2026-03-14 }'
    const more = { 'budgets/drum/budget.yaml': small.replace('2.4e7', old) }
    const budget = tern(`${head}components: { drum: { quality: ${value} } }\n`, more)
    const quality = { text: '2.4e8', about: 'decay', evidence: null, measured: null }
    expect(root(budget, 'drum.quality')).toMatchObject(quality)
    const explained = tern(`${head}components: { drum: { quality: { evidence: log 7 } } }\n`, more)
    expect(root(explained, 'drum.quality')).toMatchObject({ text: '2.4e7', evidence: 'log 7', measured: '2026-03-14' })
  })

  it('can put a parameter in the place of an explained value', () => {
    const more = { 'budgets/drum/budget.yaml': small.replace('2.4e7', '{ value: 2.4e7, about: decay }') }
    const text = `${head}parameters: { q: { value: 1e9, about: hope } }\ncomponents: { drum: { quality: q } }\n`
    expect(root(tern(text, more), 'q')).toMatchObject({ value: 1e9, about: 'hope' })
  })

  it('replaces a component of another kind as a whole', () => {
    const more = { 'budgets/drum/budget.yaml': small.replace('cavity.back', 'cavity.back, angle: 80°') }
    const budget = tern(`${head}components: { detector: { kind: sideband, reads: cavity.back } }\n`, more)
    expect(budget.components[2]).toMatchObject({ id: 'detector', kind: 'sideband' })
    expect(budget.roots.map(each => each.id)).not.toContain('detector.angle')
  })

  it('may build on one that builds on another, ten in all', () => {
    const step = (to: number) => head.replace('../drum', `../s${to}`)
    const chain = (count: number) =>
      Object.fromEntries(
        Array.from({ length: count }, (_, i) => [`budgets/s${i}/budget.yaml`, i + 1 < count ? step(i + 1) : head]),
      )
    expect(root(tern(step(0), chain(9)), 'drum.quality').value).toBe(2.4e7)
    const { problems } = readTern({ ...base, 'budgets/tern/budget.yaml': step(0), ...chain(10) })
    expect(problems.map(formatProblem)).toEqual([
      'budgets/s9/budget.yaml:4:7: more than 10 files build on each other up to here; join some of them',
    ])
  })

  it('finds tables from the file that names them', () => {
    const line = '  stray: { kind: force-noise, into: drum, table: { file: data/floor.csv, units: [Hz, N/√Hz] } }\n'
    const more = {
      'budgets/drum/budget.yaml': `${small}contributions:\n${line}`,
      'budgets/drum/data/floor.csv': '1e6,1e-18\n2e6,1e-18\n',
    }
    expect(tern(head, more).tables.map(table => table.file)).toEqual(['budgets/drum/data/floor.csv'])
    const own = tern(`${head}contributions: { stray: { table: { file: floor.csv } } }\n`, {
      ...more,
      'budgets/tern/floor.csv': '1e6,2e-18\n2e6,2e-18\n',
    })
    expect(own.tables.map(table => table.file)).toEqual(['budgets/tern/floor.csv'])
  })
})

describe('shared parts', () => {
  const parted = small.replace('    kind: cavity\n    frequency: 282 THz\n', '')
  const include = (text: string, paths: string) => text.replace('readout:', `include: ${paths}\nreadout:`)

  it('lie below the file that includes them', () => {
    const more = { 'budgets/shared/laser.yaml': laser }
    const budget = tern(include(parted, '../shared/laser.yaml'), more)
    expect(root(budget, 'cavity.frequency').place).toEqual({
      file: 'budgets/shared/laser.yaml',
      line: 4,
      column: 38,
    })
    expect(budget.title).toBe('Membrane')
    const over = include(parted.replace('modes:', 'frequency: 200 THz\n    modes:'), '[../shared/laser.yaml]')
    expect(root(tern(over, more), 'cavity.frequency').value).toBe(200e12)
  })

  it('lie above what the file builds on', () => {
    const budget = tern(`${head}include: [laser.yaml]\n`, { 'budgets/tern/laser.yaml': laser.replace('282', '195') })
    expect(root(budget, 'cavity.frequency').value).toBe(195e12)
  })

  it('may hold parameters that only other budgets use', () => {
    const more = { 'budgets/shared/room.yaml': 'format: 1\nparameters: { room: 295 K }\n' }
    expect(tern(`${head}include: ../shared/room.yaml\n`, more).warnings).toEqual([])
    const own = tern(`${head}parameters: { room: 295 K }\n`).warnings.map(({ code }) => code)
    expect(own).toEqual(['unused'])
  })

  it('may include another one, which then counts once', () => {
    const room = 'format: 1\nparameters: { room: 295 K }\n'
    const part = (id: string) =>
      `format: 1\ninclude: room.yaml\ncomponents: { ${id}: { kind: rigid, mass: 1 g, frequency: 1 Hz, quality: 1e3, temperature: room } }\n`
    const budget = tern(`${head}include: [../shared/a.yaml, ../shared/b.yaml]\n`, {
      'budgets/shared/room.yaml': room,
      'budgets/shared/a.yaml': part('a'),
      'budgets/shared/b.yaml': part('b'),
    })
    expect(budget.components.map(each => each.id)).toEqual(['drum', 'cavity', 'detector', 'a', 'b'])
    expect(root(budget, 'room').place.file).toBe('budgets/shared/room.yaml')
  })
})
