import { evaluateAtFrequencies } from '../../src/engine/assess.js'
import type { Budget } from '../../src/model/budget.js'
import { readoutOf, type ReadoutOf } from '../engine/readout-of.js'
import { discretise, type Langevin } from './discretise.js'
import { expected, fine, points, type Expected } from './expected.js'
import { langevin } from './langevin.js'
import { simulate } from './simulate.js'
import { length, welch } from './welch.js'

export const rate = 8e6
export const samples = 1 << 19

/** How far the averaged spectrum lies from the engine's, in standard deviations. */
export interface Agreement {
  /** Σ z² over bins so far apart that they are independent, minus their number, over its standard deviation √(2·number). */
  readonly chiSquared: number
  /** Σ z over the same bins over the root of their number: sees a small error of one sign in all of them. */
  readonly lean: number
  /** The bin that lies farthest. */
  readonly farthest: number
}

/** Four standard deviations of the sums, five of the farthest of a thousand bins. */
export const within = ({ chiSquared, lean, farthest }: Agreement): boolean =>
  Math.abs(chiSquared) < 4 && Math.abs(lean) < 4 && farthest < 5

/** Density of the record: the budget's total, referred back to the detector by the response. */
function recordDensity(budget: Budget, frequencies: Float64Array): Float64Array {
  const { total, response } = evaluateAtFrequencies(budget, frequencies)
  return total.map((value, i) => value * response[i])
}

/** The engine's side: the upper sideband is at positive frequencies of the conjugate amplitude, the lower at negative ones. */
function engineSpectrum(positive: Budget, negative: Budget | null): Expected {
  // The density at zero is taken just beside it.
  const frequencies = Float64Array.from({ length: points }, (_, k) => (Math.max(k, 1e-3) * rate) / fine)
  const first = recordDensity(positive, frequencies)
  const second = negative === null ? first : recordDensity(negative, frequencies)
  const [white] = recordDensity(positive, Float64Array.of(1e4 * rate))
  return expected({ positive: first, negative: second }, white, samples)
}

/** Holds an averaged spectrum against what it has to be, from the fifth bin up to `last`. */
export function distance(spectrum: Float64Array, { mean, deviation }: Expected, last: number): Agreement {
  const bins = Array.from({ length: last - 4 }, (_, i) => i + 4)
  const z = bins.map(k => (spectrum[k] - mean[k]) / deviation[k])
  const apart = z.filter((_, i) => i % 4 === 0)
  const sum = apart.reduce((total, value) => total + value * value, 0)
  return {
    lean: apart.reduce((total, value) => total + value, 0) / Math.sqrt(apart.length),
    chiSquared: (sum - apart.length) / Math.sqrt(2 * apart.length),
    farthest: Math.max(...z.map(Math.abs)),
  }
}

/** Holds a simulated record against the engine's density of it. */
export function compare(
  system: Langevin,
  [positive, negative]: readonly [Budget, Budget | null],
  seed: number,
): Agreement {
  const spectrum = welch(simulate(discretise(system, 1 / rate), samples, 1 << 14, seed), rate)
  // Near zero and near half the rate a real record is correlated with its mirror image.
  return distance(spectrum, engineSpectrum(positive, negative), length / 2 - 4)
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
