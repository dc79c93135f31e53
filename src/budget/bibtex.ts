import type { Place, Problem } from '../model/problem.js'
import { isSourceText, sourceText, type SourceText } from './yaml-text.js'

export const largestBibliography = 1024 * 1024
const mostEntries = 5000
const longestEntry = 20_000
const deepestBraces = 30

/** An entry of a BibTeX file as it stands there. */
export interface BibEntry {
  readonly key: string
  /** From its `@` to its last bracket. */
  readonly text: string
  readonly place: Place
  /** Words without quotes or braces in the place of a value, which name an `@string`. */
  readonly macros: readonly { readonly name: string; readonly place: Place }[]
  readonly tooComplex: boolean
}

export interface BibFile {
  readonly file: string
  /** By key; a key that stands twice has two entries. */
  readonly entries: ReadonlyMap<string, readonly BibEntry[]>
  /** Definitions by the name of the `@string`, in small letters. */
  readonly strings: ReadonlyMap<string, BibEntry>
  /** What makes the file unreadable from some place on. */
  readonly faults: readonly Problem[]
}

/** Finds the entries of a BibTeX file and what they name, in one pass; what stands between entries is a remark. */
export function scanBibtex(file: string, bytes: Uint8Array): BibFile {
  const source = sourceText(file, bytes, largestBibliography)
  if (!isSourceText(source)) return { file, entries: new Map(), strings: new Map(), faults: [source] }
  return new Scanner(source).scan()
}

class Scanner {
  readonly #entries = new Map<string, BibEntry[]>()
  readonly #strings = new Map<string, BibEntry>()
  readonly #faults: Problem[] = []
  #count = 0

  constructor(readonly source: SourceText) {}

  scan(): BibFile {
    const { text, file } = this.source
    for (let at = text.indexOf('@'); at >= 0 && this.#faults.length === 0; at = text.indexOf('@', at))
      at = this.#item(at)
    return { file, entries: this.#entries, strings: this.#strings, faults: this.#faults }
  }

  /** Reads what begins at an `@`; where to go on. */
  #item(at: number): number {
    const { text } = this.source
    head.lastIndex = at
    const found = head.exec(text)
    if (found === null) return at + 1
    const [, type = '', open = '{'] = found
    const body = bodyOf(text, head.lastIndex, open)
    if (body === null) {
      this.#fault(at, `this \`@${type.slice(0, 40)}\` is not closed; its last bracket is missing`)
      return text.length
    }
    const kind = type.toLowerCase()
    if (kind !== 'comment' && kind !== 'preamble')
      this.#keep({ at, from: head.lastIndex, body, isString: kind === 'string' })
    return body.end
  }

  #keep({ at, from, body, isString }: Item): void {
    const { text } = this.source
    if (++this.#count > mostEntries) this.#fault(at, `the file has more than ${mostEntries} entries`)
    const name = (isString ? /^\s*([^\s=]+)/ : /^\s*([^\s,]+)/).exec(
      text.slice(from, Math.min(body.end - 1, from + 300)),
    )
    const key = name?.[1] ?? ''
    const tooComplex = body.end - at > longestEntry || body.deepest > deepestBraces
    const macros = (tooComplex ? [] : body.words).map(({ start, end }) => ({
      name: text.slice(start, end).toLowerCase(),
      place: this.source.place(start),
    }))
    const entry = {
      key,
      text: tooComplex ? '' : text.slice(at, body.end),
      place: this.source.place(at),
      macros,
      tooComplex,
    }
    if (isString) this.#strings.set(key.toLowerCase(), entry)
    else this.#entries.set(key, [...(this.#entries.get(key) ?? []), entry])
  }

  #fault(at: number, message: string): void {
    this.#faults.push({ severity: 'error', code: 'bibtex', place: this.source.place(at), message })
  }
}

const head = /@\s*([A-Za-z]+)\s*([{(])/y

interface Item {
  readonly at: number
  /** Behind the first bracket. */
  readonly from: number
  readonly body: Body
  readonly isString: boolean
}

interface Body {
  /** Behind the last bracket. */
  readonly end: number
  readonly deepest: number
  readonly words: readonly { readonly start: number; readonly end: number }[]
}

/** Walks from behind the first bracket to the last one of an entry; null where that is missing. */
function bodyOf(text: string, start: number, open: string): Body | null {
  const words: { start: number; end: number }[] = []
  let [depth, deepest, quotes, isValue] = [0, 0, false, false]
  for (let at = start; at < text.length; at++) {
    const character = text[at] ?? ''
    if (depth === 0 && !quotes && character === (open === '{' ? '}' : ')')) return { end: at + 1, deepest, words }
    if (character === '{') deepest = Math.max(deepest, ++depth)
    else if (character === '}') depth = Math.max(0, depth - 1)
    else if (depth > 0) continue
    else if (character === '"') quotes = !quotes
    else if (quotes || /\s/.test(character)) continue
    else if (character === '=' || character === '#') isValue = true
    else if (isValue) {
      const end = endOfWord(text, at)
      if (/[A-Za-z]/.test(character)) words.push({ start: at, end })
      at = Math.max(at, end - 1)
      isValue = false
    }
    if (character === '{' || character === '"' || character === ',') isValue = false
  }
  return null
}

function endOfWord(text: string, start: number): number {
  let end = start
  while (end < text.length && !/[\s,#"{}()=]/.test(text[end] ?? '')) end++
  return end
}
