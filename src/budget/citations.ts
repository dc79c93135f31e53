import { createRequire } from 'node:module'
import type { Citation } from '../model/budget.js'
import { EngineFault, Refusal, type Place, type Problem } from '../model/problem.js'
import { scanBibtex, type BibEntry, type BibFile } from './bibtex.js'
import { citationLink, citationText, isCitable, type ReadEntry } from './citation-text.js'
import { FileRefusal, type FileSource } from './file-source.js'
import type { Issues } from './issues.js'
import { suggestion } from './nearest.js'
import { quoted } from './quoted.js'
import type { Tree, TreeScalar } from './tree.js'

const fileName = 'references.bib'

/**
 * The works that a budget cites, in the order of the file. `evidence` of one word is a key, `assumed` apart; of several,
 * a note. The key is looked up in `references.bib` beside the file that holds it and in the folders above.
 */
export function readCitations(root: Tree, files: FileSource, issues: Issues): Citation[] {
  const shelf = new Shelf(files)
  const citations = new Map<string, Citation>()
  for (const scalar of evidenceIn(root)) {
    const key = scalar.text
    if (key === '' || key === 'assumed' || /\s/.test(key) || citations.has(key)) continue
    const citation = cite(scalar, shelf, issues)
    if (citation !== null) citations.set(key, citation)
  }
  return [...citations.values()]
}

/** Every `evidence` of a file; no id can have this name. */
function* evidenceIn(tree: Tree): Generator<TreeScalar> {
  if (tree.type === 'scalar') return
  const below = tree.type === 'list' ? tree.items.map(value => ({ key: '', value })) : tree.entries.values()
  for (const { key, value } of below) {
    if (key === 'evidence' && value.type === 'scalar') yield value
    else yield* evidenceIn(value)
  }
}

function cite(scalar: TreeScalar, shelf: Shelf, issues: Issues): Citation | null {
  const books = shelf.around(scalar.place.file)
  const book = books.find(({ entries }) => entries.has(scalar.text))
  const faults = books.flatMap(each => each.faults)
  for (const fault of faults) issues.add(fault)
  if (book === undefined) {
    if (faults.length === 0) issues.error('citation', scalar.place, unknown(scalar.text, books))
    return null
  }
  const [entry, second] = book.entries.get(scalar.text) ?? []
  if (second !== undefined && entry !== undefined) {
    const message = `the key ${quoted(scalar.text)} stands twice in this file, first in line ${entry.place.line}; rename one`
    issues.error('bibtex', second.place, message)
  }
  if (entry === undefined || second !== undefined || !isSound(entry, book, issues)) return null
  if (shelf.files.hurried === true) return postponed(entry, book)
  const citation = citationOf(entry, book)
  if ('severity' in citation) issues.add(citation)
  return 'severity' in citation ? null : citation
}

/** A citation that is read when somebody looks at it; a fault that only the library sees is refused then. */
function postponed(entry: BibEntry, book: BibFile): Citation {
  const now = (): Citation => {
    const citation = citationOf(entry, book)
    if ('severity' in citation) throw new Refusal([citation])
    return citation
  }
  return {
    key: entry.key,
    get text() {
      return now().text
    },
    get link() {
      return now().link
    },
  }
}

function unknown(key: string, books: readonly BibFile[]): string {
  const note = 'a note has several words'
  if (books.length === 0)
    return `${quoted(key)} is one word and so a key of \`${fileName}\`, but no such file lies beside this one or above it; ${note}${suggestion(key, ['assumed'])}`
  const keys = books.flatMap(({ entries }) => [...entries.keys()])
  const where = books.map(({ file }) => `\`${file}\``).join(' and ')
  return `${quoted(key)} is one word and so a key, but no entry of ${where} has it; ${note}${suggestion(key, [...keys, 'assumed'])}`
}

const months = new Set(['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'])

/** The library passes over strings that are defined nowhere. */
function isSound(entry: BibEntry, { strings }: BibFile, issues: Issues): boolean {
  if (entry.tooComplex)
    issues.error(
      'bibtex',
      entry.place,
      'this entry is longer than 20000 characters or has braces in more than 30 braces',
    )
  const open = entry.macros.filter(({ name }) => !strings.has(name) && !months.has(name))
  for (const { name, place } of open) {
    const message = `no \`@string\` is called ${quoted(name)}; define it, or put the text in braces${suggestion(name, strings.keys())}`
    issues.error('bibtex', place, message)
  }
  return open.length === 0 && !entry.tooComplex
}

const read = new Map<string, Citation>()

/** One reading of a text is enough for all budgets that cite it. */
function citationOf(entry: BibEntry, { strings }: BibFile): Citation | Problem {
  const macros = [...macrosOf(entry, strings)].map(({ text }) => `${text}\n`).join('')
  const known = read.get(macros + entry.text)
  if (known !== undefined) return known
  const citation = parse(entry, macros)
  if (read.size > 1000) read.clear()
  if (!('severity' in citation)) read.set(macros + entry.text, citation)
  return citation
}

/** The definitions that an entry rests on, each behind those it needs itself. */
function macrosOf(entry: BibEntry, strings: BibFile['strings'], found = new Set<BibEntry>()): ReadonlySet<BibEntry> {
  for (const { name } of entry.macros) {
    const definition = strings.get(name)
    if (definition === undefined || found.has(definition) || found.size > 100) continue
    macrosOf(definition, strings, found)
    found.add(definition)
  }
  return found
}

function parse(entry: BibEntry, macros: string): Citation | Problem {
  const { key, place, text } = entry
  const fault = { severity: 'error', code: 'bibtex', place } as const
  try {
    const found = library()(macros + text, { forceType: '@biblatex/text', generateGraph: false })[0]
    if (found !== undefined && isCitable(found)) return { key, text: citationText(found), link: citationLink(found) }
    return { ...fault, message: `the entry ${quoted(key)} has neither author nor title` }
  } catch (error) {
    const message = `the entry ${quoted(key)} is no BibTeX that can be read here; look for a missing comma or brace`
    return { ...fault, place: placeOf(error, entry, macros), message }
  }
}

/** The library tells the line of what it has read. */
function placeOf(error: unknown, { place, text }: BibEntry, macros: string): Place {
  const told = /at line (\d{1,6}) col (\d{1,6})/.exec(error instanceof Error ? error.message : '')
  const line = Number(told?.[1] ?? 1) - macros.split('\n').length
  if (!(line > 0) || line >= text.split('\n').length) return place
  return { ...place, line: place.line + line, column: Number(told?.[2] ?? 1) }
}

type Chain = (text: string, options: { forceType: string; generateGraph: boolean }) => readonly ReadEntry[]

let chain: Chain | null = null

/** Loaded at the first citation only: it takes longer than reading a budget. */
function library(): Chain {
  if (chain !== null) return chain
  const require = createRequire(import.meta.url)
  const core = require('@citation-js/core') as { plugins: { input: { chain: Chain } }; logger: { level: string } }
  // Loading it registers the format with the core.
  const plugin: unknown = require('@citation-js/plugin-bibtex')
  if (plugin === undefined) throw new EngineFault('the BibTeX format is missing')
  core.logger.level = 'silent'
  chain = core.plugins.input.chain
  return chain
}

const scanned = new Map<string, { readonly bytes: Uint8Array; readonly book: BibFile }>()

/** The bibliographies around files; a file that has not changed is not scanned again. */
class Shelf {
  readonly #books = new Map<string, BibFile | null>()

  constructor(readonly files: FileSource) {}

  /** Those beside a file and in the folders above, nearest first. */
  around(file: string): readonly BibFile[] {
    const folders = file.split('/').slice(0, -1)
    const paths = [...folders.keys(), folders.length].map(count => [...folders.slice(0, count), fileName].join('/'))
    return paths.toReversed().flatMap(path => this.#book(path) ?? [])
  }

  #book(path: string): BibFile | null {
    const known = this.#books.get(path)
    if (known !== undefined) return known
    const book = this.#read(path)
    this.#books.set(path, book)
    return book
  }

  #read(path: string): BibFile | null {
    let bytes: Uint8Array
    try {
      bytes = this.files.read(path)
    } catch (error) {
      if (!(error instanceof FileRefusal)) throw error
      if (error.code === 'missing') return null
      const problem = {
        severity: 'error',
        code: 'file',
        place: { file: path, line: 1, column: 1 },
        message: `the file ${error.message}`,
      } as const
      return { file: path, entries: new Map(), strings: new Map(), faults: [problem] }
    }
    const last = scanned.get(path)
    if (last !== undefined && Buffer.compare(last.bytes, bytes) === 0) return last.book
    const book = scanBibtex(path, bytes)
    if (scanned.size > 20) scanned.clear()
    scanned.set(path, { bytes, book })
    return book
  }
}
