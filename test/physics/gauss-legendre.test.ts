import { describe, expect, test } from 'vitest'
import { gaussLegendre } from '../../src/physics/gauss-legendre.js'

describe('Gauss–Legendre rule', () => {
  // Identity: exact for polynomials of degree 2n − 1; 1e-14 is rounding of n terms.
  test.each([1, 2, 3, 8, 16, 40])('%s points integrate monomials up to degree 2n − 1', n => {
    const { nodes, weights } = gaussLegendre(n)
    for (let degree = 0; degree < 2 * n; degree++) {
      const sum = nodes.reduce((s, x, i) => s + weights[i] * x ** degree, 0)
      expect(Math.abs(sum - (degree % 2 === 0 ? 2 / (degree + 1) : 0))).toBeLessThan(2e-14)
    }
  })

  test('degree 2n is not exact', () => {
    const { nodes, weights } = gaussLegendre(2)
    expect(nodes.reduce((s, x, i) => s + weights[i] * x ** 4, 0)).toBeCloseTo(2 / 9, 14)
  })

  // Published number: x = 0.774596669241483, w = 0.555555555555556 and 0.888888888888889 for n = 3 [Abramowitz, Stegun (1964), table 25.4].
  test('three points as tabulated', () => {
    const { nodes, weights } = gaussLegendre(3)
    expect(nodes[2]).toBeCloseTo(0.774596669241483, 14)
    expect(nodes[1]).toBeCloseTo(0, 15)
    expect(weights[0]).toBeCloseTo(0.555555555555556, 14)
    expect(weights[1]).toBeCloseTo(0.888888888888889, 14)
  })

  test('nodes ascend', () => {
    const { nodes } = gaussLegendre(16)
    for (let i = 1; i < 16; i++) expect(nodes[i]).toBeGreaterThan(nodes[i - 1])
  })
})
