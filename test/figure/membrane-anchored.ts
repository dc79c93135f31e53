import { MEMBRANE, membraneInput, type Membrane } from './membrane.js'
import type { FigureInput } from '../../src/figure/input.js'
import type { Anchor } from '../../src/model/points.js'

/** The membrane with a pole beside its mode: where the light has moved and broadened it. */
export function withPole(
  membrane: Membrane = MEMBRANE,
  shift = 40,
  halfWidth = 25,
): { input: FigureInput; mode: Anchor } {
  const input = membraneInput(membrane)
  const mode = input.points.anchors[0]
  const pole: Anchor = { id: 'pole 1', nature: 'pole', frequency: mode.frequency + shift, halfWidth }
  return { input: { ...input, points: { ...input.points, anchors: [mode, pole] } }, mode }
}
