import type { Tree, TreeScalar } from './tree.js'
import { child } from './tree.js'

/** A quantity as a file states it, with what it says around it. */
export interface Amount {
  readonly scalar: TreeScalar
  readonly about: string | null
  readonly evidence: string | null
  readonly measured: string | null
  readonly distribution: TreeScalar | null
  readonly effect: TreeScalar | null
  /** True for `{ value: … }`. */
  readonly explained: boolean
}

/** A bare quantity or `{ value, about, evidence, … }`; null where the shape is neither, which the schema has said. */
export function amountOf(tree: Tree | undefined): Amount | null {
  if (tree === undefined || tree.type === 'list') return null
  const value = tree.type === 'scalar' ? tree : child(tree, 'value')
  if (value?.type !== 'scalar') return null
  return {
    scalar: value,
    about: textOf(child(tree, 'about')),
    evidence: textOf(child(tree, 'evidence')),
    measured: textOf(child(tree, 'measured')),
    distribution: scalarOf(child(tree, 'distribution')),
    effect: scalarOf(child(tree, 'effect')),
    explained: tree.type === 'map',
  }
}

/** The text of a scalar, null where nothing stands. */
export function textOf(tree: Tree | undefined): string | null {
  return tree?.type === 'scalar' && tree.text !== '' ? tree.text : null
}

function scalarOf(tree: Tree | undefined): TreeScalar | null {
  return tree?.type === 'scalar' && tree.text !== '' ? tree : null
}
