import { multiply as times } from '../physics/complex.js'
import { addForms, registerForm, scaleForm, type Form } from './form.js'

/**
 * Registers that hold A = 1/[h − i(Δ+ω)]. s(A − B) of two with the same h is s·i(Δ − Δ′)·A·B, which loses no digits where the two are
 * nearly equal: the stiffness of light far inside the linewidth.
 */
export class Decays {
  readonly #known = new Map<number, { half: number; detuning: number }>()

  add(register: number, values: { half: number; detuning: number }): void {
    this.#known.set(register, values)
  }

  /** The form with every such difference written as a product. */
  withoutCancellation(form: Form, multiply: (a: Form, b: Form) => Form): Form {
    for (const [i, a] of form.terms.entries()) {
      const first = this.#known.get(a.register)
      if (first === undefined) continue
      for (const b of form.terms.slice(i + 1)) {
        const second = this.#known.get(b.register)
        if (second?.half !== first.half || a.scale.re !== -b.scale.re || a.scale.im !== -b.scale.im) continue
        const rest: Form = { constant: form.constant, terms: form.terms.filter(t => t !== a && t !== b) }
        const product = multiply(registerForm(a.register), registerForm(b.register))
        const factor = times(a.scale, { re: 0, im: first.detuning - second.detuning })
        return this.withoutCancellation(addForms(rest, scaleForm(product, factor)), multiply)
      }
    }
    return form
  }
}
