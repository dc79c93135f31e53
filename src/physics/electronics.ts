import { boltzmannConstant, elementaryCharge, referenceNoiseTemperature } from './constants.js'
import { callenWeltonTemperature, quantumEnergy } from './quanta.js'

/**
 * One-sided power density of the voltage across an open resistor: S_V(f) = 4R · hf(n + ½), in V²/Hz.
 * R ≥ 0 in Ω, f > 0 in Hz, T ≥ 0 in K. It holds the zero-point share, as an ideal linear amplifier records it.
 * The limit used in tests: 4k_BTR for hf ≪ k_BT. [Nyquist, Phys. Rev. 32, 110 (1928); Callen, Welton, Phys. Rev. 83, 34 (1951)]
 */
export function johnsonVoltagePsd(resistance: number, frequency: number, temperature: number): number {
  return 4 * resistance * boltzmannConstant * callenWeltonTemperature(2 * Math.PI * frequency, temperature)
}

/**
 * One-sided power density of the current through a shorted resistor: S_I(f) = (4/R) · hf(n + ½), in A²/Hz.
 * R > 0 in Ω, f > 0 in Hz, T ≥ 0 in K; sources and limit as for `johnsonVoltagePsd`.
 */
export function johnsonCurrentPsd(resistance: number, frequency: number, temperature: number): number {
  return johnsonVoltagePsd(1 / resistance, frequency, temperature)
}

/**
 * One-sided power density of the shot noise of a current: S_I(f) = 2e|I|, in A²/Hz; I in A.
 * Independent carriers, frequencies below the inverse transit time. [Schottky, Ann. Phys. 57, 541 (1918)]
 */
export function shotCurrentPsd(current: number): number {
  return 2 * elementaryCharge * Math.abs(current)
}

/** RMS of white noise of a one-sided power density in a bandwidth B in Hz: √(S·B). */
export function rmsInBand(psd: number, bandwidth: number): number {
  return Math.sqrt(psd * bandwidth)
}

/**
 * Noise temperature as quanta: n = k_BT/hf, f > 0 in Hz, T in K.
 * The trade's linear scale for added noise, no Bose function: the half quantum of a quantum-limited amplifier is hf/2k_B.
 * [Caves, Phys. Rev. D 26, 1817 (1982)]
 */
export function quantaOfNoiseTemperature(temperature: number, frequency: number): number {
  return (boltzmannConstant * temperature) / quantumEnergy(2 * Math.PI * frequency)
}

/** Added quanta as a noise temperature in K, hf·n/k_B; the inverse of `quantaOfNoiseTemperature`. */
export function noiseTemperatureOfQuanta(quanta: number, frequency: number): number {
  return (quanta * quantumEnergy(2 * Math.PI * frequency)) / boltzmannConstant
}

/** Noise temperature in K of a noise figure in dB: T = T₀(10^(NF/10) − 1) with T₀ = 290 K. */
export function noiseTemperatureOfFigure(figure: number): number {
  return referenceNoiseTemperature * Math.expm1((figure * Math.LN10) / 10)
}

/** Noise figure in dB of a noise temperature in K: 10 log₁₀(1 + T/T₀) with T₀ = 290 K. */
export function noiseFigure(temperature: number): number {
  return (10 / Math.LN10) * Math.log1p(temperature / referenceNoiseTemperature)
}

/**
 * Least quanta that a phase-preserving amplifier of power gain G > 0 adds, referred to its input: ½|1 − 1/G|.
 * [Haus, Mullen, Phys. Rev. 128, 2407 (1962); Caves, Phys. Rev. D 26, 1817 (1982)]
 */
export function leastAddedQuanta(gain: number): number {
  return Math.abs(1 - 1 / gain) / 2
}

/** One stage of a chain: quanta it adds at its own input, and its power gain. */
export interface Stage {
  readonly added: number
  readonly gain: number
}

/** Quanta that a chain of stages adds, referred to its first input: n₁ + n₂/G₁ + n₃/(G₁G₂) + … [Friis, Proc. IRE 32, 419 (1944)] */
export function addedQuantaOfChain(stages: readonly Stage[]): number {
  let gain = 1
  let sum = 0
  for (const stage of stages) {
    sum += stage.added / gain
    gain *= stage.gain
  }
  return sum
}

/** Quanta per second in a beam of power P in W at frequency f in Hz: P/hf. */
export function quantumFlux(power: number, frequency: number): number {
  return power / quantumEnergy(2 * Math.PI * frequency)
}
