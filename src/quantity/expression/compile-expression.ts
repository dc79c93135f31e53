import { QuantityError } from '../error.js'
import { ownValues } from './names-in.js'
import { codeOf } from './operations.js'
import { childrenOf, type Expression, type ExpressionNode } from './tree.js'

/**
 * An expression as a list of operations on registers. What does not need the frequency is computed once, in registers
 * of one number; the rest in registers of a block of points.
 */
export interface Program {
  /** Names whose values are handed in, in this order; `f` is handed in apart. */
  readonly order: readonly string[]
  readonly needsFrequency: boolean
  /** Numbers of the expression; they stand behind the values. */
  readonly numbers: Float64Array
  /** Code, result and two operands, four a step; operands are registers of one number. */
  readonly once: Int32Array
  readonly onceRegisters: number
  /** Register of a block and of one number, two a step: what is spread over the points before the loop. */
  readonly spread: Int32Array
  /** Like `once`, on registers of a block. */
  readonly over: Int32Array
  /** Register 0 holds the frequency. */
  readonly overRegisters: number
  /** The register that holds the result: of a block where `needsFrequency` is set. */
  readonly result: number
}

/** Compiles an expression for values in the given order. Throws a QuantityError for a name that is not in it. */
export function compileExpression(expression: Expression, order: readonly string[]): Program {
  return new Compiler(expression, order).program()
}

interface Place {
  /** True for a register of a block. */
  readonly block: boolean
  readonly register: number
}

class Compiler {
  readonly #values: ReadonlyMap<string, number>
  readonly #numbers: number[] = []
  readonly #registerOfNumber = new Map<number, number>()
  readonly #once: number[] = []
  readonly #spread: number[] = []
  readonly #spreadOf = new Map<number, number>()
  readonly #over: number[] = []
  readonly #free: number[] = []
  #temporaries = 0
  #blocks = 1

  constructor(
    readonly expression: Expression,
    readonly order: readonly string[],
  ) {
    this.#values = new Map(order.map((name, index) => [name, index]))
    this.#collect(expression.root)
  }

  program(): Program {
    const { block, register } = this.#place(this.expression.root)
    return {
      order: this.order,
      needsFrequency: block,
      numbers: Float64Array.from(this.#numbers),
      once: Int32Array.from(this.#once),
      onceRegisters: this.order.length + this.#numbers.length + this.#temporaries,
      spread: Int32Array.from(this.#spread),
      over: Int32Array.from(this.#over),
      overRegisters: this.#blocks,
      result: register,
    }
  }

  /** Registers of numbers come first, so that their count is known before an operation is placed. */
  #collect(node: ExpressionNode): void {
    const value = node.type === 'literal' ? node.value : node.type === 'name' ? ownValues.get(node.name) : undefined
    if (value !== undefined && !this.#registerOfNumber.has(value)) {
      this.#registerOfNumber.set(value, this.order.length + this.#numbers.length)
      this.#numbers.push(value)
    }
    childrenOf(node).forEach(child => this.#collect(child))
  }

  #place(node: ExpressionNode): Place {
    switch (node.type) {
      case 'literal':
        return this.#number(node.value)
      case 'name':
        return this.#named(node)
      case 'negate':
        return this.#emit('negate', [this.#place(node.of)])
      case 'binary':
        return this.#binary(node)
      case 'call': {
        const [first, ...rest] = node.given.map(each => this.#place(each))
        if (rest.length === 0) return this.#emit(node.name, [first])
        return rest.reduce((left, right) => this.#emit(node.name, [left, right]), first)
      }
    }
  }

  #number(value: number): Place {
    return { block: false, register: this.#registerOfNumber.get(value) ?? -1 }
  }

  #named(node: ExpressionNode & { readonly name: string }): Place {
    const { name, start, end } = node
    const own = ownValues.get(name)
    if (own !== undefined) return this.#number(own)
    if (name === 'f') return { block: true, register: 0 }
    const register = this.#values.get(name)
    if (register === undefined) throw new QuantityError(`\`${name}\` has no value here`, start, end - start)
    return { block: false, register }
  }

  /** The powers that are written most are exact as products and roots. */
  #binary(node: ExpressionNode & { readonly type: 'binary' }): Place {
    const left = this.#place(node.left)
    if (node.operator === '^' && node.right.type === 'literal') {
      if (node.right.value === 1) return left
      if (node.right.value === 2) return this.#emit('*', [left, left])
      if (node.right.value === 0.5) return this.#emit('sqrt', [left])
    }
    return this.#emit(node.operator, [left, this.#place(node.right)])
  }

  #emit(name: string, operands: readonly Place[]): Place {
    if (operands.every(({ block }) => !block)) {
      const register = this.order.length + this.#numbers.length + this.#temporaries++
      this.#once.push(codeOf(name), register, operands[0].register, operands.at(-1)?.register ?? 0)
      return { block: false, register }
    }
    const [a, b] = [this.#asBlock(operands[0]), this.#asBlock(operands.at(-1) ?? operands[0])]
    for (const register of new Set([a, b])) this.#release(register)
    const register = this.#free.pop() ?? this.#blocks++
    this.#over.push(codeOf(name), register, a, b)
    return { block: true, register }
  }

  /** What is spread over the points is kept, and so is the frequency. */
  #release(register: number): void {
    if (register !== 0 && ![...this.#spreadOf.values()].includes(register)) this.#free.push(register)
  }

  #asBlock({ block, register }: Place): number {
    if (block) return register
    const known = this.#spreadOf.get(register)
    if (known !== undefined) return known
    const spread = this.#blocks++
    this.#spreadOf.set(register, spread)
    this.#spread.push(spread, register)
    return spread
  }
}
