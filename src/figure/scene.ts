/**
 * What a figure draws, as plain data: the same scene is written as SVG text and could be drawn on paper. Lengths are in
 * user units, one CSS pixel at the figure's natural size; x grows to the right, y downwards.
 */
export interface Scene {
  readonly width: number
  readonly height: number
  readonly title: string
  /** What the curves do, in sentences, for those who do not see them. */
  readonly description: string
  /** In the order of drawing. */
  readonly marks: readonly Mark[]
}

export interface Size {
  readonly width: number
  readonly height: number
}

/** left ≤ right, top ≤ bottom. */
export interface Box {
  readonly left: number
  readonly top: number
  readonly right: number
  readonly bottom: number
}

/** x₀, y₀, x₁, y₁, …: at least two points, all finite. */
export type Polyline = readonly number[]

/** How ink looks; each word becomes classes of the style sheet. */
export type Ink =
  | {
      readonly as:
        | ('total' | 'spread' | 'variant' | 'limit' | 'bound')
        | ('axis' | 'tick' | 'grid' | 'leader' | 'reference' | 'best' | 'beyond')
    }
  | { readonly as: 'line' | 'share'; readonly family: import('../model/evaluation.js').Family; readonly tone: number }

export type Mark = PathMark | TextMark | RingMark

export interface PathMark {
  readonly mark: 'path'
  readonly ink: Ink
  /** The curve's id, so that a page can find it again; absent for axes. */
  readonly of?: string
  /** Lengths of dashes and gaps; absent for a solid stroke. */
  readonly dash?: readonly number[]
  /** A filled shape instead of a stroke. */
  readonly filled?: true
  readonly pieces: readonly Polyline[]
}

export interface TextMark {
  readonly mark: 'text'
  readonly ink: Ink
  readonly role: 'label' | 'tick' | 'axis' | 'note'
  readonly of?: string
  /** Of the first line's baseline. */
  readonly x: number
  readonly y: number
  readonly anchor: 'start' | 'middle' | 'end'
  readonly lines: readonly string[]
  /** A superscript behind the last line. */
  readonly raised?: string
  /** Reads upwards. */
  readonly turned?: true
  /** The rectangle that the text may fill, for tests and for placing. */
  readonly box: Box
}

export interface RingMark {
  readonly mark: 'ring'
  readonly ink: Ink
  readonly x: number
  readonly y: number
  readonly radius: number
}
