import type { Complex, Shape } from '../model/network.js'
import * as arrays from './arrays.js'
import type { Split } from './arrays.js'
import { fillBath, fillBathOverOmega, fillDecayReciprocal, fillOscillator } from './forms.js'
import type { GridArrays } from './grid-arrays.js'

/*
 * A tape is the list of array operations that one network needs at each block of points. It is written once for a
 * network, symbolically: values are linear forms over registers with complex scalars in front, so that scaling and adding
 * cost nothing until a product, a reciprocal or a modulus needs one array. Equal operations are written once.
 */

/** c + Σ s_i·register_i. */
export interface Form {
  readonly constant: Complex
  readonly terms: readonly { readonly register: number; readonly scale: Complex }[]
}

/** scale × a real array: a register, an array of the grid, or 1. */
export interface Real {
  readonly scale: number
  readonly array: RealArray
}

type RealArray =
  | { readonly kind: 'one' }
  | { readonly kind: 'register'; readonly index: number }
  | { readonly kind: 'grid'; readonly key: string; readonly of: (grid: GridArrays) => Float64Array }

type Step = (grid: GridArrays, start: number, n: number) => void

/** Registers are shared by all tapes: a tape runs to its end before another begins. */
const complexPool: Split[] = []
const realPool: Float64Array[] = []

function complexRegister(index: number): Split {
  while (complexPool.length <= index) {
    complexPool.push({ re: new Float64Array(arrays.blockLength), im: new Float64Array(arrays.blockLength) })
  }
  return complexPool[index]
}

function realRegister(index: number): Float64Array {
  while (realPool.length <= index) realPool.push(new Float64Array(arrays.blockLength))
  return realPool[index]
}

const zero: Complex = { re: 0, im: 0 }

const times = (a: Complex, b: Complex): Complex => ({ re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re })

const isZero = (a: Complex): boolean => a.re === 0 && a.im === 0

export const zeroForm: Form = { constant: zero, terms: [] }

export const constantForm = (constant: Complex): Form => ({ constant, terms: [] })

export const isZeroForm = (form: Form): boolean => form.terms.length === 0 && isZero(form.constant)

export function scaleForm(form: Form, factor: Complex): Form {
  if (isZero(factor)) return zeroForm
  return {
    constant: times(form.constant, factor),
    terms: form.terms.map(t => ({ register: t.register, scale: times(t.scale, factor) })),
  }
}

export function addForms(a: Form, b: Form): Form {
  const terms = a.terms.map(t => ({ ...t }))
  for (const term of b.terms) {
    const twin = terms.find(t => t.register === term.register)
    if (twin === undefined) terms.push({ ...term })
    else twin.scale = { re: twin.scale.re + term.scale.re, im: twin.scale.im + term.scale.im }
  }
  return {
    constant: { re: a.constant.re + b.constant.re, im: a.constant.im + b.constant.im },
    terms: terms.filter(t => !isZero(t.scale)),
  }
}

export const negateForm = (form: Form): Form => scaleForm(form, { re: -1, im: 0 })

export const realZero: Real = { scale: 0, array: { kind: 'one' } }

export class Tape {
  readonly #steps: Step[] = []
  readonly #known = new Map<string, number>()
  /** Registers that hold 1/[κ/2 − i(Δ+ω)], for the exact difference of two of them. */
  readonly #decays = new Map<number, { half: number; detuning: number }>()
  /** Real registers that hold |a|² or 1/|a|² of a complex register: their product is 1. */
  readonly #moduli = new Map<number, { of: number; inverse: boolean }>()
  #complexCount = 0
  #realCount = 0

  /** Operations on the tape, for tests and benchmarks. */
  get length(): number {
    return this.#steps.length
  }

  run(grid: GridArrays): void {
    for (let start = 0; start < grid.length; start += arrays.blockLength) {
      const n = Math.min(arrays.blockLength, grid.length - start)
      for (const step of this.#steps) step(grid, start, n)
    }
  }

  #complex(key: string, step: (out: Split) => Step): Form {
    let register = this.#known.get(key)
    if (register === undefined) {
      register = this.#complexCount++
      this.#known.set(key, register)
      this.#steps.push(step(complexRegister(register)))
    }
    return { constant: zero, terms: [{ register, scale: { re: 1, im: 0 } }] }
  }

  #real(key: string, step: (out: Float64Array) => Step): Real {
    let index = this.#known.get(key)
    if (index === undefined) {
      index = this.#realCount++
      this.#known.set(key, index)
      this.#steps.push(step(realRegister(index)))
    }
    return { scale: 1, array: { kind: 'register', index } }
  }

  oscillator(values: { mass: number; frequency: number; gamma: number; phi: number }): Form {
    const key = `oscillator ${values.mass} ${values.frequency} ${values.gamma} ${values.phi}`
    return this.#complex(key, out => (grid, start, n) => fillOscillator(out, grid, { start, n }, values))
  }

  decayReciprocal(values: { half: number; detuning: number }): Form {
    const detuning = values.detuning + 0
    const key = `decay ${values.half} ${detuning}`
    const form = this.#complex(
      key,
      out => (grid, start, n) => fillDecayReciprocal(out, grid, { start, n }, { half: values.half, detuning }),
    )
    this.#decays.set(form.terms[0].register, { half: values.half, detuning })
    return form
  }

  /** The form as one register with a scale in front; a form with more terms is written to a register of its own. */
  #single(form: Form): { register: number; scale: Complex } {
    if (form.terms.length === 1 && isZero(form.constant)) return form.terms[0]
    const exact = this.#withoutCancellation(form)
    if (exact.terms.length === 1 && isZero(exact.constant)) return exact.terms[0]
    return this.#combine(exact).terms[0]
  }

  /**
   * s(A − B) with A, B = 1/[h − i(Δ+ω)], 1/[h − i(Δ′+ω)] is s·i(Δ − Δ′)·A·B, which loses no digits where the two are nearly equal:
   * the stiffness of light far inside the linewidth.
   */
  #withoutCancellation(form: Form): Form {
    for (const [i, a] of form.terms.entries()) {
      const first = this.#decays.get(a.register)
      if (first === undefined) continue
      for (const b of form.terms.slice(i + 1)) {
        const second = this.#decays.get(b.register)
        if (second?.half !== first.half || a.scale.re !== -b.scale.re || a.scale.im !== -b.scale.im) continue
        const rest: Form = { constant: form.constant, terms: form.terms.filter(t => t !== a && t !== b) }
        const product = this.multiply(this.#of(a.register), this.#of(b.register))
        const factor = times(a.scale, { re: 0, im: first.detuning - second.detuning })
        return this.#withoutCancellation(addForms(rest, scaleForm(product, factor)))
      }
    }
    return form
  }

  #of(register: number): Form {
    return { constant: zero, terms: [{ register, scale: { re: 1, im: 0 } }] }
  }

  #combine(form: Form): Form {
    const { constant: c, terms } = form
    const key = `combine ${c.re} ${c.im} ${terms.map(t => `${t.register}*${t.scale.re},${t.scale.im}`).join(' ')}`
    const scales = Float64Array.from([...terms.flatMap(t => [t.scale.re, t.scale.im]), c.re, c.im])
    const inputs = terms.map(t => complexRegister(t.register))
    if (terms.length === 1) return this.#complex(key, out => (_, __, n) => arrays.affineInto(out, inputs[0], scales, n))
    const first = Float64Array.from([...scales.subarray(0, 4), c.re, c.im])
    const rest = terms.slice(2)
    return this.#complex(key, out => (_, __, n) => {
      arrays.combineInto(out, inputs[0], inputs[1], first, n)
      for (const [i, t] of rest.entries()) arrays.addScaledInto(out, inputs[i + 2], t.scale.re, t.scale.im, n)
    })
  }

  multiply(a: Form, b: Form): Form {
    if (isZeroForm(a) || isZeroForm(b)) return zeroForm
    if (a.terms.length === 0) return scaleForm(b, a.constant)
    if (b.terms.length === 0) return scaleForm(a, b.constant)
    // (c + s·A)·t·B is kept as c·t·B + s·t·A·B: the product A·B is often wanted for itself.
    if (a.terms.length === 1 && !isZero(a.constant) && b.terms.length === 1 && isZero(b.constant)) {
      return addForms(scaleForm(b, a.constant), this.multiply({ constant: zero, terms: a.terms }, b))
    }
    if (b.terms.length === 1 && !isZero(b.constant) && a.terms.length === 1 && isZero(a.constant))
      return this.multiply(b, a)
    const [x, y] = [this.#single(a), this.#single(b)]
    const [low, high] = x.register <= y.register ? [x, y] : [y, x]
    const product = this.#complex(
      `multiply ${low.register} ${high.register}`,
      out => (_, __, n) => arrays.multiplyInto(out, complexRegister(low.register), complexRegister(high.register), n),
    )
    return scaleForm(product, times(x.scale, y.scale))
  }

  reciprocal(a: Form): Form {
    if (a.terms.length === 0) return constantForm(reciprocalOf(a.constant))
    const x = this.#single(a)
    const form = this.#complex(
      `reciprocal ${x.register}`,
      out => (_, __, n) => arrays.reciprocalInto(out, complexRegister(x.register), n),
    )
    return scaleForm(form, reciprocalOf(x.scale))
  }

  divide(a: Form, b: Form): Form {
    if (isZeroForm(a)) return zeroForm
    if (b.terms.length === 0) return scaleForm(a, reciprocalOf(b.constant))
    if (a.terms.length === 0) return scaleForm(this.reciprocal(b), a.constant)
    const [x, y] = [this.#single(a), this.#single(b)]
    if (x.register === y.register) return constantForm(times(x.scale, reciprocalOf(y.scale)))
    const form = this.#complex(
      `divide ${x.register} ${y.register}`,
      out => (_, __, n) => arrays.divideInto(out, complexRegister(x.register), complexRegister(y.register), n),
    )
    return scaleForm(form, times(x.scale, reciprocalOf(y.scale)))
  }

  /** |a|². */
  abs2(a: Form): Real {
    if (a.terms.length === 0) return constantReal(a.constant.re ** 2 + a.constant.im ** 2)
    const { register, scale } = this.#single(a)
    const real = this.#real(`abs2 ${register}`, out => (_, __, n) => arrays.abs2Into(out, complexRegister(register), n))
    this.#moduli.set(indexOf(real), { of: register, inverse: false })
    return scaleReal(real, scale.re ** 2 + scale.im ** 2)
  }

  /** 1/|a|². */
  inverseAbs2(a: Form): Real {
    if (a.terms.length === 0) return constantReal(1 / (a.constant.re ** 2 + a.constant.im ** 2))
    const { register, scale } = this.#single(a)
    const real = this.#real(
      `inverse ${register}`,
      out => (_, __, n) => arrays.inverseAbs2Into(out, complexRegister(register), n),
    )
    this.#moduli.set(indexOf(real), { of: register, inverse: true })
    return scaleReal(real, 1 / (scale.re ** 2 + scale.im ** 2))
  }

  /** |a|. */
  modulus(a: Form): Real {
    return this.root(this.abs2(a))
  }

  /** √a of a real that is not negative. */
  root(a: Real): Real {
    if (a.array.kind === 'one') return constantReal(Math.sqrt(a.scale))
    const index = this.#index(a)
    const real = this.#real(`root ${index}`, out => (_, __, n) => arrays.rootInto(out, realRegister(index), n))
    return scaleReal(real, Math.sqrt(a.scale))
  }

  /** |Im a|. */
  absImaginary(a: Form): Real {
    if (a.terms.length === 0) return constantReal(Math.abs(a.constant.im))
    const { register } = this.#combineAlways(a)
    return this.#real(
      `imaginary ${register}`,
      out => (_, __, n) => arrays.absImaginaryInto(out, complexRegister(register), n),
    )
  }

  #combineAlways(a: Form): { register: number } {
    const single = this.#single(a)
    if (single.scale.re === 1 && single.scale.im === 0) return single
    return this.#combine({ constant: zero, terms: [single] }).terms[0]
  }

  /** |a|²·p + |b|²·q for p, q > 0. */
  pair(a: Form, p: number, b: Form, q: number): Real {
    if (isZeroForm(a)) return scaleReal(this.abs2(b), q)
    if (isZeroForm(b)) return scaleReal(this.abs2(a), p)
    if (a.terms.length === 0 || b.terms.length === 0) return this.#pairWithConstant(a, p, b, q)
    const [x, y] = [this.#single(a), this.#single(b)]
    const first = p * (x.scale.re ** 2 + x.scale.im ** 2)
    // Rounded to 14 digits, so that ports that differ by their rate alone share one array.
    const ratio = Number(((q * (y.scale.re ** 2 + y.scale.im ** 2)) / first).toPrecision(14))
    const real = this.#real(
      `pair ${x.register} ${y.register} ${ratio}`,
      out => (_, __, n) => arrays.pairInto(out, complexRegister(x.register), complexRegister(y.register), ratio, n),
    )
    return scaleReal(real, first)
  }

  #pairWithConstant(a: Form, p: number, b: Form, q: number): Real {
    if (a.terms.length === 0 && b.terms.length === 0) {
      return constantReal(this.abs2(a).scale * p + this.abs2(b).scale * q)
    }
    return this.sum([scaleReal(this.abs2(a), p), scaleReal(this.abs2(b), q)])
  }

  /** Σ Re(c_k·a_k·b_k*). */
  cross(products: readonly { a: Form; b: Form; c: Complex }[]): Real {
    const live = products.filter(({ a, b, c }) => !isZeroForm(a) && !isZeroForm(b) && !isZero(c))
    if (live.length === 0) return realZero
    const parts = live.map(({ a, b, c }) => {
      const [x, y] = [this.#register(a), this.#register(b)]
      const factor = times(c, times(x.scale, { re: y.scale.re, im: -y.scale.im }))
      return { x: x.register, y: y.register, factor: Float64Array.from([factor.re, factor.im]) }
    })
    const key = `cross ${parts.map(p => `${p.x} ${p.y} ${p.factor[0]},${p.factor[1]}`).join(' ')}`
    return this.#real(key, out => (_, __, n) => {
      for (const [i, { x, y, factor }] of parts.entries()) {
        const add = i === 0 ? arrays.crossInto : arrays.addCrossInto
        add(out, complexRegister(x), complexRegister(y), factor, n)
      }
    })
  }

  /** Also turns a constant into a register. */
  #register(a: Form): { register: number; scale: Complex } {
    if (a.terms.length > 0) return this.#single(a)
    const unit = this.#complex('unit', out => (_, __, n) => {
      out.re.fill(1, 0, n)
      out.im.fill(0, 0, n)
    })
    return { register: unit.terms[0].register, scale: a.constant }
  }

  product(a: Real, b: Real): Real {
    if (a.scale === 0 || b.scale === 0) return realZero
    if (a.array.kind === 'one') return scaleReal(b, a.scale)
    if (b.array.kind === 'one') return scaleReal(a, b.scale)
    if (b.array.kind === 'grid') {
      const index = this.#index(a)
      const { of, key } = b.array
      const real = this.#real(
        `product ${index} grid ${key}`,
        out => (grid, start, n) => arrays.productGridInto(out, realRegister(index), of(grid), start, n),
      )
      return scaleReal(real, a.scale * b.scale)
    }
    if (a.array.kind === 'grid') return this.product(b, a)
    const [p, q] = [this.#moduli.get(a.array.index), this.#moduli.get(b.array.index)]
    if (p !== undefined && q !== undefined && p.of === q.of && p.inverse !== q.inverse)
      return constantReal(a.scale * b.scale)
    const [i, j] = a.array.index <= b.array.index ? [a.array.index, b.array.index] : [b.array.index, a.array.index]
    const real = this.#real(
      `product ${i} ${j}`,
      out => (_, __, n) => arrays.productInto(out, realRegister(i), realRegister(j), n),
    )
    return scaleReal(real, a.scale * b.scale)
  }

  /** a/b. */
  ratio(a: Real, b: Real): Real {
    if (b.array.kind === 'one') return scaleReal(a, 1 / b.scale)
    const [i, j] = [this.#index(a), this.#index(b)]
    if (i === j) return constantReal(a.scale / b.scale)
    const real = this.#real(
      `ratio ${i} ${j}`,
      out => (_, __, n) => arrays.ratioInto(out, realRegister(i), realRegister(j), n),
    )
    return scaleReal(real, a.scale / b.scale)
  }

  /** Σ of reals as one array. */
  sum(terms: readonly Real[]): Real {
    const live = mergeReals(terms)
    if (live.length === 0) return realZero
    if (live.length === 1) return live[0]
    const key = `sum ${live.map(t => `${t.scale} ${arrayKey(t.array)}`).join(' + ')}`
    return this.#real(key, out => (grid, start, n) => {
      out.fill(0, 0, n)
      for (const term of live) addReal({ target: out, at: 0 }, term, grid, { start, n })
    })
  }

  #index(a: Real): number {
    if (a.array.kind === 'register') return a.array.index
    const array = a.array
    const real = this.#real(`copy ${arrayKey(array)}`, out => (grid, start, n) => {
      if (array.kind === 'grid') out.set(array.of(grid).subarray(start, start + n))
      else out.fill(1, 0, n)
    })
    return indexOf(real)
  }

  /** The density of a shape, one-sided. */
  shape(shape: Shape): Real {
    switch (shape.form) {
      case 'constant':
        return constantReal(shape.value)
      case 'power':
        return powerReal(shape)
      case 'table':
        return gridReal(shape.value, `table ${tableNumber(shape.table)}`, grid => grid.table(shape.table))
      case 'viscous bath':
      case 'structural bath': {
        const { temperature, strength, form } = shape
        const fill = form === 'viscous bath' ? fillBath : fillBathOverOmega
        const real = this.#real(
          `${form} ${temperature}`,
          out => (grid, start, n) => fill(out, grid, { start, n }, temperature),
        )
        return scaleReal(real, strength)
      }
    }
  }

  /** Writes Σ terms to a whole array of the evaluation. */
  output(target: Float64Array, terms: readonly Real[]): void {
    const live = mergeReals(terms)
    this.#steps.push((grid, start, n) => {
      const first = live[0]
      if (first?.array.kind === 'register') {
        arrays.emitFirst(target, start, realRegister(first.array.index), first.scale, n)
      } else {
        target.fill(0, start, start + n)
        if (first !== undefined) addReal({ target, at: start }, first, grid, { start, n })
      }
      for (let i = 1; i < live.length; i++) addReal({ target, at: start }, live[i], grid, { start, n })
    })
  }
}

/** target[at + i] += term on a block. */
function addReal(
  { target, at }: { target: Float64Array; at: number },
  term: Real,
  grid: GridArrays,
  { start, n }: { start: number; n: number },
): void {
  const { array, scale } = term
  if (array.kind === 'register') arrays.emit(target, at, realRegister(array.index), scale, n)
  else if (array.kind === 'one') arrays.emitConstant(target, at, scale, n)
  else if (at === start) arrays.emitGrid(target, start, array.of(grid), scale, n)
  else arrays.emit(target, at, array.of(grid).subarray(start, start + n), scale, n)
}

const indexOf = (real: Real): number => (real.array.kind === 'register' ? real.array.index : -1)

const arrayKey = (array: RealArray): string =>
  array.kind === 'one' ? 'one' : array.kind === 'register' ? `r${array.index}` : array.key

/** Terms over the same array become one; what vanishes is dropped. */
function mergeReals(terms: readonly Real[]): Real[] {
  const merged = new Map<string, Real>()
  for (const term of terms) {
    const key = arrayKey(term.array)
    const twin = merged.get(key)
    merged.set(key, twin === undefined ? term : { array: term.array, scale: twin.scale + term.scale })
  }
  return [...merged.values()].filter(term => term.scale !== 0)
}

export const constantReal = (value: number): Real => ({ scale: value, array: { kind: 'one' } })

export const scaleReal = (real: Real, factor: number): Real => ({ scale: real.scale * factor, array: real.array })

const gridReal = (scale: number, key: string, of: (grid: GridArrays) => Float64Array): Real => ({
  scale,
  array: { kind: 'grid', key, of },
})

function powerReal({ value, exponent, reference }: { value: number; exponent: number; reference: number }): Real {
  if (exponent === 0) return constantReal(value)
  return gridReal(value / reference ** exponent, `power ${exponent}`, grid => grid.power(exponent))
}

const tableNumbers = new WeakMap<object, number>()
let tables = 0

function tableNumber(table: object): number {
  let number = tableNumbers.get(table)
  if (number === undefined) {
    number = tables++
    tableNumbers.set(table, number)
  }
  return number
}

function reciprocalOf(a: Complex): Complex {
  const r = 1 / (a.re * a.re + a.im * a.im)
  return { re: a.re * r, im: -a.im * r }
}
