import type { Issues } from './issues.js'
import type { Tree } from './tree.js'

/** Requirements are read for their shape; a budget that has some must not look as if it had met them. */
export function warnRequirements(tree: Tree | undefined, issues: Issues): void {
  if (tree?.type !== 'map') return
  for (const { key, keyPlace, value } of tree.entries.values()) {
    if (value.type !== 'map') continue
    for (const [one, other] of [
      ['at', 'over'],
      ['below', 'above'],
    ] as const) {
      const given = [one, other].filter(name => value.entries.has(name))
      if (given.length === 1) continue
      const fault =
        given.length === 0 ? `needs \`${one}\` or \`${other}\`` : `has \`${one}\` and \`${other}\`; keep one of them`
      issues.error(given.length === 0 ? 'missing-key' : 'exclusive', keyPlace, `the requirement \`${key}\` ${fault}`)
    }
    issues.warning(
      'not-checked',
      keyPlace,
      `the requirement \`${key}\` is read, but this version does not check requirements yet`,
    )
  }
}
