import type { Place, Problem } from '../model/problem.js'

/** A file's text with the places in it. */
export interface SourceText {
  readonly file: string
  readonly text: string
  /** Place of a character by its offset. */
  place(offset: number): Place
}

export const largestYaml = 256 * 1024

/** The text of a file, or why it is none: too large, not UTF-8, or with characters that nobody can see. */
export function sourceText(file: string, bytes: Uint8Array, largest = largestYaml): SourceText | Problem {
  const start = { file, line: 1, column: 1 }
  if (bytes.length > largest)
    return fault(
      'too-large',
      start,
      `the file has ${bytes.length} bytes; at most ${largest} (${Math.round(largest / 1024)} kB) are read`,
    )
  let text: string
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(bytes)
  } catch {
    return fault('not-utf8', start, 'the file is not UTF-8 text; save it in that encoding')
  }
  const source = withPlaces(file, text)
  const hidden = hiddenCharacter.exec(text)
  return hidden === null ? source : fault('hidden-character', source.place(hidden.index), hiddenMessage(hidden[0]))
}

export function isSourceText(source: SourceText | Problem): source is SourceText {
  return 'text' in source
}

/**
 * Control characters other than tab and line ends, and characters that change the direction of text or cannot be seen:
 * with them a file can read differently from what it says.
 */
const hiddenCharacter =
  // oxlint-disable-next-line no-control-regex
  /[\0-\x08\x0b\x0c\x0e-\x1f\x7f-\x9f\u061c\u200b-\u200f\u2028-\u202e\u2060-\u206f\ufeff\ufff9-\ufffb]|\r(?!\n)/u

/** True for text that holds such a character, which an escape in quotes can bring in. */
export function hasHiddenCharacter(text: string): boolean {
  return hiddenCharacter.test(text)
}

export function hiddenMessage(character: string): string {
  const code = (character.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0')
  return `the character U+${code} cannot be seen and is not allowed; delete it`
}

function withPlaces(file: string, text: string): SourceText {
  const starts = [0]
  for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) starts.push(at + 1)
  const place = (offset: number): Place => {
    const line = lineOf(starts, offset)
    return { file, line: line + 1, column: offset - (starts[line] ?? 0) + 1 }
  }
  return { file, text, place }
}

/** Index of the last start that is not behind the offset. */
function lineOf(starts: readonly number[], offset: number): number {
  let low = 0
  let high = starts.length - 1
  while (low < high) {
    const middle = (low + high + 1) >> 1
    if ((starts[middle] ?? 0) <= offset) low = middle
    else high = middle - 1
  }
  return low
}

function fault(code: string, place: Place, message: string): Problem {
  return { severity: 'error', code, place, message }
}
