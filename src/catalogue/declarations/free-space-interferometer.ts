import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'free-space-interferometer',
  role: 'component',
  title: 'Interferometer without a cavity',
  summary:
    'Light is reflected from the moving surface once or a few times and its phase is compared with a strong reference, or two such arms are compared with each other. Shot noise of the phase and of the force are those of the same light; classical noise of laser or mount is a line of its own, as a displacement or a force.',
  nature: 'detector',
  family: 'imprecision',
  fields: {
    modes: {
      type: 'weights',
      required: true,
      meaning: 'weight of each mechanical mode in the coordinate that is read',
    },
    arrangement: {
      type: 'choice',
      options: ['mirror', 'michelson'],
      default: 'mirror',
      meaning:
        'mirror: one surface against a reference, power on the surface; michelson: difference of two arms at the dark port, power on the beam splitter',
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
      meaning: 'power that reaches the surface or the beam splitter',
    },
    reflections: {
      type: 'quantity',
      dimension: 'number',
      symbol: 'N',
      range: 'positive',
      default: '1',
      meaning: 'number of times that the light is reflected from the surface',
    },
    incidence: {
      type: 'quantity',
      dimension: 'angle',
      symbol: '\\vartheta',
      range: 'any',
      default: '0°',
      meaning: 'angle of incidence, from the normal of the surface',
    },
    efficiency: {
      type: 'quantity',
      dimension: 'power-ratio',
      symbol: '\\eta',
      range: 'positive-fraction',
      default: '1',
      meaning: 'power transmission between the surface and the detector, visibility included',
    },
  },
  noises: [
    { channel: 'light', parts: true },
    { channel: 'loss', parts: true },
  ],
  equations: [
    {
      name: 'imprecision',
      tex: 'S_{xx} = \\frac{\\hbar c\\lambda}{16\\pi\\,\\eta s^2 P},\\quad s = gN\\cos\\vartheta',
    },
    { name: 'back-action', tex: 'S_{FF} = \\frac{16\\pi\\hbar s^2 P}{c\\lambda}' },
    { name: 'product', tex: 'S_{xx}S_{FF} = \\hbar^2/\\eta' },
  ],
  symbols: {
    'S_{xx}': 'one-sided displacement noise of the shot noise, loss included',
    'S_{FF}': 'one-sided force noise of radiation pressure',
    c: 'speed of light',
    s: 'geometry of the reflection',
    g: '1 for one mirror, $\\tfrac12$ for the difference of two arms',
  },
  references: ['caves-1981', 'clerk-2010'],
  validity:
    'A strong, ideal reference beam or a dark port; light that leaves the surface as it came; no light that returns a second time unless counted in the reflections.',
} as const satisfies Declaration
