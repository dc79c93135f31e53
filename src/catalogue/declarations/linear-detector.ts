import { correlationFields } from '../correlation-field.js'
import type { Declaration } from '../declaration.js'

export const declaration = {
  kind: 'linear-detector',
  role: 'component',
  title: 'Linear detector',
  summary:
    'A readout known by what it does: the displacement noise that it adds to its record, the force noise with which it pushes back, and their correlation. Point contacts, single-electron transistors and every other stationary linear detector can be stated so; a pair that no detector has is refused with the number it claims.',
  nature: 'detector',
  family: 'detection',
  fields: {
    modes: {
      type: 'weights',
      required: true,
      meaning: 'weight of each mechanical mode in the coordinate that is read',
    },
    imprecision: {
      type: 'density',
      of: 'length',
      required: true,
      meaning: 'displacement noise that it adds to its record',
    },
    back_action: {
      type: 'density',
      of: 'force',
      required: true,
      meaning: 'force noise with which it pushes the coordinate',
    },
    correlation: {
      type: 'group',
      meaning: 'correlation coefficient of displacement noise and force noise, the same over the band',
      fields: correlationFields,
    },
  },
  noises: [{ channel: 'noise', parts: true }],
  equations: [
    { name: 'imprecision', tex: 'S_F^{\\mathrm{imp}} = |\\chi^{-1}|^2 S_{xx}' },
    { name: 'back-action', tex: 'S_F^{\\mathrm{ba}} = S_{FF}' },
    {
      name: 'sum',
      tex: "S_F = S_{FF} + |\\chi^{-1}|^2 S_{xx} + 2\\,\\mathrm{Re}\\left(\\chi^{-1}S_{xF}\\right),\\quad S_{xF} = (\\rho'+i\\rho'')\\sqrt{S_{xx}S_{FF}}",
    },
    {
      name: 'quantum bound',
      tex: 'S_{xx}S_{FF} \\ge (\\mathrm{Re}\\,S_{xF})^2 + \\left(\\hbar+|\\mathrm{Im}\\,S_{xF}|\\right)^2',
    },
  ],
  symbols: {
    'S_{xx}': 'one-sided density of the displacement noise',
    'S_{FF}': 'one-sided density of the force noise',
    'S_{xF}': 'one-sided cross density $\\langle xF^*\\rangle$, with fields that turn as $e^{-i\\omega t}$',
    '\\chi': 'displacement for a unit force, detector on',
  },
  references: ['clerk-2010'],
  validity:
    'A stationary detector whose force answers no motion by itself: stiffness and damping that it adds belong into the frequency and the quality of the mode.',
} as const satisfies Declaration
