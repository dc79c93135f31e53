/** Rounding in anchor + offset may put the first and last point this part of the span outside of the band. */
const ROUNDING = 1e-9

/** Points whose abscissa lies between two values, ends included. */
export function indicesBetween(x: Float64Array, low: number, high: number): number[] {
  const slack = (high - low) * ROUNDING
  const found: number[] = []
  for (let k = 0; k < x.length; k++) if (x[k] >= low - slack && x[k] <= high + slack) found.push(k)
  return found
}
