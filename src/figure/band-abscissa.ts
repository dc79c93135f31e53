import { axisOrigin } from './axis-plan.js'
import type { FigureInput } from './input.js'
import { frequencyName } from './prefix.js'
import { offsetPoints } from './offset-points.js'
import { frequencyKind } from './scales.js'

/** What a figure shows along its horizontal axis. */
export interface Abscissa {
  readonly kind: 'linear' | 'log'
  /** Of the evaluation's points, in Hz from `origin`. */
  readonly x: Float64Array
  readonly domain: readonly [number, number]
  /** Frequency at which the axis reads zero. */
  readonly origin: number
  readonly name: string
}

/** Frequency over the whole band; of a very narrow one the difference to a round frequency in it. */
export function bandAbscissa(view: FigureInput): Abscissa {
  const { low, high } = view.band
  const kind = frequencyKind(view.band)
  const middle =
    view.reference !== null && view.reference > low && view.reference < high ? view.reference : (low + high) / 2
  const origin = kind === 'log' ? 0 : axisOrigin(low, high, middle)
  return {
    kind,
    x: offsetPoints(view.points, origin),
    domain: [low - origin, high - origin],
    origin,
    name: origin === 0 ? 'Frequency' : `Frequency − ${frequencyName(origin)}`,
  }
}
