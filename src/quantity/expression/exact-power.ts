import { add, multiply, negate, rational, type Rational } from '../rational.js'
import type { ExpressionNode } from './tree.js'

/** The exact value of an exponent that is made of plain numbers alone: `-1/2`, `(3 - 1)/4`; null for every other. */
export function exactPower(node: ExpressionNode): Rational | null {
  if (node.type === 'literal') return node.exact
  if (node.type === 'negate') {
    const of = exactPower(node.of)
    return of === null ? null : negate(of)
  }
  if (node.type !== 'binary') return null
  const [left, right] = [exactPower(node.left), exactPower(node.right)]
  if (left === null || right === null) return null
  switch (node.operator) {
    case '+':
      return add(left, right)
    case '-':
      return add(left, negate(right))
    case '*':
      return multiply(left, right)
    case '/':
      return right.numerator === 0 ? null : multiply(left, rational(right.denominator, right.numerator))
    case '^':
      return null
  }
}
