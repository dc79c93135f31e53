import { evaluateAtFrequencies } from '../../src/engine/assess.js'
import type { Budget } from '../../src/model/budget.js'
import { readoutOf, type ReadoutOf } from '../engine/readout-of.js'
import { discretise, type Langevin } from './discretise.js'
import { expected, fine, points } from './expected.js'
import { langevin } from './langevin.js'
import { simulate } from './simulate.js'
import { length, welch } from './welch.js'

export const rate = 8e6
export const samples = 1 << 20

/** How far the averaged spectrum lies from the engine's, in standard deviations. */
export interface Agreement {
  /** Σ z² over bins so far apart that they are independent, minus their number, over its standard deviation √(2·number). */
  readonly chiSquared: number
  /** The bin that lies farthest. */
  readonly farthest: number
}

/** Density of the record: the budget's total, referred back to the detector by the response. */
function recordDensity(budget: Budget, frequencies: Float64Array): Float64Array {
  const { total, response } = evaluateAtFrequencies(budget, frequencies)
  return total.map((value, i) => value * response[i])
}

/** The engine's side: the upper sideband is at positive frequencies of the conjugate amplitude, the lower at negative ones. */
function engineSpectrum(positive: Budget, negative: Budget | null): ReturnType<typeof expected> {
  // The density at zero is taken just beside it.
  const frequencies = Float64Array.from({ length: points }, (_, k) => (Math.max(k, 1e-3) * rate) / fine)
  const first = recordDensity(positive, frequencies)
  const second = negative === null ? first : recordDensity(negative, frequencies)
  const [white] = recordDensity(positive, Float64Array.of(1e4 * rate))
  return expected({ positive: first, negative: second }, white, samples)
}

/** Holds a simulated record against the engine's density of it. */
export function compare(
  system: Langevin,
  [positive, negative]: readonly [Budget, Budget | null],
  seed: number,
): Agreement {
  const spectrum = welch(simulate(discretise(system, 1 / rate), samples, 1 << 14, seed), rate)
  const { mean, deviation } = engineSpectrum(positive, negative)
  // Near zero and near half the rate a real record is correlated with its mirror image.
  const bins = Array.from({ length: length / 2 - 8 }, (_, i) => i + 4)
  const z = bins.map(k => (spectrum[k] - mean[k]) / deviation[k])
  const apart = z.filter((_, i) => i % 4 === 0)
  const sum = apart.reduce((total, value) => total + value * value, 0)
  return {
    chiSquared: (sum - apart.length) / Math.sqrt(2 * apart.length),
    farthest: Math.max(...z.map(Math.abs)),
  }
}

/** The same readout by both roads; the densities of `wrong` are doubled in the simulation. */
export function agreement(readout: ReadoutOf, seed: number, wrong: string | null = null): Agreement {
  const record = (side: 'upper' | 'lower'): Budget => readoutOf({ ...readout, record: side })
  const budgets =
    typeof readout.record === 'string'
      ? ([record('upper'), record('lower')] as const)
      : ([readoutOf(readout), null] as const)
  return compare(langevin(readout, wrong), budgets, seed)
}
