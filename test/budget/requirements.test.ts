import { describe, expect, it } from 'vitest'
import { changed, good, lines, read, small } from './read.js'

const required = (text: string, base = small) => `${base}requirements:\n  goal: { ${text} }\n`
const one = (text: string, base = small) => good(required(text, base)).requirements[0]

describe('requirements', () => {
  it.each([
    [
      'of: total, at: 1.243 MHz, below: 20 aN/√Hz',
      { of: 'total', where: { at: 1.243e6 }, bound: 'below', value: 2e-17 },
    ],
    ['of: total, at: 1.243 MHz, below: 400 aN²/Hz', { bound: 'below', value: 2e-17, text: '400 aN²/Hz' }],
    ['of: thermal, over: 1.21 MHz to 1.22 MHz, below: 1 fN/√Hz', { where: { from: 1.21e6, to: 1.22e6 }, value: 1e-15 }],
    ['of: drum.bath, at: 1.25 MHz, below: 1 fN/√Hz', { of: 'drum.bath' }],
    ['of: margin.sql, at: 1.25 MHz, below: -3 dB', { of: 'margin.sql', bound: 'below', value: -3 }],
    ['of: occupancy.drum, below: 0.9, about: ground state', { where: null, value: 0.9, about: 'ground state' }],
  ])('%s', (text, expected) => {
    const { value, ...rest } = expected as { value?: number }
    const read = one(text)
    expect(read).toMatchObject({ id: 'goal', ...rest })
    if (value !== undefined) expect((read?.value ?? NaN) / value).toBeCloseTo(1, 12)
  })

  it('measure the total in the measurand’s own unit', () => {
    const displaced = changed(['{ quantity: force, mode: drum }', '{ quantity: displacement }'])
    expect(one('of: total, at: 1.25 MHz, below: 2 am/√Hz', displaced)?.value).toBeCloseTo(2e-18, 30)
    expect(lines(read(required('of: total, at: 1.25 MHz, below: 2 aN/√Hz', displaced)))).toEqual([
      expect.stringMatching(/^budget\.yaml:18:43: .*a density of displacement is wanted/),
    ])
  })

  it('may be bound by parameters and expressions', () => {
    const parameters = changed(['components:', 'parameters: { best: 2 aN/√Hz, here: 1.25 MHz }\ncomponents:'])
    expect(one('of: total, at: here, below: best', parameters)).toMatchObject({
      where: { at: 1.25e6 },
      value: 2e-18,
      text: 'best',
    })
    const doubled = one('of: total, at: here, below: = best*2', parameters)
    expect([doubled?.text, (doubled?.value ?? NaN) / 4e-18]).toEqual(['= best*2', 1])
  })

  it('can be of a line that the file lists', () => {
    const listed = `${small}contributions:\n  stray: { kind: force-noise, into: drum, density: 2 aN/√Hz }\n`
    expect(one('of: stray, at: 1.25 MHz, below: 3 aN/√Hz', listed)?.of).toBe('stray')
  })
})
