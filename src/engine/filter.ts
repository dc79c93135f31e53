import type { Complex, Filter, Shape } from '../model/network.js'
import { add, complex, multiply, polar, reciprocal, scale } from '../physics/complex.js'
import { omegaOf, type ComplexFrequency } from './dense.js'
import { addForms, constantForm, scaleForm, type Form } from './form.js'
import { blockBytes, memory } from './loops.js'
import { shapeReal } from './shapes.js'
import type { Tape } from './tape.js'

const twoPi = 2 * Math.PI

/** A complex register filled point by point from the frequency in Hz: for factors that no loop is made for. */
function pointwise(tape: Tape, key: readonly (string | number)[], value: (frequency: number) => Complex): Form {
  return tape.complex(key, out => ({ grid, start, n }) => {
    for (let i = 0; i < n; i++) {
      const { re, im } = value(grid.frequency[start + i])
      memory[out / 8 + i] = re
      memory[(out + blockBytes) / 8 + i] = im
    }
  })
}

/** (−iω)^order as a real power of ω with a phase in front. */
function derivativeForm(tape: Tape, order: number): Form {
  const form = pointwise(tape, ['order', order], frequency => complex((twoPi * frequency) ** order))
  return scaleForm(form, polar(1, (-Math.PI / 2) * order))
}

/** A filter as a form on the tape. */
export function filterForm(tape: Tape, { order, delay, constant, decays = [] }: Filter): Form {
  const sum = decays.reduce(
    (form, { coefficient, half, detuning }) =>
      addForms(form, scaleForm(tape.decayReciprocal({ half, detuning }), coefficient)),
    constantForm(constant),
  )
  const ordered = order === undefined ? sum : tape.multiply(sum, derivativeForm(tape, order))
  if (delay === undefined || delay === 0) return ordered
  return tape.multiply(
    ordered,
    pointwise(tape, ['delay', delay], frequency => polar(1, twoPi * frequency * delay)),
  )
}

/** √S of a shape, as a factor of a transfer. */
export function rootForm(tape: Tape, shape: Shape): Form {
  const root = tape.root(shapeReal(tape, shape))
  if (root.array.kind === 'one') return constantForm(complex(root.scale))
  const address = tape.written([root])
  return tape.complex(['real', address], out => ({ n }) => {
    memory.copyWithin(out / 8, address / 8, address / 8 + n)
    memory.fill(0, (out + blockBytes) / 8, (out + blockBytes) / 8 + n)
  })
}

/** A filter at one complex frequency. */
export function filterAt({ order = 0, delay = 0, constant, decays = [] }: Filter, at: ComplexFrequency): Complex {
  const omega = omegaOf(at)
  const sum = decays.reduce((total, { coefficient, half, detuning }) => {
    const response = reciprocal(complex(half + omega.im, -(detuning + omega.re)))
    return add(total, multiply(coefficient, response))
  }, constant)
  const step = order < 0 ? reciprocal(complex(omega.im, -omega.re)) : complex(omega.im, -omega.re)
  let value = sum
  for (let k = 0; k < Math.abs(order); k++) value = multiply(value, step)
  return multiply(value, scale(polar(1, omega.re * delay), Math.exp(-omega.im * delay)))
}
