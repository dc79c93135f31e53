import type { Declaration, Fields } from '../catalogue/declaration.js'
import type { Budget, Parameters } from '../model/budget.js'
import { givenNumbers, slotText } from './slots.js'
import { numberText } from './numbers.js'

/** A symbol of an equation with the value that this budget gives it. */
export interface SymbolRow {
  readonly tex: string
  readonly meaning: string
  readonly value: string
  /** Id of the root in the table of parameters; empty for a default. */
  readonly root: string
}

interface SymbolOwner {
  readonly declaration: Declaration
  readonly parameters: Parameters
}

interface SymbolField {
  readonly symbol: string
  readonly meaning: string
  readonly fallback: string
}

/** The declared symbols of a kind that this budget gives a value, one a port or channel where the field is repeated. */
export function symbolRows({ declaration, parameters }: SymbolOwner, budget: Budget): readonly SymbolRow[] {
  return givenNumbers(parameters).flatMap(({ path, slot }) => {
    const field = symbolField(path, declaration.fields, null)
    if (field === null) return []
    const said = slotText(budget, slot)
    const value = said?.text ?? field.fallback
    return [{ tex: field.symbol, meaning: field.meaning, value, root: said?.root ?? '' }]
  })
}

/** Follows a path through groups and maps; below a map the symbol's index `j` becomes the map's key. */
function symbolField(path: readonly string[], fields: Fields, key: string | null): SymbolField | null {
  const [first, ...rest] = path
  const field = fields[first]
  if (field === undefined) return null
  if (field.type === 'group') return symbolField(rest, field.fields, key)
  if (field.type === 'map') return symbolField(rest.slice(1), field.fields, rest[0])
  if (field.type === 'density') return densitySymbol(rest)
  if (field.type !== 'quantity' || field.symbol === undefined) return null
  const symbol =
    key === null ? field.symbol : field.symbol.replace(/_j\b/, `_{\\mathrm{${key.replaceAll('_', '\\_')}}}`)
  return { symbol, meaning: field.meaning, fallback: field.default ?? numberText(0) }
}

const densitySymbols: { readonly [field: string]: SymbolField } = {
  level: { symbol: '\\sqrt{S_0}', meaning: 'stated density', fallback: '' },
  exponent: { symbol: 'p', meaning: 'exponent of the power density', fallback: '0' },
  reference: { symbol: 'f_0', meaning: 'frequency at which it is stated', fallback: '' },
}

function densitySymbol(rest: readonly string[]): SymbolField {
  return densitySymbols[rest[0]]
}
