import type { Check } from '../check.js'

/** Light at grazing incidence is not reflected with a phase that motion along the normal changes. */
export const check: Check = given => {
  const incidence = given.number('incidence') ?? 0
  const least = Math.cos((89 * Math.PI) / 180)
  if (Math.cos(incidence) >= least) return []
  const degrees = Number(((incidence * 180) / Math.PI).toPrecision(4))
  return [
    {
      path: 'incidence',
      code: 'range',
      message: `light that comes in at ${degrees}° from the normal hardly sees the surface move; an angle between -89° and 89° is wanted`,
    },
  ]
}
