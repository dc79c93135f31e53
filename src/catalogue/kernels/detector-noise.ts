import { thermalBlock } from '../../physics/covariance.js'
import type { declaration } from '../declarations/detector-noise.js'
import type { Kernel } from '../kernel.js'
import { recordSource } from '../record-source.js'
import type { ValuesOf } from '../values.js'

export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'noise',
  assemble(instance, net) {
    const { density } = instance.values
    if (net.detector === null) return
    const { u, v } = net.detector
    const source = recordSource(instance, 'noise', [u, v], {
      family: 'detection',
      quanta: 1,
      vacuum: thermalBlock(1),
      heating: null,
    })
    net.source({ ...source, id: instance.id, title: instance.title, channel: null, shape: density })
  },
}
