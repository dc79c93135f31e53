import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'force-noise',
  role: 'contribution',
  title: 'Force noise',
  summary: 'A force that shakes one mode, with a stated density: white, a power law, or a table.',
  nature: 'noise',
  family: 'stray',
  fields: {
    into: { type: 'name', of: 'mode', required: true, meaning: 'mechanical mode that it pushes' },
    density: { type: 'density', of: 'force', required: true, meaning: 'one-sided density of the force' },
  },
  equations: [{ name: 'density', tex: 'S_F(f) = S_0\\,(f/f_0)^{p}' }],
  symbols: { S_0: 'power density at $f_0$', p: 'exponent of the power density', f_0: 'reference frequency' },
  references: [],
  validity: 'Stationary noise, independent of every other source.',
} as const satisfies Declaration
