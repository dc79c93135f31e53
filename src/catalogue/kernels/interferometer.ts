import { reducedPlanckConstant as hbar, speedOfLight as c } from '../../physics/constants.js'
import type { declaration as cavity } from '../declarations/cavity.js'
import type { declaration } from '../declarations/interferometer.js'
import type { Instance, Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'
import { kernel as cavityKernel } from './cavity.js'

type Values = ValuesOf<typeof declaration.fields>
type CavityValues = ValuesOf<typeof cavity.fields>

/** The cavity that the difference of the arms is [Kimble et al. 2001]. */
function asCavity({ id, values }: Instance<Values>): CavityValues {
  const { arm_length: L, arm_power: P, wavelength, bandwidth, detuning, ports } = values
  const omega = (2 * Math.PI * c) / wavelength
  // A cavity counts the angle of squeezing from the carrier that enters, whose phase before the arms' own light is arg(γ − iΔ).
  const entering = Math.atan2(-detuning, bandwidth)
  const quanta = (4 * P * L) / (hbar * omega * c)
  const pump = { port: [...ports.keys()][0], power: undefined, quanta, detuning, noise: undefined }
  return {
    frequency: (omega - detuning) / (2 * Math.PI),
    modes: new Map([[id, 1]]),
    coupling: omega / (2 * L),
    g0: undefined,
    ports: new Map(
      [...ports].map(([name, { share, squeezing }]) => [
        name,
        {
          rate: 2 * bandwidth * share,
          temperature: undefined,
          occupancy: undefined,
          squeezing: squeezing && {
            antisqueezing: undefined,
            injection_loss: undefined,
            ...squeezing,
            angle: squeezing.angle - entering,
          },
        },
      ]),
    ),
    pump,
  }
}

export const kernel: Kernel<Values> = {
  stage: 'field',
  move({ id, values: { mirror_mass: mass, arm_length: length } }, net) {
    const unknown = net.displacement(id)
    const reduced = mass / 4
    net.stamp(unknown, unknown, { form: 'oscillator', mass: reduced, frequency: 0, gamma: 0, phi: 0 })
    net.mode({
      id,
      unknown,
      mass: reduced,
      frequency: 0,
      gamma: 0,
      phi: 0,
      thermalOccupancy: 0,
      zeroPoint: null,
      // The frame's acceleration moves all mirrors alike.
      movedMass: 0,
      strainMoment: reduced * length,
    })
  },
  assemble(instance, net) {
    cavityKernel.assemble({ ...instance, values: asCavity(instance) }, net)
    // What leaves through the dark port is the light of the arms, not a reflection: its phase is theirs.
    for (const name of instance.values.ports.keys()) {
      const id = `${instance.id}.${name}`
      net.output(id, { ...net.outputOf(id), carrier: () => 0 })
    }
  },
}
