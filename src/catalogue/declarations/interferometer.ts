import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'interferometer',
  role: 'component',
  title: 'Interferometer with cavities in its arms',
  summary:
    'A Michelson interferometer with a cavity in each arm, four mirrors that are free in the band, read at its dark port. The difference of its arms is one cavity with one mechanical coordinate, which it brings along; a recycled signal changes bandwidth and detuning. Measure a strain at it, push it with forces, shake it with displacements.',
  nature: 'field',
  moves: true,
  family: 'imprecision',
  fields: {
    arm_length: {
      type: 'quantity',
      dimension: 'length',
      symbol: 'L',
      range: 'positive',
      required: true,
      meaning: 'length of an arm',
    },
    mirror_mass: {
      type: 'quantity',
      dimension: 'mass',
      symbol: 'm',
      range: 'positive',
      required: true,
      meaning: 'mass of each of the four mirrors',
    },
    arm_power: {
      type: 'quantity',
      dimension: 'power',
      symbol: 'P',
      range: 'positive',
      required: true,
      meaning: 'power that circulates in each arm',
    },
    wavelength: {
      type: 'quantity',
      dimension: 'length',
      symbol: '\\lambda',
      range: 'positive',
      required: true,
      meaning: 'wavelength of the light',
    },
    bandwidth: {
      type: 'quantity',
      dimension: 'rate',
      symbol: '\\gamma',
      range: 'positive',
      required: true,
      meaning: 'half width of the resonance of the signal, recycling and all ports included',
    },
    detuning: {
      type: 'quantity',
      dimension: 'rate',
      symbol: '\\Delta',
      range: 'any',
      default: '0 Hz',
      meaning: 'light minus resonance of the signal',
    },
    ports: {
      type: 'map',
      required: true,
      meaning: 'where the signal goes, by name: the dark port and losses, whose shares add up to 1',
      fields: {
        share: {
          type: 'quantity',
          dimension: 'number',
          symbol: 's_j',
          range: 'positive-fraction',
          default: '1',
          meaning: 'part of the signal that leaves through this port',
        },
        squeezing: {
          type: 'group',
          meaning: 'squeezed vacuum sent into this port',
          fields: {
            level: {
              type: 'quantity',
              dimension: 'decibel',
              range: 'non-negative',
              required: true,
              meaning: 'noise power below vacuum in the squeezed quadrature',
            },
            angle: {
              type: 'quantity',
              dimension: 'angle',
              range: 'any',
              default: '90°',
              meaning: 'squeezed quadrature, from the light that circulates in the arms',
            },
          },
        },
      },
    },
  },
  noises: [{ channel: 'ports', each: 'ports', parts: true }],
  equations: [
    {
      name: 'as a cavity',
      tex: 'm_{\\mathrm{eff}} = \\frac m4,\\quad G = \\frac{\\omega_0}{2L},\\quad \\kappa = 2\\gamma,\\quad \\bar n = \\frac{4PL}{\\hbar\\omega_0 c},\\quad \\kappa_j = s_j\\kappa',
    },
    { name: 'signal', tex: 'F = \\frac m4\\,L\\,\\omega^2 h' },
    {
      name: 'tuned and lossless',
      tex: 'S_h = \\frac{4\\hbar}{m\\omega^2L^2}\\left(K+\\frac1K\\right),\\quad K = \\frac{16\\,\\omega_0 P\\gamma}{mLc\\,\\omega^2(\\gamma^2+\\omega^2)}',
    },
  ],
  symbols: {
    'm_{\\mathrm{eff}}': 'mass of the coordinate that the light senses',
    G: 'frequency shift per displacement of that coordinate',
    '\\bar n': 'quanta in the cavity that stands for the arms',
    '\\kappa': 'energy decay rate of the signal',
    '\\omega_0': 'angular frequency of the light, $2\\pi c/\\lambda$',
    c: 'speed of light',
    h: 'strain, where it is measured',
    K: 'strength of the measurement',
  },
  references: ['kimble-2001'],
  validity:
    'Frequencies well below c/4L and above the suspensions; mirrors of equal mass; angles of squeezing and of the detector count from the light that circulates in the arms.',
} as const satisfies Declaration
