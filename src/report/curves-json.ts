import type { Assessment, Bands, RequirementResult } from '../model/assessment.js'
import type { Budget } from '../model/budget.js'
import type { Evaluation, Parts } from '../model/evaluation.js'
import { powerUnitOf } from './curves-csv.js'
import { engineVersion } from './engine-version.js'

/** Number of the layout below; it grows when a reader of the file would have to change. */
export const curvesFormat = 1

/** Everything computed for one budget, as data for machines; `floorbook show --json` prints it. */
export function curvesData(assessment: Assessment): object {
  const { budget, evaluation, atReference, headlines, unit } = assessment
  return {
    format: curvesFormat,
    engine: engineVersion,
    sensor: budget.sensor,
    title: budget.title,
    revision: budget.revision,
    file: budget.file,
    measurand: budget.measurand.quantity,
    sidedness: 'one-sided',
    unit: { amplitude: unit, power: powerUnitOf(unit) },
    band: { low: budget.band.low, high: budget.band.high },
    reference: budget.reference,
    headlines,
    modes: assessment.modes,
    cavities: assessment.cavities,
    roots: budget.roots.map(root => ({ ...root, place: placeText(root.place) })),
    derived: derivedData(budget),
    correlations: budget.correlations.map(({ roots, coefficient, place }) => ({
      roots: roots.map(index => budget.roots[index].id),
      coefficient,
      place: placeText(place),
    })),
    citations: budget.citations,
    root_shares: assessment.rootShares.map(({ root, elasticity, change }) => ({
      root: budget.roots[root].id,
      elasticity,
      change,
    })),
    requirements: assessment.requirements.map(requirementData),
    variants: variantsData(assessment),
    warnings: assessment.warnings.map(({ code, message, place }) => ({ code, message, place: placeText(place) })),
    curves: { ...evaluationData(evaluation), standard_uncertainty: bandsData(assessment.bands) },
    at_reference: { ...evaluationData(atReference), line_spreads: lineSpreadsData(assessment) },
  }
}

/** Of the total's amplitude density, on the points of the curves. */
function bandsData(bands: Bands | null): object | null {
  if (bands === null) return null
  const { combined, statistical, systematic } = bands
  return { combined: [...combined], statistical: [...statistical], systematic: [...systematic] }
}

function lineSpreadsData({ atReference, lineSpreads }: Assessment): object {
  return lineSpreads.map((spread, k) => ({ line: atReference.lines[k].id, ...spread }))
}

function derivedData({ roots, derived }: Budget): object {
  const values = Float64Array.from(roots, root => root.value)
  return derived.map(({ id, text, dimension, formula, about, evidence, place }) => ({
    ...{ id, text, dimension, about, evidence },
    value: formula.value(values),
    roots: formula.roots.map(index => roots[index].id),
    place: placeText(place),
  }))
}

/** A requirement whose number does not exist here has null for it. */
export function requirementData({ requirement, value, spread, frequency, met }: RequirementResult): object {
  const { id, of, where, bound, value: wanted, text, about, place } = requirement
  const exists = Number.isFinite(value)
  return {
    ...{ id, of, where, bound, wanted, text, about },
    value: exists ? value : null,
    spread: exists ? spread : null,
    frequency,
    met,
    place: placeText(place),
  }
}

function variantsData({ variants }: Assessment): object {
  return variants.map(({ id, title, assessment: { headlines, modes, requirements, evaluation, bands } }) => ({
    ...{ id, title, headlines, modes },
    requirements: requirements.map(requirementData),
    curves: {
      anchors: evaluation.points.anchors,
      frequency: [...evaluation.points.frequency],
      anchor: [...evaluation.points.anchor],
      offset: [...evaluation.points.offset],
      total: [...evaluation.total],
      standard_uncertainty: bandsData(bands),
    },
  }))
}

/** The same as text: one line a member of the outer object, shortest round-trip digits. */
export function curvesJson(assessment: Assessment): string {
  const members = Object.entries(curvesData(assessment)).map(([key, value]) => `"${key}":${jsonText(value)}`)
  return `{\n${members.join(',\n')}\n}\n`
}

function placeText({ file, line, column }: { file: string; line: number; column: number }): string {
  return `${file}:${line}:${column}`
}

/** Points and power densities of an evaluation, parts with their signs. */
export function evaluationData({ points, total, added, lines, sources, limits, response }: Evaluation): object {
  return {
    anchors: points.anchors,
    frequency: [...points.frequency],
    anchor: [...points.anchor],
    offset: [...points.offset],
    total: [...total],
    added: [...added],
    response: [...response],
    lines: lines.map(({ id, title, family, signed, of, psd }) => ({ id, title, family, signed, of, psd: [...psd] })),
    sources: sources.map(({ id, title, family, readout, owner, channel, own, ownUnit, psd, vacuum, heating }) => ({
      ...{ id, title, family, readout, owner, channel, ownUnit },
      own: [...own],
      psd: [...psd],
      ...(vacuum === undefined ? {} : { vacuum: partsData(vacuum) }),
      ...(heating === undefined ? {} : { heating: partsData(heating) }),
    })),
    limits: limits.map(({ id, title, bounds, about, psd }) => ({ id, title, bounds, about, psd: [...psd] })),
  }
}

function partsData({ imprecision, backAction, correlation }: Parts): object {
  return { imprecision: [...imprecision], back_action: [...backAction], correlation: [...correlation] }
}

/** JSON has no NaN and no infinity; a file that would need them is refused instead of saying null. */
function jsonText(value: unknown): string {
  return JSON.stringify(value, (key, each: unknown) => {
    if (typeof each === 'number' && !Number.isFinite(each)) throw new RangeError(`${key} is ${each}`)
    return each
  })
}
