import { QuantityError } from '../error.js'
import { valueOfNode } from './evaluate-expression.js'
import { childrenOf, type Expression, type ExpressionNode } from './tree.js'

/**
 * Why a result is NaN or infinite: the innermost part that is, with the values it was made of, as an error to throw.
 * `at` goes on in the sentence: `at f = 1.2 kHz`.
 */
export function faultOf(expression: Expression, valueOf: (name: string) => number, at = ''): QuantityError {
  const { text, root } = expression
  const node = innermostFault(root, valueOf) ?? root
  const value = valueOfNode(node, valueOf)
  const what = Number.isNaN(value) ? 'is not a number' : 'is infinite'
  const parts = childrenOf(node).map(
    child => `\`${text.slice(child.start, child.end)}\` is ${shown(valueOfNode(child, valueOf))}`,
  )
  const why = parts.length === 0 ? '' : `, as ${parts.join(' and ')}`
  const written = text.slice(node.start, node.end)
  return new QuantityError(
    `\`${written}\` ${what}${at === '' ? '' : ` ${at}`}${why}`,
    node.start,
    node.end - node.start,
  )
}

function innermostFault(node: ExpressionNode, valueOf: (name: string) => number): ExpressionNode | null {
  for (const child of childrenOf(node)) {
    const found = innermostFault(child, valueOf)
    if (found !== null) return found
  }
  return Number.isFinite(valueOfNode(node, valueOf)) ? null : node
}

function shown(value: number): string {
  return String(Number(value.toPrecision(4)))
}
