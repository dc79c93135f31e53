import { declarations } from '../catalogue/declarations.js'
import type { ComponentSpec } from '../model/budget.js'
import type { Issues } from './issues.js'

/** The way of the record, from the readout back to the component whose port is read. */
export interface Chain {
  /** Ids from the detector backwards: detector, then losses and amplifiers. */
  readonly path: readonly string[]
}

/** Follows `reads` from the readout; a way that comes back to itself is an error at every component of the loop. */
export function followChain(components: readonly ComponentSpec[], readout: string, issues: Issues): Chain {
  const byId = new Map(components.map(component => [component.id, component]))
  let loops = 0
  for (const component of components) {
    const loop = loopFrom(component.id, byId)
    if (loop === null) continue
    loops++
    const place = component.places.get('reads') ?? component.place
    const way = loop.map(id => `\`${id}\``).join(' reads ')
    issues.error('loop', place, `${way}: the way of the light must end at a port, such as \`cavity.back\``)
  }
  const path = wayFrom(readout, byId)
  if (loops === 0) warnAside(components, new Set(path), issues)
  return { path }
}

function next(id: string, byId: ReadonlyMap<string, ComponentSpec>): string | undefined {
  const reads = byId.get(id)?.parameters['reads']
  return typeof reads === 'string' && byId.has(reads) ? reads : undefined
}

function wayFrom(start: string, byId: ReadonlyMap<string, ComponentSpec>): string[] {
  const way: string[] = []
  for (let id: string | undefined = start; id !== undefined && !way.includes(id); id = next(id, byId)) way.push(id)
  return way
}

/** The way from a component back to itself, or null. */
function loopFrom(start: string, byId: ReadonlyMap<string, ComponentSpec>): string[] | null {
  const way = wayFrom(start, byId)
  const last = way.at(-1)
  return last !== undefined && next(last, byId) === start ? [...way, start] : null
}

function warnAside(components: readonly ComponentSpec[], onPath: ReadonlySet<string>, issues: Issues): void {
  for (const { id, kind, place } of components) {
    const nature = declarations.get(kind)?.nature
    if (onPath.has(id) || (nature !== 'chain' && nature !== 'detector')) continue
    issues.warning('aside', place, `\`${id}\` is not on the way to the readout and changes nothing`)
  }
}
