/** Why a file is no table: a place in it and a sentence. */
export interface FileFault {
  readonly line: number
  readonly column: number
  readonly message: string
}

/** A line of a file, counted from 1, without its end. */
export interface FileLine {
  readonly number: number
  readonly text: string
}

export const mostRows = 100_000
/** Blank lines, remarks and what is skipped included. */
const mostLines = 2 * mostRows
const longestLine = 2000

/** The lines of a text, at most so many; a byte order mark in front is no part of the first. */
export function linesOf(text: string): readonly FileLine[] | FileFault {
  const lines: FileLine[] = []
  let start = text.startsWith('\ufeff') ? 1 : 0
  while (start <= text.length) {
    if (lines.length === mostLines)
      return { line: mostLines + 1, column: 1, message: `the file has more than ${mostLines} lines` }
    const found = text.indexOf('\n', start)
    const end = found < 0 ? text.length : found
    lines.push({ number: lines.length + 1, text: text.slice(start, text[end - 1] === '\r' ? end - 1 : end) })
    start = end + 1
  }
  return lines
}

/** Which lines hold rows. */
export interface RowLines {
  /** Lines in front of the first row. */
  readonly skip: number
  /** What a line begins with that is passed over. */
  readonly remarks: readonly string[]
}

/** The lines with rows; blank ones and remarks are passed over. */
export function rowLinesOf(lines: readonly FileLine[], { skip, remarks }: RowLines): readonly FileLine[] | FileFault {
  const rows: FileLine[] = []
  for (const line of lines.slice(skip)) {
    const text = line.text.slice(0, longestLine + 1).trimStart()
    if (text === '' || remarks.some(mark => text.startsWith(mark))) continue
    if (line.text.length > longestLine)
      return { line: line.number, column: 1, message: `this line is longer than ${longestLine} characters` }
    rows.push(line)
    if (rows.length > mostRows) return rows
  }
  return rows
}
