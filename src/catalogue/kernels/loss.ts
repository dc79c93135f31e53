import { scale } from '../../physics/complex.js'
import { thermalBlock } from '../../physics/covariance.js'
import type { declaration } from '../declarations/loss.js'
import type { Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'
import { recordSource } from '../record-source.js'

export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'chain',
  assemble(instance, net) {
    const { reads, transmission, occupancy = 0 } = instance.values
    net.output(instance.id, {
      senses: () => net.outputOf(reads).senses(),
      carrier: () => net.outputOf(reads).carrier(),
      amplified: () => net.outputOf(reads).amplified(),
      read(u, v) {
        if (transmission < 1) {
          const rest = Math.sqrt(1 - transmission)
          net.source(
            recordSource(instance, 'loss', [scale(u, rest), scale(v, rest)], {
              family: 'detection',
              quanta: occupancy + 0.5,
              vacuum: thermalBlock(0.5),
              heating: occupancy > 0 ? thermalBlock(occupancy) : null,
            }),
          )
        }
        const kept = Math.sqrt(transmission)
        net.outputOf(reads).read(scale(u, kept), scale(v, kept))
      },
    })
  },
}
