import type { Points } from '../model/points.js'

/**
 * How far around a resonance frequencies go along with it. `spot`: a frequency that somebody names follows within thirty half widths, where
 * it means the resonance. `band`: a drawn curve follows also within ten standard uncertainties of the resonance's place, beyond which what
 * stands still changes by less than a fifth of itself.
 */
export type Reach = 'spot' | 'band'

const halfWidths = 30

const uncertainties = 10

/** A resonance that is known to this part of its half width needs no following. */
const known = 0.03

/** 1 up to the reach, then falling smoothly to 0 at twice of it. */
function taper(distance: number, reach: number): number {
  if (distance <= reach) return 1
  return distance >= 2 * reach ? 0 : (1 + Math.cos((Math.PI * (distance - reach)) / reach)) / 2
}

/**
 * Which points go along with which anchor when parameters change. A mode whose frequency is uncertain by 0.1 % does not smear a notch that
 * is 10⁻⁸ wide: next to it, what is uncertain is its depth and not its place, so that points keep their offset from it. Everywhere else a
 * frequency is a frequency.
 */
export class Following {
  /** Weights by anchor and point, no more than 1 in sum; null for an anchor that nothing follows. */
  readonly #weights: readonly (Float64Array | null)[]

  constructor(
    readonly points: Points,
    spreads: readonly number[],
    reach: Reach,
  ) {
    const { anchors, frequency } = points
    this.#weights = anchors.map(({ frequency: place, halfWidth }, a) => {
      if (!(spreads[a] > known * halfWidth)) return null
      const far = Math.max(halfWidths * halfWidth, reach === 'band' ? uncertainties * spreads[a] : 0)
      return frequency.map((f, i) => taper(Math.abs(points.anchor[i] === a ? points.offset[i] : f - place), far))
    })
    for (let i = 0; i < frequency.length; i++) {
      const sum = this.#weights.reduce((total, weights) => total + (weights?.[i] ?? 0), 0)
      if (sum > 1) for (const weights of this.#weights) if (weights !== null) weights[i] /= sum
    }
  }

  /** The points when anchors have come to other frequencies in Hz. One that follows its own anchor keeps its offset to the last digit. */
  moved(places: readonly number[]): Points {
    const { points } = this
    const anchors = points.anchors.map((anchor, a) => ({ ...anchor, frequency: places[a] }))
    const shifts = points.anchors.map(({ frequency }, a) => places[a] - frequency)
    const offset = points.offset.map((from, i) => {
      const own = points.anchor[i]
      const shift = this.#weights.reduce((sum, weights, a) => sum + (weights === null ? 0 : weights[i] * shifts[a]), 0)
      return from + (shift - (own < 0 ? 0 : shifts[own]))
    })
    const frequency = offset.map((from, i) =>
      points.anchor[i] < 0 ? from : anchors[points.anchor[i]].frequency + from,
    )
    return { anchors, frequency, anchor: points.anchor, offset }
  }
}
