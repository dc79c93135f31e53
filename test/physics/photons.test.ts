import fc from 'fast-check'
import { expect, test } from 'vitest'
import { reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { intracavityQuanta, pumpPower } from '../../src/physics/photons.js'

const omega = 2 * Math.PI * 2.8e14

test('on resonance and with one port n̄ = 4P/(ħωκ) [Aspelmeyer, Kippenberg, Marquardt, Rev. Mod. Phys. 86, 1391 (2014)]', () => {
  const cavity = { kappa: 1e6, coupled: 1e6, detuning: 0, omega }
  expect(intracavityQuanta(1e-6, cavity) / (4e-6 / (hbar * omega * 1e6))).toBeCloseTo(1, 14)
})

test('half a linewidth off resonance half as many quanta remain', () => {
  const at = (detuning: number): number => intracavityQuanta(1e-6, { kappa: 1e6, coupled: 3e5, detuning, omega })
  for (const detuning of [-5e5, 5e5]) expect(at(detuning) / at(0)).toBeCloseTo(0.5, 14)
})

test('power and quanta are inverse to each other', () => {
  const rate = fc.double({ min: 1, max: 1e12, noNaN: true })
  fc.assert(
    fc.property(
      rate,
      rate,
      rate,
      fc.double({ min: 1e-20, max: 10, noNaN: true }),
      (kappa, coupled, detuning, power) => {
        const cavity = { kappa, coupled, detuning, omega }
        expect(pumpPower(intracavityQuanta(power, cavity), cavity) / power).toBeCloseTo(1, 13)
      },
    ),
    { seed: 20272 },
  )
})
