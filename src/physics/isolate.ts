import type { Complex } from '../model/network.js'
import { magnitude } from './complex.js'
import type { Dense } from './solve-dense.js'

/**
 * Takes out what a matrix shows of its eigenvalues by itself: where all of a row or of a column but its diagonal element is zero, that
 * element is one, exactly, and the rest of the matrix has the others. It is the first step of balancing [Parlett, Reinsch, Numer. Math.
 * 13, 293 (1969)]. Without it a double eigenvalue of such a matrix is found only to the root of rounding.
 */
export function isolate(matrix: Dense): { values: Complex[]; rest: Dense } {
  const values: Complex[] = []
  let kept = matrix.map((_, i) => i)
  for (;;) {
    const alone = kept.find(i => {
      const others = kept.filter(j => j !== i)
      return others.every(j => magnitude(matrix[i][j]) === 0) || others.every(j => magnitude(matrix[j][i]) === 0)
    })
    if (alone === undefined) return { values, rest: kept.map(i => kept.map(j => matrix[i][j])) }
    values.push(matrix[alone][alone])
    kept = kept.filter(i => i !== alone)
  }
}
