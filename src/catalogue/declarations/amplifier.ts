import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'amplifier',
  role: 'component',
  title: 'Phase-preserving amplifier',
  summary: 'Amplifies both quadratures alike and adds noise, stated in quanta at its own input.',
  nature: 'chain',
  family: 'amplifier',
  fields: {
    reads: { type: 'name', of: 'port', required: true, meaning: 'port, loss or amplifier in front of it' },
    added: {
      type: 'quantity',
      dimension: 'number',
      symbol: 'n_{\\mathrm{add}}',
      range: 'non-negative',
      required: true,
      meaning: 'added noise in quanta at its input',
    },
    gain: {
      type: 'quantity',
      dimension: 'power-ratio',
      symbol: '\\mathcal G',
      range: 'positive',
      meaning: 'power gain; left out, it is so large that nothing behind it matters',
    },
  },
  noises: [{ channel: 'added', parts: true }],
  equations: [
    {
      name: 'added noise',
      tex: 'S = 2\\,n_{\\mathrm{add}}\\left(|u|^2+|v|^2\\right)/|R|^2,\\quad n_{\\mathrm{add}}\\ge\\tfrac12\\left|1-1/\\mathcal G\\right|',
    },
  ],
  symbols: { 'u, v': 'weights of the two sidebands at its input', R: 'transfer of the measurand to the detector' },
  references: ['caves-1982'],
  validity: 'Gain and added noise flat over the band, independent idlers on the two sidebands.',
} as const satisfies Declaration
