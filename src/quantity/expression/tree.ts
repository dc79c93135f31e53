import type { Dimension } from '../dimension.js'
import type { Rational } from '../rational.js'
import type { Span } from '../tree.js'
import type { FunctionName } from './functions.js'

export type Operator = '+' | '-' | '*' | '/' | '^'

/** A number as written, with its unit when it has one. */
export interface Literal {
  readonly type: 'literal'
  /** In the coherent SI unit; hertz count cycles. */
  readonly value: number
  readonly dimension: Dimension
  readonly cycles: Rational
  /** Of a number without a unit, where it is exact; exponents are made of these. */
  readonly exact: Rational | null
  /** `N/√Hz`; empty for a bare number. */
  readonly unitText: string
}

/** Places count UTF-16 units within the text; the span of what stands in brackets holds the brackets. */
export type ExpressionNode = Span &
  (
    | Literal
    | { readonly type: 'name'; readonly name: string }
    | { readonly type: 'negate'; readonly of: ExpressionNode }
    | {
        readonly type: 'binary'
        readonly operator: Operator
        readonly left: ExpressionNode
        readonly right: ExpressionNode
      }
    | { readonly type: 'call'; readonly name: FunctionName; readonly given: readonly ExpressionNode[] }
  )

export interface Expression {
  readonly text: string
  readonly root: ExpressionNode
}

/** The nodes right below one, in the order they are written. */
export function childrenOf(node: ExpressionNode): readonly ExpressionNode[] {
  switch (node.type) {
    case 'literal':
    case 'name':
      return []
    case 'negate':
      return [node.of]
    case 'binary':
      return [node.left, node.right]
    case 'call':
      return node.given
  }
}
