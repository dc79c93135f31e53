import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'free-mass',
  role: 'component',
  title: 'Free mass',
  summary: 'A mass without restoring force or loss: what a suspended mirror is far above its pendulum frequency.',
  nature: 'mechanical',
  family: 'thermal',
  fields: {
    mass: {
      type: 'quantity',
      dimension: 'mass',
      symbol: 'm',
      range: 'positive',
      required: true,
      meaning: 'mass of the body',
    },
  },
  equations: [{ name: 'response', tex: '\\chi^{-1}(\\omega) = -m\\omega^2' }],
  symbols: { '\\chi': 'displacement for a unit force, light off' },
  references: ['kimble-2001'],
  validity:
    'Frequencies far above every suspension resonance; it has no zero-point motion, so a cavity states its coupling per metre.',
} as const satisfies Declaration
