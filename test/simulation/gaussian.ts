/** Uniform numbers in (0, 1) by four words of xorshift [Marsaglia, J. Stat. Softw. 8, 14 (2003)], period 2¹²⁸ − 1. */
function uniform(seed: number): () => number {
  let [x, y, z, w] = [123456789 ^ seed, 362436069, 521288629, 88675123]
  const next = (): number => {
    const t = x ^ (x << 11)
    x = y
    y = z
    z = w
    w = (w ^ (w >>> 19) ^ (t ^ (t >>> 8))) >>> 0
    return (w + 0.5) / 2 ** 32
  }
  // Close seeds begin close to each other.
  for (let i = 0; i < 64; i++) next()
  return next
}

/** Independent normal numbers of variance 1, the same for the same seed [Box, Muller, Ann. Math. Stat. 29, 610 (1958)]. */
export function gaussian(seed: number): () => number {
  const draw = uniform(seed)
  let kept: number | null = null
  return () => {
    if (kept !== null) {
      const value = kept
      kept = null
      return value
    }
    const radius = Math.sqrt(-2 * Math.log(draw()))
    const angle = 2 * Math.PI * draw()
    kept = radius * Math.sin(angle)
    return radius * Math.cos(angle)
  }
}
