import type { Anchor } from '../model/points.js'
import { describe, type Span } from './describe.js'
import { indicesBetween } from './indices-between.js'
import type { FigureInput } from './input.js'
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
  const offsets = offsetsFrom(view, anchor)
  const shift = centre.frequency - anchor.frequency
  const reach = HALF_WIDTHS * centre.halfWidth
  const domain: [number, number] = [
    Math.max(shift - reach, view.band.low - anchor.frequency),
    Math.min(shift + reach, view.band.high - anchor.frequency),
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

/** Offsets of all points from one anchor, in Hz; exact for its own points, whatever their number of equal leading digits. */
export function offsetsFrom({ points }: FigureInput, anchor: Anchor): Float64Array {
  const { anchors, offset } = points
  const shifts = anchors.map(a => a.frequency - anchor.frequency)
  return offset.map((value, k) => (points.anchor[k] < 0 ? value - anchor.frequency : value + shifts[points.anchor[k]]))
}
