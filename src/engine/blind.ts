import type { Budget } from '../model/budget.js'
import type { Network } from '../model/network.js'
import { Refusal } from '../model/problem.js'
import { add, magnitude, multiply } from '../physics/complex.js'
import { solveDense } from '../physics/solve-dense.js'
import { denseAt, injectionColumn } from './dense.js'

/** What is left of terms that cancel is rounding below this part of them. */
const rounding = 1e-12

/** |R| at a frequency in Hz, over the sum of the magnitudes of its terms. */
function visibility(network: Network, frequency: number): number {
  const { matrix } = denseAt(network, { anchor: frequency, shift: { re: 0, im: 0 } })
  const { measurand, readout } = network
  const z = solveDense(
    matrix,
    injectionColumn(network, measurand).map(value => [value]),
  )
  const terms = [measurand.direct, ...readout.map(({ column, value }) => multiply(value, z[column][0]))]
  const sum = terms.reduce(add)
  const size = terms.reduce((total, term) => total + magnitude(term), 0)
  return size === 0 ? 0 : magnitude(sum) / size
}

/** Refuses a budget whose record holds nothing of the measurand anywhere in the band: the noise over the response has no meaning there. */
export function refuseBlind({ band, readout, readoutPlace }: Budget, network: Network): void {
  const ratio = band.high / band.low
  const somewhere = [0.07, 0.29, 0.5, 0.73, 0.91].map(part => band.low * ratio ** part)
  if (somewhere.some(frequency => visibility(network, frequency) > rounding)) return
  throw new Refusal([
    {
      severity: 'error',
      code: 'blind',
      place: readoutPlace,
      message: `\`${readout}\` records nothing of the measurand at this working point: change its angle (on resonance motion is written into the phase of the light alone, 90°), the port it reads, or the measurand`,
    },
  ])
}
