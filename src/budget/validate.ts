import { Ajv, type ErrorObject, type ValidateFunction } from 'ajv'
import { declarations } from '../catalogue/declarations.js'
import type { Issues } from './issues.js'
import { keysOf, parameterOf, problemOf } from './messages.js'
import { nearest } from './nearest.js'
import { budgetSchema } from './schema.js'
import { child, plainValue, type Tree } from './tree.js'

/** Validators and the kinds that each knows. */
const compiled: { readonly kinds: ReadonlySet<string>; readonly validate: ValidateFunction }[] = []

/** Files that differ in their kinds have validators of their own up to this many; then one for all kinds is made. */
const most = 3

/** Kinds that a file names, as far as they are words: in `components`, `contributions` and what a part or a variant may add. */
function kindsIn(tree: Tree, found = new Set<string>()): Set<string> {
  if (tree.type === 'list') for (const item of tree.items) kindsIn(item, found)
  if (tree.type !== 'map') return found
  for (const { key, value } of tree.entries.values()) {
    if (key === 'kind' && value.type === 'scalar') found.add(value.text)
    else kindsIn(value, found)
  }
  return found
}

/** Every map of `components` says what it is; otherwise the sentence about it lists all kinds. */
const allNamed = (tree: Tree): boolean => {
  const components = child(tree, 'components')
  if (components?.type !== 'map') return false
  return [...components.entries.values()].every(({ value }) => child(value, 'kind')?.type === 'scalar')
}

/**
 * A validator for the kinds of a file, compiled at the first use and kept: it costs more than everything else at the border, and in
 * proportion to the kinds that it knows. A file with a kind that does not exist is judged by all of them.
 */
function validatorFor(tree: Tree): ValidateFunction {
  const used = kindsIn(tree)
  const known = allNamed(tree) && [...used].every(kind => declarations.has(kind))
  const kinds = known && compiled.length < most ? used : new Set(declarations.keys())
  const enough = compiled.find(each => [...(known ? used : kinds)].every(kind => each.kinds.has(kind)))
  if (enough !== undefined && (known || enough.kinds.size === declarations.size)) return enough.validate
  const validate = compile(kinds)
  compiled.push({ kinds, validate })
  return validate
}

function compile(kinds: ReadonlySet<string>): ValidateFunction {
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
  return ajv.compile(budgetSchema(kinds))
}

/** Judges the shape of a budget file: keys, types, words; every error becomes a problem at its place. */
export function validateShape(tree: Tree, issues: Issues): void {
  const validate = validatorFor(tree)
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
