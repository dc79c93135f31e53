/*
 * The loops over frequency. All work on split real and imaginary arrays of one block; all budgets share them, so they
 * are compiled hot once. `out` may alias an input unless said otherwise; arrays of the grid are read from `start`.
 */

/** Points a block: registers of one evaluation then stay in the second-level cache. */
export const blockLength = 512

/** A complex register: real and imaginary parts of one block. */
export interface Split {
  readonly re: Float64Array
  readonly im: Float64Array
}

export function multiplyInto(out: Split, a: Split, b: Split, n: number): void {
  const { re, im } = out
  const { re: ar, im: ai } = a
  const { re: br, im: bi } = b
  for (let i = 0; i < n; i++) {
    const x = ar[i]
    const y = ai[i]
    const u = br[i]
    const v = bi[i]
    re[i] = x * u - y * v
    im[i] = x * v + y * u
  }
}

export function reciprocalInto(out: Split, a: Split, n: number): void {
  const { re, im } = out
  const { re: ar, im: ai } = a
  for (let i = 0; i < n; i++) {
    const x = ar[i]
    const y = ai[i]
    const r = 1 / (x * x + y * y)
    re[i] = x * r
    im[i] = -y * r
  }
}

/** out = a / b. */
export function divideInto(out: Split, a: Split, b: Split, n: number): void {
  const { re, im } = out
  const { re: ar, im: ai } = a
  const { re: br, im: bi } = b
  for (let i = 0; i < n; i++) {
    const u = br[i]
    const v = bi[i]
    const r = 1 / (u * u + v * v)
    const x = ar[i] * r
    const y = ai[i] * r
    re[i] = x * u + y * v
    im[i] = y * u - x * v
  }
}

/** out = s·a + c for complex s and c. */
export function affineInto(out: Split, a: Split, s: Float64Array, n: number): void {
  const { re, im } = out
  const { re: ar, im: ai } = a
  const sr = s[0]
  const si = s[1]
  const cr = s[2]
  const ci = s[3]
  for (let i = 0; i < n; i++) {
    const x = ar[i]
    const y = ai[i]
    re[i] = sr * x - si * y + cr
    im[i] = sr * y + si * x + ci
  }
}

/** out = s·a + t·b + c; `s` holds s, t, c as re, im pairs. */
export function combineInto(out: Split, a: Split, b: Split, s: Float64Array, n: number): void {
  const { re, im } = out
  const { re: ar, im: ai } = a
  const { re: br, im: bi } = b
  const sr = s[0]
  const si = s[1]
  const tr = s[2]
  const ti = s[3]
  const cr = s[4]
  const ci = s[5]
  for (let i = 0; i < n; i++) {
    const x = ar[i]
    const y = ai[i]
    const u = br[i]
    const v = bi[i]
    re[i] = sr * x - si * y + (tr * u - ti * v) + cr
    im[i] = sr * y + si * x + (tr * v + ti * u) + ci
  }
}

/** out += s·a; `out` must not be `a`. */
export function addScaledInto(out: Split, a: Split, sr: number, si: number, n: number): void {
  const { re, im } = out
  const { re: ar, im: ai } = a
  for (let i = 0; i < n; i++) {
    const x = ar[i]
    const y = ai[i]
    re[i] += sr * x - si * y
    im[i] += sr * y + si * x
  }
}

/** out = |a|². */
export function abs2Into(out: Float64Array, a: Split, n: number): void {
  const { re, im } = a
  for (let i = 0; i < n; i++) {
    const x = re[i]
    const y = im[i]
    out[i] = x * x + y * y
  }
}

/** out = 1/|a|². */
export function inverseAbs2Into(out: Float64Array, a: Split, n: number): void {
  const { re, im } = a
  for (let i = 0; i < n; i++) {
    const x = re[i]
    const y = im[i]
    out[i] = 1 / (x * x + y * y)
  }
}

/** out = |Im a|. */
export function absImaginaryInto(out: Float64Array, a: Split, n: number): void {
  const { im } = a
  for (let i = 0; i < n; i++) out[i] = Math.abs(im[i])
}

/** out = |a|² + ρ|b|². */
export function pairInto(out: Float64Array, a: Split, b: Split, ratio: number, n: number): void {
  const { re: ar, im: ai } = a
  const { re: br, im: bi } = b
  for (let i = 0; i < n; i++) {
    const x = ar[i]
    const y = ai[i]
    const u = br[i]
    const v = bi[i]
    out[i] = x * x + y * y + ratio * (u * u + v * v)
  }
}

/** out = c₀Re(a b*) − c₁Im(a b*) = Re(c·a·b*). */
export function crossInto(out: Float64Array, a: Split, b: Split, c: Float64Array, n: number): void {
  const { re: ar, im: ai } = a
  const { re: br, im: bi } = b
  const cr = c[0]
  const ci = c[1]
  for (let i = 0; i < n; i++) {
    const x = ar[i]
    const y = ai[i]
    const u = br[i]
    const v = bi[i]
    out[i] = cr * (x * u + y * v) - ci * (y * u - x * v)
  }
}

/** out = Re(c·a·b*) + out. */
export function addCrossInto(out: Float64Array, a: Split, b: Split, c: Float64Array, n: number): void {
  const { re: ar, im: ai } = a
  const { re: br, im: bi } = b
  const cr = c[0]
  const ci = c[1]
  for (let i = 0; i < n; i++) {
    const x = ar[i]
    const y = ai[i]
    const u = br[i]
    const v = bi[i]
    out[i] += cr * (x * u + y * v) - ci * (y * u - x * v)
  }
}

export function productInto(out: Float64Array, a: Float64Array, b: Float64Array, n: number): void {
  for (let i = 0; i < n; i++) out[i] = a[i] * b[i]
}

/** out = a·b with b an array of the grid. */
export function productGridInto(out: Float64Array, a: Float64Array, b: Float64Array, start: number, n: number): void {
  for (let i = 0; i < n; i++) out[i] = a[i] * b[start + i]
}

export function ratioInto(out: Float64Array, a: Float64Array, b: Float64Array, n: number): void {
  for (let i = 0; i < n; i++) out[i] = a[i] / b[i]
}

export function rootInto(out: Float64Array, a: Float64Array, n: number): void {
  for (let i = 0; i < n; i++) out[i] = Math.sqrt(a[i])
}

/** target[start + i] += scale·a[i]. */
export function emit(target: Float64Array, start: number, a: Float64Array, scale: number, n: number): void {
  for (let i = 0; i < n; i++) target[start + i] += scale * a[i]
}

/** target[start + i] = scale·a[i]. */
export function emitFirst(target: Float64Array, start: number, a: Float64Array, scale: number, n: number): void {
  for (let i = 0; i < n; i++) target[start + i] = scale * a[i]
}

/** target[start + i] += scale·a[start + i], a being an array of the grid. */
export function emitGrid(target: Float64Array, start: number, a: Float64Array, scale: number, n: number): void {
  const end = start + n
  for (let i = start; i < end; i++) target[i] += scale * a[i]
}

/** target[start + i] += value. */
export function emitConstant(target: Float64Array, start: number, value: number, n: number): void {
  const end = start + n
  for (let i = start; i < end; i++) target[i] += value
}
