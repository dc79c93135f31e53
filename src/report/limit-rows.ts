import type { Assessment } from '../model/assessment.js'
import type { LimitCurve } from '../model/evaluation.js'
import { decibelText, hasBackAction, marginText } from './margins.js'
import { densityText } from './numbers.js'

export interface LimitRow {
  readonly id: string
  readonly title: string
  readonly value: string
  readonly bounds: string
  readonly about: string
  /** One-sided density as a displacement of the sensed coordinate, and as a force on a single mode, in TeX. */
  readonly displacement: string
  readonly force: string
  /** Where the total and the readout's added noise stand now. */
  readonly total: string
  readonly added: string
}

/** χ_s is the response of the sensed coordinate with the light off; one-sided densities. */
const equations: Readonly<Record<string, { readonly displacement: string; readonly force: string }>> = {
  sql: { displacement: 'S_x = 2\\hbar\\,|\\chi_s|', force: 'S_F = 2\\hbar/|\\chi_s|' },
  correlation_limit: {
    displacement: 'S_x = 2\\hbar\\,|\\mathrm{Im}\\,\\chi_s|',
    force: 'S_F = 2\\hbar\\,|\\mathrm{Im}\\,\\chi_s^{-1}|',
  },
  zero_point: {
    displacement: 'S_x = 2\\hbar\\,|\\mathrm{Im}\\,\\chi_s|',
    force: 'S_F = 2\\hbar\\,|\\mathrm{Im}\\,\\chi_s^{-1}|',
  },
  energy_bound: {
    displacement: 'S_x = \\hbar^2|1 - k_{\\mathrm{opt}}\\chi_s|^2/S_F^{\\mathrm{ba}}',
    force: 'S_F = \\hbar^2|\\chi_s^{-1} - k_{\\mathrm{opt}}|^2/S_F^{\\mathrm{ba}}',
  },
}

const bounds = {
  added: 'the added noise of every stationary linear readout',
  total: 'the total',
  none: 'nothing strictly; shown to compare',
}

/** Every limit at the reference frequency, with what it says and where the budget stands. */
export function limitRows(assessment: Assessment): readonly LimitRow[] {
  const { atReference, unit } = assessment
  return atReference.limits.map(limit => ({
    id: limit.id,
    title: limit.title,
    value: densityText(Math.sqrt(limit.psd[0]), unit),
    bounds: limit.id === 'sql' ? 'readouts whose imprecision and back-action are not correlated' : bounds[limit.bounds],
    about: limit.about,
    displacement: equations[limit.id].displacement,
    force: equations[limit.id].force,
    total: standing(atReference.total[0], limit, assessment),
    added: standing(atReference.added[0], limit, assessment),
  }))
}

/** `9.2 dB above`; below the standard quantum limit, `passed by 3.1 dB`. */
function standing(psd: number, limit: LimitCurve, assessment: Assessment): string {
  if (!hasBackAction(assessment)) return 'left out'
  if (psd === 0) return 'none'
  const margin = 10 * Math.log10(psd / limit.psd[0])
  if (limit.id === 'sql' && margin <= -0.05) return `passed by ${decibelText(-margin)}`
  return marginText(margin)
}
