import type { declaration } from '../declarations/rigid.js'
import type { Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'
import { assembleMode } from './resonator.js'

export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'mechanical',
  assemble(instance, net) {
    assembleMode(instance, net, { movedMass: instance.values.mass })
  },
}
