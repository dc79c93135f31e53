import type { Complex } from '../model/network.js'
import { scale } from '../physics/complex.js'
import { thermalBlock } from '../physics/covariance.js'
import type { Assembly, Instance } from './kernel.js'
import { recordSource } from './record-source.js'

/** Makes y = √η(u a_in + v a_in†) + √(1−η)(u b + v b†) the record, b the vacuum that a lossy detection lets in. */
export function detect(
  instance: Instance<unknown>,
  net: Assembly,
  { u, v, reads, efficiency }: { u: Complex; v: Complex; reads: string; efficiency: number },
): void {
  net.detector = { u, v }
  net.reads(net.outputOf(reads).senses())
  if (efficiency < 1) {
    const rest = Math.sqrt(1 - efficiency)
    net.source(
      recordSource(instance, 'loss', [scale(u, rest), scale(v, rest)], {
        family: 'detection',
        quanta: 0.5,
        vacuum: thermalBlock(0.5),
        heating: null,
      }),
    )
  }
  const kept = Math.sqrt(efficiency)
  net.outputOf(reads).read(scale(u, kept), scale(v, kept))
}
