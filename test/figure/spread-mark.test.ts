import { describe, expect, it } from 'vitest'
import { closeUpScene } from '../../src/figure/close-up-scene.js'
import type { FigureInput } from '../../src/figure/input.js'
import { sensitivityScene } from '../../src/figure/sensitivity-scene.js'
import { renderSvg } from '../../src/figure/svg.js'
import { membraneInput } from './membrane.js'
import { curveOf, expectPathsSound, expectTextsApart, labelsOf, pathsOf, textsOf } from './scene-checks.js'

const WIDE = { width: 1100, height: 640 }
const NARROW = { width: 390, height: 380 }
const NAME = 'Total (shaded: ± standard uncertainty)'

/** The membrane with a total that is uncertain by a part of itself. */
function uncertain(part: number): FigureInput {
  const input = membraneInput()
  const best = { ...input.best!, uncertainty: part * input.best!.asd }
  return { ...input, best, uncertainty: input.total.map(psd => part * Math.sqrt(psd)) }
}

/** Distances in pixels between the upper and the lower edge of the band's only piece, at its left end. */
function heightAtLeft(input: FigureInput): number {
  const [piece] = curveOf(sensitivityScene(input, WIDE), 'spread').pieces
  return Math.abs(piece[1] - piece.at(-1)!)
}

describe('the band of the total', () => {
  it('is drawn as it was, with variants beside it', async () => {
    const input = { ...uncertain(0.2), variants: variantsOf(membraneInput()) }
    await expect(renderSvg(sensitivityScene(input, WIDE), 'band')).toMatchFileSnapshot('pictures/membrane-band.svg')
  })

  it('is one standard uncertainty to each side, on the log axis of the figure', () => {
    const ticks = textsOf(sensitivityScene(uncertain(0.2), WIDE)).filter(t => t.role === 'tick' && t.anchor === 'end')
    const [one, ten] = ['10', '100'].map(label => ticks.find(t => t.lines[0] === label)!.y)
    expect(heightAtLeft(uncertain(0.2)) / (one - ten)).toBeCloseTo(Math.log10(1.2 / 0.8), 2)
  })

  it('stands behind every curve, and is named where it can be seen', () => {
    const scene = sensitivityScene(uncertain(0.2), WIDE)
    const order = pathsOf(scene).map(path => path.ink.as)
    expect(order.indexOf('spread')).toBeLessThan(order.indexOf('line'))
    expect(labelsOf(scene)).toContain(NAME)
    expect(labelsOf(sensitivityScene(uncertain(0.001), WIDE))).toContain('Total')
    expect(textsOf(scene).some(t => t.lines[0] === 'best 3.6(7)\u00a0aN/√Hz')).toBe(true)
  })

  it('goes down to the frame where the uncertainty is larger than the total', () => {
    const scene = sensitivityScene(uncertain(3), WIDE)
    expectPathsSound(scene, 'wide band')
    expect(curveOf(scene, 'spread').pieces.flat().length).toBeGreaterThan(8)
  })

  it('is told to those who do not see it', () => {
    expect(sensitivityScene(uncertain(0.2), WIDE).description).toContain(
      'The surface around the total reaches one standard uncertainty to each side, 20 % of the total.',
    )
    expect(sensitivityScene(membraneInput(), WIDE).description).not.toContain('uncertainty')
  })

  it('is in the close-ups too, and in compact figures', () => {
    const input = uncertain(0.2)
    for (const size of [WIDE, NARROW]) {
      const scene = closeUpScene(input, input.points.anchors[0], size)
      expect(curveOf(scene, 'spread').filled).toBe(true)
      expectPathsSound(scene, 'close-up')
      expectTextsApart(scene, 'close-up')
    }
  })

  it('has no style of its own', () => {
    expect(renderSvg(sensitivityScene(uncertain(0.2), WIDE), 'b')).toContain('class="figure-spread figure-fill"')
  })
})

function variantsOf({ points, total }: FigureInput): FigureInput['variants'] {
  return [
    { id: 'cold', title: 'cold: Q ten times higher', points, total: total.map(psd => 0.25 * psd) },
    { id: 'warm', title: 'warm', points, total: total.map(psd => 9 * psd) },
  ]
}

describe('variants', () => {
  const input = { ...membraneInput(), variants: variantsOf(membraneInput()) }

  it('are thinner lines of the total’s ink, each with a dash and a name of its own', () => {
    const scene = sensitivityScene(input, WIDE)
    const [cold, warm] = ['variant-cold', 'variant-warm'].map(id => curveOf(scene, id))
    expect(cold.ink).toEqual({ as: 'variant' })
    expect(cold.dash).not.toEqual(warm.dash)
    expect(labelsOf(scene)).toEqual(expect.arrayContaining(['cold: Q ten times higher', 'warm']))
    expect(scene.description).toContain(
      'Beside it stand the totals of variants: cold: Q ten times higher; warm. Curves:',
    )
    expectTextsApart(scene, 'variants')
  })

  it('are inside the frame, above and below the total', () => {
    const scene = sensitivityScene(input, WIDE)
    for (const id of ['variant-cold', 'variant-warm']) {
      const [piece] = curveOf(scene, id).pieces
      expect(piece[0]).toBeCloseTo(curveOf(scene, 'total').pieces[0][0], 1)
      expect(curveOf(scene, id).pieces).toHaveLength(1)
    }
  })

  it('stand on points of their own, in close-ups by their offset', () => {
    const anchor = input.points.anchors[0]
    const points = { ...input.points, anchors: [{ ...anchor, frequency: anchor.frequency + 20 }] }
    const moved = { ...input, variants: [{ ...input.variants[0], points }] }
    const scene = closeUpScene(moved, anchor, WIDE)
    const lowest = (id: string): number => {
      const [piece] = curveOf(scene, id).pieces
      const heights = piece.filter((_, k) => k % 2 === 1)
      return piece[2 * heights.indexOf(Math.max(...heights))]
    }
    expect(lowest('variant-cold')).toBeGreaterThan(lowest('total') + 10)
  })
})
