import type { GridArrays } from './grid-arrays.js'

/** A real value at every point: scale × a register, an array of the grid, or 1. */
export interface Real {
  readonly scale: number
  readonly array: RealArray
}

export type RealArray =
  | { readonly kind: 'one' }
  | { readonly kind: 'register'; readonly address: number }
  | { readonly kind: 'grid'; readonly key: string; readonly of: (grid: GridArrays) => Float64Array }

export const realZero: Real = { scale: 0, array: { kind: 'one' } }

export const constantReal = (value: number): Real => ({ scale: value, array: { kind: 'one' } })

export const registerReal = (address: number): Real => ({ scale: 1, array: { kind: 'register', address } })

export const scaleReal = (real: Real, factor: number): Real => ({ scale: real.scale * factor, array: real.array })

export const gridReal = (scale: number, key: string, of: (grid: GridArrays) => Float64Array): Real => ({
  scale,
  array: { kind: 'grid', key, of },
})

export const arrayKey = (array: RealArray): string =>
  array.kind === 'one' ? 'one' : array.kind === 'register' ? String(array.address) : array.key

/** Terms over the same array become one; what vanishes is dropped. */
export function mergeReals(terms: readonly Real[]): Real[] {
  const merged = new Map<string, Real>()
  for (const term of terms) {
    const key = arrayKey(term.array)
    const twin = merged.get(key)
    merged.set(key, twin === undefined ? term : { array: term.array, scale: twin.scale + term.scale })
  }
  return [...merged.values()].filter(term => term.scale !== 0)
}
