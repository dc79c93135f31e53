import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'sideband',
  role: 'component',
  title: 'One sideband',
  summary:
    'Records the field at one side of the pump only, at the pump frequency plus or minus the signal frequency, as a spectrum analyser behind an amplifier does. Without an amplifier of large gain in front it is a heterodyne detector, and the vacuum of its image band enters the record.',
  nature: 'detector',
  family: 'detection',
  fields: {
    reads: { type: 'name', of: 'port', required: true, meaning: 'port, loss or amplifier in front of it' },
    side: { type: 'choice', options: ['upper', 'lower'], default: 'upper', meaning: 'above or below the pump' },
    efficiency: {
      type: 'quantity',
      dimension: 'power-ratio',
      symbol: '\\eta',
      range: 'positive-fraction',
      default: '1',
      meaning: 'power transmission between the port and the detector',
    },
  },
  noises: [
    { channel: 'loss', parts: true },
    { channel: 'image', parts: true },
  ],
  equations: [
    {
      name: 'record',
      tex: 'y = \\sqrt\\eta\\,a_{\\mathrm{out}}(\\omega)\\ \\text{(upper)},\\quad y = \\sqrt\\eta\\,a_{\\mathrm{out}}^\\dagger(\\omega)\\ \\text{(lower)}',
    },
    { name: 'image band without amplifier', tex: 'S_y = 2\\cdot\\tfrac12' },
  ],
  symbols: { 'a_{\\mathrm{out}}': 'field that leaves the port', S_y: 'density that it adds to the record' },
  references: ['clerk-2010', 'caves-1982'],
  validity: 'The other sideband does not reach the record.',
} as const satisfies Declaration
