import { describe, expect, test } from 'vitest'
import { assess, evaluateAtFrequencies, evaluateBand, prepare } from '../../src/engine/assess.js'
import type { Budget } from '../../src/model/budget.js'
import type { Evaluation } from '../../src/model/evaluation.js'
import { reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { budgetOf, component, place, slot } from './budget-of.js'
import { readoutOf, type ReadoutOf } from './readout-of.js'

const turn = 2 * Math.PI

const readout: ReadoutOf = {
  modes: { drum: { mass: 1e-12, frequency: 1e6, quality: 1e9, temperature: 4 } },
  coupling: 1e17,
  ports: { front: { rate: 1e7 }, inner: { rate: 1e6 } },
  quanta: 1e3,
  efficiency: 0.8,
}
const band = { low: 0.9e6, high: 1.1e6, place }
const budget = readoutOf(readout, { band, reference: 1e6 })

const curvesOf = ({ total, added, lines, limits, response }: Evaluation): Float64Array[] => [
  total,
  added,
  response,
  ...[...lines, ...limits].map(c => c.psd),
]

describe('frequencies that a person asks for', () => {
  test('give the very values of the band where a point of it stands', () => {
    const whole = evaluateBand(prepare(budget))
    // Points next to a resonance are offsets that an absolute frequency cannot state; the others must agree.
    const far = [...whole.points.frequency.keys()].filter(i => Math.abs(whole.points.offset[i]) > 1)
    const asked = evaluateAtFrequencies(
      budget,
      far.map(i => whole.points.frequency[i]),
    )
    expect(far.length).toBeGreaterThan(100)
    for (const [c, curve] of curvesOf(asked).entries()) {
      const of = curvesOf(whole)[c]
      const size = whole.total
      for (const [k, i] of far.entries()) {
        // An offset of 1 Hz is known to 1e-10 of itself.
        expect(Math.abs(curve[k] - of[i]) / Math.max(Math.abs(of[i]), 1e-6 * size[i])).toBeLessThan(1e-8)
      }
    }
  })

  test('come back in the order in which they were asked, repetitions included', () => {
    const list = [1.05e6, 1e6, 0.95e6, 1e6]
    const { points, total } = evaluateAtFrequencies(budget, list)
    expect([...points.frequency]).toEqual(list)
    expect(total[1]).toBe(total[3])
    for (const [i, f] of list.entries()) expect(evaluateAtFrequencies(budget, [f]).total[0]).toBe(total[i])
  })

  test('may be one, none, and outside the band', () => {
    expect(evaluateAtFrequencies(budget, [1e6]).total.length).toBe(1)
    expect(evaluateAtFrequencies(budget, []).total.length).toBe(0)
    expect(evaluateAtFrequencies(budget, [1])?.total[0]).toBeGreaterThan(0)
    expect(evaluateAtFrequencies(budget, [1e12]).total[0]).toBeGreaterThan(0)
  })

  test('more than one block of points gives what one point gives', () => {
    const list = Array.from({ length: 1537 }, (_, i) => 0.9e6 + 130.3 * i)
    const { total } = evaluateAtFrequencies(budget, list)
    for (const i of [0, 511, 512, 1023, 1024, 1536])
      expect(total[i]).toBe(evaluateAtFrequencies(budget, [list[i]]).total[0])
  })

  test('on the resonance of quality 1e9 the thermal force is the white one of its bath', () => {
    const { lines, response } = evaluateAtFrequencies(budget, [1e6])
    const thermal = lines.find(l => l.id === 'thermal')!.psd[0]
    // Classical form; ħω/k_BT = 1.2e-5 enters squared over 12.
    expect(thermal / (4 * 1.380649e-23 * 4 * 1e-12 * ((turn * 1e6) / 1e9))).toBeCloseTo(1, 9)
    expect(Number.isFinite(response[0])).toBe(true)
  })

  test('the same list twice gives the same bits', () => {
    const list = [0.91e6, 1e6, 1.09e6]
    const [first, second] = [0, 1].map(() => curvesOf(evaluateAtFrequencies(budget, list)))
    expect(first).toEqual(second)
  })
})

describe('absolute zero', () => {
  test('leaves the zero point: twice nothing, 2ħ|Im χ⁻¹| for the bath', () => {
    const cold = readoutOf({ ...readout, modes: { drum: { ...readout.modes['drum'], temperature: 0 } } }, { band })
    const { lines } = evaluateAtFrequencies(cold, [0.95e6, 1e6])
    const thermal = lines.find(l => l.id === 'thermal')!.psd
    for (const [i, f] of [0.95e6, 1e6].entries()) {
      expect(thermal[i] / (2 * hbar * turn * f * 1e-12 * ((turn * 1e6) / 1e9))).toBeCloseTo(1, 12)
    }
  })

  test('is the limit of falling temperature', () => {
    const at = (temperature: number): number =>
      evaluateAtFrequencies(
        readoutOf({ ...readout, modes: { drum: { ...readout.modes['drum'], temperature } } }, { band }),
        [1e6],
      ).lines.find(l => l.id === 'thermal')!.psd[0]
    // hf/k_B at a megahertz is 48 µK.
    expect(at(1e-6) / at(0) - 1).toBeLessThan(1e-12)
    expect(at(1e-300) / at(0)).toBeCloseTo(1, 12)
  })
})

describe('assessment', () => {
  const assessment = assess(budget)

  test('says best, reference, and the band around the best', () => {
    const { best, reference, halfPowerBand } = assessment.headlines
    const { total, points } = assessment.evaluation
    expect(best.asd).toBeCloseTo(Math.sqrt(Math.min(...total)), 30)
    expect(reference?.frequency).toBe(1e6)
    expect(halfPowerBand.from).toBeLessThan(best.frequency)
    expect(halfPowerBand.to).toBeGreaterThan(best.frequency)
    const level = Math.min(...total) * 2
    const there = evaluateAtFrequencies(budget, [halfPowerBand.from, halfPowerBand.to]).total
    const inside = points.frequency.filter(f => f >= halfPowerBand.from && f <= halfPowerBand.to)
    expect(inside.length).toBeGreaterThan(2)
    // Ends are read between points, to the grid's 0.1 % in amplitude.
    for (const end of there) expect(Math.abs(end / level - 1)).toBeLessThan(4e-3)
  })

  test('margins are decibels of the power over the standard quantum limit', () => {
    const { best } = assessment.headlines
    const { total, added, limits } = evaluateAtFrequencies(budget, [best.frequency])
    const sql = limits.find(l => l.id === 'sql')!.psd[0]
    expect(best.totalMargin).toBeCloseTo(10 * Math.log10(total[0] / sql), 6)
    expect(best.addedMargin).toBeCloseTo(10 * Math.log10(added[0] / sql), 6)
  })

  test('shares of the total add up to one, largest first', () => {
    const { shares } = assessment.headlines.best
    expect(shares.reduce((sum, s) => sum + s.share, 0)).toBeCloseTo(1, 12)
    expect(shares.map(s => s.share)).toEqual(shares.map(s => s.share).sort((a, b) => b - a))
  })

  test('stretches of dominance cover the band without gap, and the named line is the largest inside each', () => {
    const { dominance } = assessment.headlines
    expect(dominance[0].from).toBe(band.low)
    expect(dominance.at(-1)!.to).toBe(band.high)
    for (const [i, { line, from, to, least, greatest }] of dominance.entries()) {
      if (i > 0) expect(from).toBe(dominance[i - 1].to)
      if (i > 0) expect(line).not.toBe(dominance[i - 1].line)
      const middle = evaluateAtFrequencies(budget, [(from + to) / 2])
      const shares = middle.lines.map(l => l.psd[0] / middle.total[0])
      expect(middle.lines[shares.indexOf(Math.max(...shares))].id).toBe(line)
      expect(least).toBeLessThanOrEqual(greatest)
      expect(greatest).toBeLessThanOrEqual(1 + 1e-12)
    }
  })

  test('states mode and cavity as the file says them', () => {
    const [mode] = assessment.modes
    expect([mode.id, mode.frequency]).toEqual(['drum', 1e6])
    expect(mode.linewidth).toBeCloseTo(1e-3, 15)
    const [cavity] = assessment.cavities
    expect(cavity.linewidth).toBeCloseTo(1.1e7 / turn, 6)
    expect(cavity.quanta).toBe(1e3)
    expect(assessment.unit).toBe('N/√Hz')
  })
})

describe('a plain readout', () => {
  const plain = (changes: Partial<Budget> = {}): Budget =>
    budgetOf(
      [
        component('drum', 'rigid', {
          mass: slot(2),
          frequency: slot(3),
          quality: slot(100),
          law: 'viscous',
          temperature: slot(300),
        }),
        component('detector', 'displacement', {
          modes: new Map([['drum', slot(1)]]),
          noise: { density: 'level', level: slot(1e-12), power: false, exponent: slot(0), reference: null },
        }),
      ],
      changes,
    )

  test('is warned about: no back-action', () => {
    const { warnings } = assess(plain({ readoutPlace: { ...place, line: 5 } }))
    expect(warnings.map(w => [w.code, w.place.line])).toEqual([['no-back-action', 5]])
    expect(warnings[0].message).toMatch(/^back-action missing: `detector` states its noise/)
  })

  test('its noise is white as a displacement and |χ⁻¹|² as a force', () => {
    const displacement = { quantity: 'displacement', weights: null, at: null, place } as const
    const [x, f] = [{ measurand: displacement }, {}].map(changes => evaluateAtFrequencies(plain(changes), [7, 3]))
    const noise = (e: Evaluation): Float64Array => e.sources.find(s => s.id === 'detector.noise')!.psd
    expect(noise(x)[0] / 1e-24).toBeCloseTo(1, 12)
    const stiffness = (g: number): number => 4 * turn ** 4 * ((9 - g * g) ** 2 + ((g * 3) / 100) ** 2)
    for (const [i, g] of [7, 3].entries()) expect(noise(f)[i] / (1e-24 * stiffness(g))).toBeCloseTo(1, 12)
  })

  test('acceleration of the frame is the force over the mass that follows it', () => {
    const acceleration = { quantity: 'acceleration', weights: null, at: null, place } as const
    const [a, f] = [{ measurand: acceleration }, {}].map(changes => evaluateAtFrequencies(plain(changes), [7]))
    expect(f.total[0] / a.total[0]).toBeCloseTo(4, 12)
  })

  test('added margin leaves out the bath', () => {
    const { best } = assess(plain()).headlines
    expect(best.addedMargin!).toBeLessThan(best.totalMargin!)
  })
})
