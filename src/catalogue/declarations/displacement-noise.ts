import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'displacement-noise',
  role: 'contribution',
  title: 'Displacement noise',
  summary:
    'A motion that is added to the coordinate a cavity or a plain readout senses, before the light reacts to it: mirror coatings, a shaking mount, a drifting gap.',
  nature: 'noise',
  family: 'environment',
  fields: {
    into: {
      type: 'name',
      of: 'sensing',
      required: true,
      meaning: 'cavity or plain readout whose coordinate it moves',
    },
    density: { type: 'density', of: 'length', required: true, meaning: 'one-sided density of the displacement' },
  },
  equations: [{ name: 'density', tex: 'S_x(f) = S_0\\,(f/f_0)^{p}' }],
  symbols: { S_0: 'power density at $f_0$', p: 'exponent of the power density', f_0: 'reference frequency' },
  references: [],
  validity: 'Stationary noise, independent of every other source.',
} as const satisfies Declaration
