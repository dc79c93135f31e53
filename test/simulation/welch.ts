import FFT from 'fft.js'

/** Segments of `length` samples, each half over the next, weighted by a raised cosine [Welch, IEEE Trans. Audio 15, 70 (1967)]. */
export const length = 2048
export const hop = length / 2

export const weights = Float64Array.from({ length }, (_, j) => Math.sin((Math.PI * j) / length) ** 2)
export const weightPower = weights.reduce((sum, w) => sum + w * w, 0)

/** Discrete transform of interleaved complex numbers, Σ c_n e^{−2πikn/N}. */
export function transform(data: Float64Array): Float64Array {
  const fft = new FFT(data.length / 2)
  const out = new Float64Array(data.length)
  fft.transform(out, data)
  return out
}

export const segments = (samples: number): number => Math.floor((samples - length) / hop) + 1

/** Averaged spectrum with the one-sided norm, 2|Z|²/(f_s Σw²), of a real record or of a complex one as (real, imaginary). */
export function welch(record: readonly Float64Array[], rate: number): Float64Array {
  const count = segments(record[0].length)
  const sum = new Float64Array(length)
  const data = new Float64Array(2 * length)
  const fft = new FFT(length)
  const out = new Float64Array(2 * length)
  for (let s = 0; s < count; s++) {
    for (let j = 0; j < length; j++) {
      data[2 * j] = weights[j] * record[0][s * hop + j]
      data[2 * j + 1] = record.length > 1 ? weights[j] * record[1][s * hop + j] : 0
    }
    fft.transform(out, data)
    for (let k = 0; k < length; k++) sum[k] += out[2 * k] ** 2 + out[2 * k + 1] ** 2
  }
  return sum.map(value => (2 * value) / (count * rate * weightPower))
}
