import { CST, Lexer } from 'yaml'
import type { Problem } from '../model/problem.js'
import type { SourceText } from './yaml-text.js'

export const deepest = 30
export const mostAliases = 20
/** A budget of 256 kB that a person wrote has fewer; the parser's time grows with them. */
const mostTokens = 60_000
const mostProperties = 200
const longestText = 25_000

/**
 * The tokens of a text, made once for all; or a refusal, from them alone, of what would cost a parser time or stack: deep
 * nesting, many aliases, very many tokens; and of the parts of YAML that a budget has no use for: directives, tags, explicit
 * keys, a second document.
 */
export function boundedTokens(source: SourceText): readonly string[] | Problem {
  const scan = new Scan()
  const tokens: string[] = []
  for (const token of new Lexer().lex(source.text)) {
    const found = scan.next(token)
    if (found !== null)
      return { severity: 'error', code: found.code, place: source.place(scan.offset), message: found.message }
    scan.advance(token)
    tokens.push(token)
  }
  return tokens
}

interface Found {
  readonly code: string
  readonly message: string
}

class Scan {
  offset = 0
  #column = 0
  #tokens = 0
  #aliases = 0
  #anchors = 0
  #hasContent = false
  #flow = 0
  #isContent = false
  #startsLine = true
  /** Columns at which the enclosing block collections stand. */
  readonly #columns: number[] = []

  next(token: string): Found | null {
    if (++this.#tokens > mostTokens)
      return { code: 'too-many-tokens', message: 'the file holds too many keys and values' }
    const type = this.#isContent ? 'content' : (CST.tokenType(token) ?? 'content')
    if (token.length > longestText)
      return { code: 'too-long', message: `one text of ${token.length} characters; at most ${longestText} are read` }
    return this.#structure(type) ?? this.#unwanted(type)
  }

  advance(token: string): void {
    const type = this.#isContent ? 'content' : CST.tokenType(token)
    this.#isContent = type === 'scalar'
    if (type === 'scalar' || type === 'doc-mode' || type === 'flow-error-end') return
    this.offset += token.length
    if (type !== 'space' && type !== 'newline' && type !== 'comment') this.#hasContent = true
    const lastBreak = token.lastIndexOf('\n')
    this.#column = lastBreak < 0 ? this.#column + token.length : token.length - lastBreak - 1
    if (type === 'newline') this.#startsLine = true
    else if (type !== 'space') this.#startsLine = type === 'seq-item-ind'
  }

  #structure(type: string): Found | null {
    if (type === 'flow-map-start' || type === 'flow-seq-start') this.#flow++
    else if (type === 'flow-map-end' || type === 'flow-seq-end') this.#flow = Math.max(0, this.#flow - 1)
    else if (this.#flow === 0 && this.#startsLine && !/^(?:space|newline|comment|scalar|doc-mode)$/.test(type)) {
      while ((this.#columns.at(-1) ?? -1) >= this.#column) this.#columns.pop()
      this.#columns.push(this.#column)
    }
    if (this.#flow + this.#columns.length <= deepest + 1) return null
    return { code: 'too-deep', message: `nested deeper than ${deepest} levels; a budget needs six` }
  }

  #unwanted(type: string): Found | null {
    if (type === 'alias' && ++this.#aliases > mostAliases)
      return {
        code: 'too-many-aliases',
        message: `more than ${mostAliases} aliases (\`*name\`); use \`parameters:\` instead`,
      }
    if (type === 'anchor' && ++this.#anchors > mostProperties)
      return { code: 'too-many-anchors', message: `more than ${mostProperties} anchors (\`&name\`)` }
    if (type === 'tag')
      return {
        code: 'tag',
        message: 'a word that begins with `!` is a YAML tag, which is not allowed; put text in quotes',
      }
    if (type === 'directive-line')
      return {
        code: 'directive',
        message: 'a line that begins with `%` is a YAML directive, which is not allowed; delete it',
      }
    if (type === 'explicit-key-ind')
      return { code: 'explicit-key', message: 'a key with `?` in front is not allowed; write `key: value`' }
    if ((type === 'doc-start' && this.#hasContent) || type === 'doc-end')
      return { code: 'second-document', message: 'one file holds one document; delete this line' }
    return null
  }
}
