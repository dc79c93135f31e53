import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'displacement',
  role: 'component',
  title: 'Plain displacement readout',
  summary:
    'A readout known only by its noise: it reports the motion plus a stated displacement noise and pushes back with nothing. A budget that uses it is told that back-action is missing.',
  nature: 'detector',
  family: 'detection',
  fields: {
    modes: {
      type: 'weights',
      required: true,
      meaning: 'weight of each mechanical mode in the coordinate that is read',
    },
    noise: { type: 'density', of: 'length', required: true, meaning: 'displacement noise of the readout' },
  },
  noises: [{ channel: 'noise', parts: false }],
  equations: [{ name: 'record', tex: 'y = \\sum_k c_k x_k + x_n' }],
  symbols: { c_k: 'weight of mode $k$', x_n: 'noise of the readout, as a displacement' },
  references: ['clerk-2010'],
  validity: 'Back-action is negligible or accounted for by a line of its own.',
} as const satisfies Declaration
