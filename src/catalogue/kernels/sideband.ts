import { complex } from '../../physics/complex.js'
import { thermalBlock } from '../../physics/covariance.js'
import type { declaration } from '../declarations/sideband.js'
import { detect } from '../detect.js'
import type { Kernel } from '../kernel.js'
import { recordSource } from '../record-source.js'
import type { ValuesOf } from '../values.js'

/**
 * (u, v) = (1, 0) above the pump, (0, 1) below it. A field alone is no observable: what makes it a record mixes in half a quantum, an
 * amplifier its idler, a heterodyne detector the vacuum of its image band. Behind a large gain the latter vanishes.
 */
export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'detector',
  assemble(instance, net) {
    if (!net.isReadout(instance.id)) return
    const { reads, side, efficiency } = instance.values
    const upper = side === 'upper'
    const [u, v] = [complex(upper ? 1 : 0), complex(upper ? 0 : 1)]
    if (!net.outputOf(reads).amplified()) {
      const image = { family: 'detection', quanta: 0.5, vacuum: thermalBlock(0.5), heating: null } as const
      net.source(recordSource(instance, 'image', [v, u], image))
    }
    detect(instance, net, { u, v, reads, efficiency })
  },
}
