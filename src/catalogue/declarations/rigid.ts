import type { Declaration } from '../declaration.js'
import { modeEquations, modeFields, modeSymbols } from './resonator.js'

export const declaration = {
  kind: 'rigid',
  role: 'component',
  title: 'Rigid body on a spring',
  summary:
    'A proof mass or suspended mirror that moves as a whole: like a mechanical mode, but the whole mass follows the acceleration of the frame.',
  nature: 'mechanical',
  family: 'thermal',
  fields: modeFields,
  noises: [{ channel: 'bath', each: 'losses', parts: false }],
  equations: modeEquations,
  symbols: modeSymbols,
  references: ['callen-welton-1951', 'saulson-1990'],
  validity: 'The body is stiff at every frequency of the band.',
} as const satisfies Declaration
