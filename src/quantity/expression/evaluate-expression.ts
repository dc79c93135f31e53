import { functionOf } from './functions.js'
import { ownValues } from './names-in.js'
import { raise } from './operations.js'
import type { Expression, ExpressionNode } from './tree.js'

/**
 * The value of an expression by walking its tree, one number at a time; names are asked for by `valueOf`, the
 * frequency as `f`.
 */
export function evaluateExpression(expression: Expression, valueOf: (name: string) => number): number {
  return valueOfNode(expression.root, valueOf)
}

/** The same of a part. */
export function valueOfNode(node: ExpressionNode, valueOf: (name: string) => number): number {
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
