/**
 * Advance widths, in thousandths of the font size, of the sans-serif metrics that Helvetica, Arial and Liberation Sans
 * share; measured with Liberation Sans 2 in Chromium. Characters that are not listed count as `OTHER`.
 */
const WIDTHS: readonly (readonly [number, string])[] = [
  [191, "'"],
  [222, 'ijl'],
  [260, '|'],
  [278, ' !,./:;I[\\]ft·'],
  [333, '()-`r⁻²³'],
  [334, '{}'],
  [355, '"'],
  [389, '*'],
  [400, '°'],
  [469, '^'],
  [500, 'Jcksvxyzκγ↓↑'],
  [556, '#$0123456789?L_abdeghnopqu–ηµμ√±Γχ'],
  [584, '+<=>~−×'],
  [611, 'FTZ'],
  [667, '&ABEKPSVXYÅ'],
  [690, 'π'],
  [722, 'CDHNRU'],
  [778, 'GOQΩω'],
  [833, 'Mm'],
  [889, '%'],
  [944, 'W'],
  [1000, '…→'],
  [1015, '@'],
]
const OTHER = 1000
/** Other fonts of the fallback list are wider by up to about this factor at the sizes used here. */
const RESERVE = 1.04

const widthOf = new Map(WIDTHS.flatMap(([width, characters]) => [...characters].map(c => [c, width] as const)))

/** Width of one line of text at a font size, in the unit of the size; a little generous. */
export function textWidth(text: string, size: number): number {
  let sum = 0
  for (const character of text) sum += widthOf.get(character) ?? OTHER
  return (sum * size * RESERVE) / 1000
}

/** Breaks at spaces into at most `most` lines no wider than `width`; what does not fit ends in an ellipsis. */
export function wrapText(text: string, size: number, width: number, most: number): string[] {
  const lines: string[] = []
  let rest = text.trim().split(/\s+/)
  while (rest.length > 0 && lines.length < most) {
    let count = 1
    while (count < rest.length && textWidth(rest.slice(0, count + 1).join(' '), size) <= width) count++
    const last = lines.length === most - 1 && count < rest.length
    lines.push(shorten(rest.slice(0, count).join(' '), last, size, width))
    rest = rest.slice(count)
  }
  return lines
}

function shorten(text: string, cut: boolean, size: number, width: number): string {
  if (!cut && textWidth(text, size) <= width) return text
  let kept = [...text]
  while (kept.length > 1 && textWidth(kept.join('') + '…', size) > width) kept = kept.slice(0, -1)
  return kept.join('').trimEnd() + '…'
}
