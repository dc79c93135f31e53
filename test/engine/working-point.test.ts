import { describe, expect, test } from 'vitest'
import { assess } from '../../src/engine/assess.js'
import { reducedPlanckConstant as hbar } from '../../src/physics/constants.js'
import { readoutOf, type ReadoutOf } from './readout-of.js'

/*
 * Road: closed forms of a cavity pumped on resonance [Clerk et al., Rev. Mod. Phys. 82, 1155 (2010); Aspelmeyer, Kippenberg, Marquardt,
 * Rev. Mod. Phys. 86, 1391 (2014)].
 */

const turn = 2 * Math.PI
const mode = { mass: 2e-12, frequency: 1e6, quality: 1e5, temperature: 0.1 } as const
const kappa = turn * 2e7
const coupling = 1e17
const zeroPoint = Math.sqrt(hbar / (2 * mode.mass * turn * mode.frequency))

const stateOf = (changes: Partial<ReadoutOf> = {}) =>
  assess(
    {
      ...readoutOf({ modes: { drum: mode }, coupling, ports: { front: { rate: kappa } }, quanta: 1e4, ...changes }),
      band: { low: 0.9e6, high: 1.1e6, place: { file: 'test', line: 1, column: 1 } },
    },
    'glance',
  )

/** 4g²/κ over 2π in Hz, lowered by the cavity's filter at the mode's frequency. */
const ideal = (4 * (coupling * zeroPoint) ** 2 * 1e4) / kappa / turn / (1 + ((2 * turn * mode.frequency) / kappa) ** 2)

describe('rates of a mode', () => {
  test.each([1, 0.4])('a phase quadrature at efficiency %s measures at η·4g²/κ', efficiency => {
    const [{ measurementRate }] = stateOf({ efficiency }).modes
    expect(measurementRate! / (efficiency * ideal)).toBeCloseTo(1, 9)
  })

  test('an amplitude quadrature on resonance measures nothing', () => {
    const blind = stateOf({ record: 1e-9 }).modes[0].measurementRate
    expect(blind! / ideal).toBeCloseTo(1e-18, 20)
  })

  test('heating of the pumped port lowers it by 2n + 1', () => {
    const heated = stateOf({ ports: { front: { rate: kappa, occupancy: 0.7 } } }).modes[0].measurementRate
    expect((heated! * 2.4) / ideal).toBeCloseTo(1, 9)
  })

  test('light that cools the mode changes nothing of what is measured with it held still', () => {
    const rates = [1e-3, 1].map(part => stateOf({ detuning: -0.02 * kappa, quanta: 1e4 * part }).modes[0])
    expect(rates[1].measurementRate! / rates[0].measurementRate!).toBeCloseTo(1e3, 5)
  })

  test('the bath blurs at Γ(n + ½)', () => {
    const [{ decoherenceRate, thermalOccupancy }] = stateOf().modes
    expect(decoherenceRate).toBeCloseTo((mode.frequency / mode.quality) * (thermalOccupancy + 0.5), 9)
  })
})

describe('linearity', () => {
  test('is G x_rms over κ/2, with x_rms from the final occupancy', () => {
    const { modes, cavities, warnings } = stateOf()
    const motion = zeroPoint * Math.sqrt(2 * modes[0].finalOccupancy! + 1)
    expect(cavities[0].linearity! / ((2 * coupling * motion) / kappa)).toBeCloseTo(1, 12)
    expect(warnings.map(({ code }) => code)).not.toContain('nonlinear')
  })

  test('warns above a tenth', () => {
    const { cavities, warnings } = stateOf({
      modes: { drum: { ...mode, temperature: 300 } },
      coupling: 1e19,
      quanta: 1,
    })
    expect(cavities[0].linearity).toBeGreaterThan(0.1)
    expect(warnings.find(({ code }) => code === 'nonlinear')?.message).toContain('the readout is not linear')
  })

  test('of motion slower than the band, which a lock follows, is told without a warning', () => {
    const slow = { ...mode, temperature: 300, frequency: 8e5 }
    const { cavities, warnings } = stateOf({ modes: { drum: slow }, coupling: 1e19, quanta: 1 })
    expect(cavities[0].linearity).toBeGreaterThan(0.1)
    expect(warnings.map(({ code }) => code)).not.toContain('nonlinear')
  })
})
