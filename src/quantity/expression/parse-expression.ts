import { QuantityError } from '../error.js'
import { dimensionless } from '../dimension.js'
import { rational, toNumber, zero } from '../rational.js'
import { functionNames, functionOf, isFunctionName, mostArguments, type FunctionName } from './functions.js'
import { bracketedQuantity, isUnitToken, numberNode, plainQuantity } from './literal.js'
import { tokensOf, type Token } from './tokens.js'
import type { Expression, ExpressionNode, Operator } from './tree.js'

/** Bounds on what is read: UTF-16 units, brackets within brackets, numbers and names and operations. */
export const expressionBounds = { length: 1000, depth: 50, nodes: 500 } as const

/**
 * Reads an expression with or without its leading `=`: `sqrt(k/m)/(2*pi)`, `4*k_B*temperature*rate`.
 * `+ - * / ^`, brackets and functions as usual: −2^2 is −4, 2^3^2 is 2^9, a/b*c is (a/b)*c; nothing is multiplied
 * without a sign, but for π right behind its number (`1/2π` is 1/(2π)).
 * A number takes one unit symbol behind it (`3 kHz`, `90°`); every other unit stands in brackets with its number
 * (`(0.8 aN/√Hz)`). Throws a QuantityError with the place and a remedy.
 */
export function parseExpression(text: string): Expression {
  const { length } = expressionBounds
  if (text.length > length) {
    const message = `an expression of ${text.length} characters is too long; at most ${length} are read`
    throw new QuantityError(message, length, text.length - length)
  }
  return new Parser(text).whole()
}

const leftOperators: readonly ReadonlySet<string>[] = [new Set(['+', '-']), new Set(['*', '/'])]

class Parser {
  readonly #tokens: readonly Token[]
  #next = 0
  #depth = 0
  #nodes = 0

  constructor(readonly text: string) {
    this.#tokens = tokensOf(text)
  }

  whole(): Expression {
    if (this.#token.type === 'end')
      throw this.#refuse(this.#token, 'nothing to compute stands here; write it like `= sqrt(k/m)/(2*pi)`')
    const root = this.#sum()
    if (this.#next < this.#tokens.length - 1) throw this.#unexpected()
    return { text: this.text, root }
  }

  get #token(): Token {
    return this.#tokens[this.#next]
  }

  get #behind(): Token {
    return this.#tokens[Math.min(this.#next + 1, this.#tokens.length - 1)]
  }

  #take(): Token {
    return this.#tokens[this.#next++]
  }

  #is(sign: string, token = this.#token): boolean {
    return token.type === 'sign' && token.text === sign
  }

  #count<Node extends ExpressionNode>(node: Node): Node {
    this.#nodes += 1
    if (this.#nodes <= expressionBounds.nodes) return node
    const message = `this expression has more than ${expressionBounds.nodes} numbers, names and operations; name a part of it as a parameter`
    throw new QuantityError(message, node.start, node.end - node.start)
  }

  #deeper(read: () => ExpressionNode): ExpressionNode {
    this.#depth += 1
    if (this.#depth > expressionBounds.depth) {
      throw this.#refuse(
        this.#token,
        `stands in more than ${expressionBounds.depth} brackets; name a part of it as a parameter`,
      )
    }
    const node = read()
    this.#depth -= 1
    return node
  }

  #sum(level = 0): ExpressionNode {
    const below = (): ExpressionNode => (level === 0 ? this.#sum(1) : this.#signed())
    let left = below()
    while (this.#token.type === 'sign' && leftOperators[level].has(this.#token.text)) {
      const operator = this.#take().text as Operator
      left = this.#binary(operator, left, below())
    }
    return left
  }

  #binary(operator: Operator, left: ExpressionNode, right: ExpressionNode): ExpressionNode {
    return this.#count({ type: 'binary', operator, left, right, start: left.start, end: right.end })
  }

  /** A sign binds less than a power: −2^2 is −4. */
  #signed(read = (): ExpressionNode => this.#power()): ExpressionNode {
    if (!this.#is('-') && !this.#is('+')) return read()
    const sign = this.#take()
    const of = this.#deeper(() => this.#signed(read))
    if (sign.text === '+') return of
    return this.#count({ type: 'negate', of, start: sign.start, end: of.end })
  }

  #power(): ExpressionNode {
    const base = this.#primary()
    if (this.#token.type === 'raised') return this.#raised(base, this.#take())
    if (!this.#is('^')) return base
    this.#take()
    const power = this.#deeper(() => this.#signed())
    this.#checkHalf(base, power)
    return this.#binary('^', base, power)
  }

  #raised(base: ExpressionNode, token: Token): ExpressionNode {
    const plain = token.text
      .replace(/[⁄ᐟ]/, '/')
      .replace(/[⁰¹²³⁴-⁹⁺⁻]/g, digit => '0123456789+-'['⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻'.indexOf(digit)])
    const [over, under = '1'] = plain.split('/')
    if (plain.length > 8 || Number(under) === 0) throw this.#refuse(token, 'is no power that is read')
    const exact = rational(Number(over), Number(under))
    const { start, end } = token
    const power = { value: toNumber(exact), dimension: dimensionless, cycles: zero, exact, unitText: '', start, end }
    if (this.#token.type === 'raised' || this.#is('^')) {
      throw this.#refuse(this.#token, 'is a power of a power; write brackets, such as `(x^2)^3`')
    }
    return this.#binary('^', base, this.#count({ type: 'literal', ...power }))
  }

  /** In a unit `^1/2` is a root; here it would be half of the base, which nobody means. */
  #checkHalf(base: ExpressionNode, power: ExpressionNode): void {
    const written = this.text.slice(power.start, power.end)
    if (!/^[-−]?\s*1$/.test(written) || !this.#is('/') || this.#behind.type !== 'number') return
    const [below, whole] = [this.#behind.text, this.text.slice(base.start, this.#behind.end)]
    const [bare, sign] = [this.text.slice(base.start, base.end), written.startsWith('1') ? '' : '-']
    const message = `\`${whole}\` may be read in two ways; write \`${bare}^(${sign}1/${below})\` or \`(${bare}^${sign}1)/${below}\``
    throw new QuantityError(message, base.start, whole.length)
  }

  #primary(): ExpressionNode {
    const token = this.#token
    if (token.type === 'number') return this.#number()
    if (token.type === 'name') return this.#name()
    if (this.#is('√')) return this.#root()
    if (this.#is('(')) return this.#bracket()
    throw this.#unexpected()
  }

  #root(): ExpressionNode {
    const { start } = this.#take()
    const of = this.#deeper(() => this.#primary())
    if (this.#is('^') || this.#token.type === 'raised') {
      const under = this.text.slice(of.start, of.end)
      throw this.#refuse(
        this.#token,
        `may belong to the root or to what stands under it; write \`√(${under}^2)\` or \`(√${under})^2\``,
      )
    }
    return this.#count({ type: 'call', name: 'sqrt', given: [of], start, end: of.end })
  }

  #bracket(): ExpressionNode {
    const open = this.#take()
    const literal = this.#literalTo(open)
    if (literal !== null) return literal
    const inner = this.#deeper(() => this.#sum())
    if (!this.#is(')')) throw this.#notClosed(open)
    return { ...inner, start: open.start, end: this.#take().end }
  }

  /** A bracket that holds one number with its unit. */
  #literalTo(open: Token): ExpressionNode | null {
    const close = this.#closing()
    if (close === null) return null
    const end = this.#tokens[close].end
    const node = bracketedQuantity(this.text.slice(open.end, end - 1), { start: open.start, end })
    if (node === null) return null
    this.#next = close + 1
    return this.#count(node)
  }

  /** Index of the token that closes the bracket which was opened last. */
  #closing(): number | null {
    let open = 1
    for (let index = this.#next; index < this.#tokens.length; index += 1) {
      const token = this.#tokens[index]
      if (this.#is('(', token)) open += 1
      if (this.#is(')', token)) open -= 1
      if (open === 0) return index
    }
    return null
  }

  #name(): ExpressionNode {
    const { text: name, start, end } = this.#take()
    if (!this.#is('(')) {
      if (isFunctionName(name))
        throw new QuantityError(`\`${name}\` is a function; write \`${name}(…)\``, start, end - start)
      return this.#count({ type: 'name', name, start, end })
    }
    if (!isFunctionName(name)) throw this.#noFunction(name, start)
    const open = this.#take()
    const literal = this.#literalTo(open)
    const given = literal === null ? this.#given(open) : [literal]
    const node = this.#count({ type: 'call' as const, name, given, start, end: this.#tokens[this.#next - 1].end })
    this.#checkCount(name, node)
    return node
  }

  #given(open: Token): ExpressionNode[] {
    const given: ExpressionNode[] = []
    if (!this.#is(')')) given.push(this.#deeper(() => this.#sum()))
    while (this.#is(',')) {
      this.#take()
      given.push(this.#deeper(() => this.#sum()))
    }
    if (!this.#is(')')) throw this.#notClosed(open)
    this.#take()
    return given
  }

  #checkCount(name: FunctionName, node: ExpressionNode & { readonly given: readonly ExpressionNode[] }): void {
    const { count, many } = functionOf(name)
    const found = node.given.length
    if (found === count || (many === true && found > count && found <= mostArguments)) return
    const wanted = count === 1 ? 'one argument' : many === true ? `2 to ${mostArguments} arguments` : 'two arguments'
    const message = `\`${name}\` takes ${wanted} and has ${found}`
    const comma =
      count === 1 && /\d,\d/.test(this.text.slice(node.start, node.end)) ? '; decimals stand behind a point' : ''
    throw new QuantityError(message + comma, node.start, node.end - node.start)
  }

  #noFunction(name: string, start: number): QuantityError {
    const instead: ReadonlyMap<string, string> = new Map([
      ['log', '`ln(…)` or `log10(…)`'],
      ['lg', '`log10(…)`'],
      ['pow', '`x^y`'],
      ['arctan', '`atan(…)`'],
      ['arcsin', '`asin(…)`'],
      ['arccos', '`acos(…)`'],
    ])
    const remedy = instead.get(name)
    const known = `a product has its sign, \`${name}*(…)\`; the functions are ${functionNames.join(', ')}`
    return new QuantityError(
      `\`${name}\` is no function; ${remedy === undefined ? known : `write ${remedy}`}`,
      start,
      name.length,
    )
  }

  #number(): ExpressionNode {
    const token = this.#take()
    const behind = this.#token
    if (behind.type === 'name' && behind.text === 'pi' && this.text[behind.start] === 'π') return this.#timesPi(token)
    if (isUnitToken(behind)) return this.#withUnit(token)
    const node = this.#count(numberNode(token))
    if (behind.type === 'name' || behind.type === 'number' || this.#is('(')) throw this.#noSign(token, behind)
    return node
  }

  #timesPi(token: Token): ExpressionNode {
    const { start, end } = this.#take()
    const written = this.text.slice(token.start, end)
    if (this.#is('^') || this.#token.type === 'raised') {
      throw this.#refuse(
        this.#token,
        `may belong to π or to \`${written}\`; write \`(${written})^2\` or \`${token.text}*π^2\``,
      )
    }
    return this.#binary('*', this.#count(numberNode(token)), this.#count({ type: 'name', name: 'pi', start, end }))
  }

  /** One symbol without brackets; whatever might be more of the unit is refused. */
  #withUnit(token: Token): ExpressionNode {
    const unit = this.#take()
    const node = this.#count(plainQuantity(token, unit, this.text))
    const written = this.text.slice(token.start, unit.end)
    const next = this.#token
    const more =
      unit.type === 'name' && /^[*/]$/.test(next.text) && next.type === 'sign' && this.#startsUnit(this.#behind)
    if (this.#is('^') || next.type === 'raised' || more) {
      const all = this.text.slice(token.start, next.type === 'raised' ? next.end : this.#behind.end)
      const message = `\`${all}\` may be read in two ways; write brackets around a number with its whole unit, such as \`(3 N/m)\`, or \`(${written})\``
      throw new QuantityError(message, token.start, all.length)
    }
    if (next.type === 'name' || next.type === 'number' || this.#is('(')) throw this.#noSign(token, next)
    return node
  }

  #startsUnit(token: Token): boolean {
    const after = this.#tokens[this.#tokens.indexOf(token) + 1]
    if (this.#is('√', token)) return isUnitToken(after)
    return isUnitToken(token) && !this.#is('(', after)
  }

  #noSign(from: Token, behind: Token): QuantityError {
    const before = this.text.slice(from.start, this.#tokens[this.#next - 1].end)
    const after = this.#is('(', behind) ? '(…)' : this.text.slice(behind.start, behind.end)
    const unit = isUnitToken(behind) ? `, or \`(${before} ${after})\` for a number with its unit` : ''
    const message = `\`${before} ${after}\`: a sign is missing; write \`${before}*${after}\`${unit}`
    return new QuantityError(message, from.start, behind.end - from.start)
  }

  #notClosed(open: Token): QuantityError {
    const next = this.#token
    if (next.type !== 'end') return this.#unexpected()
    return new QuantityError('this bracket is not closed; a `)` is missing', open.start, 1)
  }

  #unexpected(): QuantityError {
    const token = this.#token
    const last = this.#tokens[this.#next - 1] as Token | undefined
    if (token.type === 'end') return this.#refuse(token, 'the expression ends too early; a number or a name is missing')
    if (this.#is(',')) {
      const comma = this.#tokens[this.#next + 1].type === 'number' && last?.type === 'number'
      return this.#refuse(
        token,
        comma ? 'is no decimal sign; write a point' : 'stands between the arguments of a function only',
      )
    }
    if (this.#is(')'))
      return this.#refuse(
        token,
        last === undefined || last.text === '(' ? 'closes an empty bracket' : 'closes no bracket, or comes too early',
      )
    if (last !== undefined && (token.type === 'name' || token.type === 'number' || this.#is('('))) {
      const before = this.text.slice(last.start, last.end)
      if (/[\p{L}\d)_]$/u.test(before)) return this.#noSign(last, token)
    }
    return this.#refuse(token, 'is not understood here; a number, a name or a bracket is wanted')
  }

  #refuse(token: Token, remedy: string): QuantityError {
    if (token.type === 'end') return new QuantityError(remedy, 0, this.text.length)
    const written = this.text.slice(token.start, token.end)
    return new QuantityError(`\`${written}\` ${remedy}`, token.start, token.end - token.start)
  }
}
