/**
 * Nodes on [−1, 1] and weights of the Gauss–Legendre rule with n points, by Newton's method on P_n from the Chebyshev-like first
 * guess cos(π(i − ¼)/(n + ½)) [Abramowitz, Stegun, Handbook of Mathematical Functions (1964), 25.4.29 and 22.16.6]. Exact for
 * polynomials of degree 2n − 1.
 */
export function gaussLegendre(n: number): { nodes: Float64Array; weights: Float64Array } {
  const nodes = new Float64Array(n)
  const weights = new Float64Array(n)
  for (let i = 0; i < n; i++) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5))
    let slope = 1
    for (let pass = 0; pass < 100; pass++) {
      const { value, derivative } = legendre(n, x)
      slope = derivative
      const step = value / derivative
      x -= step
      if (Math.abs(step) < 1e-16) break
    }
    nodes[n - 1 - i] = x
    weights[n - 1 - i] = 2 / ((1 - x * x) * slope * slope)
  }
  return { nodes, weights }
}

/** P_n(x) and its derivative by the three-term recurrence. */
function legendre(n: number, x: number): { value: number; derivative: number } {
  let previous = 1
  let value = x
  for (let k = 2; k <= n; k++) {
    const next = ((2 * k - 1) * x * value - (k - 1) * previous) / k
    previous = value
    value = next
  }
  return { value, derivative: (n * (x * value - previous)) / (x * x - 1) }
}
