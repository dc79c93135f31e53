import type { Place } from '../model/problem.js'
import { idFault, lineFault } from './names.js'
import { quoted } from './quoted.js'
import type { Issues } from './issues.js'
import { child, type Tree } from './tree.js'
import { where } from './where.js'

/** Parameters, components and contributions share one namespace, so that an id means one thing on every page. */
export function checkNames(root: Tree, issues: Issues): void {
  const taken = new Map<string, { readonly section: string; readonly place: Place }>()
  for (const section of ['parameters', 'components', 'contributions']) {
    const tree = child(root, section)
    if (tree?.type !== 'map') continue
    for (const { key, keyPlace } of tree.entries.values()) {
      report(key, section === 'contributions' ? lineFault(key) : idFault(key), { place: keyPlace, issues })
      const other = taken.get(key)
      if (other !== undefined)
        issues.error(
          'name-taken',
          keyPlace,
          `\`${key}\` is already the name of one of the ${other.section} (${where(other.place, keyPlace)}); choose another`,
        )
      taken.set(key, { section, place: keyPlace })
    }
  }
}

function report(key: string, fault: string | null, at: { readonly place: Place; readonly issues: Issues }): void {
  if (fault !== null) at.issues.error('name', at.place, `${quoted(key)} ${fault}`)
}
