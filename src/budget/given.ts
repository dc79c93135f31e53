import type { Given } from '../catalogue/check.js'
import type { ComponentSpec, Parameters, Slot } from '../model/budget.js'
import type { Values } from './values.js'

type Parameter = Parameters[string]

/** A component as the checks of its kind see it: numbers by path instead of slots. */
export function givenOf(component: ComponentSpec, values: Values): Given {
  const at = (path: string): Parameter | undefined => lookUp(component.parameters, path)
  return {
    id: component.id,
    kind: component.kind,
    has: path => component.places.has(path),
    number: path => {
      const found = at(path)
      return found !== undefined && isSlot(found) ? values.valueOf(found) : undefined
    },
    word: path => {
      const found = at(path)
      return typeof found === 'string' ? found : undefined
    },
    names: path => {
      const found = at(path)
      return found instanceof Map ? [...(found as ReadonlyMap<string, unknown>).keys()].map(String) : []
    },
  }
}

/** A group may have a field called `root`; a slot's is a number. */
export function isSlot(parameter: Parameter): parameter is Slot {
  return (
    typeof parameter === 'object' &&
    (typeof (parameter as { root?: unknown }).root === 'number' ||
      typeof (parameter as { constant?: unknown }).constant === 'number' ||
      ('formula' in parameter && !('density' in parameter)))
  )
}

function lookUp(parameters: Parameters, path: string): Parameter | undefined {
  let found: Parameter | undefined = parameters
  for (const key of path.split('.')) {
    if (typeof found !== 'object' || isSlot(found)) return undefined
    found = found instanceof Map ? (found as ReadonlyMap<string, Parameter>).get(key) : (found as Parameters)[key]
  }
  return found
}
