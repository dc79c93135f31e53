import type { Evaluation, Family, LineCurve } from '../../src/model/evaluation.js'
import type { Anchor, Points } from '../../src/model/points.js'
import { curvesOf, type FigureInput } from '../../src/figure/input.js'

const HBAR = 1.054571817e-34
const BOLTZMANN = 1.380649e-23

/** An invented membrane: mass in kg, frequency in Hz, temperature in K. */
export interface Membrane {
  readonly mass: number
  readonly frequency: number
  readonly quality: number
  readonly temperature: number
  readonly low: number
  readonly high: number
  readonly stray: number
}

export const MEMBRANE: Membrane = {
  mass: 3.1e-12,
  frequency: 1.243e6,
  quality: 1e8,
  temperature: 0.35,
  low: 1.2e6,
  high: 1.3e6,
  stray: 0.6e-18,
}

/** Points around the mode's anchor, denser towards it, and the ends of the band. */
export function membranePoints({ frequency, quality, low, high }: Membrane, count = 160): Points {
  const halfWidth = frequency / (2 * quality)
  const anchor: Anchor = { id: 'membrane', nature: 'mode', frequency, halfWidth }
  const side = (reach: number, sign: number) =>
    Array.from(
      { length: count },
      (_, k) => sign * halfWidth * Math.sinh((Math.asinh(reach / halfWidth) * (k + 1)) / count),
    )
  const offsets = [...side(frequency - low, -1).reverse(), 0, ...side(high - frequency, 1)]
  return {
    anchors: [anchor],
    frequency: Float64Array.from(offsets, o => frequency + o),
    anchor: new Int32Array(offsets.length),
    offset: Float64Array.from(offsets),
  }
}

/** The shapes of a real budget from textbook formulas; it stands in for the engine, whose numbers it does not claim to be. */
export function membraneEvaluation(membrane: Membrane = MEMBRANE): Evaluation {
  const { mass, frequency, quality, temperature, stray } = membrane
  const points = membranePoints(membrane)
  const omega0 = 2 * Math.PI * frequency
  const chi = (k: number) => {
    const real = mass * (2 * Math.PI) ** 2 * -points.offset[k] * (2 * frequency + points.offset[k])
    return {
      real,
      imaginary: (mass * omega0 * omega0) / quality,
      square: real * real + ((mass * omega0 * omega0) / quality) ** 2,
    }
  }
  const thermal = (4 * BOLTZMANN * temperature * mass * omega0) / quality
  const imprecision = 2.4e-33
  const backAction = (HBAR * HBAR * 1.4) / imprecision
  const curve = (f: (k: number) => number) => Float64Array.from(points.frequency, (_, k) => f(k))
  const line = (id: string, title: string, family: Family, psd: Float64Array, signed = false): LineCurve => ({
    id,
    title,
    family,
    signed,
    psd,
    of: [id],
  })
  const lines = [
    line(
      'thermal',
      'thermal',
      'thermal',
      curve(() => thermal),
    ),
    line(
      'shot',
      'shot noise',
      'imprecision',
      curve(k => imprecision * chi(k).square),
    ),
    line(
      'back_action',
      'back-action',
      'back-action',
      curve(() => backAction),
    ),
    line(
      'correlation',
      'correlation',
      'correlation',
      curve(k => 0.5 * HBAR * chi(k).real),
      true,
    ),
    line(
      'amplifier',
      'amplifier',
      'amplifier',
      curve(k => 0.45 * imprecision * chi(k).square),
    ),
    line(
      'heating',
      'cavity heating',
      'heating',
      curve(() => 0.3 * backAction),
    ),
    line(
      'detector',
      'detector loss',
      'detection',
      curve(k => 0.13 * imprecision * chi(k).square),
    ),
    line(
      'stray',
      'stray forces',
      'stray',
      curve(() => stray * stray),
    ),
  ]
  const total = curve(k => lines.reduce((sum, l) => sum + l.psd[k], 0))
  const limit = (id: string, title: string, f: (k: number) => number) => ({
    id,
    title,
    psd: curve(f),
    bounds: 'added' as const,
    about: title,
  })
  const limits = [
    limit('standard-quantum-limit', 'standard quantum limit', k => 2 * HBAR * Math.sqrt(chi(k).square)),
    limit('correlation-limit', 'correlation limit', k => 2 * HBAR * chi(k).imaginary),
  ]
  const ones = curve(() => 1)
  return { points, total, added: total, lines, sources: [], limits, response: ones }
}

export function membraneInput(membrane: Membrane = MEMBRANE): FigureInput {
  const evaluation = membraneEvaluation(membrane)
  const { total, points } = evaluation
  const best = total.indexOf(Math.min(...total))
  return {
    title: 'Sandpiper membrane',
    quantity: 'force',
    unit: 'N/√Hz',
    band: { low: membrane.low, high: membrane.high },
    ...curvesOf(evaluation),
    uncertainty: null,
    variants: [],
    comparable: true,
    reference: membrane.frequency,
    best: { frequency: points.frequency[best], asd: Math.sqrt(total[best]), uncertainty: 0 },
  }
}
