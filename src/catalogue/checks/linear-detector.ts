import type { Check } from '../check.js'

/** |ρ| ≤ 1: no two noises are more than fully correlated. */
export const check: Check = given => {
  const size = Math.hypot(given.number('correlation.real') ?? 0, given.number('correlation.imaginary') ?? 0)
  if (size <= 1) return []
  return [
    {
      path: 'correlation',
      code: 'correlation',
      message: `a coefficient of correlation is at most 1 in magnitude; this one has ${Number(size.toPrecision(4))}`,
    },
  ]
}
