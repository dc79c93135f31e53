import { constantNames } from './constants.js'
import { functionNames } from './functions.js'
import { childrenOf, type Expression, type ExpressionNode } from './tree.js'

/** Names that the language itself gives a value: π, and what says that a number counts turns or radians. */
export const ownValues: ReadonlyMap<string, number> = new Map([
  ['pi', Math.PI],
  ['cycle', 1],
  ['radian', 1],
])

export const ownNames: ReadonlySet<string> = new Set(ownValues.keys())

/** All names of an expression once, in the order of their first use; functions, `pi`, `cycle` and `radian` are none. */
export function namesIn(expression: Expression): string[] {
  const names = new Set<string>()
  const visit = (node: ExpressionNode): void => {
    if (node.type === 'name' && !ownNames.has(node.name)) names.add(node.name)
    childrenOf(node).forEach(visit)
  }
  visit(expression.root)
  return [...names]
}

/** What no parameter may be called: names of the language, its functions, the frequency and the constants of nature. */
export const reservedNames: ReadonlySet<string> = new Set([...ownNames, ...functionNames, 'f', ...constantNames])
