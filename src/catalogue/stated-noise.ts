import type { Family } from '../model/evaluation.js'
import type { Injection, Shape, Source } from '../model/network.js'
import { complex } from '../physics/complex.js'
import type { Instance } from './kernel.js'

/** A contribution that is a source of its own: a density as the file states it, entering at one node outside of the readout. */
export function statedNoise(
  { id, title }: Instance<unknown>,
  entering: { readonly family: Family; readonly ownUnit: Source['ownUnit']; readonly node: Injection },
  shape: Shape,
): Source {
  return {
    id,
    title,
    family: entering.family,
    readout: false,
    owner: id,
    channel: null,
    ownUnit: entering.ownUnit,
    ownFactor: 1,
    nodes: [entering.node],
    vacuum: [[complex(1)]],
    heating: null,
    shape,
    parted: false,
  }
}
