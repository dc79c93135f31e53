import type { Complex } from '../model/network.js'
import { EngineFault } from '../model/problem.js'
import { conjugate, multiply as times, norm, reciprocal } from '../physics/complex.js'
import { addUp } from './add-up.js'
import { Decays } from './decays.js'
import {
  addForms,
  isConstant,
  isSingle,
  isZero,
  isZeroForm,
  reciprocalConstant,
  registerForm,
  scaleForm,
  zeroForm,
  type Form,
  type Term,
} from './form.js'
import type { GridArrays } from './grid-arrays.js'
import { KeyTree, type Key } from './key-tree.js'
import { blockBytes, blockCapacity, blockLength, loops } from './loops.js'
import { copyIn } from './registers.js'
import { arrayKey, constantReal, gridReal, mergeReals, realZero, registerReal, scaleReal, type Real } from './real.js'

/** What a step is given at each block. */
export interface Block {
  readonly grid: GridArrays
  start: number
  n: number
}

type Step = (block: Block) => void

/** Addresses of the block's frequency, anchor frequency and offset in Hz, which every tape loads first. */
export const inputs = { frequency: 0, base: blockBytes, offset: 2 * blockBytes } as const

/**
 * The list of array operations that one network needs at each block of points, written once and symbolically: values are
 * linear forms over registers (`Form`), so that scaling and adding cost nothing until a product, a reciprocal or a modulus
 * needs one array. Equal operations are written once.
 */
export class Tape {
  readonly #steps: Step[] = []
  readonly #known = new KeyTree()
  readonly #decays = new Decays()
  /** Real registers that hold |a|² or 1/|a|² of a complex register: their product is 1. */
  readonly #moduli = new Map<number, { of: number; inverse: boolean }>()
  #blocks = 3

  /** Runs all steps on each block of the grid, then hands the block to `copy`. */
  run(grid: GridArrays, copy: (block: Block) => void): void {
    const block: Block = { grid, start: 0, n: 0 }
    for (let start = 0; start < grid.length; start += blockLength) {
      block.start = start
      block.n = Math.min(blockLength, grid.length - start)
      copyIn(grid.frequency, block, inputs.frequency)
      copyIn(grid.base, block, inputs.base)
      copyIn(grid.offset, block, inputs.offset)
      for (const step of this.#steps) step(block)
      copy(block)
    }
  }

  #register(key: Key, blocks: number, step: (out: number) => Step): number {
    const node = this.#known.find(key)
    if (node.address < 0) {
      node.address = this.#blocks * blockBytes
      this.#blocks += blocks
      if (this.#blocks > blockCapacity) throw new EngineFault(`this budget needs more than ${blockCapacity} arrays`)
      this.#steps.push(step(node.address))
    }
    return node.address
  }

  /** A complex register filled by a step that is written once for each key. */
  complex(key: Key, step: (out: number) => Step): Form {
    return registerForm(this.#register(key, 2, step))
  }

  /** A real register, likewise. */
  real(key: Key, step: (out: number) => Step): Real {
    return registerReal(this.#register(key, 1, step))
  }

  /** 1/[κ/2 − i(Δ + ω)], rates in rad/s. */
  decayReciprocal(values: { half: number; detuning: number }): Form {
    const half = values.half
    const detuning = values.detuning + 0
    const form = this.complex(['decay', half, detuning], out => ({ n }) => {
      loops.decayReciprocal(out, inputs.frequency, n, half, detuning)
    })
    this.#decays.add(form.terms[0].register, { half, detuning })
    return form
  }

  /** The form as one register with a scale in front, or a constant. */
  single(form: Form): Form {
    if (isConstant(form) || isSingle(form)) return form
    const { register, scale } = this.#single(form)
    return scaleForm(registerForm(register), scale)
  }

  /** The same as a term; a form with more terms is written to a register of its own. */
  #single(form: Form): Term {
    if (isSingle(form)) return form.terms[0]
    const exact = this.#decays.withoutCancellation(form, (a, b) => this.multiply(a, b))
    return (isSingle(exact) ? exact : this.#combine(exact)).terms[0]
  }

  #combine({ constant: c, terms }: Form): Form {
    const key = ['combine', c.re, c.im, ...terms.flatMap(t => [t.register, t.scale.re, t.scale.im])]
    const [a, b, ...rest] = terms
    if (b === undefined) {
      return this.complex(
        key,
        out =>
          ({ n }) =>
            loops.affine(out, a.register, n, a.scale.re, a.scale.im, c.re, c.im),
      )
    }
    const [s, t] = [a.scale, b.scale]
    return this.complex(key, out => ({ n }) => {
      loops.combine(out, a.register, b.register, n, s.re, s.im, t.re, t.im, c.re, c.im)
      for (const term of rest) loops.addScaled(out, term.register, n, term.scale.re, term.scale.im)
    })
  }

  multiply(a: Form, b: Form): Form {
    if (isZeroForm(a) || isZeroForm(b)) return zeroForm
    if (isConstant(a)) return scaleForm(b, a.constant)
    if (isConstant(b)) return scaleForm(a, b.constant)
    // (c + s·A)·t·B is kept as c·t·B + s·t·A·B: the product A·B is often wanted for itself.
    if (a.terms.length === 1 && !isSingle(a) && isSingle(b)) {
      return addForms(scaleForm(b, a.constant), this.multiply({ constant: { re: 0, im: 0 }, terms: a.terms }, b))
    }
    if (b.terms.length === 1 && !isSingle(b) && isSingle(a)) return this.multiply(b, a)
    const [x, y] = [this.#single(a), this.#single(b)].sort((p, q) => p.register - q.register)
    const product = this.complex(['multiply', x.register, y.register], out => ({ n }) => {
      loops.multiply(out, x.register, y.register, n)
    })
    return scaleForm(product, times(x.scale, y.scale))
  }

  reciprocal(a: Form): Form {
    if (isConstant(a)) return reciprocalConstant(a)
    const { register, scale } = this.#single(a)
    const form = this.complex(
      ['reciprocal', register],
      out =>
        ({ n }) =>
          loops.reciprocal(out, register, n),
    )
    return scaleForm(form, reciprocal(scale))
  }

  divide(a: Form, b: Form): Form {
    if (isZeroForm(a)) return zeroForm
    if (isConstant(b)) return scaleForm(a, reciprocal(b.constant))
    if (isConstant(a)) return scaleForm(this.reciprocal(b), a.constant)
    const [x, y] = [this.#single(a), this.#single(b)]
    const form = this.complex(['divide', x.register, y.register], out => ({ n }) => {
      loops.divide(out, x.register, y.register, n)
    })
    return scaleForm(form, times(x.scale, reciprocal(y.scale)))
  }

  /** |a|². */
  abs2(a: Form): Real {
    if (isConstant(a)) return constantReal(norm(a.constant))
    const { register, scale } = this.#single(a)
    const real = this.real(
      ['abs2', register],
      out =>
        ({ n }) =>
          loops.abs2(out, register, n),
    )
    this.#moduli.set(addressOf(real), { of: register, inverse: false })
    return scaleReal(real, norm(scale))
  }

  /** 1/|a|². */
  inverseAbs2(a: Form): Real {
    if (isConstant(a)) return constantReal(1 / norm(a.constant))
    const { register, scale } = this.#single(a)
    const real = this.real(
      ['inverse', register],
      out =>
        ({ n }) =>
          loops.inverseAbs2(out, register, n),
    )
    this.#moduli.set(addressOf(real), { of: register, inverse: true })
    return scaleReal(real, 1 / norm(scale))
  }

  /** |a|. */
  modulus(a: Form): Real {
    return this.root(this.abs2(a))
  }

  /** √a of a real, NaN where it is negative. The scale is taken out, so that what differs by a factor alone shares one root. */
  root(square: Real): Real {
    if (square.array.kind === 'one') return constantReal(Math.sqrt(square.scale))
    if (square.array.kind === 'grid') {
      const { key, of } = square.array
      return gridReal(Math.sqrt(square.scale), `root ${key}`, grid => grid.root(of(grid)))
    }
    const { address } = square.array
    const real = this.real(
      ['root', address],
      out =>
        ({ n }) =>
          loops.root(out, address, n),
    )
    return scaleReal(real, Math.sqrt(square.scale))
  }

  /** |Im a|. */
  absImaginary(a: Form): Real {
    if (isConstant(a)) return constantReal(Math.abs(a.constant.im))
    const single = this.#single(a)
    const plain = single.scale.re === 1 && single.scale.im === 0
    const { register } = plain ? single : this.#combine({ constant: { re: 0, im: 0 }, terms: [single] }).terms[0]
    return this.real(
      ['imaginary', register],
      out =>
        ({ n }) =>
          loops.absImaginary(out, register, n),
    )
  }

  /** |a|²·p + |b|²·q for p, q > 0. */
  pair(a: Form, p: number, b: Form, q: number): Real {
    if (isConstant(a) || isConstant(b)) return this.sum([scaleReal(this.abs2(a), p), scaleReal(this.abs2(b), q)])
    const [x, y] = [this.#single(a), this.#single(b)]
    const first = p * norm(x.scale)
    // Rounded to 14 digits, so that ports that differ by their rate alone share one array.
    const ratio = Number(((q * norm(y.scale)) / first).toPrecision(14))
    const real = this.real(['pair', x.register, y.register, ratio], out => ({ n }) => {
      loops.pair(out, x.register, y.register, n, ratio)
    })
    return scaleReal(real, first)
  }

  /** Σ Re(c_k·a_k·b_k*). */
  cross(products: readonly { a: Form; b: Form; c: Complex }[]): Real {
    const live = products.filter(({ a, b, c }) => !isZeroForm(a) && !isZeroForm(b) && !isZero(c))
    if (live.length === 0) return realZero
    const parts = live.map(({ a, b, c }) => {
      const [x, y] = [this.#written(a), this.#written(b)]
      return { x: x.register, y: y.register, factor: times(c, times(x.scale, conjugate(y.scale))) }
    })
    const key = ['cross', ...parts.flatMap(p => [p.x, p.y, p.factor.re, p.factor.im])]
    return this.real(key, out => ({ n }) => {
      for (const [i, { x, y, factor }] of parts.entries()) {
        if (i === 0) loops.cross(out, x, y, n, factor.re, factor.im)
        else loops.addCross(out, x, y, n, factor.re, factor.im)
      }
    })
  }

  /** Like `#single`, for constants too. */
  #written(a: Form): Term {
    if (!isConstant(a)) return this.#single(a)
    const unit = this.complex(['unit'], out => ({ n }) => {
      loops.constant(out, n, 1)
      loops.constant(out + blockBytes, n, 0)
    })
    return { register: unit.terms[0].register, scale: a.constant }
  }

  product(a: Real, b: Real): Real {
    if (a.scale === 0 || b.scale === 0) return realZero
    if (a.array.kind === 'one') return scaleReal(b, a.scale)
    if (b.array.kind === 'one') return scaleReal(a, b.scale)
    const [x, y] = [this.#address(a), this.#address(b)].sort((p, q) => p - q)
    const [p, q] = [this.#moduli.get(x), this.#moduli.get(y)]
    const one = p !== undefined && q !== undefined && p.of === q.of && p.inverse !== q.inverse
    if (one) return constantReal(a.scale * b.scale)
    const real = this.real(
      ['product', x, y],
      out =>
        ({ n }) =>
          loops.product(out, x, y, n),
    )
    return scaleReal(real, a.scale * b.scale)
  }

  /** a/b. */
  ratio(a: Real, b: Real): Real {
    if (b.array.kind === 'one') return scaleReal(a, 1 / b.scale)
    const [x, y] = [this.#address(a), this.#address(b)]
    if (x === y) return constantReal(a.scale / b.scale)
    const real = this.real(
      ['ratio', x, y],
      out =>
        ({ n }) =>
          loops.ratio(out, x, y, n),
    )
    return scaleReal(real, a.scale / b.scale)
  }

  /** Σ of reals as one array; sums over the same arrays with the same scales are one register. */
  sum(terms: readonly Real[]): Real {
    const live = mergeReals(terms)
    if (live.length === 0) return realZero
    if (live.length === 1) return live[0]
    const written = live.map(term => ({ address: this.#address(term), scale: term.scale }))
    const key = ['sum', ...written.flatMap(t => [t.scale, t.address])]
    return this.real(
      key,
      out =>
        ({ n }) =>
          addUp(out, written, n),
    )
  }

  /** The address of the array in front of which the scale stands. */
  #address({ array }: Real): number {
    if (array.kind === 'register') return array.address
    return addressOf(
      this.real(['copy', arrayKey(array)], out => block => {
        if (array.kind === 'grid') copyIn(array.of(block.grid), block, out)
        else loops.constant(out, block.n, 1)
      }),
    )
  }

  /** The address of Σ terms written as they are, scale included: what an evaluation copies out. */
  written(terms: readonly Real[]): number {
    const total = this.sum(terms)
    const address = this.#address(total)
    const { scale } = total
    if (scale === 1) return address
    return addressOf(
      this.real(
        ['sum', scale, '*', address],
        out =>
          ({ n }) =>
            loops.sum1(out, address, n, scale),
      ),
    )
  }
}

const addressOf = (real: Real): number => (real.array.kind === 'register' ? real.array.address : -1)
