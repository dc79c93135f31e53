import { bandAbscissa } from './band-abscissa.js'
import { bandSpan, describe } from './describe.js'
import type { FigureInput } from './input.js'
import { plotScene } from './plot-scene.js'
import type { Scene, Size } from './scene.js'

/**
 * Amplitude density of the measurand against frequency, log–log, over the whole band: every line, the total, the limits,
 * each named next to its curve, with the reference frequency and the best point marked. Narrower than 600 pixels it is
 * compact: few names in the frame, the others in rows below, so that the scene may be higher than asked for.
 */
export function sensitivityScene(view: FigureInput, size: Size): Scene {
  return plotScene(view, size, {
    title: `${view.title}: noise budget`,
    description: describe(view, bandSpan(view)),
    abscissa: bandAbscissa(view),
  })
}
