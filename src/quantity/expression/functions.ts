/** What a function asks of its arguments and what comes out. */
export type Rule =
  /** A plain number in, a plain number out; an angle counts in radians. */
  | 'number'
  /** All of one kind in, the same kind out. */
  | 'same'
  /** All of one kind in, a plain number out. */
  | 'ratio'
  /** Half of every exponent. */
  | 'root'

export interface FunctionMeaning {
  readonly rule: Rule
  /** Of arguments; a function with two takes more where `many` is set. */
  readonly count: 1 | 2
  readonly many?: true
  readonly apply: (a: number, b: number) => number
}

export const mostArguments = 20

const number = (apply: (a: number) => number): FunctionMeaning => ({ rule: 'number', count: 1, apply })

const table = {
  sqrt: { rule: 'root', count: 1, apply: Math.sqrt },
  abs: { rule: 'same', count: 1, apply: Math.abs },
  sign: { rule: 'ratio', count: 1, apply: Math.sign },
  exp: number(Math.exp),
  ln: number(Math.log),
  log10: number(Math.log10),
  sin: number(Math.sin),
  cos: number(Math.cos),
  tan: number(Math.tan),
  asin: number(Math.asin),
  acos: number(Math.acos),
  atan: number(Math.atan),
  sinh: number(Math.sinh),
  cosh: number(Math.cosh),
  tanh: number(Math.tanh),
  coth: number(x => 1 / Math.tanh(x)),
  atan2: { rule: 'ratio', count: 2, apply: Math.atan2 },
  hypot: { rule: 'same', count: 2, many: true, apply: Math.hypot },
  min: { rule: 'same', count: 2, many: true, apply: Math.min },
  max: { rule: 'same', count: 2, many: true, apply: Math.max },
} as const satisfies Record<string, FunctionMeaning>

export type FunctionName = keyof typeof table

const functions: ReadonlyMap<string, FunctionMeaning> = new Map<string, FunctionMeaning>(Object.entries(table))

/** All functions of the language, in the order in which they are listed to people. */
export const functionNames: readonly FunctionName[] = Object.keys(table) as FunctionName[]

export function isFunctionName(name: string): name is FunctionName {
  return functions.has(name)
}

export function functionOf(name: FunctionName): FunctionMeaning {
  return table[name]
}
