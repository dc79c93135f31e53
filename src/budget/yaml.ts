import { Composer, Parser, type Document, type YAMLError } from 'yaml'
import type { Problem } from '../model/problem.js'
import type { Tree } from './tree.js'
import { treeOf } from './yaml-tree.js'
import { refuseUnbounded } from './yaml-bounds.js'
import { yamlMessage } from './yaml-messages.js'
import { sourceText, type SourceText } from './yaml-text.js'

export interface YamlFile {
  /** Null where the file cannot be read as one tree. */
  readonly tree: Tree | null
  readonly problems: readonly Problem[]
}

/**
 * Reads a YAML file of a stranger: bounded in size, depth, keys and aliases before and while it is parsed, every scalar as
 * its own text, every value with its place. Never throws.
 */
export function readYaml(file: string, bytes: Uint8Array): YamlFile {
  const source = sourceText(file, bytes)
  if ('severity' in source) return { tree: null, problems: [source] }
  const unbounded = refuseUnbounded(source)
  if (unbounded !== null) return { tree: null, problems: [unbounded] }
  const document = compose(source)
  if ('severity' in document) return { tree: null, problems: [document] }
  if (document.errors.length > 0) return { tree: null, problems: syntaxProblems(source, document.errors) }
  return treeOf(source, document)
}

/** The library's own search for equal keys is quadratic: it is off, and `treeOf` looks for them. */
function compose(source: SourceText): Document.Parsed | Problem {
  const start = { file: source.file, line: 1, column: 1 }
  try {
    const composer = new Composer({ schema: 'failsafe', uniqueKeys: false })
    const documents = [...composer.compose(new Parser().parse(source.text), true, source.text.length)]
    const [only] = documents
    if (only !== undefined && documents.length === 1) return only
    return { severity: 'error', code: 'yaml', place: start, message: 'the file does not hold one YAML document' }
  } catch (error) {
    const reason = error instanceof Error ? error.message : 'unknown reason'
    return { severity: 'error', code: 'yaml', place: start, message: `this file cannot be read as YAML: ${reason}` }
  }
}

/** One problem a line: a first error makes others behind it on the same line. */
function syntaxProblems(source: SourceText, errors: readonly YAMLError[]): Problem[] {
  const problems = new Map<number, Problem>()
  for (const error of errors) {
    const place = source.place(error.pos[0])
    if (problems.has(place.line)) continue
    const message = yamlMessage(error.code, error.message, lineAt(source.text, error.pos[0]))
    problems.set(place.line, { severity: 'error', code: 'yaml', place, message })
  }
  return [...problems.values()].slice(0, 20)
}

function lineAt(text: string, offset: number): string {
  const start = text.lastIndexOf('\n', offset - 1) + 1
  const end = text.indexOf('\n', offset)
  return text.slice(start, end < 0 ? undefined : end)
}
