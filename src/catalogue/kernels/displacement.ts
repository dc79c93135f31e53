import { complex } from '../../physics/complex.js'
import type { declaration } from '../declarations/displacement.js'
import type { Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'

export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'detector',
  assemble(instance, net) {
    if (!net.isReadout(instance.id)) return
    const { modes, noise } = instance.values
    const weights = [...modes].map(([id, weight]) => ({ mode: net.modeOf(id), weight }))
    for (const { mode, weight } of weights) net.record(mode.unknown, complex(weight))
    const injection = { rows: [], direct: complex(1) }
    net.sensing({ id: instance.id, weights, injection, light: null })
    net.reads(instance.id)
    net.source({
      id: `${instance.id}.noise`,
      title: `${instance.title} noise`,
      family: 'detection',
      readout: true,
      owner: instance.id,
      channel: 'noise',
      ownUnit: 'm²/Hz',
      ownFactor: 1,
      nodes: [injection],
      vacuum: [[complex(1)]],
      heating: null,
      shape: noise,
      parted: true,
    })
  },
}
