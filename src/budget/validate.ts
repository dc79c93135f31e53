import { Ajv, type ErrorObject, type ValidateFunction } from 'ajv'
import type { Issues } from './issues.js'
import { problemOf } from './messages.js'
import { budgetSchema } from './schema.js'
import { plainValue, type Tree } from './tree.js'

let compiled: ValidateFunction | null = null

/** Compiled at the first use and kept: it costs more than everything else at the border. */
function validator(): ValidateFunction {
  if (compiled !== null) return compiled
  const ajv = new Ajv({
    allErrors: true,
    strict: true,
    strictRequired: false,
    allowUnionTypes: true,
    discriminator: true,
    ownProperties: true,
    verbose: true,
    // Each definition becomes one function; written into every place that refers to it, compiling takes four times as long.
    inlineRefs: false,
    validateSchema: false,
    addUsedSchema: false,
  })
  compiled = ajv.compile(budgetSchema())
  return compiled
}

/** Judges the shape of a budget file: keys, types, words; every error becomes a problem at its place. */
export function validateShape(tree: Tree, issues: Issues): void {
  const validate = validator()
  if (validate(plainValue(tree))) return
  for (const error of relevant(validate.errors ?? [])) issues.add(problemOf(error, tree))
}

/**
 * Leaves out the frames around an error (`if`, `oneOf`) and the keys that exclude each other, which are judged where fields
 * are read, with better words.
 */
function relevant(errors: readonly ErrorObject[]): ErrorObject[] {
  return errors.filter(
    error =>
      !['if', 'oneOf', 'not'].includes(error.keyword) &&
      error.propertyName === undefined &&
      !/\/allOf\/\d+\/oneOf\//.test(error.schemaPath),
  )
}
