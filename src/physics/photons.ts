import { reducedPlanckConstant } from './constants.js'

/** A pump at a cavity: rates and detuning in rad/s, omega the pump's angular frequency. */
export interface PumpedCavity {
  /** κ, sum over all ports. */
  readonly kappa: number
  /** κ_in of the pumped port. */
  readonly coupled: number
  /** Δ = ω_pump − ω_cavity. */
  readonly detuning: number
  readonly omega: number
}

/**
 * Quanta that a pump of power P (W, at the port) keeps in a cavity: n̄ = P κ_in / [ħω_p(κ²/4 + Δ²)].
 * Linear cavity, working-point detuning. [Aspelmeyer, Kippenberg, Marquardt, Rev. Mod. Phys. 86, 1391 (2014), eq. 12]
 * Limit used in tests: on resonance and with one port n̄ = 4P/(ħω κ).
 */
export function intracavityQuanta(power: number, { kappa, coupled, detuning, omega }: PumpedCavity): number {
  return (power * coupled) / (reducedPlanckConstant * omega * ((kappa * kappa) / 4 + detuning * detuning))
}

/** The power P in W that keeps n̄ quanta in the cavity, the inverse of `intracavityQuanta`. */
export function pumpPower(quanta: number, { kappa, coupled, detuning, omega }: PumpedCavity): number {
  return (quanta * reducedPlanckConstant * omega * ((kappa * kappa) / 4 + detuning * detuning)) / coupled
}
