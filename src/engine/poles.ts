import type { Complex, Network } from '../model/network.js'
import { add, complex, magnitude, reciprocal, scale, subtract } from '../physics/complex.js'
import { solveDense } from '../physics/solve-dense.js'
import { denseAt, omegaOf, type ComplexFrequency } from './dense.js'
import { poleGuesses } from './state-space.js'

/** One pole of the network: z(t) ∝ e^{−iωt}. */
export interface Pole {
  readonly at: ComplexFrequency
  /** ω in rad/s. */
  readonly omega: Complex
}

/** The mode nearest to a frequency, as the anchor from which its pole is measured; 0 Hz where there is none. */
function anchorFor(network: Network, omega: Complex): number {
  const candidates = network.modes.map(mode => Math.sign(omega.re) * mode.frequency)
  const distance = (f: number): number => Math.abs(omega.re - 2 * Math.PI * f)
  return candidates.reduce((best, f) => (distance(f) < distance(best) ? f : best), 0)
}

/**
 * Newton's method on det M(ω) = 0: ω ← ω − 1/tr(M⁻¹M′). It converges quadratically, so that a step of 1e-8 is the last one. At the root
 * itself M is singular to rounding and steps are noise, which happens where the guess is already as good as can be: then the smallest step
 * decides. A guess on the imaginary axis, where the continued structural loss jumps, is kept as it is.
 */
function polish(network: Network, guess: Complex): Pole {
  const anchor = anchorFor(network, guess)
  let shift = subtract(guess, complex(2 * Math.PI * anchor))
  if (Math.abs(guess.re) < 1e-7 * magnitude(guess)) {
    const omega = complex(0, guess.im)
    return { at: { anchor: 0, shift: omega }, omega }
  }
  let best = { shift, size: Infinity }
  for (let i = 0; i < 50; i++) {
    const { matrix, slope } = denseAt(network, { anchor, shift })
    const product = solveDense(matrix, slope)
    const step = reciprocal(product.reduce((sum, row, k) => add(sum, row[k]), complex(0)))
    const size = magnitude(step)
    if (!Number.isFinite(size)) break
    shift = subtract(shift, step)
    if (size < best.size) best = { shift, size }
    if (size <= 1e-8 * magnitude(shift)) break
  }
  shift = best.shift
  const at = { anchor, shift }
  return { at, omega: omegaOf(at) }
}

/** All poles, polished; a polish that runs away to another pole is discarded for its guess. */
export function polesOf(network: Network): Pole[] {
  return poleGuesses(network).map(guess => {
    const pole = polish(network, guess)
    const moved = magnitude(subtract(pole.omega, guess))
    if (moved <= 1e-3 * magnitude(guess)) return pole
    const anchor = anchorFor(network, guess)
    return { at: { anchor, shift: subtract(guess, complex(2 * Math.PI * anchor)) }, omega: guess }
  })
}

/** Decay rate 2·(−Im ω) of a pole's energy in rad/s; negative where it grows. */
export const energyDecay = (pole: Pole): number => -2 * pole.omega.im

/**
 * The pole that each mode with a frequency has become, nearest first; the motion may be overdamped, then its frequency is 0.
 * Poles far from every mode (fields) stay unassigned.
 */
export function polesOfModes(network: Network, poles: readonly Pole[]): Map<string, Pole> {
  const free = poles.filter(pole => pole.omega.re >= 0)
  const assigned = new Map<string, Pole>()
  const pairs = network.modes
    .filter(mode => mode.frequency > 0)
    .flatMap(mode =>
      free.map(pole => ({
        mode,
        pole,
        distance: magnitude(scale(subtract(pole.omega, complex(2 * Math.PI * mode.frequency)), 1)),
      })),
    )
    .sort((a, b) => a.distance - b.distance)
  for (const { mode, pole } of pairs) {
    if (assigned.has(mode.id) || [...assigned.values()].includes(pole)) continue
    assigned.set(mode.id, pole)
  }
  return assigned
}
