import type { AxisPlan } from './axis-plan.js'
import type { AxisScale } from './scales.js'
import type { Box, Mark, PathMark, TextMark } from './scene.js'
import { overlaps, textMark } from './text-box.js'
import type { Tick } from './ticks.js'
import type { TypeSizes } from './type-sizes.js'

/** Lengths of ticks. */
export const MAJOR = 6
const MINOR = 3.5

/** One axis with its scale. */
export interface Axis {
  readonly plan: AxisPlan
  readonly scale: AxisScale
}

/** Open axes at the left and the bottom of a frame, ticks outwards, hairlines behind the labelled amplitudes. */
export function axisMarks(frame: Box, x: Axis, y: Axis, type: TypeSizes): Mark[] {
  const xs = x.plan.ticks.map(tick => ({ tick, at: x.scale.at(tick.value) }))
  const ys = y.plan.ticks.map(tick => ({ tick, at: y.scale.at(tick.value) }))
  const texts = [...apart(xs.map(t => xText(t, frame, type))), ...apart(ys.map(t => yText(t, frame, type)))]
  return [
    grid(
      frame,
      ys.filter(t => t.tick.text !== null).map(t => t.at),
    ),
    stroke('axis', [[frame.left, frame.top, frame.left, frame.bottom, frame.right, frame.bottom]]),
    stroke('tick', [
      ...xs.map(({ tick, at }) => [at, frame.bottom, at, frame.bottom + reach(tick)]),
      ...ys.map(({ tick, at }) => [frame.left - reach(tick), at, frame.left, at]),
    ]),
    ...texts,
    ...titles(frame, x.plan.title, y.plan.title, type),
  ]
}

function grid(frame: Box, heights: readonly number[]): PathMark {
  return stroke(
    'grid',
    heights.map(at => [frame.left, at, frame.right, at]),
  )
}

function stroke(as: 'axis' | 'tick' | 'grid', pieces: readonly (readonly number[])[]): PathMark {
  return { mark: 'path', ink: { as }, pieces }
}

function reach(tick: Tick): number {
  return tick.text === null ? MINOR : MAJOR
}

interface At {
  readonly tick: Tick
  readonly at: number
}

function xText({ tick, at }: At, frame: Box, type: TypeSizes): TextMark | null {
  return tickText(tick, { x: at, y: frame.bottom + MAJOR + 4 + type.tick * 0.8, anchor: 'middle' }, type)
}

function yText({ tick, at }: At, frame: Box, type: TypeSizes): TextMark | null {
  return tickText(tick, { x: frame.left - MAJOR - 4, y: at + type.tick * 0.35, anchor: 'end' }, type)
}

function tickText(tick: Tick, at: Pick<TextMark, 'x' | 'y' | 'anchor'>, type: TypeSizes): TextMark | null {
  if (tick.text === null) return null
  const raised = tick.raised === undefined ? {} : { raised: tick.raised }
  return textMark({ ink: { as: 'tick' }, role: 'tick', ...at, lines: [tick.text], ...raised }, type.tick)
}

/** Leaves out a text that would touch the one before it. */
function apart(texts: readonly (TextMark | null)[]): TextMark[] {
  const kept: TextMark[] = []
  for (const text of texts) {
    const last = kept.at(-1)
    if (text !== null && (last === undefined || !overlaps(grown(last.box), text.box))) kept.push(text)
  }
  return kept
}

function grown(box: Box): Box {
  return { left: box.left - 5, right: box.right + 5, top: box.top, bottom: box.bottom }
}

function titles(frame: Box, x: string, y: string, type: TypeSizes): TextMark[] {
  const ink = { as: 'axis' } as const
  const below = frame.bottom + MAJOR + 10 + type.tick + type.axis * 1.1
  const middle = (frame.left + frame.right) / 2
  return [
    textMark({ ink, role: 'axis', x: middle, y: below, anchor: 'middle', lines: [x] }, type.axis),
    textMark(
      {
        ink,
        role: 'axis',
        x: type.axis * 1.05,
        y: (frame.top + frame.bottom) / 2,
        anchor: 'middle',
        lines: [y],
        turned: true,
      },
      type.axis,
    ),
  ]
}
