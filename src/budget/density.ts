import type { DensityField } from '../catalogue/declaration.js'
import type { DensitySpec, Slot } from '../model/budget.js'
import type { Place } from '../model/problem.js'
import type { Issues } from './issues.js'
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

const white: Slot = { constant: 0 }

/** Reads densities: a level, a power law or a table. */
export class DensityReader {
  constructor(
    readonly values: Values,
    readonly tables: TableReader,
    readonly issues: Issues,
  ) {}

  /** `tree` is a bare level, or the map that holds `density`, `exponent`, `reference` and `table`. */
  read(tree: Tree, of: Of, spot: DensitySpot): DensitySpec | null {
    const bare = tree.type !== 'map' || child(tree, 'value') !== undefined
    if (bare) return this.#level(tree, of, spot)
    const level = child(tree, 'density')
    const table = child(tree, 'table')
    if (level !== undefined && table !== undefined)
      this.issues.error('exclusive', spot.place, 'both `density` and `table` are given; keep one of them')
    if (level === undefined && table === undefined && child(tree, 'expression') === undefined)
      this.issues.error(
        'missing-key',
        spot.place,
        `a density is needed here: \`density\` with its unit, or a \`table\``,
      )
    if (table !== undefined) return this.#table(tree, table, of)
    return level === undefined ? null : this.#law(tree, level, of, spot)
  }

  #table(tree: Tree, table: Tree, of: Of): DensitySpec | null {
    for (const key of ['exponent', 'reference']) {
      const stray = tree.type === 'map' ? tree.entries.get(key) : undefined
      if (stray !== undefined)
        this.issues.error(
          'exclusive',
          stray.keyPlace,
          `\`${key}\` belongs to a \`density\`, not to a \`table\`; delete it`,
        )
    }
    const index = this.tables.read(table, of)
    return index === null ? null : { density: 'table', table: index }
  }

  #level(tree: Tree, of: Of, spot: DensitySpot): DensitySpec | null {
    const level = this.values.read(tree, useAsDensity(of), { path: spot.path, range: 'non-negative' })
    if (level === null) return null
    return { density: 'level', level: level.slot, power: level.power, exponent: white, reference: null }
  }

  #law(tree: Tree, levelTree: Tree, of: Of, spot: DensitySpot): DensitySpec | null {
    const spec = this.#level(levelTree, of, spot)
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
