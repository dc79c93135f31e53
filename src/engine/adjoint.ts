import type { Entry, Injection, Network } from '../model/network.js'
import { addForms, constantForm, isZeroForm, negateForm, scaleForm, zeroForm, type Form } from './form.js'
import { filterForm, rootForm } from './filter.js'
import { oscillator } from './oscillator.js'
import type { Tape } from './tape.js'

/** Factors of the transposed field block, kept as forms on the tape: Dᵀ = L·U without row exchanges. */
interface FieldFactors {
  readonly indices: readonly number[]
  /** Rows of the eliminated transposed block above the diagonal, and multipliers below it. */
  readonly rows: readonly (readonly Form[])[]
  readonly reciprocals: readonly Form[]
}

/** The adjoint row w of Mᵀw = readout, with the mechanical unknowns free and clamped. */
export interface Adjoint {
  /** w over all unknowns. */
  readonly full: readonly Form[]
  /** Over the fields with the mechanics clamped, zero at mechanical unknowns. */
  readonly clamped: readonly Form[]
  /** full − clamped, formed without subtracting the two. */
  readonly moved: readonly Form[]
  /** Solves the clamped transposed field block for another row over the fields. */
  clampedRow(row: readonly { column: number; value: { re: number; im: number } }[]): readonly Form[]
}

function entryForm(tape: Tape, entry: Entry): Form {
  if (entry.form === 'constant') return constantForm(entry.value)
  if (entry.form === 'oscillator') return oscillator(tape, entry)
  return tape.reciprocal(tape.decayReciprocal(entry))
}

class Matrix {
  readonly #entries = new Map<number, Entry[]>()
  readonly #size: number

  constructor(
    readonly network: Network,
    readonly tape: Tape,
  ) {
    this.#size = network.unknowns.length
    for (const { row, column, entry } of network.entries) {
      const key = row * this.#size + column
      this.#entries.set(key, [...(this.#entries.get(key) ?? []), entry])
    }
  }

  form(row: number, column: number): Form {
    const entries = this.#entries.get(row * this.#size + column) ?? []
    return entries.reduce<Form>((sum, entry) => addForms(sum, entryForm(this.tape, entry)), zeroForm)
  }

  /** 1/M_rr where the diagonal is one decay, filled directly. */
  reciprocal(index: number): Form | null {
    const entries = this.#entries.get(index * this.#size + index) ?? []
    return entries.length === 1 && entries[0].form === 'decay' ? this.tape.decayReciprocal(entries[0]) : null
  }
}

/** Eliminates the transposed block over `indices` in the order given. */
function factor(matrix: Matrix, indices: readonly number[]): FieldFactors {
  const { tape } = matrix
  const rows = indices.map(i => indices.map(j => (i === j ? null : matrix.form(j, i))))
  const diagonal: (Form | null)[] = indices.map(() => null)
  const reciprocals: Form[] = []
  for (const [k, index] of indices.entries()) {
    const direct = diagonal[k] === null ? matrix.reciprocal(index) : null
    reciprocals.push(direct ?? tape.reciprocal(diagonal[k] ?? matrix.form(index, index)))
    for (let i = k + 1; i < indices.length; i++) {
      const below = rows[i][k] as Form
      if (isZeroForm(below)) continue
      const multiplier = tape.multiply(below, reciprocals[k])
      rows[i][k] = multiplier
      for (let j = k + 1; j < indices.length; j++) {
        const change = negateForm(tape.multiply(multiplier, rows[k][j] ?? zeroForm))
        if (isZeroForm(change)) continue
        if (i === j) diagonal[i] = addForms(diagonal[i] ?? matrix.form(indices[i], indices[i]), change)
        else rows[i][j] = addForms(rows[i][j] as Form, change)
      }
    }
  }
  return { indices, rows: rows.map(row => row.map(form => form ?? zeroForm)), reciprocals }
}

/** Solves the factored block for a right-hand side over the same indices. */
function substitute(tape: Tape, { rows, reciprocals }: FieldFactors, right: readonly Form[]): Form[] {
  const z = [...right]
  for (let i = 0; i < z.length; i++) {
    for (let j = 0; j < i; j++) z[i] = addForms(z[i], negateForm(tape.multiply(rows[i][j], z[j])))
  }
  for (let i = z.length - 1; i >= 0; i--) {
    for (let j = i + 1; j < z.length; j++) z[i] = addForms(z[i], negateForm(tape.multiply(rows[i][j], z[j])))
    z[i] = tape.multiply(z[i], reciprocals[i])
  }
  return z
}

/** Dense elimination of the mechanical rows, what light does to them included; the last division is fused. */
function solveMechanics(tape: Tape, matrix: Form[][], right: Form[]): Form[] {
  const n = right.length
  const a = matrix.map(row => [...row])
  const z = [...right]
  for (let k = 0; k < n; k++) {
    for (let i = k + 1; i < n; i++) {
      if (isZeroForm(a[i][k])) continue
      const multiplier = tape.divide(a[i][k], a[k][k])
      for (let j = k + 1; j < n; j++) a[i][j] = addForms(a[i][j], negateForm(tape.multiply(multiplier, a[k][j])))
      z[i] = addForms(z[i], negateForm(tape.multiply(multiplier, z[k])))
    }
  }
  for (let i = n - 1; i >= 0; i--) {
    for (let j = i + 1; j < n; j++) z[i] = addForms(z[i], negateForm(tape.multiply(a[i][j], z[j])))
    z[i] = tape.divide(z[i], a[i][i])
  }
  return z
}

/**
 * Writes the solution of Mᵀw = readout on the tape. The fields are eliminated first: their solution with the motion
 * clamped is the imprecision row, and what the motion adds comes out on its own, so that neither part is a difference.
 */
export function adjoint(tape: Tape, network: Network): Adjoint {
  const matrix = new Matrix(network, tape)
  const size = network.unknowns.length
  const of = (nature: string) => network.unknowns.map((_, i) => i).filter(i => network.unknowns[i].nature === nature)
  const fields = of('field')
  const mechanics = of('mechanical')
  const factors = factor(matrix, fields)
  const spread = (over: readonly number[], values: readonly Form[]): Form[] => {
    const all: Form[] = Array.from({ length: size }, () => zeroForm)
    for (const [i, index] of over.entries()) all[index] = values[i]
    return all
  }
  const rowOver = (row: Network['readout'], over: readonly number[]): Form[] =>
    over.map(column =>
      row.filter(r => r.column === column).reduce((sum, r) => addForms(sum, constantForm(r.value)), zeroForm),
    )

  const clamped = substitute(tape, factors, rowOver(network.readout, fields))
  // v_k: what a unit of w at mechanical row k asks of the fields.
  const pulls = mechanics.map(k =>
    substitute(
      tape,
      factors,
      fields.map(f => matrix.form(k, f)),
    ),
  )
  const schur = mechanics.map(j =>
    mechanics.map((k, kIndex) =>
      fields.reduce(
        (sum, f, fIndex) => addForms(sum, negateForm(tape.multiply(pulls[kIndex][fIndex], matrix.form(f, j)))),
        matrix.form(k, j),
      ),
    ),
  )
  const right = rowOver(network.readout, mechanics).map((form, j) =>
    fields.reduce(
      (sum, f, fIndex) => addForms(sum, negateForm(tape.multiply(clamped[fIndex], matrix.form(f, mechanics[j])))),
      form,
    ),
  )
  const pushed = solveMechanics(tape, schur, right)
  const movedFields = fields.map((_, fIndex) =>
    mechanics.reduce(
      (sum, _k, kIndex) => addForms(sum, negateForm(tape.multiply(pulls[kIndex][fIndex], pushed[kIndex]))),
      zeroForm,
    ),
  )
  const moved = spread(fields, movedFields).map((form, i) =>
    mechanics.includes(i) ? pushed[mechanics.indexOf(i)] : form,
  )
  const still = spread(fields, clamped)
  return {
    full: moved.map((form, i) => addForms(still[i], form)),
    clamped: still,
    moved,
    clampedRow: row => spread(fields, substitute(tape, factors, rowOver(row, fields))),
  }
}

/**
 * t = w·b + direct, the transfer of an injection to the record. Where it enters one row, that element of w is written out first, so that
 * sources which enter the same row through different ports share one array; over several rows it stays a form, in which what cancels cancels.
 */
export function transfer(tape: Tape, row: readonly Form[], injection: Injection, withDirect: boolean): Form {
  const start = withDirect ? constantForm(injection.direct) : zeroForm
  const alone = injection.rows.length === 1
  const form = injection.rows.reduce((sum, { row: r, value }) => {
    const element = alone ? tape.single(row[r]) : row[r]
    return addForms(sum, scaleForm(element, value))
  }, start)
  const filtered = injection.filter === undefined ? form : tape.multiply(form, filterForm(tape, injection.filter))
  return injection.shape === undefined ? filtered : tape.multiply(filtered, rootForm(tape, injection.shape))
}
