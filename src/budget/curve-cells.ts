/** What stands between the cells of a row. */
export const separators = ['comma', 'semicolon', 'tab', 'spaces'] as const
export type Separator = (typeof separators)[number]

export interface Cell {
  /** Without spaces and quotation marks around it. */
  readonly text: string
  /** Of its first character in the line, counted from 1. */
  readonly column: number
}

/** Why a line is no row of cells: its column and a sentence. */
export interface CellFault {
  readonly column: number
  readonly message: string
}

export const mostCells = 64

const marks = { comma: ',', semicolon: ';', tab: '\t' } as const

/**
 * The cells of a line. A cell may stand in quotation marks, two of which mean one inside it [RFC 4180]; no cell goes over
 * the end of its line. With `spaces`, any number of spaces and tabs parts two cells and quotation marks mean nothing.
 */
export function cellsOf(line: string, separator: Separator): readonly Cell[] | CellFault {
  if (separator === 'spaces') return spaced(line)
  const mark = marks[separator]
  if (!line.includes('"')) return plain(line.split(mark, mostCells + 1))
  const cells: Cell[] = []
  let at = 0
  while (at <= line.length) {
    if (cells.length === mostCells) return tooMany
    const found = cellAt(line, at, mark)
    if ('message' in found) return found
    cells.push(found.cell)
    at = found.end + 1
  }
  return cells
}

const tooMany: CellFault = { column: 1, message: `this row has more than ${mostCells} cells` }

/** Most files have no quotation marks at all. */
function plain(pieces: readonly string[]): readonly Cell[] | CellFault {
  if (pieces.length > mostCells) return tooMany
  let at = 0
  return pieces.map(piece => {
    const column = at + piece.length - piece.trimStart().length + 1
    at += piece.length + 1
    return { text: piece.trim(), column }
  })
}

function spaced(line: string): readonly Cell[] | CellFault {
  const cells: Cell[] = []
  for (const { 0: text, index } of line.matchAll(/[^ \t]+/g)) {
    if (cells.length === mostCells) return tooMany
    cells.push({ text, column: index + 1 })
  }
  return cells
}

function cellAt(line: string, at: number, mark: string): { readonly cell: Cell; readonly end: number } | CellFault {
  let first = at
  while (first < line.length && line[first] !== mark && (line[first] === ' ' || line[first] === '\t')) first++
  if (line[first] === '"') return quotedCellAt(line, first, mark)
  const found = line.indexOf(mark, first)
  const end = found < 0 ? line.length : found
  const text = line.slice(first, end).trimEnd()
  const stray = text.indexOf('"')
  if (stray >= 0) return { column: first + stray + 1, message: 'a quotation mark stands inside a cell' }
  return { cell: { text, column: first + 1 }, end }
}

function quotedCellAt(line: string, first: number, mark: string): ReturnType<typeof cellAt> {
  let close = line.indexOf('"', first + 1)
  while (close >= 0 && line[close + 1] === '"') close = line.indexOf('"', close + 2)
  if (close < 0) return { column: first + 1, message: 'a quotation mark is not closed in its line' }
  const found = line.indexOf(mark, close + 1)
  const end = found < 0 ? line.length : found
  if (line.slice(close + 1, end).trim() !== '')
    return { column: close + 2, message: 'something stands between a closing quotation mark and the end of its cell' }
  const text = line
    .slice(first + 1, close)
    .replaceAll('""', '"')
    .trim()
  return { cell: { text, column: first + 1 }, end }
}
