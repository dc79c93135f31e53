import { describe, expect, test } from 'vitest'
import { evaluateAtFrequencies, prepare } from '../../src/engine/assess.js'
import type { Budget } from '../../src/model/budget.js'
import { Refusal, type Problem } from '../../src/model/problem.js'
import { reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { place } from './budget-of.js'
import { readoutOf, type ReadoutOf } from './readout-of.js'

const turn = 2 * Math.PI

function problemsOf(budget: Budget): readonly Problem[] {
  try {
    prepare(budget)
    return []
  } catch (error) {
    if (error instanceof Refusal) return error.problems
    throw error
  }
}

/** The budget with its pump at a line of its own. */
function withPumpAt(budget: Budget, line: number): Budget {
  const components = budget.components.map(c =>
    c.id === 'cavity' ? { ...c, places: new Map([['pump', { ...place, line, column: 9 }]]) } : c,
  )
  return { ...budget, components }
}

const [Omega, quality, kappa] = [1e6, 1e6, 4e6]
const mass = 1e-12

const pumped = (quanta: number, detuning: number, coupling = 1e17): ReadoutOf => ({
  modes: { drum: { mass, frequency: Omega, quality, temperature: 1 } },
  coupling,
  ports: { front: { rate: kappa } },
  quanta,
  detuning,
})

describe('blue detuning', () => {
  // Closed form of weak coupling: parametric instability where 4g²/κ·[…] = Γ.
  const blue = turn * Omega
  const antidamping = (quanta: number): number => {
    const g2 = ((1e17 * 1e17 * hbar) / (2 * mass * turn * Omega)) * quanta
    return g2 * kappa * (1 / (kappa ** 2 / 4) - 1 / (kappa ** 2 / 4 + (2 * blue) ** 2))
  }
  const threshold = (turn * Omega) / quality / antidamping(1)

  test.each([0.9, 0.99, 0.999])('%s of the threshold is stable', part => {
    expect(problemsOf(readoutOf(pumped(part * threshold, blue)))).toEqual([])
  })

  test.each([1.001, 1.01, 2, 100])('%s of the threshold is refused', part => {
    const [problem] = problemsOf(withPumpAt(readoutOf(pumped(part * threshold, blue)), 14))
    expect(problem.code).toBe('unstable')
    expect([problem.place.line, problem.place.column]).toEqual([14, 9])
  })

  test('the message says where, how fast, and what would be right', () => {
    const [problem] = problemsOf(readoutOf(pumped(2 * threshold, blue)))
    expect(problem.message).toMatch(
      /^this working point is unstable: light amplifies the motion at 1(\.0+)?e\+6|^this working point is unstable: light amplifies the motion at 1000000 Hz by 1(\.00\d)? Hz/,
    )
    expect(problem.message).toMatch(/a negative or smaller detuning, or less pump power would be right$/)
    expect(problem.severity).toBe('error')
  })

  test('no curve is computed there', () => {
    expect(() => evaluateAtFrequencies(readoutOf(pumped(2 * threshold, blue)), [1e6])).toThrow(Refusal)
  })

  test('linewidths next to the threshold are what is left of the damping', () => {
    const { poles } = prepare(readoutOf(pumped(0.999 * threshold, blue)))
    const slowest = Math.min(...poles.map(p => -2 * p.omega.im))
    // A thousandth of Γ to a percent: weak coupling is Γ/κ = 2e-6 off.
    expect(slowest / ((turn * Omega) / quality / 1000)).toBeCloseTo(1, 2)
  })
})

describe('static spring', () => {
  // Closed form, ω → 0: unstable where 2ħG²n̄|Δ|/(κ²/4 + Δ²) > mΩ² at Δ < 0.
  const red = -3e7
  const threshold = (mass * (turn * Omega) ** 2 * (kappa ** 2 / 4 + red ** 2)) / (2 * hbar * 1e17 ** 2 * Math.abs(red))

  test.each([0.5, 0.99, 0.9999])('%s of the threshold is stable', part => {
    expect(problemsOf(readoutOf(pumped(part * threshold, red)))).toEqual([])
  })

  test.each([1.0001, 1.1, 10])('%s of the threshold is refused', part => {
    const [problem] = problemsOf(readoutOf(pumped(part * threshold, red)))
    expect(problem.message).toMatch(/the spring of the light pulls harder than the mechanical spring holds/)
    expect(problem.message).toMatch(/less pump power, or a smaller detuning would be right$/)
  })
})

describe('passive networks', () => {
  test('resonant light never destabilises, however strong', () => {
    for (const quanta of [1, 1e6, 1e12]) expect(problemsOf(readoutOf(pumped(quanta, 0)))).toEqual([])
  })

  test('a free mass under resonant light is at the margin and allowed', () => {
    for (const quanta of [1, 1e8, 1e16]) {
      const readout = { ...pumped(quanta, 0), modes: { mirror: { mass: 1e-3, frequency: 0 } } }
      expect(problemsOf(readoutOf(readout))).toEqual([])
    }
  })

  test('a free mass in detuned light is refused: its spring or its damping has the wrong sign', () => {
    for (const detuning of [-1e6, 1e6]) {
      const readout = { ...pumped(1e16, detuning), modes: { mirror: { mass: 1e-3, frequency: 0 } } }
      expect(problemsOf(readoutOf(readout)).map(p => p.code)).toEqual(['unstable'])
    }
  })
})
