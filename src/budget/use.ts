import { isDeclaredName, toDeclared, toDensity, type DensityOf } from '../quantity/declared.js'
import type { Quantity } from '../quantity/parse.js'
import { EngineFault } from '../model/problem.js'

/** A quantity in the canonical unit of one use of it. */
export interface Converted {
  readonly value: number
  readonly uncertainty: number
  /** The root's dimension: a declared name, or `force-amplitude-density` and its like. */
  readonly dimension: string
  /** Of a density: true for a power density. */
  readonly power: boolean
}

/** How a field uses a quantity; throws a QuantityError where it cannot. */
export type Use = (quantity: Quantity) => Converted

export function useAs(dimension: string): Use {
  if (!isDeclaredName(dimension)) throw new EngineFault(`no declared dimension is called ${dimension}`)
  return quantity => {
    const { value, uncertainty } = toDeclared(quantity, dimension)
    return { value, uncertainty, dimension, power: false }
  }
}

export function useAsDensity(of: DensityOf): Use {
  return quantity => {
    const { value, uncertainty, power } = toDensity(quantity, of)
    const dimension = of === 'quanta' ? 'number' : `${of}-${power ? 'power' : 'amplitude'}-density`
    return { value, uncertainty, dimension, power }
  }
}
