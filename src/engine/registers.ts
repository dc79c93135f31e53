import { blockBytes, blockLength, memory } from './loops.js'

/** Views of whole blocks, made once: a new view costs as much as the copy itself. */
const views: Float64Array[] = []

function viewOf(address: number): Float64Array {
  const index = address / blockBytes
  return (views[index] ??= memory.subarray(index * blockLength, (index + 1) * blockLength))
}

/** Copies points start … start + n of an array into a register. */
export function copyIn(from: Float64Array, { start, n }: { start: number; n: number }, address: number): void {
  memory.set(n === from.length ? from : from.subarray(start, start + n), address / 8)
}

/** Copies n points of a register into an array from `start`. */
export function copyOut(address: number, { start, n }: { start: number; n: number }, to: Float64Array): void {
  const view = viewOf(address)
  to.set(n === blockLength ? view : view.subarray(0, n), start)
}
