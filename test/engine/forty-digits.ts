import { all, create, type BigNumber } from 'mathjs'

/** Numbers of 40 digits. */
export const { bignumber } = create(all, { number: 'BigNumber', precision: 40 })

/** Solves a square system whose right-hand sides stand behind each row, by elimination with row exchanges; the rows are used up. */
export function eliminate(rows: BigNumber[][]): BigNumber[][] {
  const n = rows.length
  const width = rows[0].length
  for (let k = 0; k < n; k++) {
    let best = k
    for (let i = k + 1; i < n; i++) if (rows[i][k].abs().gt(rows[best][k].abs())) best = i
    ;[rows[k], rows[best]] = [rows[best], rows[k]]
    for (let i = k + 1; i < n; i++) {
      if (rows[i][k].isZero()) continue
      const factor = rows[i][k].div(rows[k][k])
      for (let j = k; j < width; j++) if (!rows[k][j].isZero()) rows[i][j] = rows[i][j].minus(factor.times(rows[k][j]))
    }
  }
  const x: BigNumber[][] = []
  for (let k = n - 1; k >= 0; k--) {
    x[k] = rows[k].slice(n).map((right, r) => {
      let sum = right
      for (let j = k + 1; j < n; j++) sum = sum.minus(rows[k][j].times(x[j][r]))
      return sum.div(rows[k][k])
    })
  }
  return x
}
