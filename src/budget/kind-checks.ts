import type { Given, Surroundings } from '../catalogue/check.js'
import { checks } from '../catalogue/checks.js'
import type { ComponentSpec, LineSpec } from '../model/budget.js'
import type { Chain } from './chain.js'
import { givenOf } from './given.js'
import type { Issues } from './issues.js'
import type { Values } from './values.js'

/** Everything of a budget that the checks of a kind may look at. */
export interface Checked {
  readonly components: readonly ComponentSpec[]
  readonly lines: readonly LineSpec[]
  readonly chain: Chain
  readonly values: Values
  /** Ids of components in which something is wrong already; their kinds are not asked. */
  readonly unsound: ReadonlySet<string>
}

/** Lets every kind refuse what its physics forbids. */
export function checkKinds({ components, lines, chain, values, unsound }: Checked, issues: Issues): void {
  const given = new Map<string, Given>(components.map(component => [component.id, givenOf(component, values)]))
  for (const component of components) {
    const own = given.get(component.id)
    const check = checks.get(component.kind)
    if (own === undefined || check === undefined || unsound.has(component.id)) continue
    const around: Surroundings = {
      component: id => given.get(id),
      behind: behind(component.id, chain).flatMap(id => given.get(id) ?? []),
      entering: id => entering(lines, id),
    }
    for (const { path, code, message } of check(own, around)) issues.error(code, placeOf(component, path), message)
  }
}

function placeOf(component: ComponentSpec, path: string): ComponentSpec['place'] {
  for (let at = path; at !== ''; at = at.replace(/\.?[^.]*$/, '')) {
    const place = component.places.get(at)
    if (place !== undefined) return place
  }
  return component.place
}

function behind(id: string, { path }: Chain): readonly string[] {
  const index = path.indexOf(id)
  return index < 0 ? [] : path.slice(0, index).reverse()
}

function entering(lines: readonly LineSpec[], id: string): string[] {
  return lines.filter(line => 'kind' in line.claims && line.claims.parameters['into'] === id).map(line => line.id)
}
