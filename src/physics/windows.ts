import { windowShapes, type WindowName, type WindowShape } from './window-shapes.js'

/** Above it the sum for a window that is no sum of cosines differs from its limit by less than 1e-11. */
const longestSum = 2 ** 20

/**
 * The N weights of a window in its periodic form, w_j = w(j/N), j = 0 … N − 1, as spectra are estimated with; N ≥ 1.
 * [Harris, Proc. IEEE 66, 51 (1978), section III: the missing right end point]
 */
export function windowWeights(name: WindowName, length: number): Float64Array {
  const weight = weightOf(windowShapes[name])
  return Float64Array.from({ length }, (_, j) => weight(j / length))
}

function weightOf(shape: WindowShape): (x: number) => number {
  if (shape.form === 'other') return shape.weight
  return x =>
    shape.coefficients.reduce((sum, a, k) => sum + (k % 2 === 0 ? a : -a) * Math.cos(2 * Math.PI * ((k * x) % 1)), 0)
}

/**
 * Equivalent noise bandwidth in bins, N·Σw²/(Σw)²: how much white noise an estimated line holds, in units of the spacing
 * of lines f_s/N. N ≥ 1 samples of the record, zero padding not counted. For a sum of cosines it is exactly
 * (a₀² + ½Σa_k²)/a₀² once N exceeds twice the highest order.
 * [Harris, Proc. IEEE 66, 51 (1978), eq. 11; Heinzel, Rüdiger, Schilling 2002, eq. 21, from memory]
 */
export function noiseBandwidthInBins(name: WindowName, length: number): number {
  const shape: WindowShape = windowShapes[name]
  if (shape.form === 'other') return length > longestSum ? shape.bins : summed(name, length)
  const [constant = NaN, ...orders] = shape.coefficients
  if (length <= 2 * orders.length) return summed(name, length)
  return 1 + orders.reduce((sum, a) => sum + a * a, 0) / (2 * constant * constant)
}

function summed(name: WindowName, length: number): number {
  const weights = windowWeights(name, length)
  const sum = weights.reduce((total, w) => total + w, 0)
  const squares = weights.reduce((total, w) => total + w * w, 0)
  return (length * squares) / (sum * sum)
}

/**
 * Equivalent noise bandwidth in Hz: f_s·Σw²/(Σw)². A one-sided power spectrum in V² divided by it is the power density in
 * V²/Hz. f_s > 0 in Hz is the rate of sampling, N ≥ 1 the samples of the record; sources as for `noiseBandwidthInBins`.
 */
export function noiseBandwidth(name: WindowName, { rate, length }: { rate: number; length: number }): number {
  return (noiseBandwidthInBins(name, length) * rate) / length
}
