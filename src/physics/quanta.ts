import { boltzmannConstant, reducedPlanckConstant } from './constants.js'

/** Mean quanta n(ω,T) = 1/(e^{ħω/k_BT} − 1) of a bath; omega in rad/s > 0, temperature in K ≥ 0. */
export function occupancy(omega: number, temperature: number): number {
  if (temperature === 0) return 0
  return 1 / Math.expm1((reducedPlanckConstant * omega) / (boltzmannConstant * temperature))
}

/** Zero-point amplitude x_zp = √(ħ/2mΩ) in m; mass in kg, omega in rad/s. */
export function zeroPointAmplitude(mass: number, omega: number): number {
  return Math.sqrt(reducedPlanckConstant / (2 * mass * omega))
}
