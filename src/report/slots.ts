import type { Budget, DensitySpec, Parameters, Root, Slot } from '../model/budget.js'

type Value = Parameters[string]

/** A number that a component or a contribution was given, with the path of its field. */
export interface GivenNumber {
  readonly path: readonly string[]
  readonly slot: Slot
}

function isMap(value: Value): value is ReadonlyMap<string, Parameters | Slot> {
  return value instanceof Map
}

function isSlot(value: Exclude<Value, string>): value is Slot {
  return (
    ('root' in value && typeof value.root === 'number') || ('constant' in value && typeof value.constant === 'number')
  )
}

/** A density has its own shape: only there `density` is a plain word. */
export function isDensity(value: Value | undefined): value is DensitySpec {
  return typeof value === 'object' && 'density' in value && typeof value.density === 'string'
}

/** Every number below these parameters, in the order of the file; a density gives its level, exponent and reference. */
export function givenNumbers(parameters: Parameters): readonly GivenNumber[] {
  return Object.entries(parameters).flatMap(([field, value]) => numbersOf(value, [field]))
}

function numbersOf(value: Value, path: readonly string[]): readonly GivenNumber[] {
  if (typeof value === 'string') return []
  if (isMap(value)) return [...value].flatMap(([name, inner]) => numbersOf(inner, [...path, name]))
  if (isSlot(value)) return [{ path, slot: value }]
  if (isDensity(value)) return densityNumbers(value, path)
  return Object.entries(value).flatMap(([field, inner]) => numbersOf(inner, [...path, field]))
}

function densityNumbers(spec: DensitySpec, path: readonly string[]): readonly GivenNumber[] {
  if (spec.density === 'table') return []
  const level = { path: [...path, 'level'], slot: spec.level }
  if (spec.reference === null) return [level]
  return [
    level,
    { path: [...path, 'exponent'], slot: spec.exponent },
    { path: [...path, 'reference'], slot: spec.reference },
  ]
}

/** The number in a slot, in the canonical unit of the field. */
export function slotValue(budget: Budget, slot: Slot): number {
  return 'root' in slot ? budget.roots[slot.root].value * (slot.scale ?? 1) : slot.constant
}

/** The root in a slot; null for a default. */
export function slotRoot(budget: Budget, slot: Slot): Root | null {
  return 'root' in slot ? budget.roots[slot.root] : null
}

/** The slot of a field by its path (`ports`, `front`, `rate`), or null where there is none. */
export function slotAt(parameters: Parameters, ...path: readonly string[]): Slot | null {
  const found = givenNumbers(parameters).find(
    given => given.path.length === path.length && given.path.every((name, i) => name === path[i]),
  )
  return found?.slot ?? null
}

/** A word (a choice or a name) by its path, or null. */
export function wordAt(parameters: Parameters, ...path: readonly string[]): string | null {
  let value: Value | undefined = parameters
  for (const name of path) {
    if (typeof value !== 'object') return null
    value = isMap(value) ? value.get(name) : (value as Parameters)[name]
  }
  return typeof value === 'string' ? value : null
}
