import { constants } from '../physics/constants.js'
import { QuantityError } from '../quantity/error.js'
import { checkExpression } from '../quantity/expression/check-expression.js'
import { compileExpression, type Program } from '../quantity/expression/compile-expression.js'
import { constantsByName } from '../quantity/expression/constants.js'
import { namesIn } from '../quantity/expression/names-in.js'
import { expressionBounds, parseExpression } from '../quantity/expression/parse-expression.js'
import type { Expression } from '../quantity/expression/tree.js'
import type { ValueKind } from '../quantity/expression/value-kind.js'
import { dimensionOf } from '../quantity/dimension.js'
import { one } from '../quantity/rational.js'
import type { Issues } from './issues.js'
import { placeWithin, type TreeScalar } from './tree.js'

export const natureConstants = constantsByName(constants)

/** The kind of `f`: a frequency in hertz. */
export const frequencyKind: ValueKind = { dimension: dimensionOf({ time: -1 }), cycles: one }

/** An expression as it stands in a file. */
export interface Written {
  readonly scalar: TreeScalar
  readonly expression: Expression
  /** What it names: parameters, constants, `f`. */
  readonly names: readonly string[]
}

/** An expression whose names are known and whose dimensions agree. */
export interface Checked extends Written {
  readonly kind: ValueKind
  /** Takes the values of `inputs` in their order. */
  readonly program: Program
  /** The names without `f`. */
  readonly inputs: readonly string[]
}

/** True for what a file means as an expression: it begins with `=`. */
export function isExpression(text: string): boolean {
  return text.startsWith('=')
}

export function parseWritten(scalar: TreeScalar, issues: Issues): Written | null {
  return attempt(scalar, issues, () => {
    const expression = parseExpression(scalar.text)
    return { scalar, expression, names: namesIn(expression) }
  })
}

export function checkWritten(written: Written, scope: ReadonlyMap<string, ValueKind>, issues: Issues): Checked | null {
  return attempt(written.scalar, issues, () => {
    const kind = checkExpression(written.expression, scope)
    const inputs = written.names.filter(name => name !== 'f')
    return { ...written, kind, inputs, program: compileExpression(written.expression, inputs) }
  })
}

/** The complaint of the language, at the character that it means. */
function attempt<Result>(scalar: TreeScalar, issues: Issues, work: () => Result): Result | null {
  try {
    return work()
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error
    // Of one that is too long the schema has said so at its beginning.
    const offset = scalar.text.length > expressionBounds.length ? -1 : error.offset
    issues.error('expression', placeWithin(scalar, offset), error.message)
    return null
  }
}
