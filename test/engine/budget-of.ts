import type { Budget, ComponentSpec, LineSpec, Parameters, Slot } from '../../src/model/budget.js'
import type { Place } from '../../src/model/problem.js'

export const place: Place = { file: 'test', line: 1, column: 1 }

export const slot = (constant: number): Slot => ({ constant })

/** A component as the border would hand it on. */
export function component(id: string, kind: string, parameters: Parameters): ComponentSpec {
  return { id, kind, parameters, place, places: new Map() }
}

/** A budget without a file, for tests of the engine alone. */
export function budgetOf(components: ComponentSpec[], changes: Partial<Budget> = {}): Budget {
  return {
    sensor: 'test',
    file: 'test',
    format: 1,
    title: 'Test',
    summary: null,
    about: null,
    revision: '1',
    measurand: { quantity: 'force', weights: null, at: null, place },
    readout: 'detector',
    readoutPlace: place,
    band: { low: 1, high: 10, place },
    reference: null,
    roots: [],
    derived: [],
    correlations: [],
    requirements: [],
    variants: [],
    citations: [],
    tables: [],
    components,
    lines: [],
    warnings: [],
    ...changes,
  }
}

export function line(
  id: string,
  of: string[],
  part: LineSpec['claims'] extends infer C ? (C extends { part: infer P } ? P : never) : never,
): LineSpec {
  return { id, title: null, about: null, evidence: null, place, claims: { of, part } }
}
