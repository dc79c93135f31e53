import type { Declaration } from '../catalogue/declaration.js'
import { declarations } from '../catalogue/declarations.js'
import { references, type Reference } from '../catalogue/references.js'

/** The declaration behind a kind's word. */
export function declarationOf(kind: string): Declaration | null {
  return declarations.get(kind) ?? null
}

/** `H. B. Callen, T. A. Welton, Phys. Rev. 83, 34 (1951)`. */
export function referenceText(key: string): string {
  const found = (references as { readonly [key: string]: Reference })[key]
  if (found === undefined) throw new Error(`the catalogue cites ${key}, which is not in its references`)
  return `${found.authors}, ${found.where} (${found.year})`
}
