import { distance } from 'fastest-levenshtein'
import { dimensionless, equalDimensions, isDimensionless } from '../dimension.js'
import { QuantityError } from '../error.js'
import { one, rational, zero } from '../rational.js'
import { canonicalSymbol, lookUpUnit } from '../units.js'
import { exactPower } from './exact-power.js'
import { functionOf } from './functions.js'
import {
  doubtOf,
  kindOfTraced,
  noPieces,
  power,
  product,
  quotient,
  resultOf,
  sumOf,
  traced,
  type Traced,
} from './traced.js'
import { alike, isTimeless, phraseOf, settled, type ValueKind } from './value-kind.js'
import type { Expression, ExpressionNode, Literal, Operator } from './tree.js'

/** What the names of an expression are: parameters, constants, and `f` (a frequency) where it is allowed. */
export type Scope = ReadonlyMap<string, ValueKind>

/**
 * The kind of an expression's value, by exact reckoning with dimensions.
 * Hertz carry one cycle and π carries cycle⁻¹; products and powers add; a name without time in its dimension carries
 * none. So 1/(2π·R·C) is a frequency in hertz, and sqrt(k/m) a rate in radians per second. Where nothing tells which
 * of both a rate is (a π without its 2, a speed over a length, and neither hertz nor 2π beside it), it is refused: a
 * factor `cycle` or `radian` says it. π in a force or an energy is geometry and carries nothing.
 * Throws a QuantityError with the place and both dimensions in words.
 */
export function checkExpression(expression: Expression, scope: Scope): ValueKind {
  const whole = new Checker(expression.text, scope).kindOf(expression.root)
  const doubt = doubtOf(whole)
  if (doubt === null) return resultOf(whole)
  const { start, end } = doubt.span
  const written = expression.text.slice(start, end)
  const what =
    doubt.piece === 'pi'
      ? 'may turn radians into cycles or be a plain factor'
      : 'a speed over a length, may be the frequency of a wave or a plain rate'
  const message = `\`${written}\`, ${what}; multiply the expression by \`cycle\` for hertz, or by \`radian\` for radians per second`
  throw new QuantityError(message.replace('`, may turn', '` may turn'), start, end - start)
}

const number: Traced = traced({ dimension: dimensionless, cycles: zero })

const ownKinds: ReadonlyMap<string, Traced> = new Map<string, Traced>([
  ['cycle', { ...number, hertz: one, said: 'cycle' }],
  ['radian', { ...number, said: 'radian' }],
])

/** `2*pi` and `4*pi^2`, also behind another factor: the π that has its 2. */
function isTwice(factor: ExpressionNode, pi: ExpressionNode): boolean {
  const literal = factor.type === 'binary' && /[*/]/.test(factor.operator) ? factor.right : factor
  if (literal.type !== 'literal' || literal.unitText !== '') return false
  if (pi.type === 'name') return pi.name === 'pi' && literal.value === 2
  const squared = pi.type === 'binary' && pi.operator === '^' && pi.left.type === 'name' && pi.left.name === 'pi'
  return squared && pi.right.type === 'literal' && pi.right.value === 2 && literal.value === 4
}

function asTurns(pi: Traced): Traced {
  return { ...pi, turns: pi.pi, pi: zero, pieces: noPieces }
}

class Checker {
  constructor(
    readonly text: string,
    readonly scope: Scope,
  ) {}

  kindOf(node: ExpressionNode): Traced {
    switch (node.type) {
      case 'literal':
        this.#checkUnitNames(node)
        return traced(node)
      case 'name':
        return this.#named(node)
      case 'negate':
        return this.kindOf(node.of)
      case 'binary':
        return this.#binary(node, node.operator)
      case 'call':
        return this.#call(node)
    }
  }

  #named(node: ExpressionNode & { readonly name: string }): Traced {
    if (node.name === 'pi') return { ...number, pi: one, pieces: { pi: node, ratio: null } }
    const own = ownKinds.get(node.name)
    if (own !== undefined) return own
    const kind = this.scope.get(node.name)
    if (kind === undefined) throw this.#unknown(node)
    return traced(settled(kind))
  }

  #unknown(node: ExpressionNode & { readonly name: string }): QuantityError {
    const { name } = node
    if (name === 'f') return this.#refuse(node, 'is the frequency, which stands in noises alone')
    if (lookUpUnit(canonicalSymbol(name)) !== null) {
      return this.#refuse(
        node,
        `is no name here; a unit stands behind its number, in brackets, such as \`(3 ${name})\``,
      )
    }
    const near = [...this.scope.keys(), 'pi', ...ownKinds.keys()]
      .map(known => ({ known, effort: distance(known.toLowerCase(), name.toLowerCase()) }))
      .filter(({ effort, known }) => effort <= Math.max(1, Math.floor(known.length / 3)) && effort < known.length)
      .sort((a, b) => a.effort - b.effort)
    if (near.length > 0) return this.#refuse(node, `is not known here; nearest is \`${near[0].known}\``)
    return this.#refuse(node, 'is not known here; a name is a parameter, a constant of nature or `pi`')
  }

  /** `(3 m/s)` where a parameter `s` is a time: both readings would pass the check of dimensions. */
  #checkUnitNames(node: ExpressionNode & Literal): void {
    for (const [, symbol] of node.unitText.matchAll(/[*/·×⋅∙]\s*([A-Za-z_]+)/gu)) {
      const [unit, kind] = [lookUpUnit(symbol), this.scope.get(symbol)]
      if (unit === null || kind === undefined || !equalDimensions(unit.dimension, kind.dimension)) continue
      throw this.#refuse(
        node,
        `holds \`${symbol}\`, which is a unit, but also the name of ${phraseOf(kind)}; rename the parameter`,
      )
    }
  }

  #binary(
    node: ExpressionNode & { readonly left: ExpressionNode; readonly right: ExpressionNode },
    operator: Operator,
  ): Traced {
    let [left, right] = [this.kindOf(node.left), this.kindOf(node.right)]
    if (isTwice(node.left, node.right)) right = asTurns(right)
    else if (operator === '*' && isTwice(node.right, node.left)) left = asTurns(left)
    try {
      switch (operator) {
        case '*':
          return product(left, right)
        case '/':
          return quotient(left, right, node)
        case '^':
          return this.#power(node, left, right)
        case '+':
        case '-':
          return this.#together([node.left, node.right], [left, right], operator === '+' ? 'added' : 'subtracted')
      }
    } catch (error) {
      if (!(error instanceof RangeError)) throw error
      throw this.#refuse(node, 'has a dimension beyond exact reckoning; write simpler powers')
    }
  }

  #power(
    node: { readonly left: ExpressionNode; readonly right: ExpressionNode },
    base: Traced,
    exponent: Traced,
  ): Traced {
    if (!isDimensionless(exponent.dimension)) {
      throw this.#refuse(node.right, `is ${phraseOf(kindOfTraced(exponent))}; a power is a plain number`)
    }
    const exact = exactPower(node.right)
    if (exact !== null) return power(base, exact)
    if (isDimensionless(base.dimension)) return number
    throw this.#refuse(
      node.right,
      `is no fixed number; a power of ${phraseOf(kindOfTraced(base))} must be one, such as \`2\` or \`(-1/2)\`, or divide the base by its unit first`,
    )
  }

  /** Values that are added, subtracted or compared. */
  #together(nodes: readonly ExpressionNode[], parts: readonly Traced[], verb: string): Traced {
    const kinds = parts.map(kindOfTraced)
    kinds.forEach((kind, index) => {
      if (!alike(kinds[0], kind)) throw this.#unlike([nodes[0], nodes[index]], [kinds[0], kind], verb)
    })
    kinds.forEach((kind, index) => this.#checkCounts(kind, nodes[index], kinds))
    return parts.length === 1 ? parts[0] : sumOf(parts)
  }

  #unlike([a, b]: readonly ExpressionNode[], [left, right]: readonly ValueKind[], verb: string): QuantityError {
    const turned = equalDimensions(left.dimension, right.dimension)
    const why = turned ? '; a factor 2*pi makes radians of cycles' : ''
    const [one, other] = [this.#slice(a), this.#slice(b)]
    const message = `\`${one}\` is ${phraseOf(left)} and \`${other}\` is ${phraseOf(right)}: they cannot be ${verb}${why}`
    return new QuantityError(message, a.start, b.end - a.start)
  }

  /** `1 + f*tau` lacks a 2π: a count of cycles beside a plain number is refused, whatever dimension is left. */
  #checkCounts(kind: ValueKind, node: ExpressionNode, beside: readonly ValueKind[]): void {
    const counts = isTimeless(kind) && kind.cycles.numerator > 0
    if (counts && !beside.every(({ cycles }) => cycles.numerator > 0)) throw this.#counting(node)
  }

  #counting(node: ExpressionNode): QuantityError {
    return this.#refuse(node, 'counts cycles; multiply by 2*pi for radians, or write the time per cycle in 1/Hz')
  }

  #call(node: ExpressionNode & { readonly type: 'call' }): Traced {
    const kinds = node.given.map(each => this.kindOf(each))
    switch (functionOf(node.name).rule) {
      case 'root':
        return power(kinds[0], rational(1, 2))
      case 'same':
        return this.#together(node.given, kinds, 'compared')
      case 'ratio':
        this.#together(node.given, kinds, 'compared')
        return number
      case 'number':
        return this.#ofNumber(node, kinds[0])
    }
  }

  #ofNumber(node: ExpressionNode & { readonly type: 'call' }, whole: Traced): Traced {
    const kind = kindOfTraced(whole)
    if (!isDimensionless(kind.dimension)) {
      throw this.#refuse(
        node.given[0],
        `is ${phraseOf(kind)}; \`${node.name}\` takes a plain number, so divide it by one of its kind`,
      )
    }
    if (kind.cycles.numerator > 0) throw this.#counting(node.given[0])
    return number
  }

  #slice(node: { readonly start: number; readonly end: number }): string {
    return this.text.slice(node.start, node.end)
  }

  #refuse(node: { readonly start: number; readonly end: number }, remedy: string): QuantityError {
    return new QuantityError(`\`${this.#slice(node)}\` ${remedy}`, node.start, node.end - node.start)
  }
}
