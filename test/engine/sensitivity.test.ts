import { describe, expect, test } from 'vitest'
import { assess, evaluateAtFrequencies } from '../../src/engine/assess.js'
import { Changes } from '../../src/engine/sensitivity.js'
import { spreadOf } from '../../src/engine/uncertainty.js'
import type { Budget, Root, Slot } from '../../src/model/budget.js'
import { boltzmannConstant, reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { budgetOf, component, place } from './budget-of.js'

const root = (id: string, value: number, uncertainty: number, effect: Root['effect'] = 'statistical'): Root => ({
  id,
  value,
  uncertainty,
  distribution: 'normal',
  effect,
  dimension: 'number',
  text: `${value}`,
  about: null,
  evidence: null,
  measured: null,
  place,
})

/** Slots by the id of a root. */
const slotsOf =
  (roots: readonly Root[]) =>
  (id: string): Slot => ({ root: roots.findIndex(r => r.id === id) })

const turn = 2 * Math.PI

/** A membrane read in its phase on resonance through one lossless port, all numbers uncertain. */
function phaseReadout(changes: Partial<Budget> = {}): Budget {
  const roots = [
    root('mass', 2e-12, 1e-13),
    root('frequency', 1e6, 300),
    root('quality', 1e8, 1e6),
    root('temperature', 4, 0.1, 'systematic'),
    root('rate', turn * 2e6, turn * 1e5),
    root('coupling', turn * 1e16, turn * 2e14, 'systematic'),
    root('quanta', 1e5, 5e3),
    root('efficiency', 0.7, 0.03),
    root('detuning', 0, turn * 1e3),
  ]
  const slot = slotsOf(roots)
  return budgetOf(
    [
      component('mode', 'resonator', {
        mass: slot('mass'),
        frequency: slot('frequency'),
        quality: slot('quality'),
        law: 'viscous',
        temperature: slot('temperature'),
      }),
      component('cavity', 'cavity', {
        frequency: { constant: 2.8e14 },
        modes: new Map([['mode', { constant: 1 }]]),
        coupling: slot('coupling'),
        ports: new Map([['front', { rate: slot('rate') }]]),
        pump: { port: 'front', quanta: slot('quanta'), detuning: slot('detuning') },
      }),
      component('detector', 'homodyne', {
        reads: 'cavity.front',
        angle: { constant: Math.PI / 2 },
        efficiency: slot('efficiency'),
      }),
    ],
    { roots, band: { low: 0.5e6, high: 2e6, place }, reference: 1.2e6, ...changes },
  )
}

/**
 * The total of that budget in closed form, S_F = S_th + S_ba + |χ⁻¹|²S_x, S_ba = 2ħ²G²n̄κ/(κ²/4+ω²), S_x = ħ²/(η S_ba)
 * [Clerk et al., Rev. Mod. Phys. 82, 1155 (2010)], and its derivatives by hand. The point keeps its offset from the mode.
 */
function closedForm(
  values: Map<string, number>,
  offset: number,
): { thermal: number; back: number; imprecision: number; total: number } {
  const v = (id: string): number => values.get(id)!
  const omega0 = turn * v('frequency')
  const omega = turn * (v('frequency') + offset)
  const gamma = omega0 / v('quality')
  const x = (hbar * omega) / (2 * boltzmannConstant * v('temperature'))
  const thermal = (4 * boltzmannConstant * v('temperature') * v('mass') * gamma * x) / Math.tanh(x)
  const back = (2 * hbar ** 2 * v('coupling') ** 2 * v('quanta') * v('rate')) / (v('rate') ** 2 / 4 + omega ** 2)
  const stiffness = v('mass') * (-turn * offset) * (omega0 + omega)
  const inverse2 = stiffness ** 2 + (v('mass') * omega * gamma) ** 2
  const imprecision = (inverse2 * hbar ** 2) / (v('efficiency') * back)
  return { thermal, back, imprecision, total: thermal + back + imprecision }
}

/** Derivatives of the closed form by hand where they are short: total = thermal + back + imprecision. */
function handSlopes(values: Map<string, number>, offset: number): Record<string, number> {
  const v = (id: string): number => values.get(id)!
  const omega = turn * (v('frequency') + offset)
  const { thermal, back, imprecision } = closedForm(values, offset)
  const x = (hbar * omega) / (2 * boltzmannConstant * v('temperature'))
  const cavity = v('rate') ** 2 / 4 + omega ** 2
  const logBackByRate = 1 / v('rate') - v('rate') / 2 / cavity
  return {
    quanta: (back - imprecision) / v('quanta'),
    coupling: (2 * (back - imprecision)) / v('coupling'),
    efficiency: -imprecision / v('efficiency'),
    rate: (back - imprecision) * logBackByRate,
    mass: (thermal + 2 * imprecision) / v('mass'),
    // ∂ ln(T x coth x)/∂T = x/(T sinh x cosh x) at fixed ω.
    temperature: (thermal * x) / (v('temperature') * Math.sinh(x) * Math.cosh(x)),
  }
}

const valuesOf = (budget: Budget): Map<string, number> => new Map(budget.roots.map(r => [r.id, r.value]))

describe('derivatives of the total by its roots', () => {
  const budget = phaseReadout()
  const offsets = [-4e5, -20, 0, 0.004, 15, 3e3, 7e5]
  const evaluation = evaluateAtFrequencies(
    budget,
    offsets.map(offset => 1e6 + offset),
  )
  const slopes = new Changes(budget).sensitivities(evaluation, 'band')

  // Road: closed form, differentiated by hand. Central differences with a step of 3e-5 leave about 1e-9.
  test.each([...offsets.entries()])('point %d, %d Hz from the mode, to 1e-7', i => {
    expect(
      Math.abs(evaluation.total[i] / closedForm(valuesOf(budget), evaluation.points.offset[i]).total - 1),
    ).toBeLessThan(1e-10)
    for (const [id, expected] of Object.entries(handSlopes(valuesOf(budget), evaluation.points.offset[i]))) {
      const slope = slopes.find(s => budget.roots[s.root].id === id)!.total[i]
      const scale = Math.max(Math.abs(expected), (evaluation.total[i] / valuesOf(budget).get(id)!) * 1e-2)
      expect(Math.abs(slope - expected) / scale, id).toBeLessThan(1e-7)
    }
  })

  test('an uncertain frequency moves the resonance and leaves its depth', () => {
    const frequency = slopes.find(s => budget.roots[s.root].id === 'frequency')!
    const onResonance = offsets.indexOf(0)
    // The total at the mode is thermal and back-action: it changes by less than a few times δf/f, not by the detuning of 300 Hz from a width of 10 mHz.
    const relative = (frequency.total[onResonance] * 300) / evaluation.total[onResonance]
    expect(Math.abs(relative)).toBeLessThan(3 * 3e-4)
  })
})

describe('law of propagation', () => {
  const budget = budgetOf([], {
    roots: [root('a', 1, 1), root('b', 1, 1), root('c', 1, 1, 'systematic')],
    correlations: [{ roots: [0, 1], coefficient: -0.5, place }],
  })

  // JCGM 100:2008, 5.2.2, note 1: with r = +1 it is the linear sum; here r = −0.5 between two of three inputs.
  test('correlated inputs', () => {
    const { statistical, systematic, combined } = spreadOf(budget, [0, 1, 2], [3, 4, 12])
    expect(statistical).toBeCloseTo(Math.sqrt(9 + 16 - 12), 12)
    expect(systematic).toBe(12)
    expect(combined).toBeCloseTo(Math.sqrt(13 + 144), 12)
  })

  test('full correlation adds linearly', () => {
    const full = { ...budget, correlations: [{ roots: [0, 1] as const, coefficient: 1, place }] }
    expect(spreadOf(full, [0, 1], [3, 4]).combined).toBeCloseTo(7, 12)
  })

  /*
   * Gauge block, JCGM 100:2008 annex H.1: u_c² = 25² + 9.7² + (l_S θ̄ u(δα))² + (l_S α_S u(δθ))² with l_S = 50.000623 mm,
   * θ̄ = −0.1 °C, u(δα) = 0.58e-6/°C, α_S = 11.5e-6/°C, u(δθ) = 0.029 °C; u_c = 32 nm as printed.
   */
  test('gauge block of the GUM', () => {
    const block = budgetOf([], { roots: ['l', 'd', 'alpha', 'theta'].map(id => root(id, 1, 1)) })
    const length = 50.000623e6
    const changes = [25, 9.7, length * -0.1 * 0.58e-6, length * 11.5e-6 * 0.029]
    expect(spreadOf(block, [0, 1, 2, 3], changes).combined).toBeGreaterThan(31.5)
    expect(spreadOf(block, [0, 1, 2, 3], changes).combined).toBeLessThan(32.5)
  })
})

describe('an assessed budget', () => {
  // Road: by hand. At the reference far above the mode imprecision dominates: √S ∝ m/(G√(n̄ η)), and the rest is summed by the GUM.
  test('the headline carries the uncertainty of its roots', () => {
    const budget = phaseReadout({ reference: 1.9e6 })
    const { headlines, bands, rootShares } = assess(budget)
    const at = headlines.reference!
    const relative = at.asdSpread.combined / at.asd
    const mass = 0.05
    const coupling = 0.02
    const quanta = 0.5 * 0.05
    const efficiency = (0.5 * 0.03) / 0.7
    expect(relative).toBeGreaterThan(0.97 * Math.hypot(mass, coupling, quanta, efficiency))
    expect(relative).toBeLessThan(1.1 * Math.hypot(mass, coupling, quanta, efficiency))
    expect(at.asdSpread.systematic / at.asd).toBeGreaterThan(0.019)
    expect(at.asdSpread.systematic / at.asd).toBeLessThan(0.0205)
    expect(budget.roots[rootShares[0].root].id).toBe('mass')
    expect(rootShares[0].elasticity).toBeCloseTo(1, 1)
    expect(bands!.combined.every(value => value > 0 && Number.isFinite(value))).toBe(true)
  })

  test('a glance has the same headlines as a report', () => {
    const budget = phaseReadout()
    const glance = assess(budget, 'glance')
    expect(glance.bands).toBeNull()
    expect(glance.headlines).toEqual(assess(budget).headlines)
  })
})

describe('what stands still and what goes along', () => {
  /** One mode at 1.006(2) MHz, read with a white displacement noise; far below its frequency √S ∝ Ω² − ω². */
  const far = (): Budget => {
    const roots = [root('frequency', 1.006e6, 2e3)]
    return budgetOf(
      [
        component('mode', 'resonator', {
          mass: { constant: 1e-12 },
          frequency: { root: 0 },
          quality: { constant: 1e8 },
          law: 'viscous',
          temperature: { constant: 1e-3 },
        }),
        component('detector', 'displacement', {
          modes: new Map([['mode', { constant: 1 }]]),
          noise: {
            density: 'level',
            level: { constant: 1e-15 },
            power: false,
            exponent: { constant: 0 },
            reference: null,
          },
        }),
      ],
      { roots, band: { low: 0.9e6, high: 1.1e6, place }, reference: 1e6 },
    )
  }

  // Road: by hand. ∂ ln √S/∂Ω = 2Ω/(Ω² − ω²), so u(√S)/√S = 2·1.006·0.002/(1.006² − 1) = 0.3343.
  test('a named frequency beside the resonance stands still', () => {
    const { reference } = assess(far(), 'glance').headlines
    expect(reference!.asdSpread.combined / reference!.asd).toBeCloseTo((2 * 1.006 * 0.002) / (1.006 ** 2 - 1), 4)
  })

  test('the band does not jump, and stays below the total', () => {
    const { evaluation, bands } = assess(far())
    const relative = bands!.combined.map((u, i) => u / Math.sqrt(evaluation.total[i]))
    const steps = [...relative.keys()].slice(1).map(i => Math.abs(relative[i] - relative[i - 1]))
    expect(Math.max(...relative)).toBeLessThan(1)
    expect(Math.max(...steps)).toBeLessThan(0.05)
  })
})
