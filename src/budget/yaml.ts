import { Composer, Parser, visit, type CST, type Document, type YAMLError } from 'yaml'
import type { Problem } from '../model/problem.js'
import type { YamlFile } from './tree.js'
import { treeOf } from './yaml-tree.js'
import { boundedTokens } from './yaml-bounds.js'
import { yamlMessage } from './yaml-messages.js'
import { sourceText, type SourceText } from './yaml-text.js'

/**
 * Reads a YAML file of a stranger: bounded in size, depth, keys and aliases before and while it is parsed, every scalar as
 * its own text, every value with its place. Never throws.
 */
export function readYaml(file: string, bytes: Uint8Array): YamlFile {
  const source = sourceText(file, bytes)
  if ('severity' in source) return { tree: null, problems: [source] }
  const tokens = boundedTokens(source)
  if ('severity' in tokens) return { tree: null, problems: [tokens] }
  const document = compose(source, tokens)
  if ('severity' in document) return { tree: null, problems: [document] }
  if (document.errors.length > 0) return { tree: null, problems: syntaxProblems(source, document) }
  return treeOf(source, document)
}

/** The library's own search for equal keys is quadratic: it is off, and `treeOf` looks for them. */
function compose(source: SourceText, tokens: readonly string[]): Document.Parsed | Problem {
  const start = { file: source.file, line: 1, column: 1 }
  try {
    const composer = new Composer({ schema: 'failsafe', uniqueKeys: false })
    const documents = [...composer.compose(parse(tokens), true, source.text.length)]
    const [only] = documents
    if (only !== undefined && documents.length === 1) return only
    return { severity: 'error', code: 'yaml', place: start, message: 'the file does not hold one YAML document' }
  } catch (error) {
    const reason = error instanceof Error ? error.message : 'unknown reason'
    return { severity: 'error', code: 'yaml', place: start, message: `this file cannot be read as YAML: ${reason}` }
  }
}

function* parse(tokens: readonly string[]): Generator<CST.Token> {
  const parser = new Parser()
  for (const token of tokens) yield* parser.next(token)
  yield* parser.end()
}

/** Errors of these kinds follow from almost any other that stands before them. */
const following: ReadonlySet<string> = new Set([
  'BAD_INDENT',
  'UNEXPECTED_TOKEN',
  'MISSING_CHAR',
  'MULTILINE_IMPLICIT_KEY',
])

/** One problem a line, without those that only follow from the first. */
function syntaxProblems(source: SourceText, document: Document.Parsed): Problem[] {
  const problems = new Map<number, Problem>()
  for (const error of document.errors) {
    const offset = startOf(error, document)
    const place = source.place(offset)
    if (problems.has(place.line) || (problems.size > 0 && following.has(error.code))) continue
    const message = yamlMessage(error.code, error.message, lineAt(source.text, offset))
    problems.set(place.line, { severity: 'error', code: 'yaml', place, message })
  }
  return [...problems.values()].slice(0, 20)
}

/** A quotation mark that is never closed is reported where the file ends; it is wrong where it begins. */
function startOf(error: YAMLError, document: Document.Parsed): number {
  let start = error.pos[0]
  if (error.code !== 'MISSING_CHAR') return start
  visit(document, {
    Scalar: (_key, { range, type }) => {
      if (range?.[1] === error.pos[0] && type?.startsWith('QUOTE') === true) start = range[0]
    },
  })
  return start
}

function lineAt(text: string, offset: number): string {
  const start = text.lastIndexOf('\n', offset - 1) + 1
  const end = text.indexOf('\n', offset)
  return text.slice(start, end < 0 ? undefined : end)
}
