import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'lever',
  role: 'component',
  title: 'Optical lever',
  summary:
    'A beam is reflected from a surface that tilts as it moves, and its deflection is measured. The light turns the surface with the noise of where its photons land, and pushes it with the noise of their number, which the deflection does not tell. Classical noise of pointing or mount is a line of its own, as a displacement.',
  nature: 'detector',
  family: 'imprecision',
  fields: {
    modes: {
      type: 'weights',
      required: true,
      meaning: 'weight of each mechanical mode in the coordinate that is read',
    },
    wavelength: {
      type: 'quantity',
      dimension: 'length',
      symbol: '\\lambda',
      range: 'positive',
      required: true,
      meaning: 'wavelength of the light',
    },
    power: {
      type: 'quantity',
      dimension: 'power',
      symbol: 'P',
      range: 'positive',
      required: true,
      meaning: 'power that the surface reflects',
    },
    spot: {
      type: 'quantity',
      dimension: 'length',
      symbol: 'w',
      range: 'positive',
      required: true,
      meaning: 'radius of the beam on the surface where its intensity has fallen to 1/e²',
    },
    arm: {
      type: 'quantity',
      dimension: 'length',
      symbol: '\\ell',
      range: 'positive',
      required: true,
      meaning:
        'displacement of the coordinate over the tilt that comes with it, two thirds of the length of an end-loaded beam',
    },
    lift: {
      type: 'quantity',
      dimension: 'number',
      symbol: 'b',
      range: 'any',
      default: '1',
      meaning:
        'displacement of the spot along the beam over that of the coordinate; 0 where the beam meets the axis of a torsion balance',
    },
    detection: {
      type: 'choice',
      options: ['split', 'matched'],
      default: 'split',
      meaning: 'split: difference of two halves of the beam; matched: the first odd mode of the beam itself',
    },
    efficiency: {
      type: 'quantity',
      dimension: 'power-ratio',
      symbol: '\\eta',
      range: 'positive-fraction',
      default: '1',
      meaning:
        'power transmission between the surface and the detector, without the part that a split detector cannot see',
    },
  },
  noises: [
    { channel: 'light', parts: true },
    { channel: 'loss', parts: true },
    { channel: 'pressure', parts: true },
  ],
  equations: [
    {
      name: 'imprecision',
      tex: 'S_{xx} = \\frac{\\hbar c\\lambda\\,\\ell^2}{4\\pi\\,\\eta\\,d\\,w^2P},\\quad d = \\frac{2}{\\pi}\\ \\text{(split)},\\ 1\\ \\text{(matched)}',
    },
    {
      name: 'back-action',
      tex: 'S_{FF} = \\frac{4\\pi\\hbar w^2P}{c\\lambda\\,\\ell^2}',
    },
    { name: 'pressure', tex: 'S_{FF}^{P} = \\frac{16\\pi\\hbar b^2P}{c\\lambda}' },
  ],
  symbols: {
    'S_{xx}': 'one-sided displacement noise of the shot noise, loss included',
    'S_{FF}': 'one-sided force noise of the torque that light exerts, over $\\ell$',
    'S_{FF}^{P}': 'one-sided force noise of the light’s power',
    c: 'speed of light',
    d: 'part of the deflection that the detector takes in',
  },
  references: ['hsu-2004', 'putman-1992', 'caves-1981'],
  validity:
    'A Gaussian beam at normal incidence that is smaller than the surface, small deflections, a detector in the far field.',
} as const satisfies Declaration
