import { operations } from './operations.js'
import type { Program } from './compile-expression.js'

/** Points that are computed at once; a handful of such arrays stays in the processor's cache. */
const blockLength = 256

/**
 * The value of an expression without `f`, for values in the order that it was compiled for; in coherent SI units, with
 * hertz as cycles. May be NaN or infinite, which the caller must refuse (`faultOf` says why).
 */
export function run(program: Program, values: Float64Array): number {
  if (program.needsFrequency) throw new RangeError('a program that needs the frequency runs over frequencies')
  return once(program, values)[program.result]
}

/**
 * The values of an expression at the frequencies f (Hz) into `out`, which may be `f` itself.
 * Returns the index of the first value that is NaN or infinite, or −1; `out` is filled in any case.
 */
export function runOver(program: Program, values: Float64Array, f: Float64Array, out: Float64Array): number {
  if (out.length !== f.length) throw new RangeError(`${f.length} frequencies do not fit ${out.length} values`)
  const singles = once(program, values)
  if (!program.needsFrequency) out.fill(singles[program.result])
  else overBlocks(program, singles, f, out)
  return out.findIndex(value => !Number.isFinite(value))
}

/** The registers of one number. */
function once({ order, numbers, once, onceRegisters }: Program, values: Float64Array): Float64Array {
  if (values.length !== order.length) throw new RangeError(`${values.length} values do not fit ${order.length} names`)
  const registers = new Float64Array(onceRegisters)
  registers.set(values)
  registers.set(numbers, order.length)
  for (let i = 0; i < once.length; i += 4) {
    registers[once[i + 1]] = operations[once[i]].apply(registers[once[i + 2]], registers[once[i + 3]])
  }
  return registers
}

function overBlocks(program: Program, singles: Float64Array, f: Float64Array, out: Float64Array): void {
  const { over, overRegisters, spread, result } = program
  const blocks = Array.from({ length: overRegisters }, () => new Float64Array(Math.min(blockLength, f.length)))
  for (let i = 0; i < spread.length; i += 2) blocks[spread[i]].fill(singles[spread[i + 1]])
  for (let start = 0; start < f.length; start += blockLength) {
    const count = Math.min(blockLength, f.length - start)
    blocks[0].set(f.subarray(start, start + count))
    for (let i = 0; i < over.length; i += 4) {
      operations[over[i]].loop(blocks[over[i + 1]], blocks[over[i + 2]], blocks[over[i + 3]], count)
    }
    out.set(count === blockLength ? blocks[result] : blocks[result].subarray(0, count), start)
  }
}
