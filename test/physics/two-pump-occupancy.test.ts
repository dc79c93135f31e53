import { describe, expect, test } from 'vitest'
import { evadedQuanta } from '../../src/physics/evaded-quanta.js'
import { occupancy } from '../../src/physics/quanta.js'
import { quadratureOccupancies } from '../../src/physics/two-pump-occupancy.js'
import type { TwoPumpCavity } from '../../src/physics/two-pump.js'

const twoPi = 2 * Math.PI
const omega = twoPi * 5e6

function cavityWith(changes: Partial<TwoPumpCavity>, kappa = 0.1 * omega, quanta = 0): TwoPumpCavity {
  return {
    mass: 5e-14,
    omega,
    gamma: omega / 1e7,
    temperature: 0.02,
    coupling: twoPi * 100,
    ports: [{ id: 'front', rate: kappa, occupancy: quanta }],
    red: 0,
    blue: 0,
    halfSpacing: omega,
    spacingError: 0,
    detuning: 0,
    ...changes,
  }
}

describe('quadratures', () => {
  test('without pumps both have the quanta of the bath', () => {
    const { measured, conjugate } = quadratureOccupancies(cavityWith({}))
    const bath = occupancy(omega, 0.02)
    expect(measured / bath).toBeCloseTo(1, 5)
    expect(conjugate / bath).toBeCloseTo(1, 5)
  })

  test.each([
    [1e4, 0],
    [1e6, 0.4],
  ])('equal pumps of %s quanta add the exact Δn₁ and Δn₂', (pump, quanta) => {
    const cavity = cavityWith({ red: pump, blue: pump, temperature: 0 }, 0.1 * omega, quanta)
    const exact = evadedQuanta(cavity, 0)
    const { measured, conjugate } = quadratureOccupancies(cavity)
    // The field answers within 2/κ, the motion within 2/Γ: white noise is what the law takes.
    expect(Math.abs(measured / exact.measured - 1)).toBeLessThan(2e-3)
    expect(Math.abs(conjugate / exact.conjugate - 1)).toBeLessThan(1e-4)
  })

  test('the red pump alone cools both as sideband cooling says', () => {
    const kappa = 0.2 * omega
    const cavity = cavityWith({ red: 3e4, temperature: 0.01 }, kappa)
    const strength = (4 * cavity.coupling ** 2 * cavity.red) / kappa
    const optical = strength * (1 - 1 / (1 + ((4 * omega) / kappa) ** 2))
    const bath = occupancy(omega, 0.01)
    const expected = (cavity.gamma * bath + optical * (kappa / (4 * omega)) ** 2) / (cavity.gamma + optical)
    const { measured, conjugate } = quadratureOccupancies(cavity)
    expect((measured + conjugate) / 2 / expected).toBeCloseTo(1, 2)
    expect(measured / conjugate).toBeCloseTo(1, 2)
  })

  test('a red pump stronger than the blue one squeezes the measured quadrature and heats the other', () => {
    const { measured, conjugate } = quadratureOccupancies(cavityWith({ red: 3e6, blue: 1.5e6, temperature: 0 }))
    expect(measured).toBeLessThan(-0.2)
    expect(conjugate).toBeGreaterThan(0.5)
    expect((measured + 0.5) * (conjugate + 0.5)).toBeGreaterThan(0.25)
  })
})
