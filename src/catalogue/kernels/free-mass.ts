import type { declaration } from '../declarations/free-mass.js'
import type { Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'

export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'mechanical',
  assemble(instance, net) {
    const { mass } = instance.values
    const unknown = net.displacement(instance.id)
    net.stamp(unknown, unknown, { form: 'oscillator', mass, frequency: 0, gamma: 0, phi: 0 })
    net.mode({
      id: instance.id,
      unknown,
      mass,
      frequency: 0,
      gamma: 0,
      phi: 0,
      movedMass: mass,
      thermalOccupancy: 0,
      zeroPoint: null,
    })
  },
}
