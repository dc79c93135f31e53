import { describe, expect, test } from 'vitest'
import { isWindowName, windowNames, windowShapes, type WindowName } from '../../src/physics/window-shapes.js'
import { noiseBandwidth, noiseBandwidthInBins, windowWeights } from '../../src/physics/windows.js'
import { deviation, type Check } from './check.js'

const heinzel =
  'Heinzel, Rüdiger, Schilling 2002, numbers as reprinted in the public documentation of a library of signal processing'
const remembered = 'Heinzel, Rüdiger, Schilling 2002, from memory'
const harris = 'Harris, Proc. IEEE 66, 51 (1978), table I, from memory'
const long = 2 ** 20

/** Tolerances: half a unit of the last printed digit; 1e-9 where the value is a closed form. */
const bandwidths: readonly (readonly [WindowName, number, number, string])[] = [
  ['rectangular', 1, 1e-12, 'closed form'],
  ['bartlett', 4 / 3, 1e-9, 'closed form, 1.3333 printed'],
  ['welch', 1.2, 1e-9, '(8/15)/(2/3)² = 6/5'],
  ['hann', 1.5, 5e-5, heinzel],
  ['hamming', 1.36, 0.003, harris],
  ['blackman', 1.73, 0.003, harris],
  ['exact-blackman', 1.69, 0.003, harris],
  ['blackman-harris', 2.0044, 5e-5, remembered],
  ['nuttall3', 1.9444, 5e-5, remembered],
  ['nuttall3a', 1.7721, 5e-5, remembered],
  ['nuttall3b', 1.7037, 5e-5, heinzel],
  ['nuttall4', 2.31, 5e-5, heinzel],
  ['nuttall4a', 2.1253, 5e-5, remembered],
  ['nuttall4b', 2.0212, 5e-5, remembered],
  ['nuttall4c', 1.9761, 5e-5, remembered],
  ['flat-top', 3.7702, 5e-5, `${remembered}: the same shape with rounded coefficients`],
  ['sft3f', 3.1681, 5e-5, remembered],
  ['sft4f', 3.797, 5e-5, remembered],
  ['sft5f', 4.3412, 5e-5, remembered],
  ['sft3m', 2.9452, 5e-5, remembered],
  ['sft4m', 3.3868, 5e-5, remembered],
  ['sft5m', 3.8852, 5e-5, remembered],
  ['hft70', 3.4129, 5e-5, remembered],
  ['hft90d', 3.8832, 5e-5, remembered],
  ['hft95', 3.8112, 5e-5, remembered],
  ['hft116d', 4.2186, 5e-5, remembered],
  ['hft144d', 4.5386, 5e-5, remembered],
  ['hft169d', 4.8347, 5e-5, heinzel],
  ['hft196d', 5.1134, 5e-5, remembered],
  ['hft223d', 5.3888, 5e-5, remembered],
  ['hft248d', 5.6512, 5e-5, heinzel],
]

describe('noise bandwidth of windows against tables', () => {
  test('every window is in the table', () => {
    expect(bandwidths.map(([name]) => name).sort()).toEqual([...windowNames].sort())
  })

  test.each(bandwidths)('%s has %d bins', (name, expected, tolerance, source) => {
    const check: Check = {
      quantity: name,
      computed: () => noiseBandwidthInBins(name, long),
      expected,
      tolerance,
      source,
    }
    expect(deviation(check), source).toBeLessThanOrEqual(tolerance)
  })

  test('identity: the closed form is the sum, for any length', () => {
    for (const name of windowNames)
      for (const length of [2, 3, 7, 16, 20, 21, 22, 23, 64, 1000]) {
        const weights = windowWeights(name, length)
        const sum = weights.reduce((total, w) => total + w, 0)
        const squares = weights.reduce((total, w) => total + w * w, 0)
        expect(noiseBandwidthInBins(name, length) / ((length * squares) / (sum * sum))).toBeCloseTo(1, 11)
      }
  })

  test('limit: a long record of a window that is no sum of cosines', () => {
    for (const name of ['bartlett', 'welch'] as const)
      expect(Math.abs(noiseBandwidthInBins(name, long) / noiseBandwidthInBins(name, 2 * long) - 1)).toBeLessThan(1e-11)
  })

  test('in hertz it is the spacing of lines times the bins', () => {
    expect(noiseBandwidth('hann', { rate: 50e3, length: 4096 })).toBe((1.5 * 50e3) / 4096)
    expect(noiseBandwidth('rectangular', { rate: 1, length: 1 })).toBe(1)
  })

  test('names are own ones', () => {
    expect([isWindowName('hann'), isWindowName('constructor'), isWindowName('')]).toEqual([true, false, false])
  })
})

/** |W(q bins)|/W(0) of a window's weights. */
function responseAt(weights: Float64Array, bins: number): number {
  let [re, im, sum] = [0, 0, 0]
  weights.forEach((w, j) => {
    const phase = (2 * Math.PI * bins * j) / weights.length
    re += w * Math.cos(phase)
    im -= w * Math.sin(phase)
    sum += w
  })
  return Math.hypot(re, im) / sum
}

function overlapCorrelation(weights: Float64Array, shift: number): number {
  let [product, square] = [0, 0]
  weights.forEach((w, j) => {
    product += w * (weights[j + shift] ?? 0)
    square += w * w
  })
  return product / square
}

function halfWidth(weights: Float64Array, ratio: number): number {
  let [low, high] = [0, 2]
  for (let step = 0; step < 60; step++) {
    const middle = (low + high) / 2
    if (responseAt(weights, middle) > ratio) low = middle
    else high = middle
  }
  return low
}

describe('the Hann window against tables', () => {
  const hann = windowWeights('hann', 4096)

  test.each([
    ['correlation at an overlap of 50 % in %', () => 100 * overlapCorrelation(hann, 2048), 16.7, 0.002, harris],
    ['correlation at an overlap of 75 % in %', () => 100 * overlapCorrelation(hann, 1024), 65.9, 0.001, harris],
    ['scalloping loss in dB', () => -20 * Math.log10(responseAt(hann, 0.5)), 1.42, 0.005, harris],
    ['width at 3 dB in bins', () => 2 * halfWidth(hann, 10 ** (-3 / 20)), 1.4382, 5e-5, heinzel],
    [
      'variance of an average with half overlap, times its number',
      () => 1 + 2 * overlapCorrelation(hann, 2048) ** 2,
      1.0555555555555556,
      1e-9,
      'Welch, IEEE Trans. AU 15, 70 (1967)',
    ],
  ] as const)('%s', (quantity, computed, expected, tolerance, source) => {
    expect(deviation({ quantity, computed, expected, tolerance, source }), source).toBeLessThanOrEqual(tolerance)
  })
})

describe('a flat top', () => {
  const tops = windowNames.filter(name => /^(?:flat|[sh]ft)/.test(name))

  // Published property of all of them: the largest loss of amplitude between two lines is below 0.02 dB for hft…, and
  // below 0.12 dB for the others [Heinzel, Rüdiger, Schilling 2002, from memory].
  test.each(tops)('%s has no scalloping', name => {
    const loss = -20 * Math.log10(responseAt(windowWeights(name, 1024), 0.5))
    expect(Math.abs(loss)).toBeLessThan(name.startsWith('hft') ? 0.02 : 0.12)
  })

  // The letter D marks windows that vanish at their ends [ibid.]: the printed digits cancel.
  test.each(tops.filter(name => /^hft\d+d$/.test(name)))('%s vanishes at its ends', name => {
    const { coefficients } = windowShapes[name] as { coefficients: readonly number[] }
    const end = coefficients.reduce((sum: number, a, k) => sum + (k % 2 === 0 ? a : -a), 0)
    expect(Math.abs(end)).toBeLessThan(1e-6)
  })
})
