import { functionNames, functionOf } from './functions.js'

/** One operation of a program: its number in `operations` is its code. */
export interface Operation {
  readonly name: string
  readonly operands: 1 | 2
  readonly apply: (a: number, b: number) => number
  /** out = a ∘ b over the first `count` points; out may be a or b. */
  readonly loop: (out: Float64Array, a: Float64Array, b: Float64Array, count: number) => void
}

function operation(name: string, operands: 1 | 2, apply: Operation['apply']): Operation {
  const loop: Operation['loop'] = (out, a, b, count) => {
    for (let i = 0; i < count; i += 1) out[i] = apply(a[i], b[i])
  }
  return { name, operands, apply, loop }
}

/** a^b; a square and a root are rounded once, wherever they are computed. */
export function raise(a: number, b: number): number {
  if (b === 2) return a * a
  return b === 0.5 ? Math.sqrt(a) : a ** b
}

/** The four that most points go through, each in a loop of its own. */
const plain: readonly Operation[] = [
  {
    ...operation('+', 2, (a, b) => a + b),
    loop: (out, a, b, count) => {
      for (let i = 0; i < count; i += 1) out[i] = a[i] + b[i]
    },
  },
  {
    ...operation('-', 2, (a, b) => a - b),
    loop: (out, a, b, count) => {
      for (let i = 0; i < count; i += 1) out[i] = a[i] - b[i]
    },
  },
  {
    ...operation('*', 2, (a, b) => a * b),
    loop: (out, a, b, count) => {
      for (let i = 0; i < count; i += 1) out[i] = a[i] * b[i]
    },
  },
  {
    ...operation('/', 2, (a, b) => a / b),
    loop: (out, a, b, count) => {
      for (let i = 0; i < count; i += 1) out[i] = a[i] / b[i]
    },
  },
]

export const operations: readonly Operation[] = [
  ...plain,
  operation('^', 2, raise),
  operation('negate', 1, a => -a),
  ...functionNames.map(name => operation(name, functionOf(name).count, functionOf(name).apply)),
]

const codes: ReadonlyMap<string, number> = new Map(operations.map(({ name }, code) => [name, code]))

export function codeOf(name: string): number {
  const code = codes.get(name)
  if (code === undefined) throw new RangeError(`there is no operation ${name}`)
  return code
}
