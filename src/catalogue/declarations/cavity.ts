import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'cavity',
  role: 'component',
  title: 'Cavity',
  summary:
    'One optical or microwave mode whose frequency follows a mechanical coordinate, pumped through one of its ports. Any detuning, any ratio of linewidth to mechanical frequency; every port brings its vacuum and its quanta, as imprecision, as back-action and as their correlation.',
  nature: 'field',
  family: 'imprecision',
  fields: {
    frequency: {
      type: 'quantity',
      dimension: 'frequency',
      symbol: '\\omega_c/2\\pi',
      range: 'positive',
      required: true,
      meaning: 'frequency of the cavity at the working point',
    },
    modes: {
      type: 'weights',
      required: true,
      meaning: 'weight of each mechanical mode in the coordinate that the cavity senses',
    },
    coupling: {
      type: 'quantity',
      dimension: 'rate-per-length',
      symbol: 'G',
      range: 'any',
      meaning: 'frequency shift per unit displacement of the sensed coordinate',
    },
    g0: {
      type: 'quantity',
      dimension: 'rate',
      symbol: 'g_0',
      range: 'any',
      meaning: 'single-quantum coupling rate, with one mode of weight 1',
    },
    ports: {
      type: 'map',
      required: true,
      meaning: 'everything through which the field decays, by name; a port neither pumped nor read is a loss',
      fields: {
        rate: {
          type: 'quantity',
          dimension: 'rate',
          symbol: '\\kappa_j',
          range: 'positive',
          required: true,
          meaning: 'energy decay rate through this port',
        },
        temperature: {
          type: 'quantity',
          dimension: 'temperature',
          range: 'non-negative',
          meaning: 'temperature of the port’s bath',
        },
        occupancy: {
          type: 'group',
          shorthand: 'base',
          meaning: 'quanta of the port’s bath, constant or following the pump',
          fields: {
            base: {
              type: 'quantity',
              dimension: 'number',
              symbol: 'n_j',
              range: 'non-negative',
              required: true,
              meaning: 'quanta without pump',
            },
            rise: {
              type: 'quantity',
              dimension: 'number',
              range: 'non-negative',
              default: '0',
              meaning: 'quanta that the pump adds when the cavity holds `at` quanta',
            },
            at: {
              type: 'quantity',
              dimension: 'number',
              range: 'positive',
              default: '1',
              meaning: 'intracavity quanta at which `rise` is stated',
            },
            exponent: {
              type: 'quantity',
              dimension: 'number',
              range: 'any',
              default: '1',
              meaning: 'power of the intracavity quanta with which the rise grows',
            },
          },
        },
        squeezing: {
          type: 'group',
          meaning: 'squeezed vacuum sent into the pumped port',
          fields: {
            level: {
              type: 'quantity',
              dimension: 'decibel',
              range: 'non-negative',
              required: true,
              meaning: 'noise power below vacuum in the squeezed quadrature',
            },
            antisqueezing: {
              type: 'quantity',
              dimension: 'decibel',
              range: 'non-negative',
              meaning:
                'noise power above vacuum in the other quadrature; as much as `level` where left out, a pure state',
            },
            injection_loss: {
              type: 'quantity',
              dimension: 'power-ratio',
              symbol: '\\varepsilon',
              range: 'fraction',
              meaning: 'part of the power that vacuum replaces between the squeezer and the port, none where left out',
            },
            angle: {
              type: 'quantity',
              dimension: 'angle',
              range: 'any',
              default: '0°',
              meaning: 'squeezed quadrature, from the carrier that enters the port',
            },
          },
        },
      },
      exclusive: [{ keys: ['temperature', 'occupancy'], need: 'at most one' }],
    },
    pump: {
      type: 'group',
      required: true,
      meaning: 'the carrier that reads the motion',
      fields: {
        port: { type: 'key', of: 'ports', required: true, meaning: 'port through which it enters' },
        power: {
          type: 'quantity',
          dimension: 'power',
          symbol: 'P',
          range: 'positive',
          meaning: 'power that reaches the port',
        },
        quanta: {
          type: 'quantity',
          dimension: 'number',
          symbol: '\\bar n',
          range: 'positive',
          meaning: 'quanta that the pump keeps in the cavity',
        },
        detuning: {
          type: 'quantity',
          dimension: 'rate',
          symbol: '\\Delta',
          range: 'any',
          default: '0 Hz',
          meaning: 'pump minus cavity frequency at the working point, static shift included',
        },
      },
      exclusive: [{ keys: ['power', 'quanta'], need: 'exactly one' }],
    },
  },
  exclusive: [{ keys: ['coupling', 'g0'], need: 'exactly one' }],
  noises: [{ channel: 'ports', each: 'ports', parts: true }],
  equations: [
    {
      name: 'field',
      tex: 'a(\\omega) = \\chi_c(\\omega)\\Big[iG\\bar a\\,x + \\sum_j\\sqrt{\\kappa_j}\\,a_j(\\omega)\\Big],\\quad \\chi_c(\\omega)=\\frac{1}{\\kappa/2-i(\\Delta+\\omega)}',
    },
    { name: 'force of light', tex: 'F = \\hbar G\\bar a\\,(a+a^\\dagger)' },
    {
      name: 'imprecision',
      tex: 'S_F^{\\mathrm{imp}} = \\frac{2\\,t_{\\mathrm{imp}}V_j\\,t_{\\mathrm{imp}}^\\dagger}{|R|^2}',
    },
    {
      name: 'back-action',
      tex: 'S_F^{\\mathrm{ba}} = 2\\,f\\,V_j f^\\dagger,\\quad f=\\hbar G\\sqrt{\\bar n\\kappa_j}\\,\\big(\\chi_c(\\omega),\\,\\chi_c^*(-\\omega)\\big)',
    },
    {
      name: 'squeezed port with injection loss',
      tex: 'V_j = (1-\\varepsilon)\\,V_{\\mathrm{sqz}} + \\tfrac12\\varepsilon',
    },
    { name: 'pump', tex: 'P = \\hbar\\omega_p\\bar n\\,\\frac{\\kappa^2/4+\\Delta^2}{\\kappa_{\\mathrm{in}}}' },
  ],
  symbols: {
    a: 'field in the cavity in the frame of the pump',
    a_j: 'noise that enters through port $j$',
    x: 'motion of the sensed coordinate',
    '\\bar a': 'mean field, $\\sqrt{\\bar n}$, real',
    '\\kappa': 'total energy decay rate, $\\sum_j\\kappa_j$',
    '\\chi_c': 'response of the field',
    'V_{\\mathrm{sqz}}':
      'squeezed covariance, $n_j+\\tfrac12$ times $10^{-L/10}$ in the squeezed quadrature of level $L$ and $10^{A/10}$ in the other of antisqueezing $A$',
    V_j: 'symmetrised covariance of the noise at port $j$',
    't_{\\mathrm{imp}}': 'transfer to the detector with the motion clamped',
    R: 'transfer of the measurand to the detector',
    '\\omega_p': 'frequency of the pump, $\\omega_c+\\Delta$',
  },
  references: ['aspelmeyer-2014', 'clerk-2010'],
  validity:
    'One field mode, a linear shift of its frequency with displacement, small motion compared with the linewidth over the coupling.',
} as const satisfies Declaration
