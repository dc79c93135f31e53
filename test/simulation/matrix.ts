export type Matrix = readonly (readonly number[])[]

export const zeros = (rows: number, columns: number): number[][] =>
  Array.from({ length: rows }, () => new Array<number>(columns).fill(0))

export const transpose = (a: Matrix): number[][] => a[0].map((_, j) => a.map(row => row[j]))

export const product = (a: Matrix, b: Matrix): number[][] =>
  a.map(row => b[0].map((_, j) => row.reduce((sum, value, k) => sum + value * b[k][j], 0)))

/** e^A by its power series after halving A until its norm is below 1/8, then squaring [Higham, Functions of Matrices (SIAM, 2008), 10.3]. */
export function exponential(a: Matrix): number[][] {
  const norm = Math.max(...a.map(row => row.reduce((sum, value) => sum + Math.abs(value), 0)))
  const halvings = Math.max(0, Math.ceil(Math.log2(norm * 8)))
  const small = a.map(row => row.map(value => value / 2 ** halvings))
  const one = a.map((row, i) => row.map((_, j) => (i === j ? 1 : 0)))
  let sum: number[][] = one
  let term: number[][] = one
  // (1/8)¹⁵/15! is far below double precision.
  for (let order = 1; order <= 15; order++) {
    term = product(term, small).map(row => row.map(value => value / order))
    sum = sum.map((row, i) => row.map((value, j) => value + term[i][j]))
  }
  for (let i = 0; i < halvings; i++) sum = product(sum, sum)
  return sum
}

/** Lower triangle L with L Lᵀ = A; a row without variance stays zero. */
export function triangle(a: Matrix): number[][] {
  const lower = zeros(a.length, a.length)
  for (let i = 0; i < a.length; i++) {
    for (let j = 0; j <= i; j++) {
      const rest = a[i][j] - lower[i].slice(0, j).reduce((sum, value, k) => sum + value * lower[j][k], 0)
      if (i === j) lower[i][i] = Math.sqrt(Math.max(rest, 0))
      else lower[i][j] = lower[j][j] === 0 ? 0 : rest / lower[j][j]
    }
  }
  return lower
}
