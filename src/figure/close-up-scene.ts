import { bisectCenter } from 'd3-array'
import type { Anchor } from '../model/points.js'
import { describe, type Span } from './describe.js'
import { indicesBetween } from './indices-between.js'
import type { FigureInput } from './input.js'
import { offsetPoints } from './offset-points.js'
import { plotScene } from './plot-scene.js'
import { frequencyName, withUnit } from './prefix.js'
import type { Scene, Size } from './scene.js'

/** The close-up reaches so many half widths to each side. */
const HALF_WIDTHS = 24
/** A pole belongs to the mode when it is nearer than so many of its own half widths. */
const NEAR = 50
/** Curves that a compact close-up names. */
const NAMED = 4

/** One resonance against the offset from it, as wide as the resonance is with the light on. */
export function closeUpScene(view: FigureInput, anchor: Anchor, size: Size): Scene {
  const centre = featureAt(view, anchor)
  const offsets = offsetPoints(view.points, anchor.frequency)
  const shift = centre.frequency - anchor.frequency
  const reach = HALF_WIDTHS * centre.halfWidth
  const narrow: [number, number] = [shift - reach, shift + reach]
  const [low, high] = isBare(centre, anchor) ? widenedWindow(view.total, offsets, narrow) : narrow
  const domain: [number, number] = [
    Math.max(low, view.band.low - anchor.frequency),
    Math.min(high, view.band.high - anchor.frequency),
  ]
  return plotScene(view, size, {
    title: `${view.title}: close-up of ${anchor.id}`,
    description: describe(view, offsetSpan(anchor, offsets, domain)),
    abscissa: {
      kind: 'linear',
      x: offsets,
      domain,
      origin: anchor.frequency,
      name: `Offset from ${frequencyName(anchor.frequency)}`,
    },
    named: NAMED,
    nameHidden: false,
  })
}

/** The light has not broadened a pole that is no wider than so many times the bare mode. */
const BROADENED = 2

function isBare(centre: Anchor, anchor: Anchor): boolean {
  return centre.halfWidth <= BROADENED * anchor.halfWidth
}

/**
 * A mode that the light leaves alone can be far narrower than what is to be seen: the band around it in which the sensor
 * is good. The window then reaches half a width beyond that band; where the total has a peak, or a slope, at the mode, it
 * stays at the mode's own width.
 */
function widenedWindow(total: Float64Array, x: Float64Array, narrow: [number, number]): [number, number] {
  const centre = bisectCenter(x, (narrow[0] + narrow[1]) / 2)
  const level = 2 * total[centre]
  const isFlat = narrow.every(edge => total[bisectCenter(x, edge)] >= FLAT * total[centre])
  if (!isFlat || !(level > 0)) return narrow
  let [from, to] = [centre, centre]
  while (from > 0 && total[from - 1] <= level) from--
  while (to < x.length - 1 && total[to + 1] <= level) to++
  const half = (x[to] - x[from]) / 2
  return [Math.min(narrow[0], x[from] - half), Math.max(narrow[1], x[to] + half)]
}

/** A floor may sag by this much towards the edges of the narrow window. */
const FLAT = 0.95

function offsetSpan(anchor: Anchor, offsets: Float64Array, [low, high]: [number, number]): Span {
  const say = (offset: number) => (offset === 0 ? 'no offset' : withUnit(offset, 'Hz', 3))
  return {
    shown: indicesBetween(offsets, low, high),
    range: `against the offset from ${frequencyName(anchor.frequency)}, from ${say(low)} to ${say(high)}`,
    at: k => say(offsets[k]),
  }
}

/** The pole nearest to a mode, which has its width with the light on; the mode itself where there is none near. */
function featureAt({ points }: FigureInput, anchor: Anchor): Anchor {
  const distance = (pole: Anchor) => Math.abs(pole.frequency - anchor.frequency)
  const poles = points.anchors.filter(
    a => a.nature === 'pole' && distance(a) <= NEAR * Math.max(a.halfWidth, anchor.halfWidth),
  )
  return poles.sort((a, b) => distance(a) - distance(b))[0] ?? anchor
}
