import { expect, test } from 'vitest'
import { pumpRange, totalAt } from '../../src/engine/power-sweep.js'
import { reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { readoutOf, type ReadoutOf } from './readout-of.js'

const turn = 2 * Math.PI
const mode = { mass: 2e-12, frequency: 1e6, quality: 1e5, temperature: 0 } as const
const omega = turn * mode.frequency
const gamma = omega / mode.quality
const kappa = turn * 2e7
const coupling = 1e17
const g0 = coupling * Math.sqrt(hbar / (2 * mode.mass * omega))
/** Road: imprecision and back-action equal at the resonance; the cavity filters both. */
const bestQuanta = ((kappa * gamma) / (16 * g0 * g0)) * (1 + ((2 * omega) / kappa) ** 2)

const budget = (changes: Partial<ReadoutOf>) =>
  readoutOf({ modes: { drum: mode }, coupling, ports: { front: { rate: kappa } }, quanta: bestQuanta, ...changes })

test.each([0.1, 1, 7])('on resonance the best pump has κΓ/16g₀² quanta, from %s times it', part => {
  const range = pumpRange(budget({ quanta: bestQuanta * part }), mode.frequency)
  expect(range?.best?.factor).toBeCloseTo(1 / part, 2)
  expect(range?.stableUpTo).toBeNull()
  // Standard quantum limit and zero-point noise, each 2ħmΩΓ.
  expect(range!.best!.asd ** 2 / (4 * hbar * mode.mass * omega * gamma)).toBeCloseTo(1, 6)
})

test('light on the blue side ends at a pump from which on nothing is stationary', () => {
  const blue = budget({ detuning: 0.2 * kappa, quanta: 1 })
  const weak = budget({ detuning: 0.2 * kappa, quanta: bestQuanta })
  const { stableUpTo } = pumpRange(weak, mode.frequency)!
  expect(stableUpTo).toBeGreaterThan(1)
  expect(totalAt(blue, bestQuanta * stableUpTo! * 0.999, mode.frequency)).toBeGreaterThan(0)
  expect(totalAt(blue, bestQuanta * stableUpTo! * 1.001, mode.frequency)).toBeNull()
})

test('a readout without a cavity has no pump', () => {
  const plain = budget({})
  const components = plain.components.filter(({ kind }) => kind !== 'cavity')
  expect(pumpRange({ ...plain, components }, 1)).toBeNull()
})
