import type { declaration } from '../declarations/displacement-noise.js'
import type { Kernel } from '../kernel.js'
import { statedNoise } from '../stated-noise.js'
import type { ValuesOf } from '../values.js'

export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'noise',
  assemble(instance, net) {
    const { into: target, density } = instance.values
    const node = net.sensingOf(target).injection
    net.source(statedNoise(instance, { family: 'environment', ownUnit: 'm²/Hz', node }, density))
  },
}
