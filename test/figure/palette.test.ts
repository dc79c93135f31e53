import { describe, expect, it } from 'vitest'
import { dashOf, negativeDash } from '../../src/figure/dashes.js'
import { FAMILIES, FAMILY_COLOURS, GROUND, type Scheme } from '../../src/figure/palette.js'
import { contrast, difference, lab, linear, seenWith, VISIONS, type Triple, type Vision } from './colour-vision.js'

const SCHEMES: Scheme[] = ['light', 'dark']
const EYES = Object.keys(VISIONS) as Vision[]

describe('the measures themselves', () => {
  // Pairs 1, 7, 13 and 25 of the test data of Sharma, Wu and Dalal (2005); from memory.
  it.each<[Triple, Triple, number]>([
    [[50, 2.6772, -79.7751], [50, 0, -82.7485], 2.0425],
    [[50, 0, 0], [50, -1, 2], 2.3669],
    [[50, -0.001, 2.49], [50, 0.0011, -2.49], 4.7461],
    [[60.2574, -34.0099, 36.2677], [60.4626, -34.1751, 39.4387], 1.2644],
  ])('CIEDE2000 of %j and %j is %d', (a, b, expected) => {
    expect(difference(a, b)).toBeCloseTo(expected, 4)
    expect(difference(b, a)).toBeCloseTo(expected, 4)
  })

  it('white stays white for every eye', () => {
    for (const eye of EYES) for (const c of seenWith(eye, [1, 1, 1])) expect(c).toBeCloseTo(1, 4)
  })

  it('red and green of equal lightness come together for deuteranopia, not for tritanopia', () => {
    const pair = ['#b4502d', '#6d7a1c'] as const
    const apart = (eye: Vision) => difference(lab(seenWith(eye, linear(pair[0]))), lab(seenWith(eye, linear(pair[1]))))
    for (const eye of ['normal', 'tritanopia'] as const) expect(apart(eye)).toBeGreaterThan(2 * apart('deuteranopia'))
  })

  it('black on white has a contrast of 21', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10)
  })
})

describe.each(SCHEMES)('the palette, %s', scheme => {
  const ground = GROUND[scheme]
  const colours = FAMILIES.map(family => [family, FAMILY_COLOURS[family][scheme]] as const)

  it.each(colours)('%s stands out from the paper by more than 3 : 1', (_, colour) => {
    expect(contrast(colour, ground.paper)).toBeGreaterThan(3)
    // Curves also cross the region beyond the standard quantum limit.
    expect(contrast(colour, ground.beyond)).toBeGreaterThan(2.9)
  })

  it('text and limits are readable', () => {
    expect(contrast(ground.ink, ground.paper)).toBeGreaterThan(12)
    expect(contrast(ground.limit, ground.paper)).toBeGreaterThan(4.5)
    expect(contrast(ground.axis, ground.paper)).toBeGreaterThan(4.5)
  })

  it.each(EYES)('no two families, nor a family and the greys, come near each other: %s', eye => {
    const all = [...colours, ['total', ground.ink] as const, ['limits', ground.limit] as const]
    const seen = all.map(([name, colour]) => ({ name, at: lab(seenWith(eye, linear(colour))) }))
    for (const a of seen)
      for (const b of seen.slice(seen.indexOf(a) + 1)) {
        if (a.name === 'total' && b.name === 'limits') continue
        expect(difference(a.at, b.at), `${a.name} and ${b.name}`).toBeGreaterThan(10)
      }
  })
})

describe('dashes', () => {
  it('families whose greys in print are nearer than 4 in lightness have different strokes or are printed with names', () => {
    const grey = (colour: string) => lab(linear(colour))[0]
    const strokes = FAMILIES.map(family => ({
      family,
      grey: grey(FAMILY_COLOURS[family].light),
      dash: `${dashOf(family, 0)}`,
    }))
    const alike = strokes.flatMap((a, k) =>
      strokes.slice(k + 1).filter(b => a.dash === b.dash && Math.abs(a.grey - b.grey) < 0.5),
    )
    expect(alike).toEqual([])
  })

  it('the first four lines of a family are drawn differently, and never like a negative stretch', () => {
    for (const family of FAMILIES) {
      const dashes = [0, 1, 2, 3].map(tone => `${dashOf(family, tone)}`)
      expect(new Set(dashes).size).toBe(4)
      expect(dashes).not.toContain(`${negativeDash()}`)
      expect(dashOf(family, 4)).toEqual(dashOf(family, 0))
    }
  })
})
