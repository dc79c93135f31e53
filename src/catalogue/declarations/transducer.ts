import { correlationFields } from '../correlation-field.js'
import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'transducer',
  role: 'component',
  title: 'Transducer with a voltage amplifier',
  summary:
    'Motion becomes a voltage, and an amplifier with voltage noise and current noise reads it; the current noise flows back through the transducer and pushes. Capacitive and piezoelectric pickups make a voltage of displacement, coils one of velocity; a SQUID or a transistor behind them is stated by its noise at the input.',
  nature: 'detector',
  family: 'amplifier',
  fields: {
    modes: {
      type: 'weights',
      required: true,
      meaning: 'weight of each mechanical mode in the coordinate that is read',
    },
    per_displacement: {
      type: 'quantity',
      dimension: 'voltage-per-length',
      symbol: '\\alpha',
      range: 'positive',
      meaning: 'transduction factor of a transducer of displacement: voltage per displacement, force per charge',
    },
    per_velocity: {
      type: 'quantity',
      dimension: 'voltage-per-speed',
      symbol: '\\beta',
      range: 'positive',
      meaning: 'transduction factor of a transducer of velocity: voltage per velocity, force per current',
    },
    voltage_noise: {
      type: 'density',
      of: 'voltage',
      required: true,
      meaning: 'voltage noise of the amplifier, at its input',
    },
    current_noise: {
      type: 'density',
      of: 'current',
      required: true,
      meaning: 'current noise of the amplifier, at its input',
    },
    correlation: {
      type: 'group',
      meaning: 'correlation coefficient of voltage noise and current noise, the same over the band',
      fields: correlationFields,
    },
  },
  exclusive: [{ keys: ['per_displacement', 'per_velocity'], need: 'exactly one' }],
  noises: [{ channel: 'noise', parts: true }],
  equations: [
    {
      name: 'of displacement',
      tex: 'V = \\alpha x,\\ F = \\alpha q,\\quad S_{xx} = \\frac{e_n^2}{\\alpha^2},\\quad S_{FF} = \\frac{\\alpha^2 i_n^2}{\\omega^2}',
    },
    {
      name: 'of velocity',
      tex: 'V = \\beta\\dot x,\\ F = \\beta I,\\quad S_{xx} = \\frac{e_n^2}{(\\beta\\omega)^2},\\quad S_{FF} = \\beta^2 i_n^2',
    },
    {
      name: 'sum',
      tex: "S_F = S_{FF} + |\\chi^{-1}|^2 S_{xx} + 2\\,\\mathrm{Re}\\left(\\chi^{-1}S_{xF}\\right),\\quad S_{VI} = (\\rho'+i\\rho'')\\,e_n i_n",
    },
    {
      name: 'quantum bound',
      tex: '(e_n i_n)^2 \\ge (\\mathrm{Im}\\,S_{VI})^2 + \\left(\\hbar\\omega+|\\mathrm{Re}\\,S_{VI}|\\right)^2',
    },
    {
      name: 'at the noise match',
      tex: 'n_{\\mathrm{add}} = \\frac{e_n i_n}{2\\hbar\\omega}',
    },
  ],
  symbols: {
    e_n: 'voltage noise, amplitude density',
    i_n: 'current noise, amplitude density',
    'S_{xF}': 'one-sided cross density of displacement noise and force noise that follows from $S_{VI}$',
    'S_{VI}': 'one-sided cross density $\\langle e\\,i^*\\rangle$, with fields that turn as $e^{-i\\omega t}$',
    '\\chi': 'displacement for a unit force, transducer connected',
    x: 'sensed displacement',
    I: 'current of the noise, through the transducer',
    q: 'charge that the current noise brings',
  },
  references: ['clerk-2010'],
  validity:
    'An amplifier that loads the transducer with nothing but its noise; Johnson noise of the circuit is a loss channel of the mode or a line of its own.',
} as const satisfies Declaration
