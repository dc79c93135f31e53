import type { Loops } from './array-loops.js'
import { blockLength } from './simd-module.js'

/**
 * The loops over frequency in TypeScript, for where WebAssembly is not allowed. Same operations in the same order as
 * `.ci/generate-simd.mjs`, so that both give the same bits.
 */
export function plainLoops(m: Float64Array): Loops {
  const B = blockLength
  const over = (bytes: number): number => bytes >> 3
  return {
    multiply(out, a, b, n) {
      for (let i = 0, o = over(out), p = over(a), q = over(b); i < n; i++, o++, p++, q++) {
        const [x, y, u, v] = [m[p], m[p + B], m[q], m[q + B]]
        m[o] = x * u - y * v
        m[o + B] = x * v + y * u
      }
    },
    reciprocal(out, a, n) {
      for (let i = 0, o = over(out), p = over(a); i < n; i++, o++, p++) {
        const [x, y] = [m[p], m[p + B]]
        const r = 1 / (x * x + y * y)
        m[o] = x * r
        m[o + B] = -y * r
      }
    },
    divide(out, a, b, n) {
      for (let i = 0, o = over(out), p = over(a), q = over(b); i < n; i++, o++, p++, q++) {
        const [u, v] = [m[q], m[q + B]]
        const r = 1 / (u * u + v * v)
        const x = m[p] * r
        const y = m[p + B] * r
        m[o] = x * u + y * v
        m[o + B] = y * u - x * v
      }
    },
    affine(out, a, n, sr, si, cr, ci) {
      for (let i = 0, o = over(out), p = over(a); i < n; i++, o++, p++) {
        const [x, y] = [m[p], m[p + B]]
        m[o] = sr * x - si * y + cr
        m[o + B] = sr * y + si * x + ci
      }
    },
    combine(out, a, b, n, sr, si, tr, ti, cr, ci) {
      for (let i = 0, o = over(out), p = over(a), q = over(b); i < n; i++, o++, p++, q++) {
        const [x, y, u, v] = [m[p], m[p + B], m[q], m[q + B]]
        m[o] = sr * x - si * y + (tr * u - ti * v) + cr
        m[o + B] = sr * y + si * x + (tr * v + ti * u) + ci
      }
    },
    addScaled(out, a, n, sr, si) {
      for (let i = 0, o = over(out), p = over(a); i < n; i++, o++, p++) {
        const [x, y] = [m[p], m[p + B]]
        m[o] += sr * x - si * y
        m[o + B] += sr * y + si * x
      }
    },
    abs2(out, a, n) {
      for (let i = 0, o = over(out), p = over(a); i < n; i++, o++, p++) {
        const [x, y] = [m[p], m[p + B]]
        m[o] = x * x + y * y
      }
    },
    inverseAbs2(out, a, n) {
      for (let i = 0, o = over(out), p = over(a); i < n; i++, o++, p++) {
        const [x, y] = [m[p], m[p + B]]
        m[o] = 1 / (x * x + y * y)
      }
    },
    absImaginary(out, a, n) {
      for (let i = 0, o = over(out), p = over(a); i < n; i++, o++, p++) m[o] = Math.abs(m[p + B])
    },
    pair(out, a, b, n, ratio) {
      for (let i = 0, o = over(out), p = over(a), q = over(b); i < n; i++, o++, p++, q++) {
        const [x, y, u, v] = [m[p], m[p + B], m[q], m[q + B]]
        m[o] = x * x + y * y + ratio * (u * u + v * v)
      }
    },
    cross(out, a, b, n, cr, ci) {
      for (let i = 0, o = over(out), p = over(a), q = over(b); i < n; i++, o++, p++, q++) {
        const [x, y, u, v] = [m[p], m[p + B], m[q], m[q + B]]
        m[o] = cr * (x * u + y * v) - ci * (y * u - x * v)
      }
    },
    addCross(out, a, b, n, cr, ci) {
      for (let i = 0, o = over(out), p = over(a), q = over(b); i < n; i++, o++, p++, q++) {
        const [x, y, u, v] = [m[p], m[p + B], m[q], m[q + B]]
        m[o] += cr * (x * u + y * v) - ci * (y * u - x * v)
      }
    },
    product(out, a, b, n) {
      for (let i = 0, o = over(out), p = over(a), q = over(b); i < n; i++, o++, p++, q++) m[o] = m[p] * m[q]
    },
    ratio(out, a, b, n) {
      for (let i = 0, o = over(out), p = over(a), q = over(b); i < n; i++, o++, p++, q++) m[o] = m[p] / m[q]
    },
    root(out, a, n) {
      for (let i = 0, o = over(out), p = over(a); i < n; i++, o++, p++) m[o] = Math.sqrt(m[p])
    },
    sum1(out, a, n, s0) {
      for (let i = 0, o = over(out), p = over(a); i < n; i++, o++, p++) m[o] = s0 * m[p]
    },
    sum2(out, a, b, n, s0, s1) {
      for (let i = 0, o = over(out), p = over(a), q = over(b); i < n; i++, o++, p++, q++) m[o] = s0 * m[p] + s1 * m[q]
    },
    sum4(out, a, b, c, d, n, s0, s1, s2, s3) {
      const [o, p, q, r, s] = [out, a, b, c, d].map(over)
      for (let i = 0; i < n; i++) m[o + i] = s0 * m[p + i] + s1 * m[q + i] + s2 * m[r + i] + s3 * m[s + i]
    },
    constant(out, n, value) {
      m.fill(value, over(out), over(out) + n)
    },
    oscillator(out, f, base, offset, n, stiffness, frequency, slope, level) {
      const [o, p, q, r] = [out, f, base, offset].map(over)
      for (let i = 0; i < n; i++) {
        const x = m[p + i]
        m[o + i] = stiffness * (frequency - m[q + i] - m[r + i]) * (frequency + x)
        m[o + B + i] = slope * x + level
      }
    },
    decayReciprocal(out, f, n, half, detuning) {
      for (let i = 0, o = over(out), p = over(f); i < n; i++, o++, p++) {
        const shift = detuning + 2 * Math.PI * m[p]
        const r = 1 / (half * half + shift * shift)
        m[o] = half * r
        m[o + B] = shift * r
      }
    },
    warmBath(out, f, n, classical, ratio) {
      for (let i = 0, o = over(out), p = over(f); i < n; i++, o++, p++) {
        const x = ratio * m[p]
        const r = x * x
        const series = 1 / 3 + r * (-1 / 45 + r * (2 / 945 + r * (-1 / 4725 + r * (2 / 93555 + 0))))
        m[o] = classical * (1 + r * series)
      }
    },
  }
}
