import type { Slot } from '../model/budget.js'
import { QuantityError } from '../quantity/error.js'
import type { Quantity } from '../quantity/parse.js'
import { amountOf, type Amount } from './amount.js'
import { factorBetween, fit, type Fitted } from './convert.js'
import { isExpression, type Checked } from './expression.js'
import type { Issues } from './issues.js'
import { Keeper } from './keeper.js'
import { suggestion } from './nearest.js'
import { ParameterTable, readQuantity, refuseSpread, wordPattern, type Parameter } from './parameters.js'
import { quoted } from './quoted.js'
import { rangeFault, type Range } from './range.js'
import { placeWithin, type Tree, type TreeScalar } from './tree.js'
import type { Converted, Use } from './use.js'
import { where } from './where.js'

/** A number that a field was given. */
export interface Given {
  readonly slot: Slot
  readonly value: number
  readonly power: boolean
}

/** Where a quantity stands: the path that names its root (empty where it becomes none), and what it may be. */
export interface Spot {
  readonly path: string
  readonly range: Range
}

/** The numbers of one budget: named parameters, quantities and expressions written where they are used. */
export class Values {
  readonly parameters: ParameterTable
  readonly keeper: Keeper

  constructor(
    parameters: Tree | undefined,
    readonly issues: Issues,
  ) {
    this.parameters = new ParameterTable(parameters, issues)
    this.keeper = new Keeper(this.parameters, issues)
  }

  /** Reads what stands in a field; null where it is no such quantity, which has then been said. */
  read(tree: Tree | undefined, use: Use, spot: Spot): Given | null {
    const amount = amountOf(tree)
    if (amount === null || amount.scalar.text === '') return null
    const given = this.#given(amount, use, spot.path)
    if (given === null) return null
    const fault = rangeFault(given.value, spot.range)
    if (fault === null) return given
    const { scalar } = amount
    this.issues.error('range', scalar.place, `${this.#shown(scalar, given)} ${fault}`)
    return null
  }

  #given(amount: Amount, use: Use, path: string): Given | null {
    const { text } = amount.scalar
    if (isExpression(text)) return this.#expression(amount, use, path)
    return wordPattern.test(text) ? this.#named(amount, use) : this.#inline(amount, use, path)
  }

  /** A quantity as it stands; a parameter with what stands for it; what an expression comes to. */
  #shown({ text, place }: TreeScalar, { value }: Given): string {
    const written = this.parameters.all.get(text)?.amount.scalar
    const origin = written === undefined ? '' : ` (${quoted(written.text)}, ${where(written.place, place)})`
    const derived = isExpression(written?.text ?? text)
    return `${quoted(text)}${origin}${derived ? ` comes to ${Number(value.toPrecision(4))} in SI units and` : ''}`
  }

  /** A number that is no root of its own, unless a parameter is: the reference frequency. */
  number(tree: Tree | undefined, use: Use, range: Range): number | null {
    return this.read(tree, use, { path: '', range })?.value ?? null
  }

  /** Once every field of the budget in `file` is read. */
  finish(file: string): void {
    this.parameters.warnUnused(file)
    this.keeper.finish()
  }

  valueOf(slot: Slot): number {
    if ('constant' in slot) return slot.constant
    if ('formula' in slot) return slot.formula.value(this.keeper.rootValues()) * (slot.scale ?? 1)
    return (this.keeper.roots[slot.root]?.value ?? NaN) * (slot.scale ?? 1)
  }

  /** The complaint about a quantity, at the character that it means, or at a name with a remark on what it stands for. */
  #attempt<Result>(scalar: TreeScalar, work: () => Result, remark = ''): Result | null {
    try {
      return work()
    } catch (error) {
      if (!(error instanceof QuantityError)) throw error
      const place = remark === '' ? placeWithin(scalar, error.offset) : scalar.place
      this.issues.error('quantity', place, error.message + remark)
      return null
    }
  }

  #inline(amount: Amount, use: Use, path: string): Given | null {
    const quantity = readQuantity(amount.scalar, this.issues)
    if (quantity === null) return null
    const converted = this.#attempt(amount.scalar, () => use(quantity))
    if (converted === null) return null
    const { value, power } = converted
    if (path === '') return { slot: { constant: value }, value, power }
    return { slot: { root: this.keeper.addRoot({ id: path, amount, quantity }, converted) }, value, power }
  }

  #expression(amount: Amount, use: Use, path: string): Given | null {
    const checked = this.check(amount, false)
    const fitted = checked === null ? null : this.fit(checked, use)
    if (checked === null || fitted === null) return null
    const formula = this.keeper.formula(checked, fitted.outcome)
    const value = formula === null ? null : this.keeper.judged(() => formula.value(this.keeper.rootValues()))
    if (formula === null || value === null) return null
    if (path !== '') this.keeper.addDerived(path, amount, { formula, dimension: fitted.dimension })
    return { slot: { formula }, value, power: fitted.power }
  }

  /** Reads an expression where it stands; null where it is wrong, which has been said. */
  check(amount: Amount, withFrequency: boolean): Checked | null {
    refuseSpread(amount, this.issues)
    const written = this.parameters.parse(amount.scalar)
    return written === null ? null : this.parameters.check(written, withFrequency)
  }

  /** How the value of an expression becomes that of a field; null where it is of another kind, which has been said. */
  fit({ kind, scalar }: Checked, use: Use): Fitted | null {
    return this.#attempt(scalar, () => fit(kind, scalar.text, use))
  }

  #named(amount: Amount, use: Use): Given | null {
    const { scalar } = amount
    const parameter = this.parameters.use(scalar.text)
    if (parameter === undefined) {
      this.issues.error('unknown-parameter', scalar.place, this.#unknown(scalar.text))
      return null
    }
    this.#refuseSecondText(amount, parameter)
    const { quantity, checked } = parameter
    const remark = ` (parameter \`${parameter.name}\`, ${where(parameter.amount.scalar.place, scalar.place)})`
    if (quantity !== null) {
      const converted = this.#attempt(scalar, () => use(quantity), remark)
      return converted === null ? null : this.#root({ parameter, quantity, scalar, use }, converted)
    }
    if (checked === null) return null
    const text = parameter.amount.scalar.text
    const fitted = this.#attempt(scalar, () => fit(checked.kind, text, use), remark)
    return fitted === null ? null : this.#formula({ parameter, checked, scalar }, fitted)
  }

  #refuseSecondText(amount: Amount, { name }: Parameter): void {
    const { about, evidence, measured, distribution, effect, explained, scalar } = amount
    if (!explained || (about ?? evidence ?? measured ?? distribution ?? effect) === null) return
    const message = `\`${name}\` is a parameter: its \`about\`, \`evidence\` and all else stand in \`parameters\``
    this.issues.error('explained-twice', scalar.place, message)
  }

  #unknown(word: string): string {
    if (/^(?:yes|no|on|off|true|false|null|y|n)$/i.test(word))
      return `\`${word}\` is no quantity; write a number and its unit, such as \`3.1(2) ng\``
    const names = [...this.parameters.all.keys()]
    const known =
      names.length === 0
        ? 'the file has no `parameters`'
        : `\`parameters\` has ${names
            .slice(0, 12)
            .map(name => `\`${name}\``)
            .join(', ')}${names.length > 12 ? ' …' : ''}`
    return `no parameter is called ${quoted(word)}: ${known}${suggestion(word, names)}`
  }

  /** One root a parameter, in the unit of its first use; another use of the same number may count it in the other turn. */
  #root(
    { parameter, quantity, scalar, use }: Named & { readonly quantity: Quantity; readonly use: Use },
    converted: Converted,
  ): Given | null {
    const { name, amount } = parameter
    const { value, power, dimension } = converted
    const kept = this.keeper.keptRoots.get(name)
    if (kept === undefined) {
      const root = this.keeper.addRoot({ id: name, amount, quantity }, converted)
      this.keeper.keptRoots.set(name, { ...converted, use, index: root })
      return { slot: { root }, value, power }
    }
    const same = kept.value === value && kept.uncertainty === converted.uncertainty
    const scale = factorBetween(kept.dimension, dimension) ?? (same ? 1 : null)
    if (scale !== null) return { slot: scaled({ root: kept.index }, scale), value, power }
    this.keeper.twoUses(name, scalar, [kept.dimension, dimension])
    return null
  }

  #formula({ parameter, checked, scalar }: Named & { readonly checked: Checked }, fitted: Fitted): Given | null {
    const { name, amount } = parameter
    const { power, dimension, outcome } = fitted
    const kept = this.keeper.keptFormulas.get(name)
    const formula = kept?.formula ?? this.keeper.formula(checked, outcome)
    const base = formula === null ? null : this.keeper.judged(() => formula.value(this.keeper.rootValues()))
    if (formula === null || base === null) return null
    if (kept === undefined) {
      this.keeper.keptFormulas.set(name, { ...fitted, formula })
      this.keeper.addDerived(name, amount, { formula, dimension })
      return { slot: { formula }, value: base, power }
    }
    const same = 'factor' in outcome && 'factor' in kept.outcome && outcome.factor === kept.outcome.factor
    const scale = factorBetween(kept.dimension, dimension) ?? (same ? 1 : null)
    if (scale !== null) return { slot: scaled({ formula }, scale), value: base * scale, power }
    this.keeper.twoUses(name, scalar, [kept.dimension, dimension])
    return null
  }
}

/** A parameter where a field names it. */
interface Named {
  readonly parameter: Parameter
  readonly scalar: TreeScalar
}

function scaled(slot: Exclude<Slot, { readonly constant: number }>, scale: number): Slot {
  return scale === 1 ? slot : { ...slot, scale }
}
