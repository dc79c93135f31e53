import { QuantityError } from '../error.js'
import { functionOf } from './functions.js'
import { raise } from './operations.js'
import { childrenOf, type Expression, type ExpressionNode } from './tree.js'

/**
 * The value of an expression by walking its tree, one number at a time; names are asked for by `valueOf`, the
 * frequency as `f`.
 */
export function evaluateExpression(expression: Expression, valueOf: (name: string) => number): number {
  return valueOfNode(expression.root, valueOf)
}

function valueOfNode(node: ExpressionNode, valueOf: (name: string) => number): number {
  switch (node.type) {
    case 'literal':
      return node.value
    case 'name':
      return ownValues.get(node.name) ?? valueOf(node.name)
    case 'negate':
      return -valueOfNode(node.of, valueOf)
    case 'binary':
      return binary(node.operator, valueOfNode(node.left, valueOf), valueOfNode(node.right, valueOf))
    case 'call': {
      const { apply } = functionOf(node.name)
      const [first, ...rest] = node.given.map(each => valueOfNode(each, valueOf))
      return rest.length === 0 ? apply(first, first) : rest.reduce((left, right) => apply(left, right), first)
    }
  }
}

const ownValues: ReadonlyMap<string, number> = new Map([
  ['pi', Math.PI],
  ['cycle', 1],
  ['radian', 1],
])

function binary(operator: string, a: number, b: number): number {
  switch (operator) {
    case '+':
      return a + b
    case '-':
      return a - b
    case '*':
      return a * b
    case '/':
      return a / b
    default:
      return raise(a, b)
  }
}

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
