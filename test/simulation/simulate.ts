import type { Step } from './discretise.js'
import { gaussian } from './gaussian.js'

/** Samples of the record, after the system has forgotten that it began at rest. */
export function simulate(step: Step, samples: number, settling: number, seed: number): Float64Array[] {
  const { states, records } = step
  const all = states + records
  const draw = gaussian(seed)
  const flatStep = Float64Array.from(step.step.flat())
  const flatLower = Float64Array.from(step.lower.flat())
  const next = new Float64Array(all)
  const normal = new Float64Array(all)
  const record = Array.from({ length: records }, () => new Float64Array(samples))
  const state = new Float64Array(states)
  for (let k = -settling; k < samples; k++) {
    for (let i = 0; i < all; i++) normal[i] = draw()
    for (let i = 0; i < all; i++) {
      let value = 0
      for (let j = 0; j < states; j++) value += flatStep[i * states + j] * state[j]
      for (let j = 0; j <= i; j++) value += flatLower[i * all + j] * normal[j]
      next[i] = value
    }
    state.set(next.subarray(0, states))
    if (k >= 0) for (let i = 0; i < records; i++) record[i][k] = next[states + i]
  }
  return record
}
