import type { Tree, TreeScalar } from './tree.js'
import { child } from './tree.js'

/** A quantity as a file states it, with what it says around it. */
export interface Amount {
  readonly scalar: TreeScalar
  readonly about: string | null
  readonly evidence: string | null
  readonly measured: string | null
  /** True for `{ value: … }`. */
  readonly explained: boolean
}

/** A bare quantity or `{ value, about, evidence, measured }`; null where the shape is neither, which the schema has said. */
export function amountOf(tree: Tree | undefined): Amount | null {
  if (tree === undefined || tree.type === 'list') return null
  if (tree.type === 'scalar') return { scalar: tree, about: null, evidence: null, measured: null, explained: false }
  const value = child(tree, 'value')
  if (value?.type !== 'scalar') return null
  return {
    scalar: value,
    about: textOf(child(tree, 'about')),
    evidence: textOf(child(tree, 'evidence')),
    measured: textOf(child(tree, 'measured')),
    explained: true,
  }
}

/** The text of a scalar, null where nothing stands. */
export function textOf(tree: Tree | undefined): string | null {
  return tree?.type === 'scalar' && tree.text !== '' ? tree.text : null
}
