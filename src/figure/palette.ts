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
  /** Lines behind everything. */
  readonly faint: string
  /** The region beyond the standard quantum limit. */
  readonly beyond: string
}

export const GROUND: { readonly [S in Scheme]: Ground } = {
  light: { paper: '#ffffff', ink: '#171b20', limit: '#6a727a', axis: '#5f6871', faint: '#e4e7ea', beyond: '#f3f4f6' },
  dark: { paper: '#15181c', ink: '#f2f1ec', limit: '#a3a9b0', axis: '#8d949b', faint: '#2b3138', beyond: '#1d2126' },
}

/**
 * One hue a family, found by a search over sRGB for the largest least colour difference (CIEDE2000) between any two, and
 * to the ground's greys, seen with normal vision, protanopia, deuteranopia and tritanopia, at a contrast to the paper of
 * more than 3 : 1. The test of this file measures what the search reached.
 */
export const FAMILY_COLOURS: { readonly [F in Family]: { readonly [S in Scheme]: string } } = {
  thermal: { light: '#d66e17', dark: '#f8bd98' },
  imprecision: { light: '#089dad', dark: '#a7e0f2' },
  'back-action': { light: '#a32953', dark: '#f5677b' },
  correlation: { light: '#7453a8', dark: '#9aabf9' },
  heating: { light: '#9e775b', dark: '#af6612' },
  amplifier: { light: '#7c76f4', dark: '#0b89cc' },
  detection: { light: '#14452f', dark: '#648857' },
  environment: { light: '#725a0d', dark: '#b6a92f' },
  stray: { light: '#692366', dark: '#927092' },
}

export const FAMILIES = Object.keys(FAMILY_COLOURS) as Family[]
