import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'homodyne',
  role: 'component',
  title: 'Homodyne detector',
  summary:
    'Measures one quadrature of the light or microwave that leaves a port. Behind an amplifier it is one demodulated quadrature.',
  nature: 'detector',
  family: 'detection',
  fields: {
    reads: { type: 'name', of: 'port', required: true, meaning: 'port, loss or amplifier in front of it' },
    angle: {
      type: 'quantity',
      dimension: 'angle',
      symbol: '\\theta',
      range: 'any',
      default: '90°',
      meaning: 'measured quadrature, from the mean carrier that leaves the port: 0° amplitude, 90° phase',
    },
    efficiency: {
      type: 'quantity',
      dimension: 'power-ratio',
      symbol: '\\eta',
      range: 'positive-fraction',
      default: '1',
      meaning: 'power transmission between the port and the detector',
    },
  },
  noises: [{ channel: 'loss', parts: true }],
  equations: [
    {
      name: 'record',
      tex: 'y = \\sqrt\\eta\\left(e^{-i(\\theta+\\psi)}a_{\\mathrm{out}} + e^{i(\\theta+\\psi)}a_{\\mathrm{out}}^\\dagger\\right) + \\sqrt{1-\\eta}\\,(\\dots)_{\\mathrm{vac}}',
    },
  ],
  symbols: {
    '\\psi': 'phase of the mean carrier that leaves the port',
    'a_{\\mathrm{out}}': 'field that leaves the port',
  },
  references: ['clerk-2010'],
  validity: 'A strong, ideal local oscillator.',
} as const satisfies Declaration
