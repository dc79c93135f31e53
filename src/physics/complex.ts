import type { Complex } from '../model/network.js'

/** Complex arithmetic outside the loop over frequency; inside it, arrays are split into real and imaginary parts. */
export const complex = (re: number, im = 0): Complex => ({ re, im })

export const polar = (magnitude: number, phase: number): Complex => ({
  re: magnitude * Math.cos(phase),
  im: magnitude * Math.sin(phase),
})

export const add = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im })

export const subtract = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im })

export const multiply = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
})

export const scale = (a: Complex, factor: number): Complex => ({ re: a.re * factor, im: a.im * factor })

export const conjugate = (a: Complex): Complex => ({ re: a.re, im: -a.im })

/** 1/a by Smith's method, free of overflow in the intermediate |a|². */
export function reciprocal(a: Complex): Complex {
  if (Math.abs(a.re) >= Math.abs(a.im)) {
    const ratio = a.im / a.re
    const denominator = a.re + a.im * ratio
    return { re: 1 / denominator, im: -ratio / denominator }
  }
  const ratio = a.re / a.im
  const denominator = a.re * ratio + a.im
  return { re: ratio / denominator, im: -1 / denominator }
}

export const divide = (a: Complex, b: Complex): Complex => multiply(a, reciprocal(b))

export const magnitude = (a: Complex): number => Math.hypot(a.re, a.im)

/** |a|². */
export const norm = (a: Complex): number => a.re * a.re + a.im * a.im

export const phase = (a: Complex): number => Math.atan2(a.im, a.re)
