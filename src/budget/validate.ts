import { Ajv, type ErrorObject, type ValidateFunction } from 'ajv'
import type { Issues } from './issues.js'
import { keysOf, parameterOf, problemOf } from './messages.js'
import { nearest } from './nearest.js'
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
    // The optimiser takes longer than it saves for one file.
    code: { optimize: false },
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
  for (const error of withoutMisspelt(relevant(validate.errors ?? []))) issues.add(problemOf(error, tree))
}

/** A misspelt key is an unknown and a missing one: one sentence is enough. */
function withoutMisspelt(errors: readonly ErrorObject[]): ErrorObject[] {
  const missing = errors.filter(error => error.keyword === 'required')
  const meant = new Set<ErrorObject>()
  for (const unknown of errors.filter(error => error.keyword === 'additionalProperties')) {
    const beside = missing.filter(error => error.instancePath === unknown.instancePath)
    const near = nearest(parameterOf(unknown, 'additionalProperty'), keysOf(unknown))
    const same = beside.find(error => parameterOf(error, 'missingProperty') === near)
    if (same !== undefined) meant.add(same)
  }
  return errors.filter(error => !meant.has(error))
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
