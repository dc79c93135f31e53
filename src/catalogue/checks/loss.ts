import type { Check } from '../check.js'

/** The bath of a lossy stretch is reckoned in quanta at the carrier's frequency; a temperature alone does not yet tell them. */
export const check: Check = given =>
  given.has('temperature')
    ? [
        {
          path: 'temperature',
          code: 'not-yet',
          message: `the temperature of a loss is not turned into quanta yet; give \`occupancy\`, 1/(exp(hf/kT) − 1) at the carrier’s frequency f`,
        },
      ]
    : []
