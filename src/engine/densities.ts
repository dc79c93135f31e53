import type { Complex, Covariance } from '../model/network.js'
import type { Form } from './form.js'
import { realZero, scaleReal, type Real } from './real.js'
import type { Tape } from './tape.js'

const isZero = (c: Complex): boolean => c.re === 0 && c.im === 0

/** t S t† of a Hermitian block, one-sided like the block. */
export function quadratic(tape: Tape, t: readonly Form[], block: Covariance): Real {
  const diagonal = block.every((row, i) => row.every((value, j) => i === j || isZero(value)))
  if (diagonal && t.length === 1) return scaleReal(tape.abs2(t[0]), block[0][0].re)
  if (diagonal && t.length === 2 && block[0][0].re > 0 && block[1][1].re > 0) {
    return tape.pair(t[0], block[0][0].re, t[1], block[1][1].re)
  }
  return bilinear(tape, t, block, t)
}

/** Re(x S y†). */
export function bilinear(tape: Tape, x: readonly Form[], block: Covariance, y: readonly Form[]): Real {
  const products = block.flatMap((row, i) => row.map((c, j) => ({ a: x[i], b: y[j], c })))
  return products.length === 0 ? realZero : tape.cross(products)
}
