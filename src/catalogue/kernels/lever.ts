import { complex } from '../../physics/complex.js'
import { deflectionOnMirror, phaseOnMirror, splitDetection } from '../../physics/reflected-light.js'
import type { declaration } from '../declarations/lever.js'
import type { Kernel } from '../kernel.js'
import { readByLight } from '../read-by-light.js'
import { senseDirectly, type DirectNoise } from '../sense-directly.js'
import type { ValuesOf } from '../values.js'

/** The power's own noise pushes the surface as it does in any reflection; the deflection holds nothing of it. */
export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'detector',
  assemble(instance, net) {
    if (!net.isReadout(instance.id)) return
    const { power, wavelength, spot, arm, lift, detection, efficiency } = instance.values
    const beam = { power, wavelength }
    const seen = efficiency * (detection === 'split' ? splitDetection : 1)
    const pressure: DirectNoise = {
      channel: 'pressure',
      family: 'back-action',
      nodes: [{ force: complex(phaseOnMirror(beam, 1).force * lift) }],
      block: [[complex(1)]],
      own: { factor: 0.5 },
    }
    const noises = readByLight(deflectionOnMirror(beam, { spot, lever: arm }), seen)
    senseDirectly(instance, net, lift === 0 ? noises : [...noises, pressure])
  },
}
