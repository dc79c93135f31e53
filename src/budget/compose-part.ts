import type { Issues } from './issues.js'
import { suggestion } from './nearest.js'
import { quoted } from './quoted.js'
import { budgetSchema } from './schema.js'
import type { TreeMap } from './tree.js'

/** What a shared part can bring into a budget. */
export const partSections = ['parameters', 'components', 'contributions'] as const
const sections: ReadonlySet<string> = new Set(partSections)

/** What it may say beside them, of itself alone. */
export const partHeads = ['format', 'title', 'about', 'include'] as const
const heads: ReadonlySet<string> = new Set(partHeads)

/** The sections of a shared part: a cryostat, a laser, an amplifier; null where it is none, which has been said. */
export function partOf(tree: TreeMap, issues: Issues): TreeMap | null {
  const before = issues.errors
  for (const { key, keyPlace, value } of tree.entries.values()) {
    if (heads.has(key)) continue
    if (belongsToBudget(key)) {
      issues.error('unknown-key', keyPlace, foreign(key))
      return null
    }
    if (!sections.has(key)) issues.error('unknown-key', keyPlace, unknown(key))
    else if (value.type !== 'map')
      issues.error('type', value.type === 'scalar' ? value.place : keyPlace, `\`${key}\` must be a map of names`)
  }
  if (issues.errors > before) return null
  return { ...tree, entries: new Map([...tree.entries].filter(([key]) => sections.has(key))) }
}

/** A whole budget is no part; one sentence about its first such key is enough. */
function belongsToBudget(key: string): boolean {
  return !sections.has(key) && Object.hasOwn(budgetSchema()['properties'] as object, key)
}

function foreign(key: string): string {
  return `${quoted(key)} belongs to a budget, not to a shared part; a budget builds on another one with \`from\``
}

function unknown(key: string): string {
  const allowed = [...heads, ...sections]
  const known = allowed.map(each => `\`${each}\``).join(', ')
  return `unknown key ${quoted(key)} in a shared part; allowed are ${known}${suggestion(key, allowed)}`
}
