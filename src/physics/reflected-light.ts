import { reducedPlanckConstant as hbar, speedOfLight as c } from './constants.js'

/** What light says of a displacement and does to it: amplitude densities of a shot-noise limited readout without loss, one-sided. */
export interface LightOnMirror {
  /** In m/√Hz. */
  readonly imprecision: number
  /** In N/√Hz. */
  readonly force: number
}

/** A beam of power `power` (W, on the surface) and wavelength `wavelength` (m). */
interface Beam {
  readonly power: number
  readonly wavelength: number
}

/**
 * Phase readout of light that a surface reflects N times at an angle of incidence ϑ, against a strong reference: the phase is 2kNcosϑ·x and has the
 * shot noise S_φ = ħω₀/2P, the force is 2PNcosϑ/c with the shot noise 2ħω₀P of the power. With s = Ncosϑ
 * S_x = ħcλ/(16πs²P), S_F = 16πħs²P/(cλ), one-sided; S_x S_F = ħ². [Caves, Phys. Rev. D 23, 1693 (1981)]
 * A Michelson interferometer at its dark port, P on the beam splitter, reads x₁ − x₂ like a single mirror in P/4.
 * Limit used in tests: (1/L)√(ħcλ/4πP), the shot noise of a Michelson interferometer as a strain.
 */
export function phaseOnMirror({ power, wavelength }: Beam, s: number): LightOnMirror {
  const imprecision = Math.sqrt((hbar * c * wavelength) / (16 * Math.PI * power)) / s
  return { imprecision, force: hbar / imprecision }
}

/**
 * Deflection of a Gaussian beam, w (`spot`, m) its 1/e² intensity radius on the surface, by a tilt ϑ: the first odd mode is excited with the amplitude
 * kwϑ, whose quadrature has the shot noise ħω₀/2P; photons land with the variance w²/4 and turn the surface with 2ħk each.
 * S_ϑ = ħω₀/(2Pk²w²), S_τ = 2ħPk²w²/ω₀, one-sided, S_ϑ S_τ = ħ²; ϑ = x/ℓ and F = τ/ℓ with the lever ℓ (`lever`, m).
 * [Hsu, Delaubert, Lam, Bowen, J. Opt. B 6, 495 (2004); Putman et al., J. Appl. Phys. 72, 6 (1992), from memory]
 */
export function deflectionOnMirror(
  { power, wavelength }: Beam,
  { spot, lever }: { readonly spot: number; readonly lever: number },
): LightOnMirror {
  const k = (2 * Math.PI) / wavelength
  const imprecision = (lever * Math.sqrt((hbar * c) / (2 * power * k))) / spot
  return { imprecision, force: hbar / imprecision }
}

/** Part of the deflection that two halves of a split detector take in, of what a detector of the first odd mode would [Hsu et al. 2004]. */
export const splitDetection = 2 / Math.PI
