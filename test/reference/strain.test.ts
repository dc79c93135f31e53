import { describe, expect, test } from 'vitest'
import { assemble } from '../../src/engine/assemble.js'
import { assess, evaluateAtFrequencies } from '../../src/engine/assess.js'
import { evaluateAt } from '../../src/engine/evaluate.js'
import { absolutePoints } from '../../src/engine/points.js'
import { add, complex, divide, multiply, norm, polar, reciprocal, scale, subtract } from '../../src/physics/complex.js'
import {
  boltzmannConstant as kB,
  reducedPlanckConstant as hbar,
  speedOfLight as c,
} from '../../src/physics/constants.js'
import { good, read } from '../budget/read.js'

const turn = 2 * Math.PI

describe('bar antenna', () => {
  /* A bar of 2270 kg and 3 m: effective mass M/2, effective length 4L/π². */
  const bar = (changes = ''): string => `format: 1
title: Bar antenna
revision: 1
measurand: { quantity: strain, mode: bar }
readout: detector
band: 850 Hz to 980 Hz
reference: 915 Hz
components:
  bar: { kind: resonator, mass: = (2270 kg)/2, frequency: 915 Hz, quality: 2e6, temperature: 2.6 K, strain_length: = 4*(3 m)/pi^2 }
  detector: { kind: displacement, modes: { bar: 1 }, noise: 1e-20 m/√Hz }
${changes}`

  /*
   * Road: published formula, check C47. S_h = (π/4)kT/(M Q L² f₀³), one-sided, derived with m_eff = M/2, L_eff = 4L/π², F = ½m_eff L_eff ω²h;
   * Astone et al. print (π/8), the two-sided form, and 6e-22/√Hz for such a bar (from memory): a factor 2 in power. 1e-6 as stated:
   * kT is the classical limit, (hf/kT)²/12 is 1e-16.
   */
  test('thermal strain on resonance, 9.49e-22/√Hz', () => {
    const { sources } = evaluateAtFrequencies(good(bar()), [915])
    const strain = Math.sqrt(sources.find(source => source.id === 'bar.bath')!.psd[0])
    expect(Math.abs(strain / 9.490572993596284e-22 - 1)).toBeLessThan(1e-6)
    expect(Math.abs(strain / Math.sqrt(((Math.PI / 4) * kB * 2.6) / (2270 * 2e6 * 9 * 915 ** 3)) - 1)).toBeLessThan(
      1e-9,
    )
  })

  test('away from it the thermal strain falls as ω⁻² of a white force', () => {
    const { sources } = evaluateAtFrequencies(good(bar()), [850, 980])
    const { psd } = sources.find(source => source.id === 'bar.bath')!
    expect(psd[0] / psd[1]).toBeCloseTo((980 / 850) ** 4, 9)
  })

  test('a displacement noise is read as strain through the response', () => {
    const { added } = evaluateAtFrequencies(good(bar()), [900])
    const force = 0.5 * 1135 * ((4 * 3) / Math.PI ** 2) * (turn * 900) ** 2
    const response = force / (1135 * Math.hypot((turn * 915) ** 2 - (turn * 900) ** 2, (turn ** 2 * 915 * 900) / 2e6))
    expect(Math.sqrt(added[0]) / (1e-20 / response)).toBeCloseTo(1, 9)
  })

  test('the report has its unit, and a requirement is a strain', () => {
    const assessment = assess(good(bar('requirements:\n  goal: { of: total, at: 915 Hz, below: 1e-21 1/√Hz }\n')))
    expect(assessment.unit).toBe('1/√Hz')
    expect(assessment.requirements[0].met).toBe(true)
  })

  test('without its length a strain is an error that says so', () => {
    const text = bar().replace(', strain_length: = 4*(3 m)/pi^2', '')
    expect(read(text).problems.map(problem => problem.message)).toEqual([
      'a strain pushes `bar` by its effective length, which is not known; give `strain_length`, 4/π² of its length for a bar',
    ])
    expect(read(text.replace('resonator', 'rigid')).problems.map(problem => problem.message)).toEqual([
      'a strain pushes `bar` by its effective length, which is not known; push a `resonator` with a `strain_length` or an `interferometer` instead',
    ])
  })
})

describe('interferometer', () => {
  const [m, L, gamma, power] = [40, 4000, turn * 100, 2e5]
  const wavelength = 1.064e-6
  const omega0 = (turn * c) / wavelength
  const budget = (
    changes: { ports?: string; detector?: string; detuning?: string; more?: string } = {},
  ): string => `format: 1
title: Interferometer
revision: 1
measurand: { quantity: strain, at: arms }
readout: detector
band: 5 Hz to 5 kHz
reference: 100 Hz
components:
  arms:
    kind: interferometer
    arm_length: 4 km
    mirror_mass: 40 kg
    arm_power: 200 kW
    wavelength: 1064 nm
    bandwidth: 100 Hz
    ports: ${changes.ports ?? '{ dark: {} }'}
    ${changes.detuning ?? ''}
  detector: { kind: homodyne, reads: arms.dark${changes.detector ?? ''} }
${changes.more ?? ''}`
  const sql = (f: number): number => (8 * hbar) / (m * (turn * f) ** 2 * L ** 2)
  const strength = (f: number): number => {
    const omega = turn * f
    return (16 * omega0 * power * gamma) / (m * L * c * omega ** 2 * (gamma ** 2 + omega ** 2))
  }
  const frequencies = [5, 20, 100, 300, 5e3]
  const strain = (text: string): Float64Array => evaluateAtFrequencies(good(text), frequencies).total

  // Road: published formulas, exact for this model [Kimble et al., Phys. Rev. D 65, 022002 (2001)]; 1e-10 leaves rounding.
  test('S_h = (h_SQL²/2)(K + 1/K)', () => {
    for (const [i, value] of strain(budget()).entries()) {
      const K = strength(frequencies[i])
      expect(Math.abs(value / ((sql(frequencies[i]) / 2) * (K + 1 / K)) - 1)).toBeLessThan(1e-10)
    }
  })

  test('the standard quantum limit is that of four free mirrors', () => {
    const { limits } = evaluateAtFrequencies(good(budget()), frequencies)
    for (const [i, value] of limits.find(limit => limit.id === 'sql')!.psd.entries())
      expect(Math.abs(value / sql(frequencies[i]) - 1)).toBeLessThan(1e-12)
  })

  test('squeezed and variational', () => {
    const ports = '{ dark: { squeezing: { level: 10 dB } } }'
    for (const [i, value] of strain(budget({ ports })).entries()) {
      const K = strength(frequencies[i])
      expect(Math.abs(value / ((sql(frequencies[i]) / 2) * (10 * K + 0.1 / K)) - 1)).toBeLessThan(1e-10)
    }
    const angle = (35 * Math.PI) / 180
    for (const [i, value] of strain(budget({ detector: ', angle: 35°' })).entries()) {
      const K = strength(frequencies[i])
      const expected = (1 + (1 / Math.tan(angle) - K) ** 2) / K
      expect(Math.abs(value / ((sql(frequencies[i]) / 2) * expected) - 1)).toBeLessThan(1e-9)
    }
  })

  // Losses inside: S_imp is 1/share of the lossless one, back-action is that of all ports.
  test('a lossy arm', () => {
    const ports = '{ dark: { share: 0.8 }, arms: { share: 0.2 } }'
    for (const [i, value] of strain(budget({ ports })).entries()) {
      const K = strength(frequencies[i])
      expect(Math.abs(value / ((sql(frequencies[i]) / 2) * (K + 1 / (0.8 * K))) - 1)).toBeLessThan(1e-10)
    }
    const { problems } = read(budget({ ports: '{ dark: { share: 0.8 }, arms: { share: 0.3 } }' }))
    expect(problems.map(problem => problem.message)).toEqual([
      'the shares of the ports of `arms` add up to 1.1; change one of them so that the sum is 1',
    ])
  })

  /*
   * Road: second derivation, detuned. Both fields and the mirror are eliminated by hand: a = χ(iGā x + √κ a_in), x = (F + ħGā(a + a†))/M,
   * y = e^{−iθ}(√κ a − a_in) + conjugate; the angle counts from the light of the arms. The free mirror on an optical spring is unstable, as
   * the budget says, so that its curves are taken from the network. 1e-9: the spring cancels three digits near its resonance.
   */
  test('detuned, the optical spring included', () => {
    const [theta, delta, kappa] = [1.1, turn * 30, 2 * gamma]
    const sensor = good(budget({ detuning: 'detuning: 30 Hz', detector: ', angle: 1.1 rad' }))
    expect(() => evaluateAtFrequencies(sensor, [100])).toThrow(/unstable|grows/)
    const { total } = evaluateAt(sensor, assemble(sensor), absolutePoints(frequencies), {
      sources: false,
      limits: false,
    })
    const push = (omega0 / (2 * L)) * Math.sqrt((4 * power * L) / (hbar * omega0 * c))
    for (const [i, f] of frequencies.entries()) {
      const omega = turn * f
      const chi = reciprocal(complex(kappa / 2, -(delta + omega)))
      const twin = reciprocal(complex(kappa / 2, delta - omega))
      const stiffness = multiply(complex(0, hbar * push * push), subtract(chi, twin))
      const inertia = subtract(complex((-m / 4) * omega ** 2), stiffness)
      const [u, v] = [polar(1, -theta), polar(1, theta)]
      const perMetre = scale(
        multiply(complex(0, 1), subtract(multiply(u, chi), multiply(v, twin))),
        Math.sqrt(kappa) * push,
      )
      const response = scale(divide(perMetre, inertia), (m / 4) * L * omega ** 2)
      const noise = [
        { weight: u, field: chi },
        { weight: v, field: twin },
      ].map(({ weight, field }) => {
        const force = scale(field, hbar * push * Math.sqrt(kappa))
        const direct = multiply(weight, subtract(scale(field, kappa), complex(1)))
        return norm(add(direct, divide(multiply(perMetre, force), inertia)))
      })
      // One-sided vacuum: 2·½ in each of the two.
      expect(Math.abs(total[i] / ((noise[0] + noise[1]) / norm(response)) - 1)).toBeLessThan(1e-9)
    }
  })

  test('forces and displacements enter it by its name', () => {
    const more = `contributions:
  gravity: { kind: force-noise, into: arms, density: 1 pN/√Hz }
  ground: { kind: displacement-noise, into: arms, density: 1e-19 m/√Hz }
`
    const { sources } = evaluateAtFrequencies(good(budget({ more })), [100])
    const of = (id: string): number => Math.sqrt(sources.find(source => source.id === id)!.psd[0])
    expect(of('gravity') / (1e-12 / ((m / 4) * L * (turn * 100) ** 2))).toBeCloseTo(1, 10)
    // Differential arm length x₁ − x₂ of coordinates whose mass is m/4: a displacement of it is L·h.
    expect(of('ground') / (1e-19 / L)).toBeCloseTo(1, 10)
  })
})
