import type { Budget, Variant } from '../model/budget.js'
import { ofVariant, type Problem } from '../model/problem.js'
import { textOf } from './amount.js'
import { Issues } from './issues.js'
import { child, type Tree, type TreeEntry, type TreeMap } from './tree.js'
import { applyChanges } from './variant-changes.js'

/** Turns a whole tree into a budget; what is wrong goes into the issues that it is given. */
export type ReadTree = (tree: Tree, issues: Issues) => Budget | null

/**
 * The variants of a budget, each a budget of its own: the same files with its changes laid over them. It has no variants,
 * and no requirements but those that its changes state. What is wrong in it is said with its name, unless the budget
 * itself has the same fault.
 */
export function readVariants(root: Tree, read: ReadTree, issues: Issues): Variant[] {
  const variants = child(root, 'variants')
  if (root.type !== 'map' || variants?.type !== 'map') return []
  const plain = without(root, ['variants', 'requirements'])
  const known = new Set(issues.sorted().map(sentence))
  return [...variants.entries.values()].flatMap(entry => {
    const own = new Issues()
    const variant = readVariant(entry, plain, tree => read(tree, own), own)
    for (const problem of own.sorted())
      if (problem.severity === 'error' && !known.has(sentence(problem))) issues.add(ofVariant(entry.key, problem))
    return variant === null ? [] : [variant]
  })
}

function readVariant(
  { key, keyPlace, value }: TreeEntry,
  plain: TreeMap,
  read: (tree: Tree) => Budget | null,
  issues: Issues,
): Variant | null {
  const changes = child(value, 'changes')
  if (changes?.type !== 'map') return null
  const budget = read(applyChanges(plain, changes, issues))
  if (budget === null || issues.failed) return null
  const [title, about] = [textOf(child(value, 'title')), textOf(child(value, 'about'))]
  return { id: key, title: title ?? key.replaceAll('_', ' '), about, budget, place: keyPlace }
}

function without(tree: TreeMap, dropped: readonly string[]): TreeMap {
  return { ...tree, entries: new Map([...tree.entries].filter(([key]) => !dropped.includes(key))) }
}

function sentence({ place, message }: Problem): string {
  return `${place.file}:${place.line}:${place.column}:${message}`
}
