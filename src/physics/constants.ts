/*
 * CODATA 2022 recommended values [Mohr, Newell, Taylor, Tiesinga, CODATA 2022 adjustment, 2024]. The first five define the SI
 * and are exact [BIPM, SI Brochure, 9th edition, 2019].
 */

/** h in J s, exact. */
export const planckConstant = 6.62607015e-34

/** ħ = h/2π in J s. */
export const reducedPlanckConstant = planckConstant / (2 * Math.PI)

/** k_B in J/K, exact. */
export const boltzmannConstant = 1.380649e-23

/** e in C, exact. */
export const elementaryCharge = 1.602176634e-19

/** c in m/s, exact. */
export const speedOfLight = 299792458
