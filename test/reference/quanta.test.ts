import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { boltzmannConstant, planckConstant, reducedPlanckConstant } from '../../src/physics/constants.js'
import {
  callenWeltonTemperature,
  decibelsOfZeroPoint,
  frequencyOfOccupancy,
  groundStateProbability,
  occupancy,
  quantumEnergy,
  sidebandRatio,
  temperatureOfOccupancy,
  xCothX,
  zeroPointAmplitude,
} from '../../src/physics/quanta.js'
import { deviation, type Check } from './check.js'

const turn = 2 * Math.PI

/** Tolerances: 1e-6 for recomputed values, otherwise the rounding of the printed number. */
const checks: readonly Check[] = [
  {
    quantity: 'effective temperature of 5 GHz at 20 mK in K',
    computed: () => callenWeltonTemperature(turn * 5e9, 0.02),
    expected: 0.11998255401430992,
    tolerance: 1e-6,
    source: 'Callen, Welton, Phys. Rev. 83, 34 (1951)',
  },
  {
    quantity: 'effective temperature over temperature where hf = kT',
    computed: () => callenWeltonTemperature(boltzmannConstant / reducedPlanckConstant, 1),
    expected: 1.0819767068693265,
    tolerance: 1e-9,
    source: 'Callen, Welton, Phys. Rev. 83, 34 (1951): (x/2) coth(x/2) at x = 1',
  },
  {
    quantity: 'quanta of 10.56 MHz at 20 mK',
    computed: () => occupancy(turn * 10.56e6, 0.02),
    expected: 39,
    tolerance: 0.03,
    source: 'Teufel et al., Nature 475, 359 (2011): about 40, from memory',
  },
  {
    quantity: 'quanta of 3.68 GHz at 20 K',
    computed: () => occupancy(turn * 3.68e9, 20),
    expected: 112.74323111845747,
    tolerance: 1e-6,
    source: 'Chan et al., Nature 478, 89 (2011): frequency and temperature of the abstract',
  },
  {
    quantity: 'ground-state probability at 3.8 quanta',
    computed: () => groundStateProbability(3.8),
    expected: 0.21,
    tolerance: 0.02,
    source: 'Rocheleau et al., Nature 463, 72 (2010), abstract: 0.21',
  },
  {
    quantity: 'ground-state probability at 0.85 quanta',
    computed: () => groundStateProbability(0.85),
    expected: 0.54,
    tolerance: 0.005,
    source: 'Chan et al., Nature 478, 89 (2011): 0.85 from the abstract, 54 % from memory',
  },
  {
    quantity: '0.09 quanta in dB of the zero-point energy',
    computed: () => decibelsOfZeroPoint(0.09),
    expected: -7.4,
    tolerance: 0.01,
    source: 'Qiu et al., Phys. Rev. Lett. 124, 173601 (2020), abstract: -7.4 dB; the reference is half a quantum',
  },
  {
    quantity: 'frequency with 0.43 quanta at 12 µK in Hz',
    computed: () => frequencyOfOccupancy(0.43, 12e-6) / turn,
    expected: 305e3,
    tolerance: 0.03,
    source: 'Delić et al., Science 367, 892 (2020): 0.43(3) and 12 µK from the abstract, 305 kHz from memory',
  },
  {
    quantity: 'temperature of 480 quanta at 6.3 MHz in K',
    computed: () => temperatureOfOccupancy(turn * 6.3e6, 480),
    expected: 0.14528023425828404,
    tolerance: 1e-6,
    source: 'Rocheleau et al., Nature 463, 72 (2010): 480 from the abstract, 6.3 MHz from memory',
  },
  {
    quantity: 'sideband ratio at 0.85 quanta',
    computed: () => sidebandRatio(0.85),
    expected: 0.45945945945945943,
    tolerance: 1e-9,
    source: 'Safavi-Naeini et al., Phys. Rev. Lett. 108, 033602 (2012): n/(n+1)',
  },
  {
    quantity: 'quanta of 1 kHz at 10 mK',
    computed: () => occupancy(turn * 1e3, 0.01),
    expected: 208365.6912336757,
    tolerance: 1e-6,
    source: 'Bose function',
  },
  {
    quantity: 'product Q·f for one coherent oscillation at 300 K in Hz',
    computed: () => (boltzmannConstant * 300) / planckConstant,
    expected: 6250985736998.272,
    tolerance: 1e-6,
    source: 'Qf > kT/h; quoted as 6.2e12 Hz',
  },
  {
    quantity: 'zero-point motion of a 40 kg pendulum of 1 Hz in m',
    computed: () => zeroPointAmplitude(40, turn),
    expected: 4.580397330251365e-19,
    tolerance: 1e-6,
    source: '√(ħ/2mω)',
  },
]

describe('quanta against published numbers', () => {
  test.each(checks)('$quantity', check => {
    expect(deviation(check), check.source).toBeLessThanOrEqual(check.tolerance)
  })

  test('the linear form kT/hf would give half the temperature of 0.43 quanta: the Bose form is meant', () => {
    const linear = (0.43 * planckConstant * 305e3) / boltzmannConstant
    expect(linear).toBeCloseTo(6.3e-6, 7)
  })
})

describe('limits and identities', () => {
  const omegas = fc.double({ min: 1, max: 1e12, noNaN: true })
  const temperatures = fc.double({ min: 1e-3, max: 1e3, noNaN: true })

  test('kT·x coth x is ħω(n + ½)', () => {
    fc.assert(
      fc.property(omegas, temperatures, (omega, temperature) => {
        const left = boltzmannConstant * callenWeltonTemperature(omega, temperature)
        expect(left / (quantumEnergy(omega) * (occupancy(omega, temperature) + 0.5))).toBeCloseTo(1, 12)
      }),
    )
  })

  test('temperature of the occupancy is the temperature', () => {
    fc.assert(
      fc.property(omegas, temperatures, (omega, temperature) => {
        // Below 1e-300 quanta the occupancy has no digits left to invert.
        fc.pre(occupancy(omega, temperature) > 1e-300)
        expect(temperatureOfOccupancy(omega, occupancy(omega, temperature)) / temperature).toBeCloseTo(1, 12)
      }),
    )
  })

  test('cold and hot ends', () => {
    expect(occupancy(1e9, 0)).toBe(0)
    expect(occupancy(1e12, 1e-6)).toBe(0)
    expect(occupancy(1e9, -1)).toBeNaN()
    expect(callenWeltonTemperature(1e9, 0)).toBe((reducedPlanckConstant * 1e9) / boltzmannConstant / 2)
    expect(temperatureOfOccupancy(1e9, 0)).toBe(0)
    // The next term of n + ½ = 1/x + x/12 is 1e-19 of the first here.
    const x = (reducedPlanckConstant * 1e3) / (boltzmannConstant * 300)
    expect((occupancy(1e3, 300) + 0.5) * x).toBeCloseTo(1, 14)
  })

  test('x coth x is even, 1 at zero, |x| far out, and smooth where its branches meet', () => {
    expect(xCothX(0)).toBe(1)
    expect(xCothX(-3)).toBe(xCothX(3))
    expect(xCothX(800)).toBe(800)
    expect(xCothX(Infinity)).toBe(Infinity)
    expect(xCothX(NaN)).toBeNaN()
    expect(Math.abs(xCothX(1.0000001e-8) - 1)).toBeLessThan(3e-16)
    expect(xCothX(0.01)).toBeCloseTo(1 + 1e-4 / 3 - 1e-8 / 45, 13)
  })

  test('probability, ratio and decibels at their ends', () => {
    expect(groundStateProbability(0)).toBe(1)
    expect(sidebandRatio(0)).toBe(0)
    expect(decibelsOfZeroPoint(0.5)).toBe(0)
    expect(zeroPointAmplitude(1, 0)).toBe(Infinity)
  })
})
