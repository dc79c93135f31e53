import { axisOrigin } from './axis-plan.js'
import { describe } from './describe.js'
import type { FigureInput } from './input.js'
import { type Abscissa, plotScene } from './plot-scene.js'
import { withUnit } from './prefix.js'
import { frequencyKind } from './scales.js'
import type { Scene, Size } from './scene.js'

/**
 * Amplitude density of the measurand against frequency, log–log, over the whole band: every line, the total, the limits,
 * each named next to its curve, with the reference frequency and the best point marked. Narrower than 600 pixels it is
 * compact: few names in the frame, the others in rows below, so that the scene may be higher than asked for.
 */
export function sensitivityScene(view: FigureInput, size: Size): Scene {
  return plotScene(view, size, {
    title: `${view.title}: noise budget`,
    description: describe(view, view.band.low, view.band.high),
    abscissa: bandAbscissa(view),
  })
}

function bandAbscissa(view: FigureInput): Abscissa {
  const { low, high } = view.band
  const kind = frequencyKind(view.band)
  const middle = view.reference !== null && view.reference > low && view.reference < high ? view.reference : (low + high) / 2
  const origin = kind === 'log' ? 0 : axisOrigin(low, high, middle)
  return {
    kind,
    x: origin === 0 ? view.points.frequency : view.points.frequency.map(f => f - origin),
    domain: [low - origin, high - origin],
    origin,
    name: origin === 0 ? 'Frequency' : `Frequency − ${withUnit(origin, 'Hz', 9)}`,
  }
}
