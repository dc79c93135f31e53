import { scale } from '../../physics/complex.js'
import { thermalBlock } from '../../physics/covariance.js'
import type { declaration } from '../declarations/amplifier.js'
import type { Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'
import { recordSource } from '../record-source.js'

/**
 * A gain that the file leaves out is so large that nothing behind matters; the record is then written at the
 * amplifier's input, gain 1, and the reader of budgets has made sure that nothing noisy follows.
 */
export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'chain',
  assemble(instance, net) {
    const { reads, added, gain = 1 } = instance.values
    net.output(instance.id, {
      senses: () => net.outputOf(reads).senses(),
      carrier: () => net.outputOf(reads).carrier(),
      amplified: () => instance.values.gain === undefined || net.outputOf(reads).amplified(),
      read(u, v) {
        const amplitude = Math.sqrt(gain)
        const weights = [scale(u, amplitude), scale(v, amplitude)] as const
        net.source(
          recordSource(instance, 'added', weights, {
            family: 'amplifier',
            quanta: added,
            vacuum: thermalBlock(added),
            heating: null,
          }),
        )
        net.outputOf(reads).read(...weights)
      },
    })
  },
}
