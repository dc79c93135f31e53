// Generated from the folder beside it by .ci/generate-catalogue.mjs; do not edit.
import type { Kernel } from './kernel.js'
import { kernel as amplifier } from './kernels/amplifier.js'
import { kernel as cavity } from './kernels/cavity.js'
import { kernel as detectorNoise } from './kernels/detector-noise.js'
import { kernel as displacement } from './kernels/displacement.js'
import { kernel as displacementNoise } from './kernels/displacement-noise.js'
import { kernel as forceNoise } from './kernels/force-noise.js'
import { kernel as freeMass } from './kernels/free-mass.js'
import { kernel as freeSpaceInterferometer } from './kernels/free-space-interferometer.js'
import { kernel as homodyne } from './kernels/homodyne.js'
import { kernel as interferometer } from './kernels/interferometer.js'
import { kernel as lever } from './kernels/lever.js'
import { kernel as linearDetector } from './kernels/linear-detector.js'
import { kernel as loss } from './kernels/loss.js'
import { kernel as resonator } from './kernels/resonator.js'
import { kernel as rigid } from './kernels/rigid.js'
import { kernel as sideband } from './kernels/sideband.js'
import { kernel as transducer } from './kernels/transducer.js'

/** The numerical face of every kind. */
export const kernels = {
  amplifier,
  cavity,
  'detector-noise': detectorNoise,
  displacement,
  'displacement-noise': displacementNoise,
  'force-noise': forceNoise,
  'free-mass': freeMass,
  'free-space-interferometer': freeSpaceInterferometer,
  homodyne,
  interferometer,
  lever,
  'linear-detector': linearDetector,
  loss,
  resonator,
  rigid,
  sideband,
  transducer,
} as const satisfies { readonly [kind: string]: Kernel }
