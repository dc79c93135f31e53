import { Refusal } from '../../model/problem.js'
import { conjugate, polar } from '../../physics/complex.js'
import type { declaration } from '../declarations/homodyne.js'
import { detect } from '../detect.js'
import type { Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'

/** u = e^{−i(θ+ψ)}, v = u*, with ψ the phase of the mean carrier that leaves the port. */
export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'detector',
  assemble(instance, net) {
    if (!net.isReadout(instance.id)) return
    const { reads, angle, efficiency } = instance.values
    const carrier = net.outputOf(reads).carrier()
    if (carrier === null) {
      throw new Refusal([
        {
          severity: 'error',
          code: 'no-carrier',
          place: instance.place('angle'),
          message: `no mean carrier leaves \`${reads}\` at this working point (reflection of a critically coupled port), so that the angle counts from nothing: read another port, or change a rate or the detuning`,
        },
      ])
    }
    const u = polar(1, -(angle + carrier))
    detect(instance, net, { u, v: conjugate(u), reads, efficiency })
  },
}
