import { quantaOfNoiseTemperature } from './electronics.js'
import { occupancy } from './quanta.js'

/** How a noise temperature was found: the law of the loads that it was measured with, or the bath that it is compared with. */
export type NoiseTemperatureConvention = 'rayleigh-jeans' | 'callen-welton' | 'planck' | 'source'

/**
 * Added noise in quanta at the input of an amplifier of noise temperature T_N ≥ 0 (K) at ω > 0 (rad/s):
 * k_BT_N/ħω where the loads of the measurement were taken as Rayleigh–Jeans or Callen–Welton, k_BT_N/ħω − ½ where they
 * were taken as Planck without zero-point noise, n(ω, T_N) where T_N is the temperature of a source whose quanta equal
 * the added noise. All agree within half a quantum for k_BT_N ≫ ħω. [Caves, Phys. Rev. D 26, 1817 (1982)]
 */
export function addedQuantaOfNoiseTemperature(
  omega: number,
  temperature: number,
  convention: NoiseTemperatureConvention,
): number {
  if (convention === 'source') return occupancy(omega, temperature)
  const classical = quantaOfNoiseTemperature(temperature, omega / (2 * Math.PI))
  return convention === 'planck' ? classical - 0.5 : classical
}
