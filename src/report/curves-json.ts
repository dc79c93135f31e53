import type { Assessment } from '../model/assessment.js'
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
    warnings: assessment.warnings.map(({ code, message, place }) => ({ code, message, place: placeText(place) })),
    curves: evaluationData(evaluation),
    at_reference: evaluationData(atReference),
  }
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
