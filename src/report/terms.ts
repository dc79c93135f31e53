import type { Assessment } from '../model/assessment.js'
import type { Parts, SourceCurve } from '../model/evaluation.js'
import { densityText, numberText, percentText } from './numbers.js'

/** One source (or part of one) behind a line at the reference frequency: own density × |t/R|² = at the measurand. */
export interface TermRow {
  readonly source: string
  readonly title: string
  readonly own: string
  readonly transfer: string
  readonly product: string
  readonly share: string
}

/** The row of a claim such as `cavity.front imprecision`; null where it names no source. */
export function termRow(claim: string, { atReference, unit }: Assessment): TermRow | null {
  const [id, part] = claim.split(' ')
  const source = atReference.sources.find(each => each.id === id)
  if (source === undefined) return null
  const { own, psd } = claimed(source, part ?? null)
  return {
    source: claim,
    title: part === undefined ? source.title : `${source.title}, ${part}`,
    own: ownText(own, source.ownUnit),
    transfer: own > 0 ? transferText(psd / own, unit, source.ownUnit) : '—',
    product: squareText(psd, unit),
    share: percentText(psd / atReference.total[0]),
  }
}

/** Vacuum is half a quantum; what the occupancy adds is the rest of the source's own quanta. */
const vacuumQuanta = 0.5

function claimed(source: SourceCurve, part: string | null): { readonly own: number; readonly psd: number } {
  const { vacuum, heating } = source
  if (part === 'heating' && heating !== undefined)
    return { own: Math.max(0, source.own[0] - vacuumQuanta), psd: whole(heating) }
  const share = heating === undefined ? source.own[0] : vacuumQuanta
  if (part === 'imprecision' && vacuum !== undefined) return { own: share, psd: vacuum.imprecision[0] }
  if (part === 'back-action' && vacuum !== undefined) return { own: share, psd: vacuum.backAction[0] }
  return { own: source.own[0], psd: source.psd[0] }
}

function whole(parts: Parts): number {
  return parts.imprecision[0] + parts.backAction[0] + parts.correlation[0]
}

function ownText(own: number, unit: SourceCurve['ownUnit']): string {
  if (unit === 'quanta')
    return own === vacuumQuanta ? '½ quantum' : `${numberText(own, 3)} ${own === 1 ? 'quantum' : 'quanta'}`
  return squareText(own, unit === 'N²/Hz' ? 'N/√Hz' : 'm/√Hz')
}

/** A power density as the square of its amplitude: `(1.5 aN/√Hz)²`. */
function squareText(psd: number, unit: string): string {
  return psd === 0 ? '0' : `(${densityText(Math.sqrt(psd), unit)})²`
}

/** |t/R|² in measurand² per own unit, as the square of an amplitude where it has a unit. */
function transferText(ratio: number, unit: string, ownUnit: SourceCurve['ownUnit']): string {
  if (ownUnit === 'quanta') return `${squareText(ratio, unit)} per quantum`
  const base = unit.replace('/√Hz', '')
  const own = ownUnit === 'N²/Hz' ? 'N' : 'm'
  return base === own ? numberText(ratio, 4) : `(${densityText(Math.sqrt(ratio), `${base}/${own}`)})²`
}
