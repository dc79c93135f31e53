import type { ErrorCode } from 'yaml'

/** What the YAML parser complained about, told to somebody who does not know YAML's grammar. */
export function yamlMessage(code: ErrorCode, message: string, near: string): string {
  const line = near.trim()
  const explain = explanations[code]
  if (typeof explain === 'function') return explain(line, message)
  return explain ?? `this is not YAML: ${lowerFirst(message.split('\n')[0] ?? '')}`
}

type Explanation = string | ((line: string, message: string) => string)

const explanations: { readonly [code in ErrorCode]?: Explanation } = {
  BLOCK_AS_IMPLICIT_KEY: nestedKey,
  MULTILINE_IMPLICIT_KEY: noColon,
  MISSING_CHAR: (line, message) =>
    /quote/.test(message)
      ? 'a quotation mark is opened and never closed; close it on the same line'
      : /map values/.test(message)
        ? noColon(line)
        : `something is not closed or left out here: ${lowerFirst(message)}`,
  TAB_AS_INDENT: 'a tab cannot indent a line; use spaces',
  BAD_INDENT: (_, message) =>
    /same column/.test(message)
      ? 'this line is indented differently from the keys beside it; keys of one map start in one column'
      : /must end with|sufficiently indented/.test(message)
        ? 'a bracket that was opened is not closed before this line'
        : 'this line is not indented enough for what it belongs to',
  BAD_SCALAR_START: line =>
    `a value cannot begin with \`${/[@`%]/.exec(line)?.[0] ?? 'this character'}\`; put the text in quotes`,
  BAD_DQ_ESCAPE: 'a backslash in double quotes begins an escape, and this is none; use single quotes',
  UNEXPECTED_TOKEN: (_, message) =>
    /block-seq-ind/.test(message)
      ? 'a list item `- …` must begin on a line of its own'
      : 'this does not belong here: a bracket, quotation mark or colon is left over or missing before it',
  BLOCK_IN_FLOW: 'a list or map on lines of its own cannot stand inside brackets',
  MULTIPLE_DOCS: 'one file holds one document; delete the line `---`',
  KEY_OVER_1024_CHARS: 'a key is longer than 1024 characters',
  BAD_ALIAS: 'a `*` begins an alias, and this is none; put the text in quotes',
  ALIAS_PROPS: 'an alias cannot have an anchor or a tag of its own',
}

function nestedKey(line: string): string {
  const second = line.indexOf(': ', line.indexOf(': ') + 1)
  return second >= 0 || line.endsWith(':')
    ? 'a colon followed by a space begins a value, and this line has two; put text that holds a colon in quotes'
    : 'this key has a value on its own line and more keys below it; it can have only one of them'
}

function noColon(line: string): string {
  const joined = /^("[^"]*"|[\w-]+):(?=\S)/.exec(line)
  return joined === null
    ? `\`${line.slice(0, 40)}\` is not of the form \`key: value\``
    : `a space is missing behind the colon of \`${joined[1]}:\``
}

function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1)
}
