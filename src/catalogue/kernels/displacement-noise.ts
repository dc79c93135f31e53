import { complex } from '../../physics/complex.js'
import type { declaration } from '../declarations/displacement-noise.js'
import type { Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'

export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'noise',
  assemble(instance, net) {
    const { into: target, density } = instance.values
    net.source({
      id: instance.id,
      title: instance.title,
      family: 'environment',
      readout: false,
      owner: instance.id,
      channel: null,
      ownUnit: 'm²/Hz',
      ownFactor: 1,
      nodes: [net.sensingOf(target).injection],
      vacuum: [[complex(1)]],
      heating: null,
      shape: density,
      parted: false,
    })
  },
}
