import type { Shape } from '../model/network.js'
import type { Field, Fields } from './declaration.js'

type Given<F extends Field> = F extends { required: true } | { default: string } ? never : undefined

type ValueOf<F extends Field> = F extends { type: 'quantity' }
  ? number
  : F extends { type: 'choice'; options: readonly (infer O)[] }
    ? O
    : F extends { type: 'name' } | { type: 'key' }
      ? string
      : F extends { type: 'weights' }
        ? ReadonlyMap<string, number>
        : F extends { type: 'density' }
          ? Shape
          : F extends { type: 'map'; fields: infer G extends Fields }
            ? ReadonlyMap<string, ValuesOf<G>>
            : F extends { type: 'group'; fields: infer G extends Fields }
              ? ValuesOf<G>
              : never

/** What a kernel is given: the fields of its declaration as SI numbers, names and maps; what the file leaves out is undefined. */
export type ValuesOf<F extends Fields> = { readonly [K in keyof F]: ValueOf<F[K]> | Given<F[K]> }
