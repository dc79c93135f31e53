import type { FigureInput, FigureLine } from './input.js'

/** A line's band between two edges, both as shares of the total power at each point. */
export interface ShareBand {
  readonly line: FigureLine
  readonly lower: Float64Array
  readonly upper: Float64Array
  /** Largest absolute share, and the extent of the band. */
  readonly greatest: number
  readonly lowest: number
  readonly highest: number
}

/**
 * psd / total of every line, stacked from zero: positive shares upwards, negative ones downwards, the line of the largest
 * share first. A point where the total is not above zero has no shares.
 */
export function stackShares({ lines, total }: FigureInput): ShareBand[] {
  const shares = lines.map(line => ({ line, share: sharesOf(line.psd, total) }))
  const greatest = ({ share }: { share: Float64Array }) => share.reduce((most, v) => Math.max(most, Math.abs(v)), 0)
  const ordered = shares.map(s => ({ ...s, greatest: greatest(s) })).sort((a, b) => b.greatest - a.greatest)
  const above = new Float64Array(total.length)
  const below = new Float64Array(total.length)
  return ordered.map(({ line, share, greatest }) => {
    const lower = new Float64Array(total.length)
    const upper = new Float64Array(total.length)
    for (let k = 0; k < share.length; k++) {
      const edges = share[k] < 0 ? below : above
      const next = edges[k] + share[k]
      lower[k] = Math.min(edges[k], next)
      upper[k] = Math.max(edges[k], next)
      edges[k] = next
    }
    return { line, lower, upper, greatest, lowest: Math.min(...lower), highest: Math.max(...upper) }
  })
}

function sharesOf(psd: Float64Array, total: Float64Array): Float64Array {
  return psd.map((value, k) => {
    const share = value / total[k]
    return total[k] > 0 && Number.isFinite(share) ? share : 0
  })
}
