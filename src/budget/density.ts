import type { DensityField } from '../catalogue/declaration.js'
import type { DensitySpec, Slot } from '../model/budget.js'
import type { Place } from '../model/problem.js'
import { amountOf } from './amount.js'
import type { BandRead } from './band.js'
import { readDensityFormula } from './density-formula.js'
import { isExpression } from './expression.js'
import type { Issues } from './issues.js'
import { quoted } from './quoted.js'
import type { TableReader } from './table.js'
import { child, type Tree } from './tree.js'
import { useAs, useAsDensity } from './use.js'
import type { Values } from './values.js'

type Of = DensityField['of']

/** Where a density stands: the path of its level as a root, and the place of what holds it. */
export interface DensitySpot {
  readonly path: string
  readonly place: Place
}

interface Told {
  readonly of: Of
  readonly spot: DensitySpot
}

const white: Slot = { constant: 0 }

/** Reads densities: a level, a power law, an expression of the frequency or a table. */
export class DensityReader {
  constructor(
    readonly values: Values,
    readonly tables: TableReader,
    readonly band: BandRead | null,
    readonly issues: Issues,
  ) {}

  /** `tree` is a bare level, or the map that holds `density`, `exponent`, `reference`, `table` and `expression`. */
  read(tree: Tree, of: Of, spot: DensitySpot): DensitySpec | null {
    const bare = tree.type !== 'map' || child(tree, 'value') !== undefined
    if (bare) return this.#value(tree, of, spot)
    const [level, table, expression] = ['density', 'table', 'expression'].map(key => child(tree, key))
    const given = ['density', 'table', 'expression'].filter(key => child(tree, key) !== undefined)
    if (given.length > 1) {
      const named = given.map(key => `\`${key}\``).join(' and ')
      this.issues.error('exclusive', spot.place, `${named} are given; keep one of them`)
    }
    if (given.length === 0)
      this.issues.error(
        'missing-key',
        spot.place,
        'a density is needed here: `density` with its unit, an `expression` or a `table`',
      )
    if (table !== undefined) return this.#table(tree, table, { of, spot })
    if (expression !== undefined) return this.#stated(tree, expression, { of, spot })
    return level === undefined ? null : this.#law(tree, level, { of, spot })
  }

  #table(tree: Tree, table: Tree, { of, spot }: Told): DensitySpec | null {
    this.#refuseLaw(tree, 'a `table`')
    const path = `${spot.path.replace(/\.density$/, '')}.table`
    const read = this.tables.read(table, { of, path, values: this.values })
    if (read === null) return null
    const estimate = this.#estimate(read.table, path)
    return {
      density: 'table',
      table: read.table,
      ...(read.scale !== null && { scale: read.scale }),
      ...(estimate !== null && { estimate }),
    }
  }

  /** A spectrum averaged n times is known to 1/√n of its power [Welch, IEEE Trans. Audio Electroacoust. 15, 70 (1967)], at all frequencies alike. */
  #estimate(index: number, path: string): Slot | null {
    const { averages, place } = this.tables.tables[index]
    if (averages === null) return null
    const { roots } = this.values.keeper
    roots.push({
      id: `${path}.averages`,
      value: 1,
      uncertainty: 1 / Math.sqrt(averages),
      distribution: 'normal',
      effect: 'statistical',
      dimension: 'number',
      text: `${averages} averages`,
      about: 'factor of the measured power, with the uncertainty that its averaging leaves',
      evidence: null,
      measured: null,
      place,
    })
    return { root: roots.length - 1 }
  }

  #refuseLaw(tree: Tree, instead: string): void {
    for (const key of ['exponent', 'reference']) {
      const stray = tree.type === 'map' ? tree.entries.get(key) : undefined
      if (stray === undefined) continue
      const message = `\`${key}\` belongs to a \`density\` with a level, not to ${instead}; delete it`
      this.issues.error('exclusive', stray.keyPlace, message)
    }
  }

  /** What stands under `expression` is one. */
  #stated(tree: Tree, expression: Tree, { of, spot }: Told): DensitySpec | null {
    this.#refuseLaw(tree, 'an `expression`')
    const scalar = amountOf(expression)?.scalar
    if (scalar === undefined || isExpression(scalar.text)) return this.#value(expression, of, spot)
    const message = `${quoted(scalar.text)} is no expression; one begins with \`=\`, such as \`= (2 aN/√Hz)*sqrt((1 kHz)/f)\``
    this.issues.error('expression', scalar.place, message)
    return null
  }

  /** A level, or an expression that may name `f`. */
  #value(tree: Tree, of: Of, spot: DensitySpot): DensitySpec | null {
    const formula = readDensityFormula(tree, useAsDensity(of), this)
    return formula === undefined ? this.#level(tree, of, spot) : formula
  }

  #level(tree: Tree, of: Of, spot: DensitySpot): DensitySpec | null {
    const level = this.values.read(tree, useAsDensity(of), { path: spot.path, range: 'non-negative' })
    if (level === null) return null
    return { density: 'level', level: level.slot, power: level.power, exponent: white, reference: null }
  }

  #law(tree: Tree, levelTree: Tree, { of, spot }: Told): DensitySpec | null {
    const spec = this.#value(levelTree, of, spot)
    if (spec?.density === 'formula') this.#refuseLaw(tree, 'an expression of `f`')
    const base = spot.path.replace(/\.[^.]*$/, '')
    const entry = (key: string) => (tree.type === 'map' ? tree.entries.get(key) : undefined)
    const [exponent, reference] = [entry('exponent'), entry('reference')]
    if (exponent !== undefined && reference === undefined)
      this.issues.error(
        'missing-key',
        exponent.keyPlace,
        '`exponent` needs `reference`, the frequency at which the level holds',
      )
    if (reference !== undefined && exponent === undefined)
      this.issues.error(
        'missing-key',
        reference.keyPlace,
        '`reference` needs `exponent`, the power of the power density in frequency',
      )
    const power = this.values.read(exponent?.value, useAs('number'), { path: `${base}.exponent`, range: 'any' })
    const at = this.values.read(reference?.value, useAs('frequency'), { path: `${base}.reference`, range: 'positive' })
    if (spec === null || spec.density !== 'level') return spec
    return { ...spec, exponent: power?.slot ?? white, reference: at?.slot ?? null }
  }
}
