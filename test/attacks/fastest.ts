/** Shortest of three runs in ms: other work on the machine makes a run longer, never shorter. */
export function fastest(work: () => void): number {
  let best = Infinity
  for (let run = 0; run < 3 && best > 100; run++) {
    const start = performance.now()
    work()
    best = Math.min(best, performance.now() - start)
  }
  return best
}
