import type { Distribution, Root } from '../model/budget.js'
import type { Quantity } from '../quantity/parse.js'
import type { Amount } from './amount.js'
import type { Issues } from './issues.js'
import { quoted } from './quoted.js'

export const distributions: readonly Distribution[] = ['normal', 'rectangular', 'triangular', 'lognormal']
export const effects: readonly Root['effect'][] = ['statistical', 'systematic']

/** How the uncertainty of a root is to be understood. */
export interface Dispersion {
  readonly distribution: Distribution
  readonly effect: Root['effect']
  /** Times what stands in the file: the standard uncertainty. */
  readonly factor: number
}

const plain: Dispersion = { distribution: 'normal', effect: 'statistical', factor: 1 }

/** Standard uncertainty over half width [JCGM 100:2008, 4.3.7 and 4.3.9]. */
const perHalfWidth: Readonly<Record<Distribution, number>> = {
  normal: 1,
  rectangular: 1 / Math.sqrt(3),
  triangular: 1 / Math.sqrt(6),
  lognormal: 1,
}

/**
 * What `distribution` and `effect` say of an uncertainty. Behind ± stands the half width of a rectangular or triangular
 * distribution; in brackets always stands the standard uncertainty.
 */
export function dispersionOf(amount: Amount, quantity: Quantity, issues: Issues): Dispersion {
  const distribution = distributions.find(word => word === amount.distribution?.text)
  const effect = effects.find(word => word === amount.effect?.text)
  if (distribution === undefined && effect === undefined) return plain
  if (quantity.uncertainty === 0) {
    const key = amount.distribution === null ? 'effect' : 'distribution'
    const message = `\`${key}\` speaks of an uncertainty, but ${quoted(quantity.text)} states none; write it like \`3.1(2) ng\` or \`(3.1 ± 0.2) ng\``
    issues.error('no-uncertainty', (amount.distribution ?? amount.effect ?? amount.scalar).place, message)
  }
  if (distribution === 'lognormal' && !(quantity.value > 0))
    issues.error(
      'distribution',
      (amount.distribution ?? amount.scalar).place,
      `a lognormal value is greater than 0; ${quoted(quantity.text)} is not`,
    )
  const halfWidth = /±|\+\/?-/.test(quantity.text)
  return {
    distribution: distribution ?? plain.distribution,
    effect: effect ?? plain.effect,
    factor: halfWidth ? perHalfWidth[distribution ?? 'normal'] : 1,
  }
}
