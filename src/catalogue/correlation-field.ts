import type { GroupField } from './declaration.js'

/** The two parts of a correlation coefficient, as fields of a kind. */
export const correlationFields = {
  real: {
    type: 'quantity',
    dimension: 'number',
    symbol: "\\rho'",
    range: 'any',
    default: '0',
    meaning: 'real part of the coefficient, from −1 to 1',
  },
  imaginary: {
    type: 'quantity',
    dimension: 'number',
    symbol: "\\rho''",
    range: 'any',
    default: '0',
    meaning: 'imaginary part of the coefficient, with fields that turn as e^{−iωt}',
  },
} as const satisfies GroupField['fields']
