import type { Form } from './form.js'
import { loops } from './loops.js'
import { inputs, type Tape } from './tape.js'

/**
 * m[Ω² − ω² − i(ωΓ + Ω²φ)] as a form; frequency in Hz, Γ in rad/s. Ω² − ω² is (Ω − ω)(Ω + ω), and Ω − ω is formed in hertz from
 * the point's anchor and offset, so that nothing cancels next to a resonance of any quality.
 */
export function oscillator(
  tape: Tape,
  { mass, frequency, gamma, phi }: { mass: number; frequency: number; gamma: number; phi: number },
): Form {
  const twoPi = 2 * Math.PI
  const stiffness = mass * twoPi * twoPi
  const slope = -mass * gamma * twoPi
  const level = -mass * (twoPi * frequency) ** 2 * phi
  const { frequency: f, base, offset } = inputs
  return tape.complex(['oscillator', mass, frequency, gamma, phi], out => ({ n }) => {
    loops.oscillator(out, f, base, offset, n, stiffness, frequency, slope, level)
  })
}
