import type { Complex } from '../model/network.js'
import { multiply as times, reciprocal } from '../physics/complex.js'

/** A complex value at every point as a linear form over registers: c + Σ s_i·register_i. Scaling and adding are free. */
export interface Form {
  readonly constant: Complex
  readonly terms: readonly Term[]
}

export interface Term {
  /** Address of the register in bytes. */
  readonly register: number
  readonly scale: Complex
}

const zero: Complex = { re: 0, im: 0 }

export const isZero = (a: Complex): boolean => a.re === 0 && a.im === 0

export const zeroForm: Form = { constant: zero, terms: [] }

export const constantForm = (constant: Complex): Form => ({ constant, terms: [] })

export const registerForm = (register: number): Form => ({
  constant: zero,
  terms: [{ register, scale: { re: 1, im: 0 } }],
})

export const isZeroForm = (form: Form): boolean => form.terms.length === 0 && isZero(form.constant)

/** True where no register is needed. */
export const isConstant = (form: Form): boolean => form.terms.length === 0

/** True where the form is one register with a scale in front. */
export const isSingle = (form: Form): boolean => form.terms.length === 1 && isZero(form.constant)

export function scaleForm(form: Form, factor: Complex): Form {
  if (isZero(factor)) return zeroForm
  if (factor.re === 1 && factor.im === 0) return form
  return {
    constant: times(form.constant, factor),
    terms: form.terms.map(t => ({ register: t.register, scale: times(t.scale, factor) })),
  }
}

export function addForms(a: Form, b: Form): Form {
  if (isZeroForm(a)) return b
  if (isZeroForm(b)) return a
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

/** 1/c of a constant form. */
export const reciprocalConstant = (form: Form): Form => constantForm(reciprocal(form.constant))
