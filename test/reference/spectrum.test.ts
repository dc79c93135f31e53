import FFT from 'fft.js'
import { describe, expect, test } from 'vitest'
import type { WindowName } from '../../src/physics/window-shapes.js'
import { readTable } from '../budget/table-fixture.js'
import { uniformNumbers } from './uniform.js'

/*
 * Road: simulation and an independent library. White Gaussian noise of a known density is sampled, cut into records, weighted,
 * transformed by a library, averaged and written as an instrument writes it: V² in the bandwidth of a bin. The weights are written out
 * here by their published forms; what comes through the border must be the density that went in, within the statistical error that
 * follows from the numbers of samples and records.
 */
const rate = 10e6
const samples = 1024
const records = 400
/** Variance of the samples in V²; one-sided density 2σ²/f_s. */
const variance = 0.09
const density = (2 * variance) / rate

/** Normal numbers by the transform of Box and Muller [Ann. Math. Statist. 29, 610 (1958)]. */
function gaussian(seed: number): () => number {
  const uniform = uniformNumbers(seed)
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform())
}

const angle = (j: number): number => (2 * Math.PI * j) / samples

const weights: { readonly [name in WindowName]?: (j: number) => number } = {
  rectangular: () => 1,
  // A raised cosine, as the square of a sine.
  hann: j => Math.sin(angle(j) / 2) ** 2,
  hamming: j => 0.08 + 0.92 * Math.sin(angle(j) / 2) ** 2,
  blackman: j => 0.42 - 0.5 * Math.cos(angle(j)) + 0.08 * Math.cos(2 * angle(j)),
  bartlett: j => Math.min(j, samples - j) / (samples / 2),
  welch: j => (4 * j * (samples - j)) / samples ** 2,
  hft70: j => 1 - 1.90796 * Math.cos(angle(j)) + 1.07349 * Math.cos(2 * angle(j)) - 0.18199 * Math.cos(3 * angle(j)),
}

/** One-sided averaged power spectrum in V² rms, bins 0 to N/2, as an instrument displays it: a sine shows its mean square. */
function spectrum(weight: Float64Array, seed: number): Float64Array {
  const noise = gaussian(seed)
  const fft = new FFT(samples)
  const out = fft.createComplexArray() as number[]
  const sum = weight.reduce((total, w) => total + w, 0)
  const power = new Float64Array(samples / 2 + 1)
  for (let record = 0; record < records; record++) {
    fft.realTransform(
      out,
      Array.from(weight, w => w * Math.sqrt(variance) * noise()),
    )
    for (let k = 0; k < power.length; k++)
      power[k] += (2 * (out[2 * k] ** 2 + out[2 * k + 1] ** 2)) / sum ** 2 / records
  }
  return power
}

function moments(values: readonly number[]): { mean: number; spread: number } {
  const mean = values.reduce((sum, v) => sum + v, 0) / values.length
  const square = values.reduce((sum, v) => sum + (v - mean) ** 2, 0) / (values.length - 1)
  return { mean, spread: Math.sqrt(square) }
}

describe('white noise of a known density, sampled and transformed', () => {
  test.each(Object.entries(weights))('comes back through the %s window', (name, form) => {
    const weight = Float64Array.from({ length: samples }, (_, j) => form(j))
    const rows = [...spectrum(weight, 20261201)].map((power, k) => `${(k * rate) / samples},${power}`)
    // The first bins hold the mean, and the last one has no negative partner.
    const keep = `keep: ${(6 * rate) / samples} Hz to ${rate / 2 - 1} Hz`
    const bandwidth = `bandwidth: { window: ${name}, rate: 10 MHz, samples: ${samples} }`
    const keys = `file: x.csv\nunits: [Hz, V²]\n${bandwidth}\naverages: ${records}\n${keep}\nscale: 1 N/V`
    const { psd } = readTable(keys, rows.join('\n'))
    const { mean, spread } = moments(psd)

    // The mean over the bins is Σw²x²/Σw²: its relative variance is 2Σw⁴/(Σw²)² a record; five standard deviations.
    const fourth = weight.reduce((total, w) => total + w ** 4, 0) / weight.reduce((total, w) => total + w * w, 0) ** 2
    const error = Math.sqrt((2 * fourth) / records)
    expect(error).toBeLessThan(0.006)
    expect(Math.abs(mean / density - 1)).toBeLessThan(5 * error)

    // A bin scatters by 1/√n: the meaning of `averages`. Neighbouring bins go together, some ENBW of them.
    const independent = psd.length / 6
    expect(Math.abs(spread / mean / (1 / Math.sqrt(records)) - 1)).toBeLessThan(5 / Math.sqrt(2 * independent))
  })

  test('a wrong window is found out', () => {
    const weight = Float64Array.from({ length: samples }, (_, j) => weights.hann?.(j) ?? NaN)
    const rows = [...spectrum(weight, 1)].map((power, k) => `${(k * rate) / samples},${power}`)
    const keys = (window: string) =>
      `file: x.csv\nunits: [Hz, V²]\nbandwidth: { window: ${window}, rate: 10 MHz, samples: ${samples} }\nkeep: 60 kHz to 4.9 MHz\nscale: 1 N/V`
    const ratio = (window: string) => moments(readTable(keys(window), rows.join('\n')).psd).mean / density
    expect(Math.abs(ratio('hann') - 1)).toBeLessThan(0.02)
    expect(Math.abs(ratio('hamming') - 1)).toBeGreaterThan(0.08)
    expect(Math.abs(ratio('rectangular') - 1.5)).toBeLessThan(0.03)
  })
})
