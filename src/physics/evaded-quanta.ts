import { linewidthOf, type TwoPumpCavity } from './two-pump.js'

/**
 * Quanta that the light adds to the bath of each quadrature at the offset W (rad/s), for equal pumps (n̄ each, g = g₀√n̄) at Ω_p = Ω and δ = 0, exact:
 * Δn₁ = (g²κ/2Γ)(2n_c+1)[L(2Ω+W) + L(2Ω−W)], Δn₂ = the same + (g²κ/2Γ)(2n_c+1)·4L(W), L(w) = 1/(κ²/4 + w²), n_c the mean of the ports' quanta.
 * For κ ≪ Ω their ratio is κ²/32Ω². [Clerk, Marquardt, Jacobs, New J. Phys. 10, 095010 (2008); Hertzberg et al., Nature Phys. 6, 213 (2010)]
 */
export function evadedQuanta(cavity: TwoPumpCavity, offset: number): { measured: number; conjugate: number } {
  const { coupling, red, gamma, omega, ports } = cavity
  const kappa = linewidthOf(cavity)
  const quanta = ports.reduce((total, { rate, occupancy }) => total + (rate / kappa) * occupancy, 0)
  const strength = ((coupling * coupling * red * kappa) / (2 * gamma)) * (2 * quanta + 1)
  const lorentzian = (w: number): number => 1 / ((kappa * kappa) / 4 + w * w)
  const measured = strength * (lorentzian(2 * omega + offset) + lorentzian(2 * omega - offset))
  return { measured, conjugate: measured + strength * 4 * lorentzian(offset) }
}
