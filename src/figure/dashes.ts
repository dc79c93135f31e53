import type { Family } from '../model/evaluation.js'

type Dash = readonly number[] | null

const SOLID: Dash = null
/** Dashes of a family's first, second … line; the sequence starts elsewhere for each family, so that grey print tells them apart too. */
const SEQUENCES: { readonly [F in Family]: readonly Dash[] } = {
  thermal: [SOLID, [9, 3], [3, 3], [9, 3, 2, 3]],
  imprecision: [SOLID, [7, 2], [2, 2], [7, 2, 2, 2]],
  'back-action': [SOLID, [11, 3], [4, 3], [11, 3, 3, 3]],
  correlation: [
    [4, 3],
    [4, 3, 1.5, 3],
    [8, 4],
    [2, 4],
  ],
  heating: [[10, 3], SOLID, [5, 3], [10, 3, 2, 3]],
  amplifier: [[10, 3, 2, 3], [6, 2, 2, 2], SOLID, [3, 2]],
  detection: [[2, 2.5], [8, 3], [8, 3, 2, 3], SOLID],
  environment: [
    [6, 2.5],
    [2, 3],
    [12, 3],
    [6, 2, 1.5, 2],
  ],
  stray: [[12, 3, 2, 3, 2, 3], [2, 3.5], [6, 3], SOLID],
}
/** Of the variants' totals, in their order: long strokes, as no contribution has them. */
const VARIANTS: readonly (readonly number[])[] = [
  [16, 3],
  [16, 3, 3, 3],
  [16, 3, 3, 3, 3, 3],
  [16, 6],
  [22, 3, 8, 3],
]
/** Where a signed density is negative. */
const NEGATIVE: readonly number[] = [1.5, 3]

/** Dash of the `tone`-th line of a family, as SVG writes it; undefined for a solid stroke. */
export function dashOf(family: Family, tone: number): readonly number[] | undefined {
  const sequence = SEQUENCES[family]
  return sequence[tone % sequence.length] ?? undefined
}

/** Dash of the `index`-th variant's total. */
export function variantDash(index: number): readonly number[] {
  return VARIANTS[index % VARIANTS.length]
}

export function negativeDash(): readonly number[] {
  return NEGATIVE
}
