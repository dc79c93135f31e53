import { references, type Reference } from '../catalogue/references.js'
import type { Budget } from '../model/budget.js'
import { referenceText } from './catalogue.js'

/** An entry of the report's list of references; its number is its index + 1. */
export interface BibliographyEntry {
  readonly key: string
  readonly text: string
  /** Address of a web page, or empty. */
  readonly link: string
}

/** What a value rests on, as a report prints it. */
export interface EvidenceText {
  /** A note, or empty where the evidence is an entry of the bibliography. */
  readonly note: string
  readonly assumed: boolean
  /** Number in the list of references; 0 for none. */
  readonly number: number
}

/** References of the catalogue in the order of mention, then what the budget itself cites; each once. */
export function bibliographyOf(budget: Budget, catalogueKeys: readonly string[]): readonly BibliographyEntry[] {
  const own = budget.citations.map(({ key, text, link }) => ({ key: ownKey(key), text, link: addressOf(link) }))
  const shared = new Map(own.filter(({ key, text }) => isOfCatalogue(key, text)).map(entry => [entry.key, entry]))
  const laws = catalogueKeys.map(key => shared.get(ownKey(key)) ?? { key, text: referenceText(key), link: '' })
  return [...laws, ...own.filter(entry => !laws.includes(entry))]
}

/** Keys of a budget and keys of the catalogue may be alike without meaning the same. */
const ownKey = (key: string): string => `budget:${key}`

/** Whether a budget cites under a key of the catalogue the very work that the catalogue means: same year, same author. */
function isOfCatalogue(key: string, text: string): boolean {
  const reference = (references as { readonly [key: string]: Reference })[key.replace(/^budget:/, '')]
  if (reference === undefined) return false
  const [author] = reference.authors.split(',')
  return text.includes(String(reference.year)) && text.includes(author.slice(author.lastIndexOf(' ') + 1))
}

/** Of a DOI or an address; nothing else becomes a link, whatever a file says. */
function addressOf(link: string | null): string {
  if (link === null) return ''
  if (/^https?:\/\//i.test(link)) return link
  return /^10\.\d{4,9}\//.test(link) ? `https://doi.org/${link}` : ''
}

/** Evidence that is a key of the bibliography becomes its number; anything else stays a note. */
export function evidenceText(evidence: string | null, bibliography: readonly BibliographyEntry[]): EvidenceText {
  const number = evidence === null ? 0 : bibliography.findIndex(({ key }) => key === ownKey(evidence)) + 1
  const assumed = evidence === 'assumed'
  return { note: assumed || number > 0 ? '' : (evidence ?? ''), assumed, number }
}
