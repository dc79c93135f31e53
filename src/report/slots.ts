import type { Budget, DensitySpec, Parameters, Root, Slot } from '../model/budget.js'
import { numberText } from './numbers.js'

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
    ('root' in value && typeof value.root === 'number') ||
    ('constant' in value && typeof value.constant === 'number') ||
    ('formula' in value && !('density' in value))
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
  if (isDensity(value)) return densityNumbers(value, path)
  if (isSlot(value)) return [{ path, slot: value }]
  return Object.entries(value).flatMap(([field, inner]) => numbersOf(inner, [...path, field]))
}

function densityNumbers(spec: DensitySpec, path: readonly string[]): readonly GivenNumber[] {
  if (spec.density !== 'level') return []
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
  if ('constant' in slot) return slot.constant
  const scale = slot.scale ?? 1
  if ('root' in slot) return budget.roots[slot.root].value * scale
  return slot.formula.value(Float64Array.from(budget.roots, root => root.value)) * scale
}

/** Every root that a slot's number rests on: one, several below a formula, or none for a default. */
export function slotRoots(budget: Budget, slot: Slot): readonly Root[] {
  if ('constant' in slot) return []
  return 'root' in slot ? [budget.roots[slot.root]] : slot.formula.roots.map(index => budget.roots[index])
}

/** What the file says in a slot and where a reader finds it; null for a default. */
export function slotText(budget: Budget, slot: Slot): { readonly text: string; readonly root: string } | null {
  if ('constant' in slot) return null
  if ('root' in slot) return { text: budget.roots[slot.root].text, root: budget.roots[slot.root].id }
  const derived = budget.derived.find(({ formula }) => formula === slot.formula)
  return { text: derived?.text ?? numberText(slotValue(budget, slot)), root: derived?.id ?? '' }
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
