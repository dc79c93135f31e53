import { EigenvalueDecomposition } from 'ml-matrix'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { assemble } from '../../src/engine/assemble.js'
import { transferAt } from '../../src/engine/transfer-at.js'
import { energyDecay, polesOf, polesOfModes, type Pole } from '../../src/engine/poles.js'
import type { Network } from '../../src/model/network.js'
import { complex, magnitude } from '../../src/physics/complex.js'
import { driftOf } from './lyapunov.js'
import { randomReadout } from './random-readout.js'
import { readoutOf, type ReadoutOf } from './readout-of.js'

const turn = 2 * Math.PI

const networkOf = (readout: ReadoutOf): Network => assemble(readoutOf(readout))

const dark: ReadoutOf = {
  modes: { drum: { mass: 1e-12, frequency: 1e6, quality: 1e9 } },
  coupling: 1e17,
  ports: { front: { rate: 1e6 } },
  quanta: 1e-30,
  detuning: -2e6,
}

/** The pole with the largest distance to its nearest partner in another list, relative to the fastest rate. */
function distance(poles: readonly Pole[], others: readonly { re: number; im: number }[]): number {
  const fastest = Math.max(...others.map(magnitude))
  const nearest = poles.map(({ omega }) => Math.min(...others.map(o => Math.hypot(o.re - omega.re, o.im - omega.im))))
  return Math.max(...nearest) / fastest
}

describe('poles of modes and fields', () => {
  // Closed form: Ω√(1 − 1/4Q²) − iΓ/2, and ∓Δ − iκ/2; the polish keeps Γ/2 of a part in 1e9 to 1e-7 of itself.
  test('light off: those of the oscillator and of the cavity', () => {
    const network = networkOf(dark)
    const poles = polesOf(network)
    expect(poles.length).toBe(4)
    const drum = polesOfModes(network, poles).get('drum')!
    expect(drum.omega.re / (turn * 1e6)).toBeCloseTo(1, 12)
    expect(energyDecay(drum) / (turn * 1e-3)).toBeCloseTo(1, 7)
    const fields = poles.filter(p => Math.abs(p.omega.im) > 1e5)
    expect(fields.map(p => Math.round(p.omega.re)).sort((a, b) => a - b)).toEqual([-2e6, 2e6])
    for (const { omega } of fields) expect(omega.im / -5e5).toBeCloseTo(1, 9)
  })

  test('structural loss decays as Ωφ', () => {
    const network = networkOf({ ...dark, modes: { drum: { ...dark.modes['drum'], law: 'structural' } } })
    const drum = polesOfModes(network, polesOf(network)).get('drum')!
    expect(energyDecay(drum) / (turn * 1e-3)).toBeCloseTo(1, 7)
  })

  // Second derivation: eigenvalues of the drift matrix written down in the time domain; good to rounding of the fastest rate times the
  // condition of nearly equal poles.
  test('eigenvalues of the drift matrix', () => {
    fc.assert(
      fc.property(randomReadout({ modes: [1, 4] }), random => {
        const modes = Object.fromEntries(
          Object.entries(random.modes).map(([id, m], k) => [
            id,
            { ...m, law: 'viscous' as const, frequency: m.frequency * 1.2 ** k },
          ]),
        )
        const readout = { ...random, modes }
        const { drift } = driftOf(readout)
        const { realEigenvalues, imaginaryEigenvalues } = new EigenvalueDecomposition(drift)
        const eigenvalues = realEigenvalues.map((re, i) => complex(-imaginaryEigenvalues[i], re))
        const poles = polesOf(networkOf(readout))
        expect(poles.length).toBe(eigenvalues.length)
        expect(distance(poles, eigenvalues)).toBeLessThan(1e-9)
      }),
      { numRuns: 100, seed: 20270, endOnFailure: true },
    )
  })

  // R·(ω − pole) is the residue: the same at a hundredth and at a ten-thousandth of the width, to about the hundredth.
  test('next to the pole of a mode the response rises as 1/(ω − pole)', () => {
    fc.assert(
      fc.property(randomReadout({ modes: [1, 1] }), readout => {
        const network = networkOf(readout)
        for (const { at, omega } of polesOfModes(network, polesOf(network)).values()) {
          const width = Math.abs(omega.im)
          const residue = (part: number): number => {
            const aside = { anchor: at.anchor, shift: complex(at.shift.re + part * width, at.shift.im) }
            return magnitude(transferAt(network, network.measurand, aside)) * part
          }
          expect(Math.abs(residue(1e-4) / residue(1e-2) - 1)).toBeLessThan(0.05)
        }
      }),
      { numRuns: 40, seed: 20271, endOnFailure: true },
    )
  })
})

describe('poles of modes', () => {
  test('each mode gets its own, nearest first', () => {
    const modes = {
      low: { mass: 1e-12, frequency: 1e6, quality: 1e6 },
      high: { mass: 1e-12, frequency: 1.0001e6, quality: 1e6 },
    }
    const network = networkOf({ ...dark, modes })
    const assigned = polesOfModes(network, polesOf(network))
    expect(Math.round(assigned.get('high')!.omega.re / turn)).toBe(1000100)
    expect(Math.round(assigned.get('low')!.omega.re / turn)).toBe(1000000)
  })

  test('a free mass has none', () => {
    const network = networkOf({ ...dark, modes: { mirror: { mass: 1, frequency: 0 } } })
    expect(polesOfModes(network, polesOf(network)).size).toBe(0)
  })
})

// Two equal modes among four in a cavity far wider than their frequencies: an iteration without bound stood still on this matrix.
test('equal modes in a wide cavity', () => {
  const mode = { mass: 4e-9, frequency: 1.409e6, quality: 8e7 }
  const modes = {
    one: mode,
    other: mode,
    third: { ...mode, frequency: 1.93e6 },
    fourth: { ...mode, frequency: 2.49e6 },
  }
  const readout = { modes, coupling: 2.4e9, ports: { front: { rate: 1.97e9 } }, quanta: 1, detuning: 0.98e9 }
  const poles = polesOf(networkOf(readout))
  expect(poles.length).toBe(10)
  const found = poles.map(({ omega }) => omega.re / turn).filter(f => f > 0 && f < 1e8)
  expect(found.toSorted((a, b) => a - b).map(f => Math.round(f / 1e3))).toEqual([1409, 1409, 1930, 2490])
})
