import type { Shape } from '../model/network.js'
import { boltzmannConstant, reducedPlanckConstant } from '../physics/constants.js'
import type { GridArrays } from './grid-arrays.js'
import { loops, memory } from './loops.js'
import { constantReal, gridReal, scaleReal, type Real } from './real.js'
import { inputs, type Block, type Tape } from './tape.js'

/**
 * 4ħω(n(ω,T) + ½) = 4k_BT·x coth x, x = ħω/2k_BT, in J on a block, one-sided; times mΓ the force density of a viscous bath
 * [Callen, Welton 1951]. At T = 0 it is 2ħω.
 */
function fillBath(out: number, { grid, start, n }: Block, temperature: number): void {
  const { frequency } = grid
  const classical = 4 * boltzmannConstant * temperature
  const ratio = (Math.PI * reducedPlanckConstant) / (boltzmannConstant * temperature)
  const largest = ratio * Math.max(frequency[start], frequency[start + n - 1])
  if (largest * largest < 0.01) {
    loops.warmBath(out, inputs.frequency, n, classical, ratio)
    return
  }
  for (let i = 0; i < n; i++) {
    // 4k_BT·x is 2ħω, which does not underflow with T; at T = 0 the ratio is infinite and its tanh 1.
    const f = frequency[start + i]
    memory[out / 8 + i] = (4 * Math.PI * reducedPlanckConstant * f) / Math.tanh(ratio * f)
  }
}

/** The density of a shape, one-sided. */
export function shapeReal(tape: Tape, shape: Shape): Real {
  switch (shape.form) {
    case 'constant':
      return constantReal(shape.value)
    case 'power': {
      const { value, exponent, reference } = shape
      return gridReal(value / reference ** exponent, `power ${exponent}`, grid => grid.power(exponent))
    }
    case 'table':
      return gridReal(shape.value, `table ${numberOf(shape.table)}`, grid => grid.table(shape.table))
    case 'formula': {
      // One array a run: blocks of the same points share it.
      let last: { grid: GridArrays; values: Float64Array } | null = null
      return gridReal(1, `formula ${numberOf(shape)}`, grid => {
        if (last?.grid !== grid) last = { grid, values: grid.formula(shape) }
        return last.values
      })
    }
    case 'viscous bath':
      return scaleReal(bath(tape, shape.temperature), shape.strength)
    case 'structural bath': {
      const overFrequency = gridReal(1 / (2 * Math.PI), 'power -1', grid => grid.power(-1))
      return scaleReal(tape.product(bath(tape, shape.temperature), overFrequency), shape.strength)
    }
  }
}

const bath = (tape: Tape, temperature: number): Real =>
  tape.real(['bath', temperature], out => block => fillBath(out, block, temperature))

const numbers = new WeakMap<object, number>()
let count = 0

/** A number that stands for a table or a formula in the keys of a tape. */
function numberOf(table: object): number {
  let number = numbers.get(table)
  if (number === undefined) {
    number = count++
    numbers.set(table, number)
  }
  return number
}
