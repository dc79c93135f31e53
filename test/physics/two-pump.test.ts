import { describe, expect, test } from 'vitest'
import { reducedPlanckConstant } from '../../src/physics/constants.js'
import { evadedQuanta } from '../../src/physics/evaded-quanta.js'
import { occupancy } from '../../src/physics/quanta.js'
import { twoPumpExponents } from '../../src/physics/two-pump-stability.js'
import { harmonicDensities, quadratureRow, twoPumpForce, type TwoPumpCavity } from '../../src/physics/two-pump.js'

const twoPi = 2 * Math.PI

/** Equal pumps exactly one mechanical frequency from a resonant cavity; the mechanics so slow to decay that it turns as e^{−iΩt}. */
function balanced(kappaOverOmega: number, changes: Partial<TwoPumpCavity> = {}): TwoPumpCavity {
  const omega = twoPi * 5e6
  const kappa = kappaOverOmega * omega
  return {
    mass: 5e-14,
    omega,
    gamma: omega / 1e8,
    temperature: 0.02,
    coupling: twoPi * 100,
    ports: [
      { id: 'front', rate: 0.8 * kappa, occupancy: 0.1 },
      { id: 'inner', rate: 0.2 * kappa, occupancy: 0.7 },
    ],
    red: 3e3,
    blue: 3e3,
    halfSpacing: omega,
    spacingError: 0,
    detuning: 0,
    ...changes,
  }
}

/** Noise of a quadrature by the ports over its noise by the bath, times the bath's n + ½: the quanta that the light adds. */
function addedQuanta(cavity: TwoPumpCavity, phase: number, offset: number): number {
  const { ports, bath } = harmonicDensities(cavity, offset, quadratureRow(cavity, phase, offset))
  return ((ports[0] + ports[1]) / bath) * (occupancy(cavity.omega, cavity.temperature) + 0.5)
}

describe('quanta that the light adds, against the exact law', () => {
  test.each([
    [0.05, 1],
    [0.3, 0],
    [0.3, 40],
    [2, 0.3],
  ])('κ/Ω = %s at %s linewidths from the centre', (ratio, linewidths) => {
    const cavity = balanced(ratio)
    const offset = linewidths * cavity.gamma
    const exact = evadedQuanta(cavity, offset)
    // Half a linewidth in a frequency, Γ/Ω = 1e-8, and the offset over Ω are what the law leaves out.
    const left = (20 * (cavity.gamma + offset)) / cavity.omega
    const conjugate = addedQuanta(cavity, Math.PI / 2, offset) / exact.conjugate
    expect(Math.abs(conjugate - 1)).toBeLessThan(left + 1e-8)
    const measured = addedQuanta(cavity, 0, offset) / exact.measured
    expect(Math.abs(measured - 1)).toBeLessThan(1e-4)
  })

  test('in the resolved-sideband limit the measured quadrature takes κ²/32Ω² of what the other takes', () => {
    const { measured, conjugate } = evadedQuanta(balanced(1e-3), 0)
    expect(measured / conjugate / (1e-6 / 32)).toBeCloseTo(1, 5)
  })
})

describe('force noise', () => {
  const readout = { port: 0, angle: Math.PI / 2, efficiency: 0.7, added: 0.9 }
  const at = (cavity: TwoPumpCavity, offset: number) => twoPumpForce(cavity, readout, offset)

  test('the bath is that of the mode at Ω, one-sided 4ħΩ(n+½)mΓ', () => {
    const cavity = balanced(0.2)
    const { mass, omega, gamma, temperature } = cavity
    const expected = 4 * reducedPlanckConstant * omega * (occupancy(omega, temperature) + 0.5) * mass * gamma
    expect(at(cavity, twoPi * 0.1).bath / expected).toBeCloseTo(1, 7)
  })

  test('it is the same on both sides of the centre, detuned and imbalanced too', () => {
    const cavity = balanced(0.2, {
      blue: 2e3,
      detuning: twoPi * 2e4,
      spacingError: twoPi * 3,
      halfSpacing: twoPi * (5e6 - 3),
    })
    const [above, below] = [at(cavity, twoPi * 5), at(cavity, -twoPi * 5)]
    expect(above.total / below.total).toBeCloseTo(1, 10)
    expect(above.ports[1] / below.ports[1]).toBeCloseTo(1, 10)
  })

  /*
   * With X₁ = f₁/(Γ/2 − iW) and −i(a − a†) = χ_c(W)[2√2 g X₁ − i√κ_j(a_j − a_j†)] the imprecision of a port that is not read counts
   * (2n_j+1)κ_j(Γ²/4 + W²)/8g²Γ quanta of the bath; its back-action comes from other sidebands, 2Ω away, and is not correlated with it.
   */
  test.each([1e2, 1e5, 1e8])(
    'with %s quanta a port adds its imprecision and its share of the exact back-action',
    quanta => {
      const cavity = balanced(0.3, { red: quanta, blue: quanta })
      const { ports, gamma, coupling, omega, temperature } = cavity
      const offset = 0.7 * gamma
      const force = at(cavity, offset)
      const weight = ports.map(({ rate, occupancy: n }) => rate * (2 * n + 1))
      const imprecision = (weight[1] * (gamma ** 2 / 4 + offset ** 2)) / (8 * coupling ** 2 * quanta * gamma)
      const backAction = (evadedQuanta(cavity, offset).measured * weight[1]) / (weight[0] + weight[1])
      const found = (force.ports[1] / force.bath) * (occupancy(omega, temperature) + 0.5)
      expect(found / (imprecision + backAction)).toBeCloseTo(1, 4)
    },
  )
})

describe('stability', () => {
  test('without pumps motion and field decay with half their energy rates', () => {
    const cavity = balanced(0.2, { red: 0, blue: 0, gamma: twoPi * 500 })
    const exponents = twoPumpExponents(cavity)
    expect(exponents[0].growth / (-twoPi * 250)).toBeCloseTo(1, 6)
    expect(exponents.at(-1)!.growth / (-0.1 * cavity.omega)).toBeCloseTo(1, 6)
  })

  test('equal pumps leave the damping alone', () => {
    const cavity = balanced(0.05, { gamma: twoPi * 500 })
    expect(twoPumpExponents(cavity)[0].growth / (-twoPi * 250)).toBeCloseTo(1, 4)
  })

  /* In the rotating-wave approximation (λ + κ/2)(λ + Γ/2) = −(g₋² − g₊²) [Clerk, Marquardt, Jacobs 2008]. */
  test.each([
    ['the red pump alone damps', 3e3, 0],
    ['a stronger blue pump makes the motion grow', 1e3, 1.1e4],
  ])('%s', (_, red, blue) => {
    const cavity = balanced(0.02, { gamma: twoPi * 0.5, red, blue })
    const [kappa, gamma] = [0.02 * cavity.omega, cavity.gamma]
    const strength = cavity.coupling ** 2 * (red - blue)
    const slow = -(kappa + gamma) / 4 + Math.sqrt(((kappa - gamma) / 4) ** 2 - strength)
    expect(twoPumpExponents(cavity)[0].growth / slow).toBeCloseTo(1, 3)
    expect(Math.sign(slow)).toBe(blue > red ? 1 : -1)
  })
})
