import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { evaluateAtFrequencies } from '../../src/engine/assess.js'
import type { Evaluation } from '../../src/model/evaluation.js'
import { Refusal } from '../../src/model/problem.js'
import { reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { randomReadout } from '../engine/random-readout.js'
import { readoutOf, type ReadoutOf } from '../engine/readout-of.js'

/*
 * Road: limits of quantum measurement that hold for every readout of the kind [Clerk et al., Rev. Mod. Phys. 82, 1155 (2010), section IV;
 * Braginsky, Khalili, Quantum Measurement (Cambridge, 1992)]. One-sided densities: S_x·S_F = ħ², four times the two-sided ħ²/4.
 */

const turn = 2 * Math.PI
const mode = { mass: 2e-12, frequency: 1e6, quality: 1e5, temperature: 0 } as const

/** Σ|part| over sources that belong to the readout, referred to the force. */
function partOf(evaluation: Evaluation, part: 'imprecision' | 'backAction' | 'correlation'): number[] {
  return [...evaluation.total.keys()].map(i =>
    evaluation.sources.reduce((sum, source) => sum + (source.vacuum?.[part][i] ?? 0), 0),
  )
}

const limit = (evaluation: Evaluation, id: string): Float64Array =>
  evaluation.limits.find(l => l.id === id)?.psd ?? new Float64Array()

/** |χ|² of the bare mode. */
function response(frequency: number): number {
  const [omega, omega0] = [turn * frequency, turn * mode.frequency]
  return 1 / (mode.mass ** 2 * ((omega0 ** 2 - omega ** 2) ** 2 + (omega * omega0) ** 2 / mode.quality ** 2))
}

const resonant = (kappa: number, changes: Partial<ReadoutOf> = {}): ReadoutOf => ({
  modes: { drum: mode },
  coupling: 1e17,
  ports: { front: { rate: kappa } },
  quanta: 1e4,
  ...changes,
})

/** S_x·S_F of the readout over ħ² where both stand alone: resonant pump, phase quadrature. */
function products(readout: ReadoutOf, frequencies: readonly number[]): number[] {
  const evaluation = evaluateAtFrequencies(readoutOf(readout), frequencies)
  const imprecision = partOf(evaluation, 'imprecision')
  const backAction = partOf(evaluation, 'backAction')
  return frequencies.map((f, i) => (imprecision[i] * response(f) * backAction[i]) / hbar ** 2)
}

describe('product of imprecision and back-action, pump on resonance, phase quadrature', () => {
  const frequencies = [3e3, 1e5, 0.999e6, 1e6, 1.003e6, 7e6, 2e8]

  // Identity; 1e-11 leaves a hundred roundings of the transfer and of the bare response formed here without offsets.
  test.each([1e3, 1e5, 1e7, 1e9])('one port, κ = %s rad/s: ħ² at every frequency', kappa => {
    for (const product of products(resonant(kappa), frequencies)) expect(Math.abs(product - 1)).toBeLessThan(1e-11)
  })

  test.each([
    [0.9, 1],
    [0.3, 1],
    [0.9, 0.4],
    [0.25, 0.05],
  ])('share %s of κ detected with efficiency %s: ħ²κ/(ηκ_d)', (share, efficiency) => {
    const ports = { inner: { rate: (1 - share) * 2e6 }, out: { rate: share * 2e6 } }
    for (const product of products(resonant(2e6, { ports, reads: 'out', efficiency }), frequencies)) {
      expect(Math.abs(product * share * efficiency - 1)).toBeLessThan(1e-11)
    }
  })

  test('without loss the two are uncorrelated', () => {
    const evaluation = evaluateAtFrequencies(readoutOf(resonant(2e6)), frequencies)
    for (const [i, c] of partOf(evaluation, 'correlation').entries()) {
      expect(Math.abs(c) / evaluation.added[i]).toBeLessThan(1e-12)
    }
  })
})

describe('added noise at the best power', () => {
  const at = 1.03e6
  const added = (readout: ReadoutOf, quanta: number, power = 1): number => {
    const evaluation = evaluateAtFrequencies(readoutOf({ ...readout, quanta: quanta * power }), [at])
    return evaluation.added[0] / limit(evaluation, 'sql')[0]
  }
  /** Quanta at which imprecision, which falls as 1/n̄, meets back-action, which grows with n̄. */
  const best = (readout: ReadoutOf): number => {
    const evaluation = evaluateAtFrequencies(readoutOf(readout), [at])
    return readout.quanta * Math.sqrt(partOf(evaluation, 'imprecision')[0] / partOf(evaluation, 'backAction')[0])
  }

  // Limit; 1e-12 is rounding.
  test('is the standard quantum limit, and more at any other power', () => {
    const readout = resonant(3e6)
    const quanta = best(readout)
    expect(Math.abs(added(readout, quanta) - 1)).toBeLessThan(1e-12)
    for (const power of [0.5, 0.9, 1.1, 2]) expect(added(readout, quanta, power)).toBeGreaterThan(1 + 1e-3)
    expect(added(readout, quanta, 2)).toBeCloseTo(1.25, 12)
  })

  test('with loss it is 1/√(η κ_d/κ) of that limit', () => {
    const ports = { inner: { rate: 1e6 }, out: { rate: 3e6 } }
    const readout = resonant(4e6, { ports, reads: 'out', efficiency: 0.5 })
    expect(added(readout, best(readout))).toBeCloseTo(1 / Math.sqrt(0.5 * 0.75), 11)
  })

  // Limit: the best angle and power reach 2ħ|Im χ⁻¹| for ω ≪ κ; Q = 20 so that the optimum is broad enough to search for. κ = 1e12 leaves
  // (ω/κ)² = 4e-11, the search some 1e-8.
  test.each([0.6e6, 0.97e6, 1.3e6])(
    'best angle and power reach the correlation limit at %s Hz, below the standard one',
    f => {
      const drum = { ...mode, quality: 20 }
      const ratio = (record: number, quanta: number, id: string): number => {
        const readout = resonant(1e12, { modes: { drum }, coupling: 1e20, record, quanta })
        const evaluation = evaluateAtFrequencies(readoutOf(readout), [f])
        return evaluation.added[0] / limit(evaluation, id)[0]
      }
      const bestAngle = (quanta: number): number =>
        least(angle => ratio(angle, quanta, 'correlation_limit'), 0, Math.PI, 12)
      const logarithm = least(n => ratio(bestAngle(10 ** n), 10 ** n, 'correlation_limit'), 0, 9, 9)
      const [quanta, angle] = [10 ** logarithm, bestAngle(10 ** logarithm)]
      const reached = ratio(angle, quanta, 'correlation_limit')
      expect(reached).toBeGreaterThan(1 - 1e-9)
      expect(reached).toBeLessThan(1 + 1e-6)
      expect(ratio(angle, quanta, 'sql')).toBeLessThan(0.9)
    },
  )
})

describe('zero-point noise', () => {
  // Identity: the bath at T = 0 and twice nothing else; 1e-12 is rounding.
  test.each(['viscous', 'structural'] as const)('is the bath at zero temperature, %s', law => {
    const cold = { ...mode, law }
    const evaluation = evaluateAtFrequencies(
      readoutOf({ ...resonant(1e6), modes: { drum: cold } }),
      [1e4, 9e5, 1e6, 4e6],
    )
    const bath = evaluation.sources.find(s => s.id === 'drum.bath')!
    for (const [i, psd] of limit(evaluation, 'zero_point').entries()) expect(bath.psd[i] / psd).toBeCloseTo(1, 12)
  })

  // Published formula: S_x = 2ħ/(mΩΓ) [Anetsberger et al., Phys. Rev. A 82, 061804 (2010)]; 1 ng, 1 MHz, Q = 1e6; check D26.
  test('peak of a nanogram at a megahertz', () => {
    const readout = resonant(1e6, { modes: { drum: { mass: 1e-12, frequency: 1e6, quality: 1e6 } } })
    const evaluation = evaluateAtFrequencies(readoutOf(readout, { measurand: displacement }), [1e6])
    expect(Math.sqrt(limit(evaluation, 'zero_point')[0]) / 2.311389893546307e-15).toBeCloseTo(1, 6)
    // The imprecision at the optimum is half of it in power [Teufel et al., Nature Nanotech. 4, 820 (2009)]; check D27.
    const optimum = resonant(1e9, {
      modes: { drum: { mass: 1e-12, frequency: 1e6, quality: 1e6 } },
      coupling: 1e15,
    })
    const parts = (quanta: number): [number, number] => {
      const here = evaluateAtFrequencies(readoutOf({ ...optimum, quanta }, { measurand: displacement }), [1e6])
      return [partOf(here, 'imprecision')[0], partOf(here, 'backAction')[0]]
    }
    const [imprecision, backAction] = parts(1)
    const [best] = parts(Math.sqrt(imprecision / backAction))
    expect(Math.sqrt(best) / 1.634399467692646e-15).toBeCloseTo(1, 6)
  })

  const displacement = {
    quantity: 'displacement',
    weights: null,
    at: null,
    place: { file: 'test', line: 1, column: 1 },
  } as const
})

describe('standard quantum limit of one mode and a force', () => {
  // Identity 2ħ|χ⁻¹| with the bare χ whatever the light does; 1e-12 is rounding. The last light is 2e8 times as stiff as the mode at its
  // resonance, which must not cost eight digits.
  test.each([
    ['viscous', 0, 1e2],
    ['structural', -3e6, 1e4],
    ['viscous', -3e6, 1e9],
  ] as const)('%s, detuning %s rad/s, %s quanta', (law, detuning, quanta) => {
    const drum = { ...mode, quality: 1e9, law }
    const readout = resonant(4e7, { modes: { drum }, detuning, quanta, record: 1 })
    const width = drum.frequency / drum.quality
    const offsets = [-0.9e6, -100, -width, 0, width / 2, 1, 5e6]
    const evaluation = evaluateAtFrequencies(
      readoutOf(readout),
      offsets.map(offset => drum.frequency + offset),
    )
    for (const [i, psd] of limit(evaluation, 'sql').entries()) {
      const f = evaluation.points.frequency[i]
      const offset = evaluation.points.offset[i]
      const loss = law === 'viscous' ? (f * drum.frequency) / drum.quality : drum.frequency ** 2 / drum.quality
      const stiffness = drum.mass * turn ** 2 * Math.hypot(offset * (f + drum.frequency), loss)
      const anchored = evaluation.points.anchors[evaluation.points.anchor[i]].frequency === drum.frequency
      if (anchored) expect(psd / (2 * hbar * stiffness)).toBeCloseTo(1, 12)
    }
    const anchors = new Set([...evaluation.points.anchor].map(a => evaluation.points.anchors[a].id))
    expect(anchors.has('drum')).toBe(true)
  })
})

describe('photon number at the standard quantum limit', () => {
  // Published formula n̄ = κΓ/(16 g₀²) with ω ≪ κ [Clerk et al. 2010]; κ/2π = 1 MHz, Γ/2π = 1 Hz, g₀/2π = 100 Hz: 6.25; check D30.
  test('on resonance imprecision and back-action are equal there', () => {
    const [kappa, gamma, g0] = [turn * 1e6, turn, turn * 100]
    const drum = { mass: 1e-12, frequency: 100, quality: (turn * 100) / gamma }
    const zeroPoint = Math.sqrt(hbar / (2 * drum.mass * turn * drum.frequency))
    const readout = resonant(kappa, { modes: { drum }, coupling: g0 / zeroPoint, quanta: 6.25 })
    const evaluation = evaluateAtFrequencies(readoutOf(readout), [drum.frequency])
    // ω/κ = 1e-4 enters squared.
    expect(partOf(evaluation, 'imprecision')[0] / partOf(evaluation, 'backAction')[0]).toBeCloseTo(1, 6)
    expect(evaluation.added[0] / limit(evaluation, 'sql')[0]).toBeCloseTo(1, 6)
  })
})

/** At random readouts and frequencies far off, near and on the resonances. */
function searched(readout: ReadoutOf, check: (evaluation: Evaluation) => void): boolean {
  const frequencies = Object.values(readout.modes).flatMap(m => {
    const width = m.frequency / m.quality!
    return [0.1 * m.frequency, m.frequency - width, m.frequency, m.frequency + 0.3 * width, 1.01 * m.frequency]
  })
  try {
    check(evaluateAtFrequencies(readoutOf(readout), [...frequencies, 1e8]))
    return true
  } catch (error) {
    const codes = error instanceof Refusal ? error.problems.map(p => p.code) : []
    if (codes.includes('unstable') || codes.includes('no-carrier')) return false
    throw error
  }
}

describe('bounds that no readout passes, over random readouts', () => {
  const binding = ['correlation_limit', 'energy_bound'] as const

  // 1e-9: lossless readouts saturate the bounds, and a sum of parts that cancel a thousandfold loses some digits.
  test('added noise', () => {
    let stable = 0
    fc.assert(
      fc.property(randomReadout({ modes: [1, 3] }), readout => {
        const good = searched(readout, evaluation => {
          for (const id of binding) {
            for (const [i, bound] of limit(evaluation, id).entries()) {
              expect(evaluation.added[i], `${id} at ${evaluation.points.frequency[i]} Hz`).toBeGreaterThan(
                bound * (1 - 1e-9),
              )
            }
          }
        })
        if (good) stable++
      }),
      { numRuns: 600, seed: 20261 },
    )
    expect(stable).toBeGreaterThan(400)
  })

  test('cold totals are at least twice the zero-point noise', () => {
    fc.assert(
      fc.property(randomReadout({ modes: [1, 1], cold: true }), readout => {
        searched(readout, evaluation => {
          for (const [i, zero] of limit(evaluation, 'zero_point').entries()) {
            expect(evaluation.total[i]).toBeGreaterThan(2 * zero * (1 - 1e-9))
          }
        })
      }),
      { numRuns: 400, seed: 20262 },
    )
  })
})

describe('readouts without loss', () => {
  // Limit reached: one port, vacuum, η = 1. With the pump on resonance every angle saturates the energy-fluctuation bound at the angle that
  // minimises it only, so that the bound is compared with the least over angles.
  test('reach the energy-fluctuation bound at their best angle', () => {
    for (const [kappa, detuning] of [
      [2e6, 0],
      [4e7, 0],
      [2e7, -1e7],
      [2e6, -6e6],
    ]) {
      const ratio = (record: number): number => {
        const evaluation = evaluateAtFrequencies(
          readoutOf(resonant(kappa, { detuning, record, quanta: 3e3, coupling: 3e16 })),
          [0.97e6],
        )
        return evaluation.added[0] / limit(evaluation, 'energy_bound')[0]
      }
      expect(ratio(least(ratio, 0, Math.PI, 60)), `κ ${kappa}, Δ ${detuning}`).toBeGreaterThan(1 - 1e-9)
      // Off resonance the bound is reached only where a single quadrature holds all that the port carries of the force.
      if (detuning === 0) expect(ratio(least(ratio, 0, Math.PI, 60))).toBeLessThan(1 + 1e-6)
    }
  })
})

/** Where a smooth function is least: a scan of `steps` intervals, then golden section. */
function least(of: (x: number) => number, from: number, to: number, steps: number): number {
  const width = (to - from) / steps
  const scan = Array.from({ length: steps }, (_, i) => from + (i + 0.5) * width)
  const values = scan.map(of)
  const start = scan[values.indexOf(Math.min(...values))]
  let [left, right] = [start - width, start + width]
  const golden = (Math.sqrt(5) - 1) / 2
  let [a, b] = [right - golden * (right - left), left + golden * (right - left)]
  let [atA, atB] = [of(a), of(b)]
  for (let i = 0; i < 20; i++) {
    if (atA < atB) {
      ;[right, b, atB] = [b, a, atA]
      a = right - golden * (right - left)
      atA = of(a)
    } else {
      ;[left, a, atA] = [a, b, atB]
      b = left + golden * (right - left)
      atB = of(b)
    }
  }
  return (left + right) / 2
}
