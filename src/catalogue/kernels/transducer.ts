import type { Filter } from '../../model/network.js'
import { complex } from '../../physics/complex.js'
import { reducedPlanckConstant } from '../../physics/constants.js'
import type { declaration } from '../declarations/transducer.js'
import type { Kernel } from '../kernel.js'
import { correlated, senseDirectly, type DirectNode } from '../sense-directly.js'
import type { ValuesOf } from '../values.js'

type Values = ValuesOf<typeof declaration.fields>

/** 1/(−iω): the charge that a current has brought, the displacement of a velocity. */
const integral: Filter = { order: -1, constant: complex(1) }

const overOmegaSquared = { form: 'power', value: 1 / (4 * Math.PI ** 2), exponent: -2, reference: 1 } as const

function nodesOf(values: Values): DirectNode[] {
  const { per_displacement: alpha, per_velocity: beta, voltage_noise: voltage, current_noise: current } = values
  if (alpha !== undefined)
    return [
      { displacement: complex(1 / alpha), shape: voltage },
      { force: complex(alpha), shape: current, filter: integral },
    ]
  return [
    { displacement: complex(1 / beta!), shape: voltage, filter: integral },
    { force: complex(beta!), shape: current },
  ]
}

/** Whichever way it transduces, S_xF is ∓i⟨ei*⟩/ω: real and imaginary part of the coefficient change places in the quantum bound. */
export const kernel: Kernel<Values> = {
  stage: 'detector',
  assemble(instance, net) {
    if (!net.isReadout(instance.id)) return
    const { voltage_noise: voltage, current_noise: current, correlation = { real: 0, imaginary: 0 } } = instance.values
    senseDirectly(instance, net, [
      {
        channel: 'noise',
        family: 'amplifier',
        nodes: nodesOf(instance.values),
        block: correlated(correlation),
        own: { factor: 1 / (2 * reducedPlanckConstant), shapes: [voltage, current, overOmegaSquared] },
        claim: {
          factor: Math.sqrt(1 - correlation.imaginary ** 2) - Math.abs(correlation.real),
          product:
            correlation.real === 0 && correlation.imaginary === 0 ? 'e_n i_n' : '√(e_n² i_n² − (Im S_VI)²) − |Re S_VI|',
          unit: 'ħω',
          remedy: 'raise `voltage_noise` or `current_noise`',
          place: instance.place('voltage_noise'),
        },
      },
    ])
  },
}
