/** Uniform numbers in (0, 1), the same in every run: the minimal standard generator with the multiplier 48271 [Park, Miller, Commun. ACM 31, 1192 (1988)]. */
export function uniformNumbers(seed: number): () => number {
  const modulus = 2 ** 31 - 1
  let state = (seed % (modulus - 1)) + 1
  return () => {
    state = (48271 * state) % modulus
    return state / modulus
  }
}
