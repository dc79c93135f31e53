import type { Formula } from '../model/budget.js'
import { EngineFault, Refusal } from '../model/problem.js'
import { faultOf } from '../quantity/expression/fault-of.js'
import { run, runOver } from '../quantity/expression/run-program.js'
import { formatPlain } from '../quantity/format.js'
import type { Checked } from './expression.js'
import { placeWithin } from './tree.js'

/** Where a step takes a value from: a root (times a factor to the coherent unit), an earlier step, a constant of nature. */
export type Input =
  { readonly root: number; readonly factor: number } | { readonly step: number } | { readonly constant: number }

/** One expression with the origin of its inputs. */
export interface Step {
  readonly checked: Checked
  readonly inputs: readonly Input[]
}

/** What becomes of the last step's value: a factor to the canonical unit, or decibels to a ratio of powers. */
export type Outcome = { readonly factor: number } | { readonly level: true }

/** The steps of a formula, each behind those it needs; the last gives the result. Every step is computed once. */
export class StepwiseFormula implements Formula {
  readonly roots: readonly number[]

  readonly #steps: readonly Step[]
  readonly #outcome: Outcome

  constructor(steps: readonly Step[], outcome: Outcome) {
    this.#steps = steps
    this.#outcome = outcome
    const roots = steps.flatMap(step => step.inputs.flatMap(input => ('root' in input ? [input.root] : [])))
    this.roots = [...new Set(roots)].sort((a, b) => a - b)
  }

  value(roots: Float64Array): number {
    const { last, results } = this.#before(roots)
    if (last.checked.program.needsFrequency)
      throw new EngineFault('a formula of the frequency has no value without one')
    const settled = this.#settled(this.#single(last, results, roots))
    if (Number.isFinite(settled)) return settled
    throw refusal(last, 0, `${shown(last)} is beyond the numbers that are read`)
  }

  over(roots: Float64Array, frequency: Float64Array, out: Float64Array): void {
    const { last, results } = this.#before(roots)
    const inputs = inputsOf(last, results, roots)
    // The frequencies are kept where both are one array, for the sake of the refusal.
    const asked = out === frequency ? frequency.slice() : frequency
    const fault = runOver(last.checked.program, inputs, asked, out)
    if (fault >= 0) throw faultAt(last, inputs, asked[fault])
    for (let i = 0; i < out.length; i++) {
      if (out[i] < 0)
        throw refusal(last, 0, `${shown(last)} is negative at f = ${hertz(asked[i])}; a density is 0 or greater`)
      out[i] = this.#settled(out[i])
    }
  }

  #settled(value: number): number {
    return 'level' in this.#outcome ? 10 ** (value / 10) : value * this.#outcome.factor
  }

  #before(roots: Float64Array): { last: Step; results: Float64Array } {
    const results = new Float64Array(this.#steps.length)
    const [last] = this.#steps.slice(-1)
    if (last === undefined) throw new EngineFault('a formula without steps')
    this.#steps.slice(0, -1).forEach((step, index) => {
      results[index] = this.#single(step, results, roots)
    })
    return { last, results }
  }

  #single(step: Step, results: Float64Array, roots: Float64Array): number {
    const inputs = inputsOf(step, results, roots)
    const value = run(step.checked.program, inputs)
    if (Number.isFinite(value)) return value
    throw faultAt(step, inputs, null)
  }
}

function inputsOf({ inputs }: Step, results: Float64Array, roots: Float64Array): Float64Array {
  return Float64Array.from(inputs, input => {
    if ('root' in input) return (roots[input.root] ?? NaN) * input.factor
    return 'step' in input ? (results[input.step] ?? NaN) : input.constant
  })
}

function faultAt(step: Step, inputs: Float64Array, frequency: number | null): Refusal {
  const values = new Map(step.checked.inputs.map((name, index) => [name, inputs[index] ?? NaN]))
  if (frequency !== null) values.set('f', frequency)
  const at = frequency === null ? '' : `at f = ${hertz(frequency)}`
  const { offset, message } = faultOf(step.checked.expression, name => values.get(name) ?? NaN, at)
  return refusal(step, offset, message)
}

function refusal({ checked }: Step, offset: number, message: string): Refusal {
  const place = placeWithin(checked.scalar, offset)
  return new Refusal([{ severity: 'error', code: 'not-finite', place, message }])
}

function shown({ checked }: Step): string {
  return `\`${checked.scalar.text.slice(0, 60)}\``
}

function hertz(frequency: number): string {
  return formatPlain(frequency, 'Hz', { digits: 6 })
}
