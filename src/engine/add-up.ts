import { loops } from './loops.js'

/** out = Σ scale·array, four arrays a pass. */
export function addUp(out: number, terms: readonly { address: number; scale: number }[], n: number): void {
  const [a, b] = terms
  loops.sum2(out, a.address, b.address, n, a.scale, b.scale)
  for (let i = 2; i < terms.length; i += 3) {
    const [p, q, r] = [terms[i], terms[i + 1] ?? terms[i], terms[i + 2] ?? terms[i]]
    const [second, third] = [i + 1 < terms.length ? q.scale : 0, i + 2 < terms.length ? r.scale : 0]
    loops.sum4(out, out, p.address, q.address, r.address, n, 1, p.scale, second, third)
  }
}
