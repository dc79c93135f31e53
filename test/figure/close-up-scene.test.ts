import { describe, expect, it } from 'vitest'
import { closeUpScene } from '../../src/figure/close-up-scene.js'
import { offsetPoints } from '../../src/figure/offset-points.js'
import { renderSvg } from '../../src/figure/svg.js'
import type { FigureInput } from '../../src/figure/input.js'
import { MEMBRANE, membraneInput } from './membrane.js'
import { withPole } from './membrane-anchored.js'
import { curveOf, expectPathsSound, expectTextsApart, labelsOf, textsOf } from './scene-checks.js'

const SIZE = { width: 900, height: 420 }

/** A total with a peak as narrow as the mode: there is nothing to see farther away. */
function peaked(input: FigureInput): FigureInput {
  const { halfWidth } = input.points.anchors[0]
  return { ...input, total: input.points.offset.map(offset => 1e-30 / (1 + (offset / halfWidth) ** 2)) }
}

/** Ends of the window in Hz, as the description says them. */
function rangeOf(description: string): number[] {
  const [, ...ends] = /from (−?[\d.]+)\u00a0Hz to (−?[\d.]+)\u00a0Hz\./.exec(description) ?? []
  return ends.map(end => Number(end.replace('−', '-')))
}

function xTitle(scene: ReturnType<typeof closeUpScene>): string {
  return textsOf(scene)
    .find(t => t.role === 'axis')!
    .lines[0].replaceAll('\u00a0', ' ')
}

describe('close-up', () => {
  it('reads offsets from the mode in a fitting unit', () => {
    const input = peaked(membraneInput())
    expect(xTitle(closeUpScene(input, input.points.anchors[0], SIZE))).toBe('Offset from 1.243 MHz (mHz)')
    const broad = membraneInput({ ...MEMBRANE, quality: 1e4 })
    expect(xTitle(closeUpScene(broad, broad.points.anchors[0], SIZE))).toBe('Offset from 1.243 MHz (kHz)')
  })

  it('is as wide as the pole near the mode, and centred on it', () => {
    const { input, mode } = withPole(MEMBRANE, 40, 25)
    const scene = closeUpScene(input, mode, SIZE)
    expect(xTitle(scene)).toBe('Offset from 1.243 MHz (Hz)')
    const ticks = textsOf(scene)
      .filter(t => t.role === 'tick')
      .map(t => t.lines[0])
    // 40 ± 24 · 25 Hz.
    expect(ticks).toContain('600')
    expect(ticks).toContain('−400')
    expect(ticks).not.toContain('−600')
  })

  it('takes no notice of a pole that is far away', () => {
    const { input, mode } = withPole(MEMBRANE, 4000, 25)
    expect(xTitle(closeUpScene(peaked(input), mode, SIZE))).toBe('Offset from 1.243 MHz (mHz)')
  })

  it('shows the band in which the sensor is good where the mode is far narrower and the light leaves it alone', () => {
    const input = membraneInput()
    const scene = closeUpScene(input, input.points.anchors[0], SIZE)
    expect(xTitle(scene)).toBe('Offset from 1.243 MHz (Hz)')
    // The total's power doubles some 190 Hz away; the window reaches half a width beyond.
    const [low, high] = rangeOf(scene.description)
    expect(low).toBeGreaterThan(-420)
    expect(low).toBeLessThan(-300)
    expect(high).toBeGreaterThan(300)
    expect(high).toBeLessThan(420)
  })

  it('stays at the width of the pole where the light has broadened it', () => {
    const { input, mode } = withPole(MEMBRANE, 0, 4)
    expect(rangeOf(closeUpScene(input, mode, SIZE).description)).toEqual([-96, 96])
  })

  it('keeps the shape of a resonance of quality 10¹²: offsets are not differences of rounded frequencies', () => {
    const sharp = membraneInput({ ...MEMBRANE, quality: 1e12 })
    const offsets = offsetPoints(sharp.points, sharp.points.anchors[0].frequency)
    expect(offsets).toEqual(sharp.points.offset)
    const halfWidth = sharp.points.anchors[0].halfWidth
    const total = sharp.points.offset.map(offset => 1e-30 / (1 + (offset / halfWidth) ** 2))
    const scene = closeUpScene({ ...sharp, total }, sharp.points.anchors[0], SIZE)
    const [piece] = curveOf(scene, 'total').pieces
    expect(piece.length / 2).toBeGreaterThan(20)
    // Symmetric about the mode: the peak stands half way.
    const heights = piece.filter((_, k) => k % 2 === 1)
    const peak = piece[2 * heights.indexOf(Math.min(...heights))]
    expect(peak).toBeCloseTo((piece[0] + piece.at(-2)!) / 2, 6)
    expect(xTitle(scene)).toBe('Offset from 1.243 MHz (µHz)')
  })

  it('measures points of other anchors, and of none, from this one', () => {
    const { input, mode } = withPole(MEMBRANE, 40, 25)
    const points = {
      ...input.points,
      anchor: Int32Array.of(0, 1, -1),
      offset: Float64Array.of(-3, 2, 1.3e6),
      frequency: Float64Array.of(1242997, 1243042, 1.3e6),
    }
    expect([...offsetPoints(points, mode.frequency)]).toEqual([-3, 42, 57000])
  })

  it('stays inside the band', () => {
    const input = membraneInput({ ...MEMBRANE, quality: 100 })
    const scene = closeUpScene(input, input.points.anchors[0], SIZE)
    const ticks = textsOf(scene)
      .filter(t => t.role === 'tick')
      .map(t => Number(t.lines[0].replace('−', '-')))
    expect(Math.min(...ticks)).toBeGreaterThanOrEqual(-43)
    expect(Math.max(...ticks.filter(t => t < 100))).toBeLessThanOrEqual(57)
  })

  it.each([SIZE, { width: 390, height: 340 }])('names only what is in the frame, apart from each other (%j)', size => {
    const { input, mode } = withPole(MEMBRANE, 0, 0.02)
    const scene = closeUpScene(input, mode, size)
    expect(labelsOf(scene).join()).not.toContain('↓')
    expect(labelsOf(scene)).not.toContain('shot noise')
    expectTextsApart(scene, 'close-up')
    expectPathsSound(scene, 'close-up')
    expect(renderSvg(scene, 'c')).not.toMatch(/NaN|Infinity|undefined|null/)
  })

  it('describes the resonance by offsets', () => {
    const input = peaked(membraneInput())
    const { description } = closeUpScene(input, input.points.anchors[0], SIZE)
    expect(description.replaceAll('\u00a0', ' ')).toContain(
      'against the offset from 1.243 MHz, from −149 mHz to 149 mHz.',
    )
    expect(description).toContain('The largest contribution is back-action from')
  })
})
