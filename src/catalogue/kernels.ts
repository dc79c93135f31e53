// Generated from the folder beside it by .ci/generate-catalogue.mjs; do not edit.
import type { Kernel } from './kernel.js'

/** The numerical face of every kind. */
export const kernels = {} as const satisfies { readonly [kind: string]: Kernel }
