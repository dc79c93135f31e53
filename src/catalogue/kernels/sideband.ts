import { complex } from '../../physics/complex.js'
import type { declaration } from '../declarations/sideband.js'
import { detect } from '../detect.js'
import type { Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'

/** (u, v) = (1, 0) above the pump, (0, 1) below it. */
export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'detector',
  assemble(instance, net) {
    if (!net.isReadout(instance.id)) return
    const { reads, side, efficiency } = instance.values
    const upper = side === 'upper'
    detect(instance, net, { u: complex(upper ? 1 : 0), v: complex(upper ? 0 : 1), reads, efficiency })
  },
}
