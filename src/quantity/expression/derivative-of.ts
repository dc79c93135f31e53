import { dimensionless } from '../dimension.js'
import { zero } from '../rational.js'
import type { FunctionName } from './functions.js'
import { childrenOf, type Expression, type ExpressionNode, type Operator } from './tree.js'

/**
 * The exact derivative of an expression by one of its names, as an expression to compile like any other; zero where
 * the name does not occur. At the corner of `abs`, `min` and `max` it is the mean of both sides.
 */
export function derivativeOf(expression: Expression, name: string): Expression {
  return { text: expression.text, root: derivative(expression.root, name) ?? number(0, expression.root) }
}

/** Null stands for zero, so that products with it are never built. */
type Slope = ExpressionNode | null

function derivative(node: ExpressionNode, name: string): Slope {
  const inner = childrenOf(node).map(child => derivative(child, name))
  switch (node.type) {
    case 'literal':
      return null
    case 'name':
      return node.name === name ? number(1, node) : null
    case 'negate':
      return negated(inner[0])
    case 'binary':
      return binary(node, inner)
    case 'call':
      return call(node, inner)
  }
}

function binary(node: ExpressionNode & { readonly type: 'binary' }, [a, b]: readonly Slope[]): Slope {
  const { left, right } = node
  switch (node.operator) {
    case '+':
      return sum(a, b)
    case '-':
      return sum(a, negated(b))
    case '*':
      return sum(times(a, right), times(b, left))
    case '/':
      return over(sum(a, negated(times(b, node))), right)
    case '^':
      return sum(
        times(a, make('*', right, make('^', left, make('-', right, number(1, right))))),
        times(b, make('*', node, apply('ln', left))),
      )
  }
}

function call(node: ExpressionNode & { readonly type: 'call' }, slopes: readonly Slope[]): Slope {
  const { name, given } = node
  const [a, b] = given
  if (name === 'min' || name === 'max') return extreme(node, slopes)
  if (name === 'hypot') return over(given.map((each, index) => times(slopes[index], each)).reduce(sum), node)
  if (name === 'atan2') {
    return over(sum(times(slopes[0], b), negated(times(slopes[1], a))), make('+', square(a), square(b)))
  }
  return times(slopes[0], outer(name, a, node))
}

/**
 * Of more than two, one after another: the extreme so far against the next. Every slope enters once, since doubling it
 * in nested extremes would grow without bound.
 */
function extreme(node: ExpressionNode & { readonly type: 'call' }, slopes: readonly Slope[]): Slope {
  const [one, two] = [number(1, node), number(2, node)]
  let [sofar, slope] = [node.given[0], slopes[0]]
  for (let index = 1; index < node.given.length; index += 1) {
    const next = node.given[index]
    const difference = node.name === 'max' ? make('-', sofar, next) : make('-', next, sofar)
    const side = apply('sign', difference)
    slope = over(sum(times(slope, make('+', one, side)), times(slopes[index], make('-', one, side))), two)
    sofar = { ...node, given: [sofar, next] }
  }
  return slope
}

type Single = Exclude<FunctionName, 'atan2' | 'hypot' | 'min' | 'max'>

/** The derivative of a function of one argument; `whole` is the function of it. */
function outer(name: Single, a: ExpressionNode, whole: ExpressionNode): ExpressionNode {
  const one = number(1, a)
  const under = (below: ExpressionNode): ExpressionNode => make('/', one, below)
  const rules: Readonly<Record<Single, () => ExpressionNode>> = {
    sqrt: () => under(make('*', number(2, a), whole)),
    abs: () => apply('sign', a),
    sign: () => number(0, a),
    exp: () => whole,
    ln: () => under(a),
    log10: () => under(make('*', number(Math.LN10, a), a)),
    sin: () => apply('cos', a),
    cos: () => negate(apply('sin', a)),
    tan: () => make('+', one, square(whole)),
    asin: () => under(apply('sqrt', make('-', one, square(a)))),
    acos: () => negate(under(apply('sqrt', make('-', one, square(a))))),
    atan: () => under(make('+', one, square(a))),
    sinh: () => apply('cosh', a),
    cosh: () => apply('sinh', a),
    tanh: () => make('-', one, square(whole)),
    coth: () => make('-', one, square(whole)),
  }
  return rules[name]()
}

function number(value: number, { start, end }: ExpressionNode): ExpressionNode {
  return { type: 'literal', value, dimension: dimensionless, cycles: zero, exact: null, unitText: '', start, end }
}

function make(operator: Operator, left: ExpressionNode, right: ExpressionNode): ExpressionNode {
  return { type: 'binary', operator, left, right, start: left.start, end: right.end }
}

function negate(of: ExpressionNode): ExpressionNode {
  return { type: 'negate', of, start: of.start, end: of.end }
}

function apply(name: FunctionName, to: ExpressionNode): ExpressionNode {
  return { type: 'call', name, given: [to], start: to.start, end: to.end }
}

function square(of: ExpressionNode): ExpressionNode {
  return make('*', of, of)
}

function negated(a: Slope): Slope {
  return a === null ? null : negate(a)
}

function sum(a: Slope, b: Slope): Slope {
  if (a === null || b === null) return a ?? b
  return make('+', a, b)
}

function times(a: Slope, b: ExpressionNode): Slope {
  return a === null ? null : make('*', a, b)
}

function over(a: Slope, b: ExpressionNode): Slope {
  return a === null ? null : make('/', a, b)
}
