import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'amplifier',
  role: 'component',
  title: 'Phase-preserving amplifier',
  summary:
    'Amplifies both quadratures alike and adds noise, stated at its own input in quanta, as a noise temperature or as a noise figure. Which quanta a temperature means depends on how it was measured, and the file says so.',
  nature: 'chain',
  family: 'amplifier',
  fields: {
    reads: { type: 'name', of: 'port', required: true, meaning: 'port, loss or amplifier in front of it' },
    added: {
      type: 'quantity',
      dimension: 'number',
      symbol: 'n_{\\mathrm{add}}',
      range: 'non-negative',
      meaning: 'added noise in quanta at its input',
    },
    noise_temperature: {
      type: 'quantity',
      dimension: 'temperature',
      symbol: 'T_N',
      range: 'positive',
      meaning: 'noise temperature at the carrier’s frequency; needs `convention`',
    },
    noise_figure: {
      type: 'quantity',
      dimension: 'decibel',
      symbol: 'N_F',
      range: 'positive',
      meaning: 'noise figure against a source at 290 K; needs `convention`',
    },
    convention: {
      type: 'choice',
      options: ['rayleigh-jeans', 'callen-welton', 'planck', 'source'],
      meaning:
        'what a noise temperature means: the noise that the loads of its measurement were taken to have, or a source whose quanta equal the added noise',
    },
    gain: {
      type: 'quantity',
      dimension: 'power-ratio',
      symbol: '\\mathcal G',
      range: 'positive',
      meaning: 'power gain; left out, it is so large that nothing behind it matters',
    },
  },
  exclusive: [{ keys: ['added', 'noise_temperature', 'noise_figure'], need: 'exactly one' }],
  noises: [{ channel: 'added', parts: true }],
  equations: [
    {
      name: 'added noise',
      tex: 'S = 2\\,n_{\\mathrm{add}}\\left(|u|^2+|v|^2\\right)/|R|^2,\\quad n_{\\mathrm{add}}\\ge\\tfrac12\\left|1-1/\\mathcal G\\right|',
    },
    {
      name: 'noise temperature, Rayleigh–Jeans or Callen–Welton loads',
      tex: 'n_{\\mathrm{add}} = \\frac{k_B T_N}{\\hbar\\omega_p}',
    },
    {
      name: 'noise temperature, Planck loads',
      tex: 'n_{\\mathrm{add}} = \\frac{k_B T_N}{\\hbar\\omega_p} - \\tfrac12',
    },
    {
      name: 'noise temperature of an equivalent source',
      tex: 'n_{\\mathrm{add}} = \\frac{1}{e^{\\hbar\\omega_p/k_B T_N}-1}',
    },
    {
      name: 'noise figure',
      tex: 'T_N = 290\\,\\mathrm{K}\\,\\left(10^{N_F/10}-1\\right)',
    },
  ],
  symbols: {
    k_B: 'Boltzmann constant',
    '\\omega_p': 'frequency of the carrier',
    'u, v': 'weights of the two sidebands at its input',
    R: 'transfer of the measurand to the detector',
  },
  references: ['caves-1982', 'friis-1944'],
  validity: 'Gain and added noise flat over the band, independent idlers on the two sidebands.',
} as const satisfies Declaration
