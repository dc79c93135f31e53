import { amplitudeDomain } from './amplitude-domain.js'
import { type Curve, curveMark, drawCurves, type Window } from './curves.js'
import { beyondMark } from './beyond.js'
import { bandSpan, describe } from './describe.js'
import type { FigureInput } from './input.js'
import { axisScale, frequencyKind } from './scales.js'
import type { Box, Mark, Scene, Size, TextMark } from './scene.js'
import { spread } from './spread.js'
import { textMark } from './text-box.js'
import { COMPACT } from './type-sizes.js'

const NAMES = new Map([
  ['total', 'Total'],
  ['limit', 'SQL'],
])
const FONT = COMPACT.label

/** The total and the standard quantum limit over the band, small and without axes, named at their right ends. */
export function sparkScene(view: FigureInput, size: Size): Scene {
  const few: FigureInput = {
    ...view,
    uncertainty: null,
    variants: [],
    lines: [],
    limits: view.limits.filter(limit => limit.prominent && view.comparable),
  }
  const frame: Box = { left: 4, top: 6, right: size.width - 40, bottom: size.height - 6 }
  const { low, high } = view.band
  const kind = frequencyKind(view.band)
  const x = view.points.frequency
  const xScale = axisScale(kind, [low, high], [frame.left, frame.right])
  const yScale = axisScale('log', amplitudeDomain(few, { x, kind, domain: [low, high], origin: 0 }), [
    frame.bottom,
    frame.top,
  ])
  const window: Window = { x, origin: 0, xScale, yScale, frame }
  const curves = drawCurves(few, window).filter(curve => curve.pieces.length > 0)
  return {
    ...size,
    title: `${view.title}: total and standard quantum limit`,
    description: describe(few, bandSpan(few)),
    marks: [
      ...surfaces(curves, window),
      ...curves.map(curveMark),
      ...ring(view, window),
      ...endLabels(curves, frame, size.height),
    ],
  }
}

function surfaces(curves: readonly Curve[], window: Window): Mark[] {
  return curves.filter(curve => curve.ink.as === 'limit').flatMap(curve => beyondMark(curve, window) ?? [])
}

function ring({ best }: FigureInput, { xScale, yScale, frame }: Window): Mark[] {
  if (best === null) return []
  const x = xScale.at(best.frequency)
  const y = yScale.at(best.asd)
  const inside = x >= frame.left && x <= frame.right && y >= frame.top && y <= frame.bottom
  return inside ? [{ mark: 'ring', ink: { as: 'best' }, x, y, radius: 3 }] : []
}

function endLabels(curves: readonly Curve[], frame: Box, height: number): TextMark[] {
  const ends = curves.map(curve => curve.pieces.at(-1)!.at(-1)!)
  const centres = spread(
    ends,
    ends.map(() => FONT * 1.2),
    1,
    height - 1,
  )
  return curves.map((curve, k) => {
    const lines = [NAMES.get(curve.ink.as) ?? curve.title]
    const at = { x: frame.right + 5, y: centres[k] + FONT * 0.27, anchor: 'start' } as const
    return textMark({ ink: curve.ink, role: 'label', of: curve.id, ...at, lines }, FONT)
  })
}
