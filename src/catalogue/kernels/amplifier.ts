import { Refusal } from '../../model/problem.js'
import { addedQuantaOfNoiseTemperature } from '../../physics/chain.js'
import { leastAddedQuanta, noiseTemperatureOfFigure } from '../../physics/electronics.js'
import { scale } from '../../physics/complex.js'
import { thermalBlock } from '../../physics/covariance.js'
import type { declaration } from '../declarations/amplifier.js'
import type { Instance, Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'
import { recordSource } from '../record-source.js'

type Values = ValuesOf<typeof declaration.fields>

/** Added quanta at the carrier's frequency in Hz; a temperature below the quantum limit there is refused. */
function addedQuanta(instance: Instance<Values>, frequency: number): number {
  const { added, noise_temperature: stated, noise_figure: figure = 0, convention, gain = Infinity } = instance.values
  if (added !== undefined) return added
  const temperature = stated ?? noiseTemperatureOfFigure(figure)
  const quanta = addedQuantaOfNoiseTemperature(2 * Math.PI * frequency, temperature, convention ?? 'callen-welton')
  const least = leastAddedQuanta(gain)
  if (quanta >= least * (1 - 1e-12)) return quanta
  const field = stated === undefined ? 'noise_figure' : 'noise_temperature'
  const rounded = (value: number): string => String(Number(value.toPrecision(4)))
  throw new Refusal([
    {
      severity: 'error',
      code: 'amplifier-limit',
      place: instance.place(field),
      message: `a phase-preserving amplifier of ${gain === Infinity ? 'large gain' : `power gain ${rounded(gain)}`} adds at least ${rounded(least)} quanta at its input; \`${field}\` comes to ${rounded(quanta)} at the carrier’s ${rounded(frequency)} Hz: raise it, or state another \`convention\``,
    },
  ])
}

/**
 * A gain that the file leaves out is so large that nothing behind matters; the record is then written at the
 * amplifier's input, gain 1, and the reader of budgets has made sure that nothing noisy follows.
 */
export const kernel: Kernel<Values> = {
  stage: 'chain',
  assemble(instance, net) {
    const { reads, gain = 1 } = instance.values
    net.output(instance.id, {
      senses: () => net.outputOf(reads).senses(),
      carrier: () => net.outputOf(reads).carrier(),
      frequency: () => net.outputOf(reads).frequency(),
      amplified: () => instance.values.gain === undefined || net.outputOf(reads).amplified(),
      read(u, v) {
        const added = addedQuanta(instance, net.outputOf(reads).frequency())
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
