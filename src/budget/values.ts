import type { Root, Slot } from '../model/budget.js'
import { QuantityError } from '../quantity/error.js'
import { parseQuantity, type Quantity } from '../quantity/parse.js'
import { amountOf, type Amount } from './amount.js'
import type { Issues } from './issues.js'
import { suggestion } from './nearest.js'
import { quoted } from './quoted.js'
import { rangeFault, type Range } from './range.js'
import { placeWithin, type Tree, type TreeScalar } from './tree.js'
import type { Converted, Use } from './use.js'

/** A number that a field was given. */
export interface Given {
  readonly slot: Slot
  readonly value: number
  readonly power: boolean
}

/** Where a quantity stands: the path that names its root, and what it may be. */
export interface Spot {
  readonly path: string
  readonly range: Range
}

interface Parameter {
  readonly name: string
  readonly amount: Amount
  /** Null where its text is no quantity, which has been said. */
  readonly quantity: Quantity | null
  used: boolean
  root: { readonly index: number; readonly converted: Converted } | null
}

/** The numbers of one budget: named parameters, and quantities written where they are used. */
export class Values {
  readonly roots: Root[] = []
  readonly #parameters = new Map<string, Parameter>()

  constructor(
    parameters: Tree | undefined,
    readonly issues: Issues,
  ) {
    if (parameters?.type !== 'map') return
    for (const { key, value } of parameters.entries.values()) {
      const amount = amountOf(value)
      if (amount === null) continue
      const quantity = this.#parseParameter(amount.scalar)
      this.#parameters.set(key, { name: key, amount, quantity, used: false, root: null })
    }
  }

  /** Reads what stands in a field; null where it is no such quantity, which has then been said. */
  read(tree: Tree | undefined, use: Use, spot: Spot): Given | null {
    const amount = amountOf(tree)
    if (amount === null || amount.scalar.text === '') return null
    const given = wordPattern.test(amount.scalar.text) ? this.#named(amount, use) : this.#inline(amount, use, spot.path)
    if (given === null) return null
    const fault = rangeFault(given.value, spot.range)
    if (fault === null) return given
    this.issues.error('range', amount.scalar.place, `${this.#shown(amount.scalar.text)} ${fault}`)
    return null
  }

  /** A quantity as it stands; a parameter with what stands for it. */
  #shown(text: string): string {
    const parameter = this.#parameters.get(text)?.amount.scalar
    return parameter === undefined
      ? quoted(text)
      : `\`${text}\` (${quoted(parameter.text)}, line ${parameter.place.line})`
  }

  /** A quantity that is no root of its own, or a parameter: the reference frequency. */
  number(tree: Tree | undefined, use: Use, range: Range): number | null {
    const before = this.roots.length
    const given = this.read(tree, use, { path: '', range })
    const amount = amountOf(tree)
    if (amount !== null && !wordPattern.test(amount.scalar.text)) this.roots.length = before
    return given?.value ?? null
  }

  warnUnused(): void {
    for (const { name, amount, used } of this.#parameters.values()) {
      if (used) continue
      this.issues.warning(
        'unused',
        amount.scalar.place,
        `the parameter \`${name}\` is not used; delete it or name it in a field`,
      )
    }
  }

  valueOf(slot: Slot): number {
    if ('constant' in slot) return slot.constant
    if ('formula' in slot)
      return slot.formula.value(Float64Array.from(this.roots, root => root.value)) * (slot.scale ?? 1)
    return (this.roots[slot.root]?.value ?? NaN) * (slot.scale ?? 1)
  }

  #parseParameter(scalar: TreeScalar): Quantity | null {
    if (scalar.text === '') return null
    if (!wordPattern.test(scalar.text)) return this.#parse(scalar)
    this.issues.error(
      'not-a-quantity',
      scalar.place,
      `${quoted(scalar.text)} is no quantity; a parameter has a number and a unit, such as \`3.1(2) ng\``,
    )
    return null
  }

  #parse(scalar: TreeScalar): Quantity | null {
    if (expression.test(scalar.text)) {
      this.issues.error('not-yet', scalar.place, 'expressions are not part of format 1 yet; write the number itself')
      return null
    }
    return this.#attempt(scalar, () => parseQuantity(scalar.text))
  }

  /** The complaint of the quantity's grammar, at the character that it means. */
  #attempt<Result>(scalar: TreeScalar, work: () => Result, remark = ''): Result | null {
    try {
      return work()
    } catch (error) {
      if (!(error instanceof QuantityError)) throw error
      this.issues.error(
        'quantity',
        remark === '' ? placeWithin(scalar, error.offset) : scalar.place,
        error.message + remark,
      )
      return null
    }
  }

  #inline(amount: Amount, use: Use, path: string): Given | null {
    const quantity = this.#parse(amount.scalar)
    if (quantity === null) return null
    const converted = this.#attempt(amount.scalar, () => use(quantity))
    if (converted === null) return null
    return { slot: { root: this.#add(path, amount, converted) }, value: converted.value, power: converted.power }
  }

  #add(id: string, amount: Amount, converted: Converted): number {
    const { about, evidence, measured, scalar } = amount
    if (measured !== null && !isDate(measured))
      this.issues.error('date', scalar.place, `\`measured\` says ${quoted(measured)}, which is no day of the calendar`)
    const { value, uncertainty, dimension } = converted
    this.roots.push({
      id,
      value,
      uncertainty,
      distribution: 'normal',
      effect: 'statistical',
      dimension,
      text: scalar.text,
      about,
      evidence,
      measured,
      place: scalar.place,
    })
    return this.roots.length - 1
  }

  #named(amount: Amount, use: Use): Given | null {
    const { scalar } = amount
    const parameter = this.#parameters.get(scalar.text)
    if (parameter === undefined) {
      this.issues.error('unknown-parameter', scalar.place, this.#unknown(scalar.text))
      return null
    }
    parameter.used = true
    if (amount.explained && (amount.about ?? amount.evidence ?? amount.measured) !== null)
      this.issues.error(
        'explained-twice',
        scalar.place,
        `\`${parameter.name}\` is a parameter: its \`about\`, \`evidence\` and \`measured\` stand in \`parameters\``,
      )
    const { quantity } = parameter
    if (quantity === null) return null
    const origin = parameter.amount.scalar.place
    const converted = this.#attempt(
      scalar,
      () => use(quantity),
      ` (parameter \`${parameter.name}\`, line ${origin.line})`,
    )
    return converted === null ? null : this.#reuse(parameter, converted, scalar)
  }

  #unknown(word: string): string {
    if (/^(?:yes|no|on|off|true|false|null|y|n)$/i.test(word))
      return `\`${word}\` is no quantity; write a number and its unit, such as \`3.1(2) ng\``
    const names = [...this.#parameters.keys()]
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
  #reuse(parameter: Parameter, converted: Converted, scalar: TreeScalar): Given | null {
    const { value, power } = converted
    if (parameter.root === null) {
      parameter.root = { index: this.#add(parameter.name, parameter.amount, converted), converted }
      return { slot: { root: parameter.root.index }, value, power }
    }
    const scale = scaleBetween(parameter.root.converted, converted)
    if (scale === null) {
      this.issues.error(
        'two-uses',
        scalar.place,
        `\`${parameter.name}\` is used as ${parameter.root.converted.dimension} elsewhere and as ${converted.dimension} here; make two parameters of it`,
      )
      return null
    }
    const root = parameter.root.index
    return { slot: scale === 1 ? { root } : { root, scale }, value, power }
  }
}

/** What starts a parameter's name and nothing else. */
const wordPattern = /^[A-Za-z_][A-Za-z0-9_]*$/
const expression = /^=|^[A-Za-z_]\w*\s*[*/+(^-]/

/** Factor from the first use's unit to another's; null where the two uses do not mean proportional numbers. */
function scaleBetween(first: Converted, other: Converted): number | null {
  if (first.dimension === other.dimension) return 1
  if (first.dimension === 'frequency' && other.dimension === 'rate') return 2 * Math.PI
  if (first.dimension === 'rate' && other.dimension === 'frequency') return 1 / (2 * Math.PI)
  return first.value === other.value && first.uncertainty === other.uncertainty ? 1 : null
}

/** Words that the schema has refused for their shape are none of this function's business. */
function isDate(text: string): boolean {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return true
  const time = Date.parse(`${text}T00:00:00Z`)
  return Number.isFinite(time) && new Date(time).toISOString().startsWith(text)
}
