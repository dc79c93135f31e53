import { parseUnit } from '../parse.js'
import type { ValueKind } from './value-kind.js'

/** A row of the table of constants that expressions may name. */
export interface ConstantRow {
  /** TeX of its symbol. */
  readonly symbol: string
  /** In the coherent SI unit. */
  readonly value: number
  readonly uncertainty: number
  readonly unit: string
}

export interface NamedConstant extends ValueKind {
  readonly name: string
  readonly value: number
  readonly uncertainty: number
}

/** Names in expressions by the TeX of the symbols; parameters begin with a small letter, which leaves few to clash. */
const names: ReadonlyMap<string, string> = new Map([
  ['h', 'h'],
  ['\\hbar', 'hbar'],
  ['k_B', 'k_B'],
  ['e', 'e'],
  ['c', 'c'],
  ['N_A', 'N_A'],
  ['R', 'R'],
  ['R_K', 'R_K'],
  ['\\Phi_0', 'Phi_0'],
  ['\\sigma', 'sigma_SB'],
  ['g_n', 'g_n'],
  ['G', 'G_N'],
  ['\\alpha', 'alpha_0'],
  ['\\varepsilon_0', 'epsilon_0'],
  ['\\mu_0', 'mu_0'],
  ['m_e', 'm_e'],
  ['m_p', 'm_p'],
  ['m_u', 'm_u'],
])

/** Every name that a constant of nature may have in an expression. */
export const constantNames: ReadonlySet<string> = new Set(names.values())

/**
 * The constants by their names in expressions. h is in J/Hz, so that E/h is a frequency in hertz and E/ħ a rate in
 * radians per second. Rows of other symbols are left out.
 */
export function constantsByName(rows: readonly ConstantRow[]): ReadonlyMap<string, NamedConstant> {
  const found = new Map<string, NamedConstant>()
  for (const { symbol, value, uncertainty, unit } of rows) {
    const name = names.get(symbol)
    if (name === undefined) continue
    const { dimension, cycles } = parseUnit(name === 'h' ? 'J/Hz' : unit)
    found.set(name, { name, value, uncertainty, dimension, cycles })
  }
  return found
}
