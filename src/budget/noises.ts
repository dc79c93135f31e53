import { declarations } from '../catalogue/declarations.js'
import type { ComponentSpec } from '../model/budget.js'

/** A noise that a component brings by itself. */
export interface Noise {
  /** `cavity.front`. */
  readonly id: string
  readonly component: string
  /** Whether a part of it can be claimed alone. */
  readonly parts: boolean
}

/** All noises that the components of a budget imply, in the order of the file. */
export function impliedNoises(components: readonly ComponentSpec[]): Noise[] {
  return components.flatMap(component =>
    (declarations.get(component.kind)?.noises ?? []).flatMap(({ channel, each, parts }) =>
      channels(component, channel, each).map(name => ({
        id: `${component.id}.${name}`,
        component: component.id,
        parts,
      })),
    ),
  )
}

function channels(component: ComponentSpec, channel: string, each: string | undefined): string[] {
  const map = each === undefined ? undefined : component.parameters[each]
  return map instanceof Map ? [...(map as ReadonlyMap<string, unknown>).keys()] : [channel]
}
