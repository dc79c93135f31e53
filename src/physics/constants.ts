/** A constant of nature as its table prints it. */
export interface Constant {
  readonly name: string
  /** TeX of its symbol. */
  readonly symbol: string
  /** In the coherent SI unit. */
  readonly value: number
  /** Standard uncertainty; 0 where the SI fixes the value. */
  readonly uncertainty: number
  readonly unit: string
  readonly source: string
}

const si = 'SI Brochure, 9th edition (BIPM 2019), exact'
const codata = 'CODATA 2022 (P. Mohr, D. Newell, B. Taylor, E. Tiesinga, 2024)'

/** h in J s, exact. */
export const planckConstant = 6.62607015e-34
/** ħ = h/2π in J s, exact. */
export const reducedPlanckConstant = planckConstant / (2 * Math.PI)
/** k_B in J/K, exact. */
export const boltzmannConstant = 1.380649e-23
/** e in C, exact. */
export const elementaryCharge = 1.602176634e-19
/** c in m/s, exact. */
export const speedOfLight = 299792458
/** N_A in 1/mol, exact. */
export const avogadroConstant = 6.02214076e23
/** R = N_A k_B in J/(mol K), exact. */
export const molarGasConstant = avogadroConstant * boltzmannConstant
/** R_K = h/e² in Ω, exact. */
export const vonKlitzingConstant = planckConstant / (elementaryCharge * elementaryCharge)
/** Φ₀ = h/2e in Wb, exact. */
export const magneticFluxQuantum = planckConstant / (2 * elementaryCharge)
/** g_n in m/s², 3rd CGPM (1901), exact. */
export const standardGravity = 9.80665
/** T₀ of noise figures in K, by the definition of the IEEE. */
export const referenceNoiseTemperature = 290
/** G in m³/(kg s²). */
export const gravitationalConstant = 6.6743e-11
/** α, a plain number. */
export const fineStructureConstant = 7.2973525643e-3
/** ε₀ in F/m. */
export const vacuumPermittivity = 8.8541878188e-12
/** μ₀ in N/A². */
export const vacuumPermeability = 1.25663706127e-6
/** m_e in kg. */
export const electronMass = 9.1093837139e-31
/** m_p in kg. */
export const protonMass = 1.67262192595e-27
/** m_u in kg. */
export const atomicMassConstant = 1.66053906892e-27
/** σ = 2π⁵k_B⁴/(15h³c²) in W/(m² K⁴), exact. */
export const stefanBoltzmannConstant =
  (2 * Math.PI ** 5 * boltzmannConstant ** 4) / (15 * planckConstant ** 3 * speedOfLight ** 2)

const row = (name: string, symbol: string, value: number, unit: string): Constant => ({
  name,
  symbol,
  value,
  uncertainty: 0,
  unit,
  source: si,
})
const measured = (constant: Omit<Constant, 'source'>): Constant => ({ ...constant, source: codata })

/** All constants with their uncertainties, for tables and for expressions. */
export const constants: readonly Constant[] = [
  row('Planck constant', 'h', planckConstant, 'J s'),
  row('reduced Planck constant', '\\hbar', reducedPlanckConstant, 'J s'),
  row('Boltzmann constant', 'k_B', boltzmannConstant, 'J/K'),
  row('elementary charge', 'e', elementaryCharge, 'C'),
  row('speed of light in vacuum', 'c', speedOfLight, 'm/s'),
  row('Avogadro constant', 'N_A', avogadroConstant, '1/mol'),
  row('molar gas constant', 'R', molarGasConstant, 'J/(mol K)'),
  row('von Klitzing constant', 'R_K', vonKlitzingConstant, 'Ω'),
  row('magnetic flux quantum', '\\Phi_0', magneticFluxQuantum, 'Wb'),
  row('Stefan–Boltzmann constant', '\\sigma', stefanBoltzmannConstant, 'W/(m² K⁴)'),
  { ...row('standard gravity', 'g_n', standardGravity, 'm/s²'), source: '3rd CGPM (1901), exact' },
  measured({
    name: 'Newtonian constant of gravitation',
    symbol: 'G',
    value: gravitationalConstant,
    uncertainty: 1.5e-15,
    unit: 'm³/(kg s²)',
  }),
  measured({
    name: 'fine-structure constant',
    symbol: '\\alpha',
    value: fineStructureConstant,
    uncertainty: 1.1e-12,
    unit: '',
  }),
  measured({
    name: 'vacuum electric permittivity',
    symbol: '\\varepsilon_0',
    value: vacuumPermittivity,
    uncertainty: 1.4e-21,
    unit: 'F/m',
  }),
  measured({
    name: 'vacuum magnetic permeability',
    symbol: '\\mu_0',
    value: vacuumPermeability,
    uncertainty: 2.0e-16,
    unit: 'N/A²',
  }),
  measured({ name: 'electron mass', symbol: 'm_e', value: electronMass, uncertainty: 2.8e-40, unit: 'kg' }),
  measured({ name: 'proton mass', symbol: 'm_p', value: protonMass, uncertainty: 5.2e-37, unit: 'kg' }),
  measured({
    name: 'atomic mass constant',
    symbol: 'm_u',
    value: atomicMassConstant,
    uncertainty: 5.2e-37,
    unit: 'kg',
  }),
]
