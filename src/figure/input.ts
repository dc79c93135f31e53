import type { Assessment } from '../model/assessment.js'
import type { Evaluation, Family } from '../model/evaluation.js'
import type { Points } from '../model/points.js'

/** A contribution as a figure needs it. */
export interface FigureLine {
  readonly id: string
  readonly title: string
  readonly family: Family
  /** Counts the lines of one family from 0: it chooses the dash. */
  readonly tone: number
  readonly signed: boolean
  /** One-sided power density at the measurand; values that are not above zero are not drawn (below zero, when signed). */
  readonly psd: Float64Array
}

export interface FigureLimit {
  readonly id: string
  readonly title: string
  /** The standard quantum limit: drawn stronger than the others. */
  readonly prominent: boolean
  readonly psd: Float64Array
}

/** The total of the budget with other values, on points of its own. */
export interface FigureVariant {
  readonly id: string
  readonly title: string
  readonly points: Points
  readonly total: Float64Array
}

/** All that a figure draws from. */
export interface FigureInput {
  readonly title: string
  /** `force`. */
  readonly quantity: string
  /** Of the amplitude density: `N/√Hz`. */
  readonly unit: string
  readonly band: { readonly low: number; readonly high: number }
  readonly points: Points
  readonly total: Float64Array
  /** Standard uncertainty of the total's amplitude density at each point; null where there is none. */
  readonly uncertainty: Float64Array | null
  readonly variants: readonly FigureVariant[]
  /** Whether distances to quantum limits mean anything: not for a readout without back-action. */
  readonly comparable: boolean
  readonly lines: readonly FigureLine[]
  readonly limits: readonly FigureLimit[]
  readonly reference: number | null
  /** Where the total is least, with its standard uncertainty; null where it is nowhere above zero. */
  readonly best: { readonly frequency: number; readonly asd: number; readonly uncertainty: number } | null
}

/** Ids under which a standard quantum limit may stand. */
const STANDARD = /^(sql|standard(_quantum(_limit)?)?)$/

/** From a whole assessment; `tones` keeps colours of published lines when a line is inserted (id → index in its family). */
export function figureInput(assessment: Assessment, tones?: ReadonlyMap<string, number>): FigureInput {
  const { budget, evaluation, headlines, unit, bands, warnings } = assessment
  return {
    title: budget.title,
    quantity: budget.measurand.quantity,
    unit,
    band: { low: budget.band.low, high: budget.band.high },
    ...curvesOf(evaluation, tones),
    uncertainty: bands !== null && bands.combined.some(u => u > 0) ? bands.combined : null,
    variants: assessment.variants.map(variantOf),
    comparable: warnings.every(({ code }) => code !== 'no-back-action'),
    reference: budget.reference,
    best: {
      frequency: headlines.best.frequency,
      asd: headlines.best.asd,
      uncertainty: headlines.best.asdSpread.combined,
    },
  }
}

/** `cold: Q ten times higher`; an id that was only made readable is not said twice. */
function variantOf({ id, title, assessment }: Assessment['variants'][number]): FigureVariant {
  const { points, total } = assessment.evaluation
  return { id, title: title === id.replaceAll('_', ' ') ? title : `${id}: ${title}`, points, total }
}

/** The curves of an evaluation alone. */
export function curvesOf(evaluation: Evaluation, tones?: ReadonlyMap<string, number>) {
  const { points, total, limits } = evaluation
  const seen = new Map<Family, number>()
  const lines = evaluation.lines.map(({ id, title, family, signed, psd }): FigureLine => {
    const next = seen.get(family) ?? 0
    seen.set(family, next + 1)
    return { id, title, family, signed, psd, tone: tones?.get(id) ?? next }
  })
  return { points, total, lines, limits: limits.map(limit => ({ ...limit, prominent: isStandard(limit.id) })) }
}

function isStandard(id: string): boolean {
  return STANDARD.test(id.toLowerCase().replace(/[-. ]/g, '_'))
}
