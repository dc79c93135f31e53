import { describe, expect, test } from 'vitest'
import { assess, evaluateAtFrequencies } from '../../src/engine/assess.js'
import type { Evaluation } from '../../src/model/evaluation.js'
import { reducedPlanckConstant as hbar, speedOfLight as c } from '../../src/physics/constants.js'
import { splitDetection } from '../../src/physics/reflected-light.js'
import { good, read } from '../budget/read.js'

const turn = 2 * Math.PI

const part = (evaluation: Evaluation, of: 'imprecision' | 'backAction'): number =>
  evaluation.sources.reduce((sum, source) => sum + (source.vacuum?.[of][0] ?? 0), 0)

describe('Michelson interferometer without cavities: 10 W, 10 kg, 4 km, 1064 nm', () => {
  /*
   * Road: published formulas, checks D23, D24 and D25. Two free end mirrors of 10 kg, difference of the arms with the reduced mass 5 kg, dark port;
   * the textbook forms [Saulson, from memory] are for mid-fringe and one port, √2 larger and √2 smaller.
   */
  const at = (f: number, detector = ''): Evaluation =>
    evaluateAtFrequencies(
      good(`format: 1
title: Michelson
revision: 1
measurand: { quantity: force, mode: difference }
readout: detector
band: 10 Hz to 1 kHz
components:
  difference: { kind: free-mass, mass: 5 kg }
  detector: { kind: free-space-interferometer, modes: { difference: 1 }, arrangement: michelson, power: 10 W, wavelength: 1064 nm${detector} }
`),
      [f],
    )
  const force = (f: number): number => 5 * 4000 * (turn * f) ** 2

  test('shot noise (1/L)√(ħcλ/4πP)', () => {
    expect(Math.sqrt(part(at(100), 'imprecision')) / force(100) / 4.090292093013533e-21).toBeCloseTo(1, 8)
  })

  test('radiation pressure (1/mf²L)√(ħP/π³cλ)', () => {
    expect(Math.sqrt(part(at(100), 'backAction')) / force(100) / 8.163419504186148e-28).toBeCloseTo(1, 8)
  })

  test('2 h_shot h_rp is the limit of two free mirrors, 4ħ/mω²L²; with loss the product of the powers is 1/η of it', () => {
    const product = (evaluation: Evaluation): number =>
      Math.sqrt(part(evaluation, 'imprecision') * part(evaluation, 'backAction')) / force(100) ** 2
    const limit = (4 * hbar) / (10 * (turn * 100) ** 2 * 4000 ** 2)
    expect((2 * product(at(100))) / limit).toBeCloseTo(1, 10)
    expect((2 * product(at(100, ', efficiency: 0.64'))) / limit).toBeCloseTo(1 / 0.8, 10)
  })
})

describe('one mirror', () => {
  const budget = (detector: string): string => `format: 1
title: Mirror
revision: 1
measurand: { quantity: displacement, at: detector }
readout: detector
band: 0.1 MHz to 10 MHz
components:
  mirror: { kind: resonator, mass: 2 ng, frequency: 1 MHz, quality: 1e5, temperature: 0 K }
  detector: { ${detector} }
`
  const light = 'modes: { mirror: 1 }, power: 2 mW, wavelength: 1064 nm'
  const at = (detector: string, f = 3e6): Evaluation => evaluateAtFrequencies(good(budget(detector)), [f])
  const [power, wavelength] = [2e-3, 1.064e-6]
  const interferometer = (more = ''): string => `kind: free-space-interferometer, ${light}${more}`

  /*
   * Road: second derivation, from photons. Phase 2kx of light whose phase has the shot noise ħω₀/2P; photons arrive as a Poisson process of rate
   * P/ħω₀, one-sided density twice the rate, and each brings 2ħk.
   */
  test('shot noise ħcλ/16πP and the force of Poisson arrivals', () => {
    const evaluation = at(interferometer())
    const k = turn / wavelength
    const energy = hbar * c * k
    expect(part(evaluation, 'imprecision') / (energy / (2 * power) / (2 * k) ** 2)).toBeCloseTo(1, 12)
    const chi2 = 1 / ((2e-12 * turn ** 2 * (1e12 - 9e12)) ** 2 + (2e-12 * turn ** 2 * 3e12 * 1e-5) ** 2)
    expect(part(evaluation, 'backAction') / chi2 / ((2 * power) / energy) / (2 * hbar * k) ** 2).toBeCloseTo(1, 9)
  })

  test('efficiency, reflections and incidence', () => {
    const plain = at(interferometer())
    const ratio = (more: string, of: 'imprecision' | 'backAction'): number =>
      part(at(interferometer(more)), of) / part(plain, of)
    expect(ratio(', efficiency: 25 %', 'imprecision')).toBeCloseTo(4, 12)
    expect(ratio(', efficiency: 25 %', 'backAction')).toBeCloseTo(1, 12)
    expect(ratio(', reflections: 3', 'imprecision')).toBeCloseTo(1 / 9, 12)
    expect(ratio(', reflections: 3', 'backAction')).toBeCloseTo(9, 12)
    expect(ratio(', incidence: 60°', 'imprecision')).toBeCloseTo(4, 12)
    expect(ratio(', incidence: 60°', 'backAction')).toBeCloseTo(0.25, 12)
  })

  test('no limit is passed, and nothing is said of missing back-action', () => {
    const { warnings, evaluation } = assess(good(budget(interferometer())))
    expect(warnings).toEqual([])
    expect(evaluation.limits.map(limit => limit.id)).toEqual(['sql', 'correlation_limit', 'zero_point', 'energy_bound'])
  })

  test('grazing light is refused', () => {
    const { problems } = read(budget(interferometer(', incidence: 90°')))
    expect(problems.map(problem => problem.message)).toEqual([
      'light that comes in at 90° from the normal hardly sees the surface move; an angle between -89° and 89° is wanted',
    ])
  })

  describe('optical lever', () => {
    const lever = (more = ''): string => `kind: lever, ${light}, spot: 20 µm, arm: 150 µm, lift: 0${more}`

    // Road: second derivation by quadrature over the beam: the tilted field's overlap with the first odd mode, and with the sign of the two halves.
    const overlap = (weight: (xi: number) => number): number => {
      const w = 20e-6
      // The kink of |ξ| costs a part (12/n)²/4 or so.
      const n = 200_000
      let sum = 0
      for (let i = 0; i < n; i++) {
        const xi = ((i + 0.5) / n - 0.5) * 12 * w
        sum += weight(xi) * Math.sqrt(2 / Math.PI) * (Math.exp((-2 * xi * xi) / (w * w)) / w) * ((12 * w) / n)
      }
      return sum
    }
    const k = turn / wavelength
    /** Variance of where photons land, and mean distance from the middle. */
    const [variance, distance] = [overlap(xi => xi * xi), overlap(Math.abs)]
    const shot = (hbar * c * k) / (2 * power)

    test('matched detection: S_ϑ = (ħω₀/2P)/⟨(2kξ)²⟩', () => {
      const expected = (shot / (4 * k * k * variance)) * 150e-6 ** 2
      expect(part(at(lever(', detection: matched')), 'imprecision') / expected).toBeCloseTo(1, 9)
    })

    // In the far field the odd part of the beam lies in quadrature with the even one; the split sign overlaps with it as |ξ|/√⟨ξ²⟩ does here.
    test('a split detector sees ⟨|ξ|⟩²/⟨ξ²⟩ = 2/π of it, which is the default', () => {
      expect(distance ** 2 / variance).toBeCloseTo(splitDetection, 7)
      const [split, matched] = [lever(), lever(', detection: matched')].map(text => part(at(text), 'imprecision'))
      expect(split / matched).toBeCloseTo(Math.PI / 2, 12)
    })

    test('back-action is the torque of photons that land at random, 2ħk·ξ each', () => {
      const torque = ((2 * power) / (hbar * c * k)) * (2 * hbar * k) ** 2 * variance
      const chi2 = 1 / ((2e-12 * turn ** 2 * (1e12 - 9e12)) ** 2 + (2e-12 * turn ** 2 * 3e12 * 1e-5) ** 2)
      expect(part(at(lever()), 'backAction') / chi2 / (torque / 150e-6 ** 2)).toBeCloseTo(1, 8)
    })

    test('where the spot moves along, the power pushes as well, as in any reflection', () => {
      const pressure = (lift: number): number =>
        at(lever().replace('lift: 0', `lift: ${lift}`)).sources.find(source => source.id === 'detector.pressure')!
          .psd[0]
      expect(pressure(1) / part(at(interferometer()), 'backAction')).toBeCloseTo(1, 12)
      expect(pressure(0.5) / pressure(1)).toBeCloseTo(0.25, 12)
    })
  })
})
