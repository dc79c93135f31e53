/** What is used of an entry as the library reads it: the names of CSL. */
export interface ReadEntry {
  readonly type?: unknown
  readonly genre?: unknown
  readonly author?: unknown
  readonly editor?: unknown
  readonly title?: unknown
  readonly 'container-title'?: unknown
  readonly publisher?: unknown
  readonly volume?: unknown
  readonly number?: unknown
  readonly page?: unknown
  readonly issued?: unknown
  readonly DOI?: unknown
  readonly URL?: unknown
}

const mostAuthors = 6

/**
 * An entry in the one style of the project, as plain text: authors, title, journal volume, page (year), DOI. What an entry
 * does not have is left out.
 */
export function citationText(entry: ReadEntry): string {
  const [year, doi] = [yearOf(entry.issued), doiOf(entry.DOI)]
  const work = listed([authorsOf(entry.author ?? entry.editor), plain(entry.title), originOf(entry)])
  return listed([spaced([work, year === null ? '' : `(${year})`]), doi === null ? '' : `doi:${doi}`]).slice(0, 1500)
}

/** True where there is something to print that tells one work from another. */
export function isCitable(entry: ReadEntry): boolean {
  return authorsOf(entry.author ?? entry.editor) !== '' || plain(entry.title) !== ''
}

/** Where the work can be read: its DOI, else an address of the web; null for none. */
export function citationLink(entry: ReadEntry): string | null {
  const doi = doiOf(entry.DOI)
  if (doi !== null) return `https://doi.org/${encodeURI(doi)}`
  const url = plain(entry.URL)
  return /^https?:\/\/[\w.-]+(?:[/?#][\x21-\x7e]*)?$/.test(url) && url.length <= 500 ? url : null
}

/** Journal, volume and page; the publisher of a book; the school of a thesis. */
function originOf(entry: ReadEntry): string {
  const [holder, publisher] = [plain(entry['container-title']), plain(entry.publisher)]
  const page = plain(entry.page).replace(/-+/g, '–')
  if (entry.type === 'article-journal') return listed([spaced([holder || publisher, plain(entry.volume)]), page])
  if (entry.type === 'thesis')
    return listed([plain(entry.genre) === 'mastersthesis' ? 'master’s thesis' : 'PhD thesis', publisher])
  if (entry.type === 'report') return listed([publisher, spaced(['report', plain(entry.number)])])
  return listed([holder === '' ? '' : `in ${spaced([holder, plain(entry.volume)])}`, page, publisher])
}

function spaced(parts: readonly string[]): string {
  return parts.filter(part => part !== '').join(' ')
}

function listed(parts: readonly string[]): string {
  return parts.filter(part => part !== '').join(', ')
}

/** Without marks of type, which the library writes as tags, and on one line. */
function plain(value: unknown): string {
  if (typeof value !== 'string' && typeof value !== 'number') return ''
  return String(value)
    .replace(/<\/?(?:i|b|sub|sup|sc|span)(?:\s[^<>]*)?>/g, '')
    .replace(/\s+/g, ' ')
    .trim()
}

function doiOf(value: unknown): string | null {
  const doi = plain(value).replace(/^(?:https?:\/\/(?:dx\.)?doi\.org\/|doi:\s*)/i, '')
  return /^10\.\d{4,9}\/[\x21-\x7e]{1,200}$/.test(doi) && !/[<>"]/.test(doi) ? doi : null
}

function yearOf(issued: unknown): string | null {
  if (typeof issued !== 'object' || issued === null) return null
  const { 'date-parts': parts, literal } = issued as { readonly 'date-parts'?: unknown; readonly literal?: unknown }
  const first: unknown = Array.isArray(parts) ? (parts as readonly unknown[])[0] : null
  const year: unknown = Array.isArray(first) ? (first as readonly unknown[])[0] : null
  return plain(year ?? literal) || null
}

function authorsOf(value: unknown): string {
  if (!Array.isArray(value)) return ''
  const names = (value as readonly unknown[]).map(nameOf).filter(name => name !== '')
  const open = names.at(-1) === 'others'
  const known = open ? names.slice(0, -1) : names
  if (known.length > mostAuthors) return `${known[0]} et al.`
  return listed(known) + (open ? ' et al.' : '')
}

/** `H. B. Callen`, `J. von Neumann`, a group by its name. */
function nameOf(value: unknown): string {
  if (typeof value !== 'object' || value === null) return ''
  const name = value as { readonly [part: string]: unknown }
  const given = plain(name['given']).replace(/(\p{Lu})[\p{L}’']+(?![\p{L}’'.])/gu, '$1.')
  const parts = [given, plain(name['dropping-particle']), plain(name['non-dropping-particle'])]
  return spaced([...parts, plain(name['family']), plain(name['suffix']), plain(name['literal'])])
}
