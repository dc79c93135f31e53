// Generated from the folder beside it by .ci/generate-catalogue.mjs; do not edit.
import type { Declaration } from './declaration.js'
import { declaration as amplifier } from './declarations/amplifier.js'
import { declaration as cavity } from './declarations/cavity.js'
import { declaration as detectorNoise } from './declarations/detector-noise.js'
import { declaration as displacement } from './declarations/displacement.js'
import { declaration as displacementNoise } from './declarations/displacement-noise.js'
import { declaration as forceNoise } from './declarations/force-noise.js'
import { declaration as freeMass } from './declarations/free-mass.js'
import { declaration as freeSpaceInterferometer } from './declarations/free-space-interferometer.js'
import { declaration as homodyne } from './declarations/homodyne.js'
import { declaration as interferometer } from './declarations/interferometer.js'
import { declaration as lever } from './declarations/lever.js'
import { declaration as linearDetector } from './declarations/linear-detector.js'
import { declaration as loss } from './declarations/loss.js'
import { declaration as resonator } from './declarations/resonator.js'
import { declaration as rigid } from './declarations/rigid.js'
import { declaration as sideband } from './declarations/sideband.js'
import { declaration as transducer } from './declarations/transducer.js'

/** Every kind by the word after `kind:`. */
export const declarations: ReadonlyMap<string, Declaration> = new Map<string, Declaration>(
  [
    amplifier,
    cavity,
    detectorNoise,
    displacement,
    displacementNoise,
    forceNoise,
    freeMass,
    freeSpaceInterferometer,
    homodyne,
    interferometer,
    lever,
    linearDetector,
    loss,
    resonator,
    rigid,
    sideband,
    transducer,
  ].map(declaration => [declaration.kind, declaration]),
)
