import type { Declaration, Fields } from '../declaration.js'

/** The fields that every mechanical mode with a restoring force shares. */
export const modeFields = {
  mass: {
    type: 'quantity',
    dimension: 'mass',
    symbol: 'm',
    range: 'positive',
    required: true,
    meaning: 'effective mass for unit amplitude at the reference point',
  },
  frequency: {
    type: 'quantity',
    dimension: 'frequency',
    symbol: '\\Omega/2\\pi',
    range: 'positive',
    required: true,
    meaning: 'frequency of the bare mode',
  },
  quality: {
    type: 'quantity',
    dimension: 'number',
    symbol: 'Q',
    range: 'positive',
    meaning: 'quality factor; with losses beside it, the total that they divide',
  },
  law: {
    type: 'choice',
    options: ['viscous', 'structural'],
    default: 'viscous',
    meaning: 'how the loss angle depends on frequency: viscous in proportion to it, structural constant',
  },
  losses: {
    type: 'map',
    meaning: 'loss channels by name, each with its own law and temperature',
    fields: {
      quality: {
        type: 'quantity',
        dimension: 'number',
        symbol: 'Q_j',
        range: 'positive',
        meaning: 'quality factor that this channel alone would leave',
      },
      share: {
        type: 'quantity',
        dimension: 'number',
        range: 'positive-fraction',
        meaning: 'part of the total damping',
      },
      law: { type: 'choice', options: ['viscous', 'structural'], default: 'viscous', meaning: 'law of its loss angle' },
      temperature: {
        type: 'quantity',
        dimension: 'temperature',
        range: 'non-negative',
        meaning: 'temperature of its bath, the mode’s when left out',
      },
    },
    exclusive: [{ keys: ['quality', 'share'], need: 'at most one' }],
  },
  temperature: {
    type: 'quantity',
    dimension: 'temperature',
    symbol: 'T',
    range: 'non-negative',
    meaning: 'temperature of the bath',
  },
} as const satisfies Fields

export const modeEquations = [
  { name: 'response', tex: '\\chi^{-1}(\\omega) = m\\left[\\Omega^2-\\omega^2-i\\Omega^2\\phi(\\omega)\\right]' },
  { name: 'viscous bath', tex: 'S_F(f) = 4\\hbar\\omega\\left(n(\\omega,T)+\\tfrac12\\right) m\\,\\Omega/Q' },
  { name: 'structural bath', tex: 'S_F(f) = 4\\hbar\\left(n(\\omega,T)+\\tfrac12\\right) m\\,\\Omega^2/Q' },
] as const

export const modeSymbols = {
  '\\chi': 'displacement for a unit force, light off',
  '\\phi': 'loss angle: viscous $\\omega/\\Omega Q$, structural $1/Q$',
  'n(\\omega,T)': 'quanta of the bath, $1/(e^{\\hbar\\omega/k_BT}-1)$',
  S_F: 'one-sided force noise of the bath',
} as const

export const declaration = {
  kind: 'resonator',
  role: 'component',
  title: 'Mechanical mode',
  summary:
    'One mode of a membrane, beam, drum or cantilever, or a pendulum: mass, frequency and the channels through which it loses energy. Each channel is a bath of its own and brings its own force noise.',
  nature: 'mechanical',
  family: 'thermal',
  fields: {
    ...modeFields,
    moved_mass: {
      type: 'quantity',
      dimension: 'mass',
      range: 'any',
      meaning: 'mass that the frame’s acceleration moves with the mode, the integral of density times mode shape',
    },
    strain_length: {
      type: 'quantity',
      dimension: 'length',
      symbol: 'L_{\\mathrm{eff}}',
      range: 'positive',
      meaning: 'effective length over which a strain pulls at the mode, 4/π² of the length of a bar',
    },
  },
  noises: [{ channel: 'bath', each: 'losses', parts: false }],
  equations: [...modeEquations, { name: 'strain', tex: 'F = \\tfrac12\\,m\\,\\omega^2 L_{\\mathrm{eff}}\\,h' }],
  symbols: { ...modeSymbols, h: 'strain, where it is measured' },
  references: ['callen-welton-1951', 'saulson-1990'],
  validity: 'Linear motion of one mode; the losses do not depend on amplitude.',
} as const satisfies Declaration
