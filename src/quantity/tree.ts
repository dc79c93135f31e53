/** What the generated parser hands over; places count UTF-16 units within the text. */
export interface Span {
  readonly start: number
  readonly end: number
}

export interface QuantityNode {
  /** A leading `2π ×`. */
  readonly pi: (Span & { readonly negative: boolean; readonly digits: string }) | null
  /** Null for `2π` and `2π rad/s`. */
  readonly number: NumberNode | null
  readonly unit: UnitNode | null
  readonly deviation: { readonly number: NumberNode; readonly unit: UnitNode | null } | null
  /** `(3.1 ± 0.2) ng`, with the power of ten behind the bracket. */
  readonly bracketed: boolean
  readonly ten?: { readonly power: number } | null
}

export interface NumberNode extends Span {
  readonly negative: boolean
  /** `3.10`, without sign and exponent. */
  readonly digits: string
  /** The concise uncertainty: `2` of `3.1(2)`. */
  readonly bracket: string | null
  readonly exponent: number
  readonly spelled: 'none' | 'e' | 'ten'
}

export interface UnitNode extends Span {
  /** Begins with a division: `/√Hz`. */
  readonly slash: boolean
  readonly head: TermNode
  readonly tail: readonly (Span & { readonly operator: '*' | '/'; readonly term: TermNode })[]
}

export interface PowerNode extends Span {
  readonly sign: string
  readonly over: string
  readonly under: string
}

export type TermNode = Span &
  (
    | { readonly type: 'root'; readonly of: TermNode }
    | { readonly type: 'group'; readonly unit: UnitNode; readonly root: boolean; readonly power: PowerNode | null }
    | { readonly type: 'symbol'; readonly symbol: string; readonly power: PowerNode | null }
    | { readonly type: 'one' }
  )
