import { complex } from '../../physics/complex.js'
import type { declaration } from '../declarations/force-noise.js'
import { into, type Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'

export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'noise',
  assemble(instance, net) {
    const { into: target, density } = instance.values
    net.source({
      id: instance.id,
      title: instance.title,
      family: 'stray',
      readout: false,
      owner: instance.id,
      channel: null,
      ownUnit: 'N²/Hz',
      ownFactor: 1,
      nodes: [into(net.modeOf(target).unknown, complex(1))],
      vacuum: [[complex(1)]],
      heating: null,
      shape: density,
      parted: false,
    })
  },
}
