import { scale } from '../../physics/complex.js'
import { thermalBlock } from '../../physics/covariance.js'
import { occupancy } from '../../physics/quanta.js'
import type { declaration } from '../declarations/loss.js'
import type { Kernel } from '../kernel.js'
import { recordSource } from '../record-source.js'
import type { ValuesOf } from '../values.js'

type Values = ValuesOf<typeof declaration.fields>

/** Quanta of the bath: stated, or of its temperature at the carrier's frequency in Hz. */
function bathQuanta({ occupancy: stated = 0, temperature }: Values, frequency: number): number {
  return temperature === undefined ? stated : occupancy(2 * Math.PI * frequency, temperature)
}

export const kernel: Kernel<Values> = {
  stage: 'chain',
  assemble(instance, net) {
    const { reads, transmission } = instance.values
    net.output(instance.id, {
      senses: () => net.outputOf(reads).senses(),
      carrier: () => net.outputOf(reads).carrier(),
      frequency: () => net.outputOf(reads).frequency(),
      amplified: () => net.outputOf(reads).amplified(),
      read(u, v) {
        if (transmission < 1) {
          const quanta = bathQuanta(instance.values, net.outputOf(reads).frequency())
          const rest = Math.sqrt(1 - transmission)
          net.source(
            recordSource(instance, 'loss', [scale(u, rest), scale(v, rest)], {
              family: 'detection',
              quanta: quanta + 0.5,
              vacuum: thermalBlock(0.5),
              heating: quanta > 0 ? thermalBlock(quanta) : null,
            }),
          )
        }
        const kept = Math.sqrt(transmission)
        net.outputOf(reads).read(scale(u, kept), scale(v, kept))
      },
    })
  },
}
