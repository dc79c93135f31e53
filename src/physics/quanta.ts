import { boltzmannConstant, reducedPlanckConstant } from './constants.js'

/**
 * Mean quanta of a bath: n(ω, T) = 1/(e^{ħω/k_BT} − 1).
 * ω > 0 in rad/s, T ≥ 0 in K; a plain number, 0 at T = 0. Negative temperatures have no meaning here: NaN.
 * The limit used in tests: n + ½ → k_BT/ħω for ħω ≪ k_BT. [Callen, Welton, Phys. Rev. 83, 34 (1951)]
 */
export function occupancy(omega: number, temperature: number): number {
  if (!(temperature >= 0)) return NaN
  if (temperature === 0) return 0
  return 1 / Math.expm1((reducedPlanckConstant * omega) / (boltzmannConstant * temperature))
}

/**
 * x coth x, which turns an energy ħω/2 into its thermal mean; even, 1 at x = 0, |x| for large |x|.
 * With x = ħω/2k_BT: k_BT · x coth x = ħω(n + ½).
 */
export function xCothX(x: number): number {
  const magnitude = Math.abs(x)
  // Below this the quadratic term of 1 + x²/3 is under half a unit in the last place.
  if (magnitude < 1e-8) return 1
  return magnitude / Math.tanh(magnitude)
}

/**
 * Temperature in K that noise of a bath is quoted as, zero-point share included: T_eff = (ħω/2k_B) coth(ħω/2k_BT).
 * ω > 0 in rad/s, T ≥ 0 in K; ħω/2k_B at T = 0, T for ħω ≪ k_BT. [Callen, Welton, Phys. Rev. 83, 34 (1951)]
 */
export function callenWeltonTemperature(omega: number, temperature: number): number {
  const quantum = (reducedPlanckConstant * omega) / boltzmannConstant
  if (temperature === 0) return quantum / 2
  return temperature * xCothX(quantum / (2 * temperature))
}

/**
 * Temperature in K of a bath with n quanta at ω: T = ħω/[k_B ln(1 + 1/n)]; the inverse of `occupancy`.
 * ω > 0 in rad/s, n ≥ 0; 0 at n = 0.
 */
export function temperatureOfOccupancy(omega: number, quanta: number): number {
  if (quanta === 0) return 0
  return (reducedPlanckConstant * omega) / (boltzmannConstant * Math.log1p(1 / quanta))
}

/** Angular frequency in rad/s at which a bath of T (K) has n > 0 quanta: ω = (k_BT/ħ) ln(1 + 1/n). */
export function frequencyOfOccupancy(quanta: number, temperature: number): number {
  return ((boltzmannConstant * temperature) / reducedPlanckConstant) * Math.log1p(1 / quanta)
}

/** Probability to find a mode in a thermal state of n ≥ 0 mean quanta in its ground state: 1/(1 + n). */
export function groundStateProbability(quanta: number): number {
  return 1 / (1 + quanta)
}

/** Sideband ratio of a thermal state, absorption over emission: n/(n + 1). [Safavi-Naeini et al., PRL 108, 033602 (2012)] */
export function sidebandRatio(quanta: number): number {
  return quanta / (quanta + 1)
}

/** Quanta in dB of the zero-point half quantum: 10 log₁₀(n/½). */
export function decibelsOfZeroPoint(quanta: number): number {
  return 10 * Math.log10(2 * quanta)
}

/**
 * Zero-point amplitude √(ħ/2mω), the standard deviation of position in the ground state.
 * m > 0 in kg, ω > 0 in rad/s; in m. Infinite for a free mass (ω = 0).
 */
export function zeroPointAmplitude(mass: number, omega: number): number {
  return Math.sqrt(reducedPlanckConstant / (2 * mass * omega))
}

/** Energy of one quantum ħω in J, ω in rad/s. */
export function quantumEnergy(omega: number): number {
  return reducedPlanckConstant * omega
}
