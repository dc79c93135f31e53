import type { Family } from '../model/evaluation.js'

export type Scheme = 'light' | 'dark'

/** Colours that are not a family's. */
export interface Ground {
  readonly paper: string
  /** The total and all text. */
  readonly ink: string
  /** Limits. */
  readonly limit: string
  /** Axes and ticks. */
  readonly axis: string
  /** Lines behind everything, and the region beyond the standard quantum limit. */
  readonly faint: string
}

export const GROUND: { readonly [S in Scheme]: Ground } = {
  light: { paper: '#ffffff', ink: '#171b20', limit: '#5f6871', axis: '#5f6871', faint: '#eceef0' },
  dark: { paper: '#15181c', ink: '#f2f1ec', limit: '#a3a9b0', axis: '#8d949b', faint: '#262b31' },
}

/**
 * One hue a family, found by a search over sRGB for the largest least colour difference (CIEDE2000) between any two, and
 * to the ground's greys, seen with normal vision, protanopia, deuteranopia and tritanopia, at a contrast to the paper of
 * more than 3 : 1. The test of this file measures what the search reached.
 */
export const FAMILY_COLOURS: { readonly [F in Family]: { readonly [S in Scheme]: string } } = {
  thermal: { light: '#d66e17', dark: '#ae8900' },
  imprecision: { light: '#089dad', dark: '#15877c' },
  'back-action': { light: '#a32953', dark: '#e74d85' },
  correlation: { light: '#7453a8', dark: '#c998ff' },
  heating: { light: '#9e775b', dark: '#ffb4b2' },
  amplifier: { light: '#7c76f4', dark: '#bbd7f8' },
  detection: { light: '#14452f', dark: '#cbec76' },
  environment: { light: '#725a0d', dark: '#aba772' },
  stray: { light: '#692366', dark: '#b061bb' },
}

export const FAMILIES = Object.keys(FAMILY_COLOURS) as Family[]
