import { complex } from '../../physics/complex.js'
import type { declaration } from '../declarations/force-noise.js'
import { into, type Kernel } from '../kernel.js'
import { statedNoise } from '../stated-noise.js'
import type { ValuesOf } from '../values.js'

export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'noise',
  assemble(instance, net) {
    const { into: target, density } = instance.values
    const node = into(net.modeOf(target).unknown, complex(1))
    net.source(statedNoise(instance, { family: 'stray', ownUnit: 'N²/Hz', node }, density))
  },
}
