import { complex } from '../../physics/complex.js'
import { reducedPlanckConstant } from '../../physics/constants.js'
import type { declaration } from '../declarations/linear-detector.js'
import type { Kernel } from '../kernel.js'
import { correlated, senseDirectly } from '../sense-directly.js'
import type { ValuesOf } from '../values.js'

/** One noise with two nodes, displacement noise in the record and force on the coordinate, and their Hermitian block. */
export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'detector',
  assemble(instance, net) {
    if (!net.isReadout(instance.id)) return
    const { imprecision, back_action: backAction, correlation = { real: 0, imaginary: 0 } } = instance.values
    senseDirectly(instance, net, [
      {
        channel: 'noise',
        family: 'detection',
        nodes: [
          { displacement: complex(1), shape: imprecision },
          { force: complex(1), shape: backAction },
        ],
        block: correlated(correlation),
        own: { factor: 1 / (2 * reducedPlanckConstant), shapes: [imprecision, backAction] },
        claim: {
          factor: Math.sqrt(1 - correlation.real ** 2) - Math.abs(correlation.imaginary),
          product:
            correlation.real === 0 && correlation.imaginary === 0
              ? '√(S_xx S_FF)'
              : '√(S_xx S_FF − (Re S_xF)²) − |Im S_xF|',
          unit: 'ħ',
          remedy: 'raise `imprecision` or `back_action`',
          place: instance.place('imprecision'),
        },
      },
    ])
  },
}
