import { blockBytes, blockLength, loops } from './loops.js'
import { copyIn, copyOut } from './registers.js'

/** Arrays for evaluations that follow one another: taking again after `reset` overwrites what was taken before. */
export class Arena {
  readonly #arrays: Float64Array[] = []
  #used = 0

  reset(): void {
    this.#used = 0
  }

  take(length: number): Float64Array {
    const known = this.#arrays[this.#used]
    const array = known?.length === length ? known : new Float64Array(length)
    this.#arrays[this.#used++] = array
    return array
  }
}

/** Amplitude density √S in X/√Hz of a power density in X²/Hz; NaN where a signed density is negative. */
export function amplitude(psd: Float64Array, out = new Float64Array(psd.length)): Float64Array {
  const at = 3 * blockBytes
  for (let start = 0; start < psd.length; start += blockLength) {
    const n = Math.min(blockLength, psd.length - start)
    copyIn(psd, { start, n }, at)
    loops.root(at, at, n)
    copyOut(at, { start, n }, out)
  }
  return out
}
