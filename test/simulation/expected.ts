import { hop, length, segments, transform, weightPower, weights } from './welch.js'

/** One-sided density of the continuous record at frequencies k·step, k = 0 … last; of a complex record also at the negative ones. */
export interface Density {
  readonly positive: Float64Array
  readonly negative: Float64Array
}

/** What Welch's estimate has to be in every bin: mean and standard deviation of the average. */
export interface Expected {
  readonly mean: Float64Array
  readonly deviation: Float64Array
}

/** Points of the fine grid between −f_s/2 and f_s/2, and how many times f_s the density is folded from. */
export const fine = 8 * length
export const folds = 4
export const points = fine * (folds + 0.5) + 1

/**
 * Density of samples that are means over 1/f_s: Σ_m S(f + m f_s) sinc²((f + m f_s)/f_s). The white rest far above is taken out first,
 * since of it the infinite sum is known: Σ_m sinc² = 1.
 */
function folded({ positive, negative }: Density, white: number): Float64Array {
  return Float64Array.from({ length: fine }, (_, j) => {
    const base = j < fine / 2 ? j : j - fine
    let sum = white
    for (let m = -folds; m <= folds; m++) {
      const k = base + m * fine
      const x = (Math.PI * k) / fine
      const sinc = k === 0 ? 1 : Math.sin(x) / x
      sum += ((k < 0 ? negative[-k] : positive[k]) - white) * sinc * sinc
    }
    return sum
  })
}

/** Autocorrelation r(τ) of the samples, interleaved complex, τ modulo the grid. */
function autocorrelation(density: Float64Array): Float64Array {
  const data = new Float64Array(2 * fine)
  // The conjugate of a forward transform of a real spectrum is its inverse.
  density.forEach((value, j) => (data[2 * j] = value / fine))
  return transform(data).map((value, i) => (i % 2 === 0 ? value : -value))
}

/** Σ_n w_n w_{n+τ}. */
const overlap = Float64Array.from({ length }, (_, tau) => {
  let sum = 0
  for (let n = 0; n + tau < length; n++) sum += weights[n] * weights[n + tau]
  return sum
})

/** E[Z_i Z_j*]/Σw² of two segments that lie `shift` samples apart, in every bin. */
function covariance(r: Float64Array, shift: number): Float64Array {
  const data = new Float64Array(2 * length)
  for (let tau = 1 - length; tau < length; tau++) {
    const from = (tau - shift + fine) % fine
    const to = (tau + length) % length
    const weight = overlap[Math.abs(tau)] / weightPower
    data[2 * to] += weight * r[2 * from]
    data[2 * to + 1] += weight * r[2 * from + 1]
  }
  return transform(data)
}

/**
 * Mean of the averaged spectrum, leakage of the window included, and its standard deviation for a Gaussian record, correlation of
 * overlapping and of neighbouring segments included: var = Σ_s (1 − |s|/K)|E[Z_0 Z_s*]|²/K [Percival, Walden, Spectral Analysis for
 * Physical Applications (Cambridge, 1993), 6.17].
 */
export function expected(density: Density, white: number, samples: number): Expected {
  const r = autocorrelation(folded(density, white))
  const count = segments(samples)
  const mean = covariance(r, 0).filter((_, i) => i % 2 === 0)
  const variance = mean.map(value => (value * value) / count)
  for (let s = 1; s <= 4; s++) {
    const pair = covariance(r, s * hop)
    for (let k = 0; k < length; k++) {
      variance[k] += (2 * (1 - s / count) * (pair[2 * k] ** 2 + pair[2 * k + 1] ** 2)) / count
    }
  }
  return { mean, deviation: variance.map(Math.sqrt) }
}
