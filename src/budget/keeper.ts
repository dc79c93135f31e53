import type { Derived, Root } from '../model/budget.js'
import { Refusal } from '../model/problem.js'
import type { Quantity } from '../quantity/parse.js'
import type { Amount } from './amount.js'
import { factorToCoherent, fit, naturalUse, type Fitted } from './convert.js'
import { dispersionOf } from './dispersion.js'
import { natureConstants, type Checked } from './expression.js'
import { StepwiseFormula, type Input, type Outcome, type Step } from './formula.js'
import type { Issues } from './issues.js'
import type { ParameterTable } from './parameters.js'
import { quoted } from './quoted.js'
import type { TreeScalar } from './tree.js'
import type { Converted, Use } from './use.js'

/** A stated parameter as it became a root, in the unit of its first use. */
export interface KeptRoot extends Converted {
  readonly index: number
  readonly use: Use
}

/** A derived parameter in the unit of its first use. */
export interface KeptFormula extends Fitted {
  readonly formula: StepwiseFormula
}

/** Collects what a budget keeps of its numbers: roots, and values derived from them. */
export class Keeper {
  readonly roots: Root[] = []
  readonly derived: Derived[] = []
  readonly keptRoots = new Map<string, KeptRoot>()
  readonly keptFormulas = new Map<string, KeptFormula>()
  /** Derived parameters that formulas rest on. */
  readonly #needed = new Set<string>()

  constructor(
    readonly parameters: ParameterTable,
    readonly issues: Issues,
  ) {}

  rootValues(): Float64Array {
    return Float64Array.from(this.roots, root => root.value)
  }

  addRoot(
    { id, amount, quantity }: { readonly id: string; readonly amount: Amount; readonly quantity: Quantity },
    { value, uncertainty, dimension }: Converted,
  ): number {
    const { about, evidence, measured, scalar } = amount
    if (measured !== null && !isDate(measured))
      this.issues.error('date', scalar.place, `\`measured\` says ${quoted(measured)}, which is no day of the calendar`)
    const { factor, distribution, effect } = dispersionOf(amount, quantity, this.issues)
    const spread = { uncertainty: uncertainty * factor, distribution, effect }
    const text = { text: scalar.text, about, evidence, measured, place: scalar.place }
    this.roots.push({ id, value, ...spread, dimension, ...text })
    return this.roots.length - 1
  }

  addDerived(id: string, amount: Amount, { formula, dimension }: Pick<Derived, 'formula' | 'dimension'>): void {
    const { about, evidence, scalar } = amount
    this.derived.push({ id, text: scalar.text, dimension, formula, about, evidence, place: scalar.place })
  }

  /** The formula of an expression with all that it is derived from; null where that cannot be, which has been said. */
  formula(checked: Checked, outcome: Outcome): StepwiseFormula | null {
    const steps: Step[] = []
    return this.#plan(checked, steps, new Map()) === null ? null : new StepwiseFormula(steps, outcome)
  }

  /** Adds the steps of an expression behind those it needs; the index of its own. */
  #plan(checked: Checked, steps: Step[], known: Map<string, number>): number | null {
    const inputs: Input[] = []
    for (const name of checked.inputs) {
      const input = this.#inputOf(name, checked.scalar) ?? this.#stepOf(name, steps, known)
      if (input === null) return null
      inputs.push(input)
    }
    steps.push({ checked, inputs })
    return steps.length - 1
  }

  #stepOf(name: string, steps: Step[], known: Map<string, number>): Input | null {
    const before = known.get(name)
    if (before !== undefined) return { step: before }
    const checked = this.parameters.all.get(name)?.checked ?? null
    const step = checked === null ? null : this.#plan(checked, steps, known)
    if (step === null) return null
    this.#needed.add(name)
    known.set(name, step)
    return { step }
  }

  /** A constant or a stated parameter; null for everything else. */
  #inputOf(name: string, scalar: TreeScalar): Input | null {
    const constant = natureConstants.get(name)
    if (constant !== undefined) return { constant: constant.value }
    const parameter = this.parameters.all.get(name)
    const quantity = parameter?.quantity ?? null
    if (parameter === undefined || quantity === null) return null
    let kept = this.keptRoots.get(name)
    if (kept === undefined) {
      const use = naturalUse(quantity)
      const converted = use(quantity)
      kept = { ...converted, use, index: this.addRoot({ id: name, amount: parameter.amount, quantity }, converted) }
      this.keptRoots.set(name, kept)
    }
    const factor = factorToCoherent(quantity, kept.use)
    if (factor !== null) return { root: kept.index, factor }
    this.twoUses(name, scalar, [kept.dimension, 'it is written'])
    return null
  }

  twoUses(name: string, { place }: TreeScalar, [first, other]: readonly [string, string]): void {
    const message = `\`${name}\` is used as ${first} elsewhere and as ${other} here; make two parameters of it`
    this.issues.error('two-uses', place, message)
  }

  /** What a formula makes of the stated values; null where it refuses them, which is then said. */
  judged<Result>(work: () => Result): Result | null {
    try {
      return work()
    } catch (error) {
      if (!(error instanceof Refusal)) throw error
      for (const problem of error.problems) this.issues.add(problem)
      return null
    }
  }

  /** Lists derived parameters that only other expressions use, in coherent units, and puts all into the order of the file. */
  finish(): void {
    for (const name of this.#needed) {
      const { amount, checked = null } = this.parameters.all.get(name) ?? {}
      if (amount === undefined || checked === null || this.keptFormulas.has(name)) continue
      const { outcome, dimension } = fit(checked.kind, amount.scalar.text, naturalUse(checked.kind))
      const formula = this.formula(checked, outcome)
      if (formula !== null) this.addDerived(name, amount, { formula, dimension })
    }
    const names = [...this.parameters.all.keys()]
    const rank = ({ id }: Derived): number => (names.includes(id) ? names.indexOf(id) : names.length)
    this.derived.sort((a, b) => rank(a) - rank(b))
  }
}

/** Words that the schema has refused for their shape are none of this function's business. */
function isDate(text: string): boolean {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return true
  const time = Date.parse(`${text}T00:00:00Z`)
  return Number.isFinite(time) && new Date(time).toISOString().startsWith(text)
}
