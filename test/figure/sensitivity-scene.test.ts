import { describe, expect, it } from 'vitest'
import type { FigureInput } from '../../src/figure/input.js'
import { sensitivityScene } from '../../src/figure/sensitivity-scene.js'
import { renderSvg } from '../../src/figure/svg.js'
import { MEMBRANE, membraneInput } from './membrane.js'
import { randomBudget } from './random-budget.js'
import { curveOf, expectPathsSound, expectTextsApart, labelsOf, pathsOf, textsOf } from './scene-checks.js'

const WIDE = { width: 1100, height: 640 }
const COMPACT = { width: 390, height: 380 }
const BROAD = { ...MEMBRANE, low: 1e5, high: 1e7, quality: 1e6 }

describe('the membrane', () => {
  it.each([
    ['wide', membraneInput(), WIDE],
    ['compact', membraneInput(BROAD), COMPACT],
  ] as const)('%s is drawn as it was', async (name, input, size) => {
    await expect(renderSvg(sensitivityScene(input, size), name)).toMatchFileSnapshot(`pictures/membrane-${name}.svg`)
  })

  it('names every line, the total and the limits in the frame once, in the curve’s own ink', () => {
    const input = membraneInput()
    const scene = sensitivityScene(input, WIDE)
    const names = labelsOf(scene).map(name => name.replace(' ↓', ''))
    // The correlation limit lies below the frame.
    const expected = [...input.lines, input.limits[0]].map(curve => curve.title)
    expect(names.toSorted()).toEqual([...expected, 'Total', '− correlation'].toSorted())
    for (const text of textsOf(scene).filter(t => t.role === 'label'))
      if (pathsOf(scene).some(p => p.of === text.of)) expect(curveOf(scene, text.of!).ink).toEqual(text.ink)
  })

  it('draws the negative side of the correlation with a stroke of its own', () => {
    const scene = sensitivityScene(membraneInput(), WIDE)
    const positive = curveOf(scene, 'line-correlation')
    const negative = curveOf(scene, 'line-correlation-negative')
    expect(negative.dash).not.toEqual(positive.dash)
    // The mode divides them.
    expect(positive.pieces.at(-1)!.at(-2)!).toBeLessThanOrEqual(negative.pieces[0][0] + 1)
  })

  it('reaches the bottom of the resonance although it is narrower than a pixel', () => {
    const input = membraneInput()
    const scene = sensitivityScene(input, WIDE)
    const lowest = Math.max(...curveOf(scene, 'total').pieces.flatMap(piece => piece.filter((_, k) => k % 2 === 1)))
    const ring = scene.marks.find(mark => mark.mark === 'ring')!
    expect(lowest).toBeCloseTo(ring.y, 0)
    expect(labelsOf(scene).length).toBeGreaterThan(0)
    expect(textsOf(scene).some(t => t.lines[0] === 'best 3.65\u00a0aN/√Hz')).toBe(true)
  })

  it('is compact in a narrow frame: the rest of the names stands below, nothing is lost above a share of 10⁻⁴', () => {
    const scene = sensitivityScene(membraneInput(), COMPACT)
    expect(scene.height).toBeGreaterThan(COMPACT.height)
    const names = labelsOf(scene)
    for (const name of ['Total', 'shot noise', 'thermal', 'back-action', 'stray forces']) expect(names).toContain(name)
    expect(names.filter(name => /SQL|standard quantum limit/.test(name))).toHaveLength(1)
    expectTextsApart(scene, 'compact')
  })

  it('has the titles and units that a journal expects', () => {
    const titles = (input: FigureInput) =>
      textsOf(sensitivityScene(input, WIDE))
        .filter(t => t.role === 'axis')
        .map(t => t.lines[0])
    expect(titles(membraneInput())).toEqual(['Frequency (MHz)', 'Force (aN/√Hz)'])
    expect(titles(membraneInput(BROAD))).toEqual(['Frequency (MHz)', 'Force (N/√Hz)'])
  })

  it('counts a band of a few hertz from a round frequency', () => {
    const input = membraneInput({ ...MEMBRANE, low: 1.243e6 - 0.5, high: 1.243e6 + 0.5 })
    const texts = textsOf(sensitivityScene(input, WIDE))
    expect(texts.find(t => t.role === 'axis')!.lines[0]).toBe('Frequency − 1.243\u00a0MHz (mHz)')
    expect(texts.some(t => t.role === 'tick' && t.lines[0] === '−400')).toBe(true)
  })

  it('says in words what the curves do', () => {
    const { description, title } = sensitivityScene(membraneInput(), WIDE)
    expect(title).toBe('Sandpiper membrane: noise budget')
    expect(description.replaceAll('\u00a0', ' ')).toBe(
      'Amplitude density of force against frequency from 1.2000 MHz to 1.3000 MHz. ' +
        'The total is least, 3.65 aN/√Hz at 1.2430 MHz, and greatest, 1.09 fN/√Hz at 1.3000 MHz. ' +
        'The largest contribution is shot noise from 1.2000 MHz to 1.2428 MHz, then back-action from 1.2428 MHz to 1.2432 MHz, ' +
        'then shot noise from 1.2432 MHz to 1.3000 MHz. ' +
        'With respect to the standard quantum limit the total is lowest at 1.2432 MHz, 2.8 dB above it. ' +
        'Curves: total; thermal; shot noise; back-action; correlation; amplifier; cavity heating; detector loss; stray forces; ' +
        'standard quantum limit; correlation limit.',
    )
  })
})

describe('inputs at the edge', () => {
  const input = membraneInput()
  const empty = { ...input, total: input.total.map(() => 0), best: null }

  it('draws axes and no total when the total is nowhere above zero', () => {
    const scene = sensitivityScene({ ...empty, lines: [], limits: [] }, WIDE)
    expect(pathsOf(scene).map(path => path.ink.as)).toEqual(['grid', 'axis', 'tick', 'reference'])
    expect(scene.description).toContain('The total is nowhere above zero.')
    expectTextsApart(scene, 'empty')
    expect(renderSvg(scene, 'e')).not.toMatch(/NaN|Infinity|undefined|null/)
  })

  it('survives a zero of the response, where the total goes to infinity', () => {
    const total = input.total.slice()
    total[40] = Infinity
    total[60] = 1e250
    const scene = sensitivityScene({ ...input, total }, WIDE)
    expectPathsSound(scene, 'zero of the response')
  })

  it('is the same twice, and leaves its input alone', () => {
    const before = JSON.stringify({ ...input, total: [...input.total] })
    expect(renderSvg(sensitivityScene(input, WIDE), 'a')).toBe(renderSvg(sensitivityScene(input, WIDE), 'a'))
    expect(JSON.stringify({ ...input, total: [...input.total] })).toBe(before)
  })
})

describe('hundreds of budgets that nobody would draw', () => {
  it.each([
    ['wide', WIDE, 200],
    ['middle', { width: 760, height: 520 }, 60],
    ['compact', COMPACT, 200],
  ] as const)(
    '%s: no names collide, none leaves the figure, every path is sound',
    (name, size, count) => {
      for (let seed = 0; seed < count; seed++) {
        const scene = sensitivityScene(randomBudget(seed), size)
        expectTextsApart(scene, `${name} ${seed}`)
        expectPathsSound(scene, `${name} ${seed}`)
        expect(renderSvg(scene, 'r')).not.toMatch(/NaN|Infinity|undefined|null/)
      }
    },
    60_000,
  )
})
