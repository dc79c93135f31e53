import type { Budget, Parameters } from '../model/budget.js'
import { formatTex } from '../quantity/format.js'
import { frequencyTex, numberTex } from './numbers.js'
import { isDensity, slotAt, slotValue } from './slots.js'
import { boltzmannConstant, reducedPlanckConstant } from '../physics/constants.js'

/** What a closed equation is evaluated with. */
export interface Ground {
  readonly budget: Budget
  readonly parameters: Parameters
  readonly channel: string | null
  /** In Hz. */
  readonly frequency: number
  /** `N/√Hz` or `m/√Hz`, of the source's own density. */
  readonly unit: string
}

/** An equation with the numbers put in, and what they give. */
export interface Substitution {
  /** Right-hand side without the result. */
  readonly tex: string
  /** One-sided power density in SI. */
  readonly value: number
}

/** Equations of the catalogue that a reader can check by hand, by their names. */
const closed: { readonly [equation: string]: (ground: Ground) => Substitution | null } = {
  'viscous bath': ground => bath(ground, 'viscous'),
  'structural bath': ground => bath(ground, 'structural'),
  density: level,
}

/**
 * Puts the file's numbers into an equation; null where it has no closed form, and also where the numbers do not give
 * the source's own density as the engine computed it, so that no card can print an equation that contradicts its curve.
 */
export function substitute(equation: string, ground: Ground, own: number): Substitution | null {
  const found = closed[equation]?.(ground) ?? null
  return found !== null && Math.abs(found.value / own - 1) < 1e-6 ? found : null
}

function bath(ground: Ground, law: 'viscous' | 'structural'): Substitution | null {
  const mass = given(ground, 'mass')
  const bare = given(ground, 'frequency')
  const temperature = channelOr(ground, 'temperature')
  const quality = channelQuality(ground)
  if (mass === null || bare === null || temperature === null || quality === null) return null
  const omega = 2 * Math.PI * ground.frequency
  const bareOmega = 2 * Math.PI * bare
  const quanta = occupancy(omega, temperature)
  const scale = law === 'viscous' ? omega * bareOmega : bareOmega * bareOmega
  const bareTex = `2\\pi\\cdot ${frequencyTex(bare)}`
  const rates = law === 'viscous' ? `(2\\pi\\cdot ${frequencyTex(ground.frequency)})(${bareTex})` : `(${bareTex})^2`
  return {
    tex: `4\\hbar\\left(${numberTex(quanta)}+\\tfrac12\\right)${rates}\\,\\frac{${formatTex(mass, 'kg')}}{${numberTex(quality)}}`,
    value: (4 * reducedPlanckConstant * scale * (quanta + 0.5) * mass) / quality,
  }
}

function occupancy(omega: number, temperature: number): number {
  if (temperature === 0) return 0
  return 1 / Math.expm1((reducedPlanckConstant * omega) / (boltzmannConstant * temperature))
}

function level(ground: Ground): Substitution | null {
  const spec = ground.parameters['density']
  if (!isDensity(spec) || spec.density !== 'level') return null
  const stated = slotValue(ground.budget, spec.level)
  const psd = spec.power ? stated : stated * stated
  const exponent = slotValue(ground.budget, spec.exponent)
  const start = `\\left(${formatTex(Math.sqrt(psd), ground.unit)}\\right)^2`
  if (exponent === 0 || spec.reference === null) return { tex: start, value: psd }
  const reference = slotValue(ground.budget, spec.reference)
  return {
    tex: `${start}\\left(\\frac{${frequencyTex(ground.frequency)}}{${frequencyTex(reference)}}\\right)^{${numberTex(exponent)}}`,
    value: psd * (ground.frequency / reference) ** exponent,
  }
}

function given({ budget, parameters }: Ground, ...path: readonly string[]): number | null {
  const slot = slotAt(parameters, ...path)
  return slot === null ? null : slotValue(budget, slot)
}

/** A channel's own value, else the mode's. */
function channelOr(ground: Ground, field: string): number | null {
  const own = ground.channel === null ? null : given(ground, 'losses', ground.channel, field)
  return own ?? given(ground, field)
}

/** Quality factor of the channel: stated for itself, or the total divided by the channel's share. */
function channelQuality(ground: Ground): number | null {
  const channel = ground.channel ?? ''
  const own = given(ground, 'losses', channel, 'quality')
  if (own !== null) return own
  const total = given(ground, 'quality')
  if (total === null) return null
  return total / (given(ground, 'losses', channel, 'share') ?? 1)
}
