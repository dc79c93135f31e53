import { EigenvalueDecomposition, Matrix } from 'ml-matrix'
import { describe, expect, test } from 'vitest'
import type { Complex } from '../../src/model/network.js'
import { complex, magnitude, subtract } from '../../src/physics/complex.js'
import { eigenvalues } from '../../src/physics/eigenvalues.js'

/** Each expected value has one of its own among the actual ones. */
function differences(actual: readonly Complex[], expected: readonly Complex[]): number {
  const left = [...actual]
  return Math.max(
    ...expected.map(value => {
      const distances = left.map(other => magnitude(subtract(value, other)))
      const least = Math.min(...distances)
      left.splice(distances.indexOf(least), 1)
      return least
    }),
  )
}

/** Numbers in (−1, 1) that look random and are always the same. */
const scattered = (i: number): number => 2 * ((Math.abs(Math.sin(12.9898 * (i + 1))) * 43758.5453) % 1) - 1

describe('eigenvalues', () => {
  test('of a triangular matrix are its diagonal, equal ones as often as they stand there', () => {
    const diagonal = [complex(1, 2), complex(1, 2), complex(-3), complex(0, 5)]
    const matrix = diagonal.map((value, i) =>
      diagonal.map((_, j) => (i === j ? value : complex(i === 0 && j > 1 ? 0.3 : 0))),
    )
    expect(differences(eigenvalues(matrix), diagonal)).toBeLessThan(1e-14)
  })

  test('of a cyclic permutation are the roots of one', () => {
    const n = 7
    const matrix = Array.from({ length: n }, (_, i) =>
      Array.from({ length: n }, (__, j) => complex(j === (i + 1) % n ? 1 : 0)),
    )
    const roots = Array.from({ length: n }, (_, k) =>
      complex(Math.cos((2 * Math.PI * k) / n), Math.sin((2 * Math.PI * k) / n)),
    )
    expect(differences(eigenvalues(matrix), roots)).toBeLessThan(1e-13)
  })

  test('of a real matrix agree with another method, and turn with a phase in front of it', () => {
    const n = 12
    const values = Array.from({ length: n }, (_, i) => Array.from({ length: n }, (__, j) => scattered(n * i + j)))
    const { realEigenvalues, imaginaryEigenvalues } = new EigenvalueDecomposition(new Matrix(values))
    const real = eigenvalues(values.map(row => row.map(value => complex(value))))
    expect(
      differences(
        real,
        realEigenvalues.map((re, i) => complex(re, imaginaryEigenvalues[i])),
      ),
    ).toBeLessThan(1e-12)
    const turned = eigenvalues(values.map(row => row.map(value => complex(0, value))))
    expect(
      differences(
        turned,
        real.map(({ re, im }) => complex(-im, re)),
      ),
    ).toBeLessThan(1e-12)
  })

  test('what is no number is a fault, not an endless search', () => {
    expect(() =>
      eigenvalues([
        [complex(NaN), complex(1)],
        [complex(1), complex(0)],
      ]),
    ).toThrow(/do not settle/)
  })
})
