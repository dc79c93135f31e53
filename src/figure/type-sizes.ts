/** Sizes of text in pixels at a figure's natural size; the style sheet is made from them. */
export interface TypeSizes {
  readonly label: number
  readonly tick: number
  readonly axis: number
  readonly note: number
  readonly raised: number
}

export const WIDE: TypeSizes = { label: 14, tick: 13, axis: 14, note: 12.5, raised: 10 }
export const COMPACT: TypeSizes = { label: 12, tick: 11.5, axis: 12, note: 11, raised: 9 }

/** Distance of baselines over the size of the text, and how much of it stands above the baseline. */
export const LINE_HEIGHT = 1.18
export const ASCENT = 0.86

/** Figures narrower than this are compact: fewer labels, smaller margins. */
export const COMPACT_BELOW = 600

export function isCompact(width: number): boolean {
  return width < COMPACT_BELOW
}

export function typeSizes(width: number): TypeSizes {
  return isCompact(width) ? COMPACT : WIDE
}
