import { describe, expect, it } from 'vitest'
import { declarations } from '../../src/catalogue/declarations.js'
import { kindGroups } from '../../src/report/kind-view.js'

const views = kindGroups().flatMap(group => group.kinds)
const field = (kind: string, path: string) =>
  views.find(view => view.kind === kind)?.fields.find(each => each.path === path)

describe('the catalogue pages', () => {
  it('show every kind once', () => {
    expect(views.map(view => view.kind).toSorted()).toEqual([...declarations.keys()].toSorted())
  })

  it('list fields down into groups and maps', () => {
    expect(field('cavity', 'ports.<name>.occupancy.base')).toMatchObject({ symbol: 'n_j', need: 'required' })
    expect(field('cavity', 'pump.detuning')).toMatchObject({ holds: 'rate', need: '0 Hz', symbol: '\\Delta' })
    expect(field('homodyne', 'efficiency')?.holds).toBe('power ratio, over 0 up to 1')
    expect(field('resonator', 'law')).toMatchObject({ holds: 'viscous or structural', need: 'viscous' })
    expect(field('resonator', 'moved_mass')?.need).toBe('optional')
  })

  it('state which fields exclude each other', () => {
    expect(views.find(view => view.kind === 'cavity')?.rules).toEqual([
      'exactly one of coupling, g0',
      'at most one of ports.<name>.temperature, ports.<name>.occupancy',
      'exactly one of pump.power, pump.quanta',
    ])
  })

  it('write references out', () => {
    expect(views.find(view => view.kind === 'amplifier')?.references).toEqual([
      'C. M. Caves, Phys. Rev. D 26, 1817 (1982)',
      'H. T. Friis, Proc. IRE 32, 419 (1944)',
    ])
  })
})
