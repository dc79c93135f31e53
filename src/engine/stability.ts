import type { Network } from '../model/network.js'
import { Refusal } from '../model/problem.js'
import { energyDecay, type Pole } from './poles.js'
import { fastestRate } from './state-space.js'

const plain = (hertz: number): string => `${Number(hertz.toPrecision(4))} Hz`

/**
 * Refuses a working point whose motion grows by itself: a pole with Im ω > 0 beyond rounding. Names the frequency and the rate of growth
 * and what would be right. A network without a cavity is passive.
 */
export function refuseUnstable(network: Network, poles: readonly Pole[]): void {
  const point = network.cavities[0]
  if (point === undefined) return
  const worst = poles.reduce((a, b) => (energyDecay(b) < energyDecay(a) ? b : a))
  const growth = -energyDecay(worst)
  const size = Math.hypot(worst.omega.re, worst.omega.im)
  if (growth <= 1e-13 * size) return
  // A free mass has a double pole at zero, which comes out as far from it as the root of rounding.
  if (network.modes.some(mode => mode.frequency === 0) && size <= 1e-7 * fastestRate(network)) return
  const frequency = Math.abs(worst.omega.re) / (2 * Math.PI)
  const how =
    frequency > 0
      ? `light amplifies the motion at ${plain(frequency)} by ${plain(growth / (2 * Math.PI))} more than its damping`
      : 'the spring of the light pulls harder than the mechanical spring holds'
  const remedy =
    point.detuning > 0 ? 'a negative or smaller detuning, or less pump power' : 'less pump power, or a smaller detuning'
  throw new Refusal([
    {
      severity: 'error',
      code: 'unstable',
      place: point.place,
      message: `this working point is unstable: ${how}; there is no stationary noise to compute; ${remedy} would be right`,
    },
  ])
}
