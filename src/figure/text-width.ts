/**
 * Advance widths in thousandths of the font size: for each character the larger of Commissioner (which the site brings
 * along) and of the widths that Helvetica, Arial and Liberation Sans share, at regular weight, measured in Chromium and
 * rounded up to ten. Characters that are not listed count as `OTHER`.
 */
const WIDTHS: readonly (readonly [number, string])[] = [
  [210, "'"],
  [260, 'ijl'],
  [270, '|'],
  [280, ' \u00a0!,.:;I·'],
  [340, '¹'],
  [380, '"[]'],
  [390, '()'],
  [400, 'fr'],
  [410, '{}²⁰⁴₂'],
  [420, 't³⁵⁶⁷⁸⁹'],
  [430, '-'],
  [450, '/\\'],
  [480, '*°'],
  [500, 'Jcsz↓↑'],
  [510, 'γ'],
  [520, 'vy'],
  [530, '⁻'],
  [540, 'xχ'],
  [550, 'k√κ'],
  [560, '127?_aegu'],
  [570, '$±Γ'],
  [580, '35Ldhnµμη'],
  [590, '+<=>q~−–×'],
  [600, 'bop'],
  [610, '4689^`'],
  [620, 'Fß'],
  [650, 'T'],
  [660, '0'],
  [670, 'BEPSY'],
  [680, 'KXZ'],
  [690, '#Vπ'],
  [700, 'AÅ'],
  [730, 'CR'],
  [740, '&DU'],
  [750, 'H'],
  [760, 'N'],
  [780, 'G'],
  [790, 'ω'],
  [810, 'w'],
  [820, 'OQΩ'],
  [880, 'm'],
  [890, '%'],
  [960, 'M'],
  [1000, '…→'],
  [1020, '@'],
  [1030, 'W'],
]
const OTHER = 1000
/** For other fallback fonts, and for hinting at small sizes. */
const RESERVE = 1.02

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
