import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { assess } from '../../src/engine/assess.js'
import type { Root } from '../../src/model/budget.js'
import { changed, good, lines, read, small } from './read.js'

function massOf(text: string): Root {
  const root = good(changed(['mass: 3.1(2) ng', `mass: ${text}`])).roots.find(({ id }) => id === 'drum.mass')
  if (root === undefined) throw new Error('no mass')
  return root
}

describe('what an uncertainty describes', () => {
  it('is normal and statistical where nothing is said', () => {
    expect(massOf('3.1(2) ng')).toMatchObject({ distribution: 'normal', effect: 'statistical' })
    expect(massOf('{ value: 3.1(2) ng, effect: systematic }')).toMatchObject({
      distribution: 'normal',
      effect: 'systematic',
    })
  })

  // JCGM 100:2008, 4.3.7: bounds of ±0.40 around 16.52 give the standard uncertainty 0.40/√3 = 0.23.
  it.each([
    ['normal', '(16.52 ± 0.40) ng', 0.4],
    ['rectangular', '(16.52 ± 0.40) ng', 0.4 / Math.sqrt(3)],
    ['triangular', '(16.52 ± 0.40) ng', 0.4 / Math.sqrt(6)],
    ['lognormal', '(16.52 ± 0.40) ng', 0.4],
    ['rectangular', '16.52 ng +/- 0.40 ng', 0.4 / Math.sqrt(3)],
    ['rectangular', '20 ng ± 2 %', 0.4 / Math.sqrt(3)],
    ['rectangular', '16.52(40) ng', 0.4],
    ['triangular', '16.52(40) ng', 0.4],
  ])('%s: `%s`', (distribution, value, expected) => {
    const root = massOf(`{ value: ${value}, distribution: ${distribution} }`)
    expect(root.distribution).toBe(distribution)
    expect(root.uncertainty / 1e-12).toBeCloseTo(expected, 12)
  })
})

describe('correlations', () => {
  const names = ['m0', 'q0', 't0'] as const
  const parameters = '  m0: 3.1(2) ng\n  q0: 2.4(1)e7\n  t0: 4.1(1) K\n'
  const text = (entries: readonly (readonly [number, number, number])[]) => {
    const list = entries.map(
      ([a, b, coefficient]) => `  - { between: [${names[a]}, ${names[b]}], coefficient: ${coefficient} }\n`,
    )
    const used = changed(
      ['components:', `parameters:\n${parameters}components:`],
      ['mass: 3.1(2) ng', 'mass: m0'],
      ['quality: 2.4e7', 'quality: q0'],
      ['temperature: 4.1 K', 'temperature: t0'],
    )
    return `${used}correlations:\n${list.join('')}`
  }

  it('are kept between roots', () => {
    const budget = good(text([[0, 2, -0.8]]))
    expect(
      budget.correlations.map(({ roots, coefficient }) => [roots.map(i => budget.roots[i]?.id), coefficient]),
    ).toEqual([[['m0', 't0'], -0.8]])
  })

  it('may be complete', () => {
    const all = [
      [0, 1, 1],
      [1, 2, 1],
      [0, 2, 1],
    ] as const
    expect(good(text(all)).correlations).toHaveLength(3)
  })

  it('say nothing of a parameter that no field uses', () => {
    const unused = text([[0, 1, 0.5]]).replace('quality: q0', 'quality: 2.4e7')
    const budget = good(unused)
    expect([budget.correlations, budget.warnings.map(({ code }) => code)]).toEqual([[], ['unused']])
  })

  it('are refused exactly where some combination would have a negative variance', () => {
    const coefficient = fc.integer({ min: -99, max: 99 }).map(hundredths => hundredths / 100)
    fc.assert(
      fc.property(coefficient, coefficient, coefficient, (a, b, c) => {
        // The determinant of a symmetric matrix with ones on its diagonal, all smaller minors being positive.
        const determinant = 1 + 2 * a * b * c - a * a - b * b - c * c
        fc.pre(Math.abs(determinant) > 1e-9)
        const told = lines(
          read(
            text([
              [0, 1, a],
              [1, 2, b],
              [0, 2, c],
            ]),
          ),
        )
        expect(told.length === 0).toBe(determinant > 0)
      }),
      { numRuns: 60, seed: 20261201 },
    )
  })
})

describe('a spectrum of n averages', () => {
  // Welch, IEEE Trans. Audio Electroacoust. 15, 70 (1967): the power of n independent spectra is known to 1/√n, its root to half of it.
  it('carries 1/√n of its power to the line and to the total', () => {
    const noise =
      'contributions:\n  tip: { kind: force-noise, into: drum, table: { file: tip.csv, units: [Hz, N/√Hz], averages: 25 } }\n'
    const { budget } = read(
      small.replace('3.1(2) ng', '3.1 ng').replace('band:', 'reference: 1.25 MHz\nband:') + noise,
      {
        'tip.csv': '1e6,3e-15\n2e6,3e-15\n',
      },
    )
    const { lineSpreads, atReference, headlines } = assess(budget!, 'glance')
    const tip = atReference.lines.findIndex(line => line.id === 'tip')
    expect(lineSpreads[tip].combined / 3e-15).toBeCloseTo(0.5 / 5, 8)
    const { asd, asdSpread } = headlines.reference!
    expect(asdSpread.combined).toBeCloseTo((0.5 / 5) * (9e-30 / asd), 24)
  })
})
