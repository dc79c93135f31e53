import { complex } from '../physics/complex.js'
import type { LightOnMirror } from '../physics/reflected-light.js'
import type { DirectNoise } from './sense-directly.js'

/**
 * Noises of a readout by light without a cavity: the vacuum of the light, whose one quadrature is seen and whose other pushes, and the vacuum of
 * what is lost on the way, √((1−η)/η) of the first as a displacement.
 */
export function readByLight({ imprecision, force }: LightOnMirror, efficiency: number): DirectNoise[] {
  const own = { factor: 0.5 }
  const light: DirectNoise = {
    channel: 'light',
    family: 'imprecision',
    nodes: [{ displacement: complex(imprecision) }, { force: complex(force) }],
    block: [
      [complex(1), complex(0)],
      [complex(0), complex(1)],
    ],
    own,
  }
  if (efficiency === 1) return [light]
  const lost = imprecision * Math.sqrt((1 - efficiency) / efficiency)
  const nodes = [{ displacement: complex(lost) }]
  return [light, { channel: 'loss', family: 'detection', nodes, block: [[complex(1)]], own }]
}
