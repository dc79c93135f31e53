/** Named expressions that need each other in a circle. */
export class CircleError extends Error {
  constructor(
    /** From a name back to itself: `a`, `b`, `a`. */
    readonly circle: readonly string[],
  ) {
    super(`${circle.map(name => `\`${name}\``).join(' → ')} goes in a circle; one of them needs a value of its own`)
    this.name = 'CircleError'
  }
}

/**
 * An order in which each definition stands behind all that it names; otherwise as they are given. Names that have no
 * definition are taken as known. Throws a CircleError.
 */
export function orderOf(definitions: ReadonlyMap<string, readonly string[]>): string[] {
  const done = new Set<string>()
  for (const name of definitions.keys()) settle(name, definitions, done)
  return [...done]
}

/** Depth first with a stack of its own, since a chain may be longer than the call stack. */
function settle(start: string, definitions: ReadonlyMap<string, readonly string[]>, done: Set<string>): void {
  const path: { name: string; next: number }[] = [{ name: start, next: 0 }]
  const onPath = new Set([start])
  for (let step = path.at(-1); step !== undefined; step = path.at(-1)) {
    const needed = done.has(step.name) ? [] : (definitions.get(step.name) ?? [])
    if (step.next === needed.length) {
      done.add(step.name)
      onPath.delete(step.name)
      path.pop()
      continue
    }
    const name = needed[step.next++]
    if (!definitions.has(name) || done.has(name)) continue
    if (onPath.has(name))
      throw new CircleError([...path.slice(path.findIndex(each => each.name === name)).map(each => each.name), name])
    path.push({ name, next: 0 })
    onPath.add(name)
  }
}
