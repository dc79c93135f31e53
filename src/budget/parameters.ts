import { CircleError, orderOf } from '../quantity/expression/order.js'
import type { ValueKind } from '../quantity/expression/value-kind.js'
import { QuantityError } from '../quantity/error.js'
import { parseQuantity, type Quantity } from '../quantity/parse.js'
import { amountOf, type Amount } from './amount.js'
import {
  checkWritten,
  frequencyKind,
  isExpression,
  natureConstants,
  parseWritten,
  type Checked,
  type Written,
} from './expression.js'
import type { Issues } from './issues.js'
import { quoted } from './quoted.js'
import { placeWithin, type Tree, type TreeScalar } from './tree.js'

/** A named value of `parameters:`; both are null where its text is wrong, which has been said. */
export interface Parameter {
  readonly name: string
  readonly amount: Amount
  /** What it states. */
  readonly quantity: Quantity | null
  /** What it is derived by. */
  readonly checked: Checked | null
}

/** What is derived has the uncertainty of what it is derived from, and no other. */
export function refuseSpread({ measured, distribution, effect, scalar }: Amount, issues: Issues): void {
  const key = distribution !== null ? 'distribution' : effect !== null ? 'effect' : 'measured'
  if ((distribution ?? effect ?? measured) === null) return
  const message = `\`${key}\` belongs to a stated value; an expression takes its uncertainty from what it names`
  issues.error('derived-spread', (distribution ?? effect ?? scalar).place, message)
}

/** What starts a parameter's name and nothing else. */
export const wordPattern = /^[A-Za-z_][A-Za-z0-9_]*$/
/** A name with a sign behind it: an expression without its `=`. */
const signless = /^[A-Za-z_]\w*\s*[*/+(^-]/

/** Reads a quantity; null where it is none, which has been said. */
export function readQuantity(scalar: TreeScalar, issues: Issues): Quantity | null {
  if (signless.test(scalar.text)) {
    issues.error('expression', scalar.place, `an expression begins with \`=\`: write \`= ${scalar.text.slice(0, 60)}\``)
    return null
  }
  try {
    return parseQuantity(scalar.text)
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error
    issues.error('quantity', placeWithin(scalar, error.offset), error.message)
    return null
  }
}

/** The named values of one budget: stated ones, and those that expressions derive from others. */
export class ParameterTable {
  readonly all = new Map<string, Parameter>()
  readonly #used = new Set<string>()

  constructor(
    parameters: Tree | undefined,
    readonly issues: Issues,
  ) {
    if (parameters?.type !== 'map') return
    const written = new Map<string, Written>()
    for (const { key, value } of parameters.entries.values()) {
      const amount = amountOf(value)
      if (amount === null) continue
      const derived = isExpression(amount.scalar.text)
      const quantity = derived || amount.scalar.text === '' ? null : this.#stated(amount.scalar)
      this.all.set(key, { name: key, amount, quantity, checked: null })
      if (derived) refuseSpread(amount, issues)
      const expression = derived ? this.parse(amount.scalar) : null
      if (expression !== null) written.set(key, expression)
    }
    this.#derive(written)
  }

  #stated(scalar: TreeScalar): Quantity | null {
    if (!wordPattern.test(scalar.text)) return readQuantity(scalar, this.issues)
    const message = `${quoted(scalar.text)} is no quantity; a parameter has a number and a unit, such as \`3.1(2) ng\`, or an expression behind \`=\``
    this.issues.error('not-a-quantity', scalar.place, message)
    return null
  }

  /** Checks what is derived behind all that it is derived from. */
  #derive(written: Map<string, Written>): void {
    for (const { names } of written.values()) for (const name of names) this.#used.add(name)
    for (const name of this.#ordered(written)) {
      const [parameter, expression] = [this.all.get(name), written.get(name)]
      if (parameter === undefined || expression === undefined) continue
      this.all.set(name, { ...parameter, checked: this.check(expression, false) })
    }
  }

  /** Every circle is told once, at the first of its names; those in it count as wrong. */
  #ordered(written: Map<string, Written>): readonly string[] {
    for (;;) {
      try {
        return orderOf(new Map([...written].map(([name, { names }]) => [name, names])))
      } catch (error) {
        if (!(error instanceof CircleError)) throw error
        const place = written.get(error.circle[0] ?? '')?.scalar.place
        if (place !== undefined) this.issues.error('circle', place, error.message)
        for (const name of error.circle) written.delete(name)
      }
    }
  }

  /** Reads an expression; null where it is none, which has been said: then nothing that it may mean counts as unused. */
  parse(scalar: TreeScalar): Written | null {
    const written = parseWritten(scalar, this.issues)
    if (written === null) for (const [word] of scalar.text.matchAll(/[a-z]\w*/g)) this.#used.add(word)
    return written
  }

  /** Checks an expression; null where it is wrong, or where something that it names is, which has been said. */
  check(written: Written, withFrequency: boolean): Checked | null {
    let sound = true
    for (const name of written.names) {
      const parameter = this.all.get(name)
      if (parameter === undefined) continue
      this.#used.add(name)
      if (parameter.quantity === null && parameter.checked === null) sound = false
    }
    return sound ? checkWritten(written, this.#scope(withFrequency), this.issues) : null
  }

  use(name: string): Parameter | undefined {
    this.#used.add(name)
    return this.all.get(name)
  }

  /** Not of those in other files, which serve other budgets too. */
  warnUnused(file: string): void {
    for (const { name, amount } of this.all.values()) {
      if (this.#used.has(name) || amount.scalar.place.file !== file) continue
      const message = `the parameter \`${name}\` is not used; delete it or name it in a field`
      this.issues.warning('unused', amount.scalar.place, message)
    }
  }

  #scope(withFrequency: boolean): ReadonlyMap<string, ValueKind> {
    const scope = new Map<string, ValueKind>(natureConstants)
    for (const { name, quantity, checked } of this.all.values()) {
      const kind = quantity ?? checked?.kind
      if (kind !== undefined) scope.set(name, kind)
    }
    if (withFrequency) scope.set('f', frequencyKind)
    return scope
  }
}
