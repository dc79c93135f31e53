import { constantNames } from '../quantity/expression/constants.js'
import { functionNames } from '../quantity/expression/functions.js'
import { ownNames } from '../quantity/expression/names-in.js'

/** What a parameter, component, contribution or port may be called. */
export const idPattern = '^[a-z][a-z0-9_]{0,59}$'
const id = new RegExp(idPattern)

/** Names of constants and functions of the expression language, and some that it may have. */
const reserved: ReadonlySet<string> = new Set([
  ...[...constantNames, ...functionNames, ...ownNames],
  ...['f', 'i', 'inf', 'nan', 'k_b', 'omega', 'log', 'pow', 'sinc', 'bessel', 'if', 'to'],
  // Words that every JavaScript object answers to.
  ...['constructor', 'prototype'],
])

/** Keys that stand around quantities and lines, so that a map of ids is never taken for one of those. */
const keys: ReadonlySet<string> = new Set([
  'kind',
  'of',
  'value',
  'about',
  'evidence',
  'measured',
  'distribution',
  'effect',
])

/** Words that columns of data and headlines use beside the lines of a budget. */
const columns: ReadonlySet<string> = new Set(['total', 'frequency', 'anchor', 'offset', 'margin', 'occupancy'])

/** Why a word cannot be a line of the budget. */
export function lineFault(word: string): string | null {
  return columns.has(word) ? 'is the name of a column or headline; choose another' : idFault(word)
}

/** Why a word cannot be an id: a clause that fits behind the word; null for a good one. */
export function idFault(word: string): string | null {
  if (reserved.has(word)) return 'is the name of a constant or a function; choose another'
  if (keys.has(word)) return 'is a key of the file format; choose another'
  if (id.test(word)) return null
  const foreign = [...word].find(character => (character.codePointAt(0) ?? 0) > 0x7f)
  if (foreign !== undefined) {
    const code = (foreign.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0')
    return `holds the letter U+${code}, which is not one of a to z; a name is made of a–z, 0–9 and _`
  }
  if (word.length > 60) return 'is longer than 60 letters'
  const near = word.toLowerCase().replace(/[^a-z0-9]+/g, '_')
  const instead = id.test(near) && !reserved.has(near) ? `, such as \`${near}\`` : ''
  return `is no name: a name begins with a to z and goes on with a–z, 0–9 and _${instead}`
}

/** Folder names that pages of the site need for themselves. */
const taken: ReadonlySet<string> = new Set([
  ...['catalogue', 'conventions', 'changes', 'compare', 'schema', 'assets', 'draft'],
  ...['con', 'prn', 'aux', 'nul', 'index', 'records', 'data', 'constructor'],
])

/** Why a folder's name cannot be a sensor; null for a good one. */
export function sensorFault(name: string): string | null {
  const folded = name.toLowerCase()
  if (taken.has(folded)) return `is a name that the site needs for itself; call the sensor something else`
  if (!/^[A-Za-z0-9][A-Za-z0-9._-]{0,59}$/.test(name) || name.includes('..') || /[.-]$/.test(name))
    return 'is no name of a sensor: use letters, digits, `.`, `-` and `_`, and begin and end with a letter or digit'
  return null
}

/** Dotted numbers: `2.1`, `10`, `1.0.3`. */
export const revisionPattern = '^[0-9]{1,6}(?:\\.[0-9]{1,6}){0,3}$'
