import type { Curve } from './curves.js'
import { wrapText } from './text-width.js'
import { textSize } from './text-box.js'

/** The text of a curve's label and the room it takes. */
export interface Label {
  readonly curve: Curve
  readonly lines: readonly string[]
  readonly width: number
  readonly height: number
}

/** Bold text is wider by about this factor. */
export const BOLD = 1.1

export function makeLabel(curve: Curve, size: number, widest: number, most: number): Label {
  const lines = wrapText(curve.title, size, widest, most)
  const { width, height } = textSize(lines, size)
  return { curve, lines, width: curve.ink.as === 'total' ? width * BOLD : width, height }
}
