import type { DensitySpec, Table } from '../../src/model/budget.js'
import { Binder, rootValues } from '../../src/engine/bind.js'
import type { Shape } from '../../src/model/network.js'
import { good, lines, read, small } from './read.js'

/** A budget of 1.2 MHz to 1.3 MHz with a table of force noise; `keys` are those of the table. */
export function withTable(keys: string, parameters = ''): string {
  const named = parameters === '' ? small : small.replace('components:', `parameters: { ${parameters} }\ncomponents:`)
  return `${named}contributions:\n  stray:\n    kind: force-noise\n    into: drum\n    table:\n${indented(keys)}`
}

function indented(keys: string): string {
  return keys
    .split('\n')
    .map(line => `      ${line}\n`)
    .join('')
}

/** The line of the budget in which the first key of a table stands. */
export const firstLine = withTable('').trimEnd().split('\n').length + 1

/** A table as the border hands it over, and the power density in SI that the engine makes of it. */
export interface ReadTable {
  readonly table: Table
  readonly psd: readonly number[]
}

export function readTable(keys: string, file: string, parameters = ''): ReadTable {
  const budget = good(withTable(keys, parameters), { 'x.csv': file })
  const [table] = budget.tables
  const claims = budget.lines.at(-1)?.claims
  if (table === undefined || claims === undefined || !('kind' in claims)) throw new Error('no table was read')
  const spec = claims.parameters['density'] as DensitySpec
  const { density } = new Binder(budget, rootValues(budget)).parameters({ density: spec }) as { density: Shape }
  if (density.form !== 'table') throw new Error('the density is no table')
  return { table, psd: [...table.psd].map(value => value * density.value) }
}

/** What is said about a table, as printed. */
export function told(keys: string, file: string, parameters = ''): string[] {
  return lines(read(withTable(keys, parameters), { 'x.csv': file }))
}
