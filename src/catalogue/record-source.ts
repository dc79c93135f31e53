import type { Complex, Covariance, Source } from '../model/network.js'
import type { Family } from '../model/evaluation.js'
import type { Instance } from './kernel.js'

/** A source of the readout that enters the record itself, with weights on its two sidebands: losses, amplifiers, detectors. */
export function recordSource(
  instance: Instance<unknown>,
  channel: string,
  weights: readonly [Complex, Complex],
  noise: {
    readonly family: Family
    readonly quanta: number
    readonly vacuum: Covariance
    readonly heating: Covariance | null
  },
): Source {
  return {
    id: `${instance.id}.${channel}`,
    title: `${instance.title} ${channel}`,
    family: noise.family,
    readout: true,
    owner: instance.id,
    channel,
    ownUnit: 'quanta',
    ownFactor: noise.quanta,
    nodes: weights.map(direct => ({ rows: [], direct })),
    vacuum: noise.vacuum,
    heating: noise.heating,
    shape: { form: 'constant', value: 1 },
    parted: true,
  }
}
