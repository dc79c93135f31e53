import { boltzmannConstant, reducedPlanckConstant } from './constants.js'
import { occupancy } from './quanta.js'

/** How a noise temperature was found: the law of the loads that it was measured with, or the bath that it is compared with. */
export type NoiseTemperatureConvention = 'rayleigh-jeans' | 'callen-welton' | 'planck' | 'source'

/**
 * Added noise in quanta at the input of an amplifier of noise temperature T_N ≥ 0 (K) at ω > 0 (rad/s):
 * k_BT_N/ħω where the loads of the measurement were taken as Rayleigh–Jeans or Callen–Welton, k_BT_N/ħω − ½ where they
 * were taken as Planck without zero-point noise, n(ω, T_N) where T_N is the temperature of a source whose quanta equal
 * the added noise. All agree within half a quantum for k_BT_N ≫ ħω. [Caves, Phys. Rev. D 26, 1817 (1982)]
 */
export function quantaOfNoiseTemperature(
  omega: number,
  temperature: number,
  convention: NoiseTemperatureConvention,
): number {
  if (convention === 'source') return occupancy(omega, temperature)
  const classical = (boltzmannConstant * temperature) / (reducedPlanckConstant * omega)
  return convention === 'planck' ? classical - 0.5 : classical
}

/** Temperature in K to which a noise figure refers; the standard's value. [IRE Standards, Proc. IRE 48, 60 (1960), from memory] */
const standardTemperature = 290

/** Noise temperature in K of a noise figure in dB: T_N = 290 K (10^{NF/10} − 1). [Friis, Proc. IRE 32, 419 (1944)] */
export function temperatureOfNoiseFigure(decibels: number): number {
  return standardTemperature * Math.expm1((decibels * Math.LN10) / 10)
}

/** Least added noise in quanta of a phase-preserving amplifier of power gain G: ½|1 − 1/G|. [Caves, Phys. Rev. D 26, 1817 (1982)] */
export function leastAddedQuanta(gain: number): number {
  return 0.5 * Math.abs(1 - 1 / gain)
}
