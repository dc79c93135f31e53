import { describe, expect, it } from 'vitest'
import type { Budget, Parameters, Slot } from '../../src/model/budget.js'
import { changed, example, good, lines, read, small } from './read.js'

function component(budget: Budget, id: string): Parameters {
  const found = budget.components.find(each => each.id === id)
  if (found === undefined) throw new Error(`no component ${id}`)
  return found.parameters
}

function rootOf(budget: Budget, slot: unknown) {
  return budget.roots[(slot as { root: number }).root]
}

function parametersOf(budget: Budget): Parameters {
  const claims = budget.lines[0]?.claims
  if (claims === undefined || !('kind' in claims)) throw new Error('the first line is no noise of its own')
  return claims.parameters
}

describe('the example budget', () => {
  const budget = good(example)

  it('keeps head, band and readout', () => {
    expect(budget).toMatchObject({
      sensor: 'tern',
      format: 1,
      title: 'Membrane force sensor',
      revision: '2.1',
      summary: null,
    })
    expect(budget).toMatchObject({ readout: 'detector', reference: 1.243e6, band: { low: 1.2e6, high: 1.3e6 } })
    expect(budget.measurand).toMatchObject({ quantity: 'force', at: null })
    expect([...(budget.measurand.weights ?? [])]).toEqual([['fundamental', 1]])
  })

  it('makes a root of a parameter, with all that the file says of it', () => {
    const mass = rootOf(budget, component(budget, 'fundamental')['mass'])
    expect(mass).toEqual({
      id: 'mass',
      value: 3.1e-12,
      uncertainty: 2e-13,
      distribution: 'normal',
      effect: 'statistical',
      dimension: 'mass',
      text: '3.1(2) ng',
      about: 'effective mass of the fundamental mode',
      evidence: 'finite-element report',
      measured: null,
      place: { file: 'budget.yaml', line: 9, column: 18 },
    })
  })

  it('names an inline quantity by its path and counts rates in radians', () => {
    const pump = component(budget, 'cavity')['pump'] as Parameters
    expect(rootOf(budget, pump['detuning'])).toMatchObject({
      id: 'cavity.pump.detuning',
      value: -0.2e6 * 2 * Math.PI,
      text: '-0.2 MHz',
    })
    const ports = component(budget, 'cavity')['ports'] as ReadonlyMap<string, Parameters>
    expect([...ports.keys()]).toEqual(['front', 'back', 'inner'])
    expect(rootOf(budget, ports.get('back')?.['rate'])).toMatchObject({
      id: 'cavity.ports.back.rate',
      value: 90e3 * 2 * Math.PI,
    })
  })

  it('fills in the defaults of a group given by its shorthand', () => {
    const ports = component(budget, 'cavity')['ports'] as ReadonlyMap<string, Parameters>
    const occupancy = ports.get('inner')?.['occupancy'] as Parameters
    expect(rootOf(budget, occupancy['base'])).toMatchObject({ id: 'cavity.ports.inner.occupancy', value: 0 })
    expect(occupancy).toMatchObject({ rise: { constant: 0 }, at: { constant: 1 }, exponent: { constant: 1 } })
    expect(ports.get('front')).not.toHaveProperty('occupancy')
  })

  it('keeps lines in order, with what they claim', () => {
    expect(budget.lines.map(line => line.id)).toEqual(['thermal', 'shot', 'back_action', 'heating', 'stray'])
    expect(budget.lines[1]?.claims).toEqual({ of: ['cavity', 'detector.loss'], part: 'imprecision' })
    expect(budget.lines[4]?.claims).toMatchObject({
      kind: 'force-noise',
      parameters: {
        into: 'fundamental',
        density: { density: 'level', power: false, exponent: { constant: 0 }, reference: null },
      },
    })
  })

  it('keeps what must be reached', () => {
    expect(budget.warnings).toEqual([])
    expect(budget.requirements).toEqual([
      {
        id: 'proposal',
        of: 'total',
        where: { at: 1.243e6 },
        bound: 'below',
        value: 2e-17,
        text: '20 aN/√Hz',
        about: null,
        place: { file: 'budget.yaml', line: 27, column: 3 },
      },
    ])
  })

  it('knows the place of every stated field', () => {
    const cavity = budget.components[1]
    expect(cavity?.place).toEqual({ file: 'budget.yaml', line: 12, column: 3 })
    expect(cavity?.places.get('pump.power')).toEqual({ file: 'budget.yaml', line: 18, column: 33 })
    expect(cavity?.places.has('g0')).toBe(false)
  })
})

describe('values', () => {
  it('keeps a revision as it is written', () => {
    expect(good(small).revision).toBe('2.10')
  })

  it('takes one parameter as a frequency and as a rate through one root', () => {
    const budget = good(
      changed(
        ['components:', 'parameters: { f0: 1.243(1) MHz }\ncomponents:'],
        ['frequency: 1.243 MHz', 'frequency: f0'],
        ['power: 3 µW', 'power: 3 µW, detuning: f0'],
      ),
    )
    expect(budget.roots.filter(root => root.id === 'f0')).toHaveLength(1)
    const pump = component(budget, 'cavity')['pump'] as Parameters
    expect(pump['detuning']).toEqual({
      root: (component(budget, 'drum')['frequency'] as { root: number }).root,
      scale: 2 * Math.PI,
    })
    expect(rootOf(budget, pump['detuning'])).toMatchObject({ value: 1.243e6, dimension: 'frequency' })
  })

  it('reads evidence beside an inline value', () => {
    const budget = good(
      changed(['temperature: 4.1 K', 'temperature: { value: 4.1(1) K, evidence: assumed, measured: 2026-11-30 }']),
    )
    expect(budget.roots.find(root => root.id === 'drum.temperature')).toMatchObject({
      value: 4.1,
      evidence: 'assumed',
      measured: '2026-11-30',
    })
  })

  it('lets an occupancy be explained and follow the pump', () => {
    const explained = good(
      changed(['{ rate: 90 kHz }', '{ rate: 90 kHz, occupancy: { value: 0.1, evidence: assumed } }']),
    )
    expect(explained.roots.find(root => root.id === 'cavity.ports.back.occupancy')).toMatchObject({
      value: 0.1,
      evidence: 'assumed',
    })
    const rising = good(
      changed(['{ rate: 90 kHz }', '{ rate: 90 kHz, occupancy: { base: 0.1, rise: 0.4, at: 1e6, exponent: 0.5 } }']),
    )
    expect(rising.roots.find(root => root.id === 'cavity.ports.back.occupancy.rise')).toMatchObject({ value: 0.4 })
  })

  it('reads an alias as the value that it stands for', () => {
    const budget = good(changed(['{ rate: 600 kHz }', '&port { rate: 600 kHz }'], ['{ rate: 90 kHz }', '*port']))
    expect(budget.roots.filter(root => /ports/.test(root.id)).map(root => [root.id, root.place.column])).toEqual([
      ['cavity.ports.front.rate', 35],
      ['cavity.ports.back.rate', 35],
    ])
  })

  it('takes quoted quantities and points into them', () => {
    expect(good(changed(['mass: 3.1(2) ng', 'mass: "3.1 ng"'])).roots[0]).toMatchObject({
      value: 3.1e-12,
      text: '3.1 ng',
    })
    expect(lines(read(changed(['mass: 3.1(2) ng', 'mass: "3.1 nq"'])))[0]).toMatch(/^budget\.yaml:8:39: `nq`/)
  })
})

describe('densities', () => {
  const noise = (text: string) => `${small}contributions:\n  stray: { kind: force-noise, into: drum, ${text} }\n`
  const density = (budget: Budget) => parametersOf(budget)['density']

  it('tells amplitude from power by the unit', () => {
    expect(density(good(noise('density: 2 aN/√Hz')))).toMatchObject({ power: false })
    const power = good(noise('density: 4 aN²/Hz'))
    expect(density(power)).toMatchObject({ power: true })
    expect(power.roots.at(-1)).toMatchObject({ id: 'stray.density', dimension: 'force-power-density', value: 4e-36 })
  })

  it('reads a power law', () => {
    const budget = good(noise('density: 2 aN/√Hz, exponent: -1, reference: 1 kHz'))
    const spec = density(budget) as { exponent: Slot; reference: Slot }
    expect(rootOf(budget, spec.exponent)).toMatchObject({ id: 'stray.exponent', value: -1 })
    expect(rootOf(budget, spec.reference)).toMatchObject({ id: 'stray.reference', value: 1000 })
  })

  it('reads a table into SI power densities', () => {
    const text = noise('table: { file: data/floor.csv, skip: 1, units: [MHz, aN/√Hz] }')
    const budget = good(text, { 'data/floor.csv': 'frequency,density\n1.1,2\n# calibrated twice\n\n1.4, 3e0\n' })
    expect(density(budget)).toEqual({ density: 'table', table: 0 })
    expect([...(budget.tables[0]?.frequency ?? [])]).toEqual([1.1e6, 1.4e6])
    expect(budget.tables[0]?.psd[0]).toBeCloseTo(4e-36, 45)
    expect(budget.tables[0]?.psd[1]).toBeCloseTo(9e-36, 45)
  })

  it('reads quanta of detector noise and a displacement readout', () => {
    const dark = good(`${small}contributions:\n  dark: { kind: detector-noise, into: detector, density: 0.1 }\n`)
    expect(dark.roots.at(-1)).toMatchObject({ id: 'dark.density', dimension: 'number', value: 0.1 })
    const plain = good(
      changed([
        '{ kind: homodyne, reads: cavity.back }',
        '{ kind: displacement, modes: { drum: 1 }, noise: 1 fm/√Hz }',
      ]),
    )
    expect(component(plain, 'detector')['noise']).toMatchObject({ density: 'level', power: false })
  })
})

describe('the network', () => {
  it('accepts a chain, and warns of what stands beside it', () => {
    const chain =
      '  line: { kind: loss, reads: cavity.back, transmission: 0.9 }\n  amplifier: { kind: amplifier, reads: line, added: 3, gain: 30 dB }\n'
    const budget = good(
      changed([
        '  detector: { kind: homodyne, reads: cavity.back }\n',
        `${chain}  detector: { kind: homodyne, reads: amplifier }\n`,
      ]),
    )
    expect(budget.warnings).toEqual([])
    const aside = good(changed(['  detector:', `${chain}  detector:`]))
    expect(aside.warnings.map(warning => warning.message)).toEqual([
      '`line` is not on the way to the readout and changes nothing',
      '`amplifier` is not on the way to the readout and changes nothing',
    ])
  })

  it('takes an amplifier without gain when nothing noisy follows', () => {
    const text = changed([
      '  detector: { kind: homodyne, reads: cavity.back }',
      '  amplifier: { kind: amplifier, reads: cavity.back, added: 3 }\n  detector: { kind: sideband, reads: amplifier }',
    ])
    expect(good(text).warnings).toEqual([])
  })

  it('divides a total quality among channels', () => {
    const losses = (text: string) => changed(['quality: 2.4e7', `quality: 2.4e7, losses: ${text}`])
    const names = (text: string) => [
      ...(component(good(losses(text)), 'drum')['losses'] as ReadonlyMap<string, unknown>).keys(),
    ]
    expect(names('{ gas: { share: 0.4 }, clamp: { share: 0.6, law: structural } }')).toEqual(['gas', 'clamp'])
    expect(names('{ gas: { quality: 1e8 }, clamp: {} }')).toEqual(['gas', 'clamp'])
  })

  it('offers the channels of losses, not the bath, to lines', () => {
    const text = changed(['quality: 2.4e7', 'losses: { gas: { quality: 1e8 }, clamp: { quality: 3e7 } }'])
    expect(good(`${text}contributions:\n  gas: { of: drum.gas }\n  rest: { of: drum.clamp }\n`).lines).toHaveLength(2)
    expect(lines(read(`${text}contributions:\n  all: { of: drum.bath }\n`))[0]).toContain(
      'no noise is called `drum.bath`; there are `drum.gas`, `drum.clamp`',
    )
  })

  it('asks for a moved mass only where it is needed', () => {
    const acceleration = ['quantity: force', 'quantity: acceleration'] as const
    expect(good(changed(acceleration, ['kind: resonator', 'kind: rigid'])).measurand.quantity).toBe('acceleration')
    expect(good(changed(acceleration, ['mass: 3.1(2) ng', 'mass: 3.1 ng, moved_mass: 2 ng'])).measurand.quantity).toBe(
      'acceleration',
    )
  })
})
