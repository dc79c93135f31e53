import { gaussLegendre } from './gauss-legendre.js'
import { twoPumpExponents } from './two-pump-stability.js'
import { harmonicDensities, quadratureRow, type TwoPumpCavity } from './two-pump.js'

/** Variances of the two quadratures of the motion about the pumps, as quanta ⟨X²⟩ − ½; their mean is the mode's occupancy. */
export interface QuadratureOccupancies {
  /** Of X₁, which the record holds; below 0 the motion is squeezed. */
  readonly measured: number
  /** Of X₂, which takes the back-action. */
  readonly conjugate: number
}

/** Each panel reaches four times as far from a pole as the one before, so that twelve nodes leave an error of 3^−24 ≈ 4e-12. */
const growth = 4

const rule = gaussLegendre(12)

/** Ends of panels between −Ω_p and Ω_p, geometric around every exponent. */
function panelEnds(cavity: TwoPumpCavity): number[] {
  const reach = cavity.halfSpacing
  const ends = twoPumpExponents(cavity).flatMap(({ growth: rate, offset }) => {
    const around = [offset]
    for (let distance = Math.max(Math.abs(rate), 1e-14 * reach); distance < 2 * reach; distance *= growth) {
      around.push(offset - distance, offset + distance)
    }
    return around
  })
  return [...new Set([-reach, ...ends.filter(end => Math.abs(end) < reach), reach])].sort((a, b) => a - b)
}

/** ⟨X²⟩ = ∫S̄_X(W) dW/2π of the quadrature at a phase, two-sided and symmetrised. */
function variance(cavity: TwoPumpCavity, ends: readonly number[], phase: number): number {
  const density = (offset: number): number => {
    const { ports, bath } = harmonicDensities(cavity, offset, quadratureRow(cavity, phase, offset))
    return ports.reduce((sum, value) => sum + value, bath)
  }
  return ends.slice(1).reduce((total, to, i) => {
    const [middle, half] = [(to + ends[i]) / 2, (to - ends[i]) / 2]
    const panel = rule.nodes.reduce((sum, node, k) => sum + rule.weights[k] * density(middle + node * half), 0)
    return total + (panel * half) / (2 * Math.PI)
  }, 0)
}

/**
 * Stationary variances of X₁ and X₂ under two pumps, from their spectra within Ω_p of the centre; what lies outside is the counter-rotating motion, smaller
 * by the decay rate over Ω. Only for stable working points. Limits used in tests: equal pumps leave n + Δn₁ and n + Δn₂; the red pump alone
 * cools to [Γn + Γ_opt(κ/4Ω)²]/(Γ + Γ_opt). [Clerk, Marquardt, Jacobs, New J. Phys. 10, 095010 (2008); Marquardt et al., PRL 99, 093902 (2007)]
 */
export function quadratureOccupancies(cavity: TwoPumpCavity): QuadratureOccupancies {
  const ends = panelEnds(cavity)
  return {
    measured: variance(cavity, ends, 0) - 0.5,
    conjugate: variance(cavity, ends, Math.PI / 2) - 0.5,
  }
}
