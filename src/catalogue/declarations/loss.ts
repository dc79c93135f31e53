import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'loss',
  role: 'component',
  title: 'Loss on the way',
  summary:
    'A lossy stretch between a port and the detector. It passes a part of the power and mixes in the noise of its own bath.',
  nature: 'chain',
  family: 'detection',
  fields: {
    reads: { type: 'name', of: 'port', required: true, meaning: 'port, loss or amplifier in front of it' },
    transmission: {
      type: 'quantity',
      dimension: 'power-ratio',
      symbol: '\\eta',
      range: 'positive-fraction',
      required: true,
      meaning: 'part of the power that passes',
    },
    temperature: {
      type: 'quantity',
      dimension: 'temperature',
      symbol: 'T',
      range: 'non-negative',
      meaning: 'temperature of the lossy stretch',
    },
    occupancy: {
      type: 'quantity',
      dimension: 'number',
      symbol: 'n',
      range: 'non-negative',
      meaning: 'quanta of its bath, none where neither is given',
    },
  },
  exclusive: [{ keys: ['temperature', 'occupancy'], need: 'at most one' }],
  noises: [{ channel: 'loss', parts: true }],
  equations: [
    {
      name: 'loss',
      tex: 'a_{\\mathrm{out}} = \\sqrt{\\eta}\\,a_{\\mathrm{in}} + \\sqrt{1-\\eta}\\,a_{\\mathrm{bath}},\\quad V = \\left(n+\\tfrac12\\right)\\begin{pmatrix}1&0\\\\0&1\\end{pmatrix}',
    },
    { name: 'bath at a temperature', tex: 'n = \\frac{1}{e^{\\hbar\\omega_p/k_B T}-1}' },
  ],
  symbols: {
    k_B: 'Boltzmann constant',
    '\\omega_p': 'frequency of the carrier',
    V: 'symmetrised covariance of the bath',
  },
  references: ['clerk-2010', 'callen-welton-1951'],
  validity:
    'A loss that is flat over the band, whose bath has the quanta of the carrier’s frequency on both sidebands.',
} as const satisfies Declaration
