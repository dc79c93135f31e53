import type { Complex, Covariance, Filter, QuantumClaim, Shape } from '../model/network.js'
import type { Family } from '../model/evaluation.js'
import { complex, scale } from '../physics/complex.js'
import type { Assembly, Instance } from './kernel.js'

/** One node of a readout's noise: what a unit of it adds to the record in m, and with how many N it pushes the coordinate. */
export interface DirectNode {
  readonly displacement?: Complex
  readonly force?: Complex
  readonly filter?: Filter
  readonly shape?: Shape
}

/** A noise of the readout; `own` in quanta, half of one for the vacuum and for the best readout there is. */
export interface DirectNoise {
  readonly channel: string
  readonly family: Family
  readonly nodes: readonly DirectNode[]
  readonly block: Covariance
  readonly own: { readonly factor: number; readonly shapes?: readonly Shape[] }
  readonly claim?: QuantumClaim
}

const none = complex(0)

/** A readout without fields of its own: y = Σ c_k x_k + its noise, which also pushes the coordinate that it senses. */
export function senseDirectly(
  instance: Instance<{ readonly modes: ReadonlyMap<string, number> }>,
  net: Assembly,
  noises: readonly DirectNoise[],
): void {
  const { id } = instance
  const weights = [...instance.values.modes].map(([mode, weight]) => ({ mode: net.modeOf(mode), weight }))
  for (const { mode, weight } of weights) net.record(mode.unknown, complex(weight))
  net.sensing({
    id,
    weights,
    injection: { rows: [], direct: complex(1) },
    light: null,
    push: noises.map(({ channel, nodes }) => ({
      source: `${id}.${channel}`,
      force: nodes.map(({ force = none, displacement: _, ...rest }) => ({ direct: force, ...rest })),
    })),
  })
  net.reads(id)
  for (const { channel, family, nodes, block, own, claim } of noises) {
    net.source({
      id: `${id}.${channel}`,
      title: `${instance.title} ${channel}`,
      family,
      readout: true,
      owner: id,
      channel,
      ownUnit: 'quanta',
      ownFactor: own.factor,
      ...(own.shapes !== undefined && { ownShapes: own.shapes }),
      ...(claim !== undefined && { claim }),
      nodes: nodes.map(({ displacement = none, force, ...rest }) => ({
        rows: force === undefined ? [] : weights.map(w => ({ row: w.mode.unknown, value: scale(force, w.weight) })),
        direct: displacement,
        ...rest,
      })),
      vacuum: block,
      heating: null,
      shape: { form: 'constant', value: 1 },
      parted: true,
    })
  }
}

/** Block of two noises with the correlation coefficient ρ = ⟨ab*⟩/√(S_a S_b), their densities standing at their nodes. */
export function correlated({ real, imaginary }: { readonly real: number; readonly imaginary: number }): Covariance {
  return [
    [complex(1), complex(real, imaginary)],
    [complex(real, 0 - imaginary), complex(1)],
  ]
}
