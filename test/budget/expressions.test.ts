import { describe, expect, it } from 'vitest'
import { Refusal } from '../../src/model/problem.js'
import type { Budget, DensitySpec, Formula, Parameters, Slot } from '../../src/model/budget.js'
import { boltzmannConstant } from '../../src/physics/constants.js'
import { changed, good, lines, read } from './read.js'

const derived = (budget: Budget, id: string) => {
  const found = budget.derived.find(each => each.id === id)
  if (found === undefined) throw new Error(`nothing is derived as ${id}`)
  return found
}
const values = (budget: Budget) => Float64Array.from(budget.roots, root => root.value)
const parameters = (budget: Budget, id: string) => budget.components.find(each => each.id === id)?.parameters ?? {}

/** A value that a kernel would be given. */
function numberOf(budget: Budget, slot: unknown): number {
  const given = slot as Slot
  if ('constant' in given) return given.constant
  const scale = given.scale ?? 1
  return ('root' in given ? (budget.roots[given.root]?.value ?? NaN) : given.formula.value(values(budget))) * scale
}

const withParameters = (text: string, ...pieces: readonly (readonly [string, string])[]) =>
  changed(['components:', `parameters:\n${text}components:`], ...pieces)

function noiseOf(text: string, more = ''): { readonly budget: Budget; readonly spec: DensitySpec } {
  const budget = good(
    `${withParameters(more === '' ? '  unit: 1\n' : more)}contributions:\n  stray: { kind: force-noise, into: drum, ${text} }\n`,
  )
  const claims = budget.lines[0]?.claims
  const spec = (claims !== undefined && 'kind' in claims ? claims.parameters['density'] : null) as DensitySpec
  return { budget, spec }
}

const densityOf = (text: string) => noiseOf(text).spec

describe('derived parameters', () => {
  const spring = '  k: 190(3) N/m\n  m0: 3.1(2) ng\n  f0: "= sqrt(k/m0)/(2*pi)"\n'
  const uses = [
    ['mass: 3.1(2) ng', 'mass: m0'],
    ['frequency: 1.243 MHz', 'frequency: f0'],
  ] as const

  it('come out in the unit of their field', () => {
    const budget = good(withParameters(spring, ...uses))
    expect(derived(budget, 'f0')).toMatchObject({
      text: '= sqrt(k/m0)/(2*pi)',
      dimension: 'frequency',
      place: { file: 'budget.yaml', line: 10, column: 7 },
    })
    expect(derived(budget, 'f0').formula.value(values(budget))).toBeCloseTo(Math.sqrt(190 / 3.1e-12) / (2 * Math.PI), 6)
    expect(parameters(budget, 'drum')['frequency']).toEqual({ formula: derived(budget, 'f0').formula })
    expect(derived(budget, 'f0').formula.roots.map(index => budget.roots[index]?.id)).toEqual(['m0', 'k'])
  })

  it('count a rate in radians and a frequency in cycles, whichever is used first', () => {
    const rate = '  gamma: "= sqrt((190 N/m)/(3.1 ng))"\n'
    const omega = Math.sqrt(190 / 3.1e-12)
    const both = [
      ['frequency: 1.243 MHz', 'frequency: gamma'],
      ['power: 3 µW', 'power: 3 µW, detuning: gamma'],
    ] as const
    const budget = good(withParameters(rate, ...both))
    const pump = parameters(budget, 'cavity')['pump'] as Parameters
    expect(numberOf(budget, parameters(budget, 'drum')['frequency']) * 2 * Math.PI).toBeCloseTo(omega, 5)
    expect(numberOf(budget, pump['detuning'])).toBeCloseTo(omega, 5)
    expect(budget.derived.map(({ id }) => id)).toEqual(['gamma'])
  })

  it('take hertz as cycles from a parameter that a field counts in radians', () => {
    const text = '  linewidth: 600(6) kHz\n  half: "= linewidth/2"\n'
    const budget = good(withParameters(text, ['rate: 600 kHz', 'rate: linewidth'], ['rate: 90 kHz', 'rate: half']))
    const ports = parameters(budget, 'cavity')['ports'] as ReadonlyMap<string, Parameters>
    expect(budget.roots.find(({ id }) => id === 'linewidth')?.value).toBeCloseTo(2 * Math.PI * 600e3, 6)
    expect(numberOf(budget, ports.get('back')?.['rate'])).toBeCloseTo(2 * Math.PI * 300e3, 5)
  })

  it('may be written in any order and rest on each other', () => {
    const text = '  a: "= b + c0"\n  b: "= c0*2"\n  c0: 1(1) ng\n'
    const budget = good(withParameters(text, ['mass: 3.1(2) ng', 'mass: a']))
    expect(derived(budget, 'a').formula.value(values(budget))).toBeCloseTo(3e-12, 24)
    expect(budget.derived.map(({ id }) => id)).toEqual(['a', 'b'])
    const moved = values(budget).map((value, index) => (budget.roots[index]?.id === 'c0' ? 2e-12 : value))
    expect(derived(budget, 'a').formula.value(moved)).toBeCloseTo(6e-12, 24)
  })

  it('are computed once each, however many rest on them', () => {
    const chain = Array.from({ length: 60 }, (_, i) => `  a${i + 1}: "= a${i}/2 + b${i}/2"\n  b${i + 1}: "= a${i}"\n`)
    const text = `  a0: 3.1 ng\n  b0: 3.1 ng\n${chain.join('')}`
    const budget = good(withParameters(text, ['mass: 3.1(2) ng', 'mass: a60']))
    expect(derived(budget, 'a60').formula.value(values(budget))).toBeCloseTo(3.1e-12, 24)
  })

  it('keep what the file says of them', () => {
    const text = '  m0: 3.1(2) ng\n  half: { value: "= m0/2", about: one half, evidence: assumed }\n'
    const budget = good(withParameters(text, ['mass: 3.1(2) ng', 'mass: half']))
    expect(derived(budget, 'half')).toMatchObject({ about: 'one half', evidence: 'assumed', dimension: 'mass' })
  })

  it('turn decibels into a ratio where one is wanted', () => {
    const amplifier =
      '  amplifier: { kind: amplifier, reads: cavity.back, added: 3, gain: total }\n  detector: { kind: homodyne, reads: amplifier }\n'
    const budget = good(
      withParameters('  first: 20 dB\n  total: "= first + (10 dB)"\n', [
        '  detector: { kind: homodyne, reads: cavity.back }\n',
        amplifier,
      ]),
    )
    expect(numberOf(budget, parameters(budget, 'amplifier')['gain'])).toBeCloseTo(1000, 9)
  })
})

describe('expressions in fields', () => {
  it('are listed by their path', () => {
    const budget = good(changed(['mass: 3.1(2) ng', 'mass: "= (3 ng) + (0.1 ng)"']))
    expect(derived(budget, 'drum.mass')).toMatchObject({ text: '= (3 ng) + (0.1 ng)', dimension: 'mass' })
    expect(numberOf(budget, parameters(budget, 'drum')['mass'])).toBeCloseTo(3.1e-12, 24)
  })

  it('may stand without quotes, and in weights', () => {
    const budget = good(
      changed(['mass: 3.1(2) ng', 'mass: = (3 ng)*2'], ['modes: { drum: 1 }', 'modes: { drum: = 1/2 }']),
    )
    const modes = parameters(budget, 'cavity')['modes'] as ReadonlyMap<string, Slot>
    expect(numberOf(budget, modes.get('drum'))).toBe(0.5)
  })

  it('name a frequency outside the band by what they come to', () => {
    const text = `${changed()}reference: "= (1.3 MHz)*2"\n`
    expect(lines(read(text))[0]).toContain('the reference frequency lies outside the band')
  })
})

describe('densities by expressions', () => {
  const over = (formula: Formula, ...frequencies: number[]) => {
    const out = new Float64Array(frequencies.length)
    formula.over(new Float64Array(0), Float64Array.from(frequencies), out)
    return [...out]
  }

  it.each(['expression', 'density'])('may name f under `%s`', key => {
    const spec = densityOf(`${key}: "= (2 aN/√Hz)*sqrt((1 MHz)/f)"`)
    if (spec.density !== 'formula') throw new Error('no formula')
    expect([spec.power, spec.text]).toEqual([false, '= (2 aN/√Hz)*sqrt((1 MHz)/f)'])
    const [one, two] = over(spec.formula, 1e6, 4e6)
    expect(one).toBeCloseTo(2e-18, 30)
    expect(two).toBeCloseTo(1e-18, 30)
  })

  it('may be power densities', () => {
    const spec = densityOf('expression: "= (4 aN²/Hz)*(f/(1 MHz))^2"')
    expect(spec).toMatchObject({ density: 'formula', power: true })
  })

  it('are levels where they do not name f', () => {
    const text = '  t0: 4.1 K\n  m0: 3.1 ng\n  rate0: 2π × 0.05 Hz\n'
    const { budget, spec } = noiseOf('density: "= sqrt(4*k_B*t0*m0*rate0)"', text)
    if (spec.density !== 'level' || !('formula' in spec.level)) throw new Error('no level by a formula')
    const expected = Math.sqrt(4 * boltzmannConstant * 4.1 * 3.1e-12 * 2 * Math.PI * 0.05)
    expect(numberOf(budget, spec.level) / expected).toBeCloseTo(1, 12)
  })

  it('may follow a power law by exponent and reference', () => {
    expect(densityOf('density: "= (1 aN/√Hz)*2", exponent: -1, reference: 1 MHz')).toMatchObject({ density: 'level' })
  })

  it('fill an array in place, and name the frequency at which they fail', () => {
    const spec = densityOf('expression: "= (2 aN/√Hz)*sqrt(f/(1 MHz) - 0.5)"')
    if (spec.density !== 'formula') throw new Error('no formula')
    const both = Float64Array.of(1.5e6, 0.4e6)
    const refused = (() => {
      try {
        spec.formula.over(new Float64Array(0), both, both)
      } catch (error) {
        return error
      }
    })()
    expect(refused).toBeInstanceOf(Refusal)
    expect((refused as Refusal).problems[0]).toMatchObject({
      code: 'not-finite',
      place: { line: 20 },
      message: '`sqrt(f/(1 MHz) - 0.5)` is not a number at f = 400.000 kHz, as `f/(1 MHz) - 0.5` is -0.1',
    })
  })
})
