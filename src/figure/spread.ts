/**
 * Moves boxes on a line apart: the centres that are nearest to their targets (least squares) with no overlap and inside
 * [low, high]. Bounded isotonic regression by pooling adjacent violators [Ayer et al. 1955]; the order of the targets is
 * kept. The boxes must fit: Σ sizes ≤ high − low.
 */
export function spread(targets: readonly number[], sizes: readonly number[], low: number, high: number): number[] {
  const order = targets.map((_, k) => k).sort((a, b) => targets[a] - targets[b] || a - b)
  const before = new Map<number, number>()
  let used = 0
  for (const k of order) {
    before.set(k, used)
    used += sizes[k]
  }
  const pools: { sum: number; members: number[] }[] = []
  for (const k of order) {
    pools.push({ sum: targets[k] - sizes[k] / 2 - before.get(k)!, members: [k] })
    while (pools.length > 1 && mean(pools.at(-2)!) > mean(pools.at(-1)!)) {
      const last = pools.pop()!
      const joined = pools.pop()!
      pools.push({ sum: joined.sum + last.sum, members: [...joined.members, ...last.members] })
    }
  }
  const centres = new Array<number>(targets.length)
  for (const pool of pools) {
    const start = Math.max(low, Math.min(mean(pool), high - used))
    for (const k of pool.members) centres[k] = start + before.get(k)! + sizes[k] / 2
  }
  return centres
}

function mean(pool: { sum: number; members: readonly number[] }): number {
  return pool.sum / pool.members.length
}
