import { phaseOnMirror } from '../../physics/reflected-light.js'
import type { declaration } from '../declarations/free-space-interferometer.js'
import type { Kernel } from '../kernel.js'
import { readByLight } from '../read-by-light.js'
import { senseDirectly } from '../sense-directly.js'
import type { ValuesOf } from '../values.js'

/** Two arms with half of the power each read their difference like one mirror in a quarter of it. */
export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'detector',
  assemble(instance, net) {
    if (!net.isReadout(instance.id)) return
    const { power, wavelength, reflections, incidence, arrangement, efficiency } = instance.values
    const s = (arrangement === 'michelson' ? 0.5 : 1) * reflections * Math.cos(incidence)
    senseDirectly(instance, net, readByLight(phaseOnMirror({ power, wavelength }, s), efficiency))
  },
}
