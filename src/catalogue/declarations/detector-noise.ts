import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'detector-noise',
  role: 'contribution',
  title: 'Detector noise',
  summary: 'Electronic noise behind the light: stated in quanta at the detector’s input, where the vacuum is one half.',
  nature: 'noise',
  family: 'detection',
  fields: {
    into: { type: 'name', of: 'recorder', required: true, meaning: 'detector that it enters' },
    density: { type: 'density', of: 'quanta', required: true, meaning: 'quanta at the detector’s input' },
  },
  equations: [{ name: 'density', tex: 'S_y(f) = 2\\,n_0\\,(f/f_0)^{p}\\left(|u|^2+|v|^2\\right)' }],
  symbols: {
    n_0: 'quanta at $f_0$',
    p: 'exponent of the quanta',
    f_0: 'reference frequency',
    'u, v': 'weights of the two sidebands in the record',
  },
  references: [],
  validity: 'Stationary noise, independent of every other source.',
} as const satisfies Declaration
