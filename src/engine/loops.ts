import type { Loops } from './array-loops.js'
import { plainLoops } from './plain-loops.js'
import { blockLength, simdModule } from './simd-module.js'

/** Blocks that all registers together may take. */
const capacity = 2048

function instantiate(): { memory: Float64Array; loops: Loops } {
  const bytes = capacity * blockLength * 8
  try {
    const memory = new WebAssembly.Memory({ initial: bytes / 65536 })
    const code = Uint8Array.from(atob(simdModule), letter => letter.charCodeAt(0))
    const { exports } = new WebAssembly.Instance(new WebAssembly.Module(code), { floorbook: { memory } })
    return { memory: new Float64Array(memory.buffer), loops: exports as unknown as Loops }
  } catch {
    // A page whose content policy forbids WebAssembly, or a processor without vectors: same numbers, slower.
    const memory = new Float64Array(capacity * blockLength)
    return { memory, loops: plainLoops(memory) }
  }
}

const instance = instantiate()

export const loops = instance.loops

/** All registers; a tape runs to its end before another begins, so that all tapes share them. */
export const memory = instance.memory

export const blockBytes = blockLength * 8

export const blockCapacity = capacity

export { blockLength }
