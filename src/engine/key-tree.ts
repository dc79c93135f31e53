/** What an operation and its operands are; equal keys are one register. */
export type Key = readonly (string | number)[]

/** Keys without turning numbers into text, which would take longer than a small evaluation. */
export class KeyTree {
  #branches: Map<string | number, KeyTree> | null = null
  address = -1

  find(key: Key): KeyTree {
    let node: KeyTree = this
    for (const part of key) {
      node.#branches ??= new Map()
      let next = node.#branches.get(part)
      if (next === undefined) {
        next = new KeyTree()
        node.#branches.set(part, next)
      }
      node = next
    }
    return node
  }
}
