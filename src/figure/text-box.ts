import type { Box, TextMark } from './scene.js'
import { textWidth } from './text-width.js'
import { ASCENT, LINE_HEIGHT } from './type-sizes.js'

type Placed = Omit<TextMark, 'mark' | 'box'>

/** A text with the box that it fills at a size. */
export function textMark(text: Placed, size: number): TextMark {
  return { mark: 'text', ...text, box: textBox(text, size) }
}

function textBox(text: Placed, size: number): Box {
  const { width, height } = textSize(text.lines, size, text.raised)
  if (text.turned) {
    const bottom = text.y + (text.anchor === 'middle' ? width / 2 : 0)
    return { left: text.x - ASCENT * size, right: text.x - ASCENT * size + height, top: bottom - width, bottom }
  }
  const left = text.x - width * { start: 0, middle: 0.5, end: 1 }[text.anchor]
  const top = text.y - ASCENT * size
  return { left, top, right: left + width, bottom: top + height }
}

export function textSize(lines: readonly string[], size: number, raised = ''): { width: number; height: number } {
  const widths = lines.map((line, k) => textWidth(k === lines.length - 1 ? line + raised : line, size))
  return { width: Math.max(0, ...widths), height: lines.length * size * LINE_HEIGHT }
}

export function overlaps(a: Box, b: Box): boolean {
  return a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom
}
