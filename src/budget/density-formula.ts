import type { DensitySpec } from '../model/budget.js'
import { amountOf } from './amount.js'
import type { BandRead } from './band.js'
import { isExpression } from './expression.js'
import type { Tree } from './tree.js'
import type { Use } from './use.js'
import type { Values } from './values.js'

const probes = 65

/** Where a formula is tried while a budget is read, so that most faults are told together with all others. */
function probesIn(band: BandRead | null): Float64Array {
  if (band === null) return new Float64Array(0)
  const ratio = band.high / band.low
  return Float64Array.from({ length: probes }, (_, i) => band.low * ratio ** (i / (probes - 1)))
}

/**
 * A density by an expression that names `f`. Undefined where none stands here (a level by an expression without `f` is a
 * level); null where it is wrong, which has been said.
 */
export function readDensityFormula(
  tree: Tree,
  use: Use,
  { values, band }: { readonly values: Values; readonly band: BandRead | null },
): DensitySpec | null | undefined {
  const amount = amountOf(tree)
  if (amount === null || !isExpression(amount.scalar.text)) return undefined
  const written = values.parameters.parse(amount.scalar)
  if (written === null) return null
  if (!written.names.includes('f')) return undefined
  const checked = values.check(amount, true)
  const fitted = checked === null ? null : values.fit(checked, use)
  const { keeper } = values
  const formula = checked === null || fitted === null ? null : keeper.formula(checked, fitted.outcome)
  if (fitted === null || formula === null) return null
  const tried = probesIn(band)
  const sound = keeper.judged(() => {
    formula.over(keeper.rootValues(), tried, new Float64Array(tried.length))
    return true
  })
  return sound === null ? null : { density: 'formula', power: fitted.power, formula, text: amount.scalar.text }
}
