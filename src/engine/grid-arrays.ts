import type { Table } from '../model/budget.js'
import type { Shape } from '../model/network.js'
import type { Points } from '../model/points.js'

type FormulaShape = Extract<Shape, { form: 'formula' }>

/** What depends on the points alone, computed once for each set of points. */
export class GridArrays {
  readonly length: number
  /** Frequency of each point's anchor in Hz, 0 where it has none. */
  readonly base: Float64Array
  readonly frequency: Float64Array
  readonly offset: Float64Array
  /** f, for whole-array powers. */
  #logarithm: Float64Array | null = null
  readonly #powers = new Map<number, Float64Array>()
  readonly #roots = new WeakMap<Float64Array, Float64Array>()
  readonly #tables = new Map<Table, Float64Array>()

  constructor(points: Points) {
    const n = points.frequency.length
    this.length = n
    this.frequency = points.frequency
    this.offset = points.offset
    this.base = new Float64Array(n)
    for (let i = 0; i < n; i++) {
      const anchor = points.anchor[i]
      this.base[i] = anchor < 0 ? 0 : points.anchors[anchor].frequency
    }
  }

  #logs(): Float64Array {
    this.#logarithm ??= this.frequency.map(Math.log)
    return this.#logarithm
  }

  /** f^exponent, f in Hz. */
  power(exponent: number): Float64Array {
    let power = this.#powers.get(exponent)
    if (power === undefined) {
      power = exponent === -1 ? this.frequency.map(f => 1 / f) : this.#logs().map(l => Math.exp(exponent * l))
      this.#powers.set(exponent, power)
    }
    return power
  }

  /** A formula at the roots' values, as a power density. */
  formula({ formula, power, roots }: FormulaShape): Float64Array {
    const values = new Float64Array(this.length)
    formula.over(roots, this.frequency, values)
    return power ? values : values.map(value => value * value)
  }

  /** √ of an array of this grid. */
  root(array: Float64Array): Float64Array {
    let root = this.#roots.get(array)
    if (root === undefined) {
      root = array.map(Math.sqrt)
      this.#roots.set(array, root)
    }
    return root
  }

  /** A table, interpolated straight in log–log; beyond its ends straight on where it says so, otherwise constant. */
  table(table: Table): Float64Array {
    let values = this.#tables.get(table)
    if (values === undefined) {
      values = interpolateLogLog(table, this.#logs())
      this.#tables.set(table, values)
    }
    return values
  }
}

function interpolateLogLog(table: Table, logs: Float64Array): Float64Array {
  const x = table.frequency.map(Math.log)
  const y = table.psd.map(Math.log)
  const last = x.length - 1
  const endless = table.outside === 'slope'
  let k = 0
  return logs.map(l => {
    if (l <= x[0] && !endless) return table.psd[0]
    if (l >= x[last] && !endless) return table.psd[last]
    while (k > 0 && l < x[k]) k--
    while (k < last - 1 && l > x[k + 1]) k++
    return Math.exp(y[k] + ((y[k + 1] - y[k]) * (l - x[k])) / (x[k + 1] - x[k]))
  })
}

const known = new WeakMap<Points, GridArrays>()

export function gridArrays(points: Points): GridArrays {
  let arrays = known.get(points)
  if (arrays === undefined) {
    arrays = new GridArrays(points)
    known.set(points, arrays)
  }
  return arrays
}
