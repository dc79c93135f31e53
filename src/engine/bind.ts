import type { Budget, DensitySpec, Parameters, Slot } from '../model/budget.js'
import type { Shape } from '../model/network.js'

/** Values of the roots as the file states them, in the order of `budget.roots`; a sweep changes a copy. */
export const rootValues = (budget: Budget): Float64Array => Float64Array.from(budget.roots, root => root.value)

type Given = Parameters[string]

const isSlot = (given: object): given is Slot =>
  'root' in given || 'constant' in given || ('formula' in given && !('density' in given))

const isDensity = (given: object): given is DensitySpec => 'density' in given && typeof given.density === 'string'

/** Turns what a file gave into what a kernel takes: slots into numbers, densities into shapes, maps and groups alike. */
export class Binder {
  constructor(
    readonly budget: Budget,
    readonly roots: Float64Array,
  ) {}

  number(slot: Slot): number {
    if ('constant' in slot) return slot.constant
    if ('formula' in slot) return slot.formula.value(this.roots) * (slot.scale ?? 1)
    return this.roots[slot.root] * (slot.scale ?? 1)
  }

  parameters(parameters: Parameters): object {
    return Object.fromEntries(Object.entries(parameters).map(([name, given]) => [name, this.#value(given)]))
  }

  #value(given: Given): unknown {
    if (typeof given === 'string') return given
    if (given instanceof Map)
      return new Map([...(given as ReadonlyMap<string, Given>)].map(([k, v]) => [k, this.#value(v)]))
    if (isSlot(given)) return this.number(given)
    if (isDensity(given)) return this.#shape(given)
    return this.parameters(given as Parameters)
  }

  /** What a table's power density is multiplied by. */
  #scaleOf({ scale, estimate }: Extract<DensitySpec, { density: 'table' }>): number {
    const known = estimate === undefined ? 1 : this.number(estimate)
    if (scale === undefined) return known
    const factor = this.number(scale.factor)
    return known * (scale.power ? factor : factor * factor)
  }

  #shape(density: DensitySpec): Shape {
    if (density.density === 'formula') {
      return { form: 'formula', power: density.power, formula: density.formula, roots: this.roots }
    }
    if (density.density === 'table') {
      return { form: 'table', value: this.#scaleOf(density), table: this.budget.tables[density.table] }
    }
    const level = this.number(density.level)
    const value = density.power ? level : level * level
    const exponent = this.number(density.exponent)
    if (density.reference === null || exponent === 0) return { form: 'constant', value }
    return { form: 'power', value, exponent, reference: this.number(density.reference) }
  }
}
