import { describe, expect, it } from 'vitest'
import { shareScene } from '../../src/figure/share-scene.js'
import { stackShares } from '../../src/figure/stack-shares.js'
import { renderSvg } from '../../src/figure/svg.js'
import { membraneInput } from './membrane.js'
import { randomBudget } from './random-budget.js'
import { expectPathsSound, expectTextsApart, labelsOf } from './scene-checks.js'

describe('stackShares', () => {
  it('adds up to one at every point, negative shares counted below zero', () => {
    const input = membraneInput()
    const bands = stackShares(input)
    for (let k = 0; k < input.total.length; k++) {
      const top = Math.max(...bands.map(b => b.upper[k]))
      const bottom = Math.min(0, ...bands.map(b => b.lower[k]))
      expect(top + bottom).toBeCloseTo(1, 12)
    }
    const correlation = bands.find(b => b.line.id === 'correlation')!
    expect(correlation.lowest).toBeLessThan(-0.01)
  })

  it('puts the line of the largest share first and touches each band to the one below', () => {
    const bands = stackShares(membraneInput())
    expect(bands[0].line.id).toBe('shot')
    expect(bands.map(b => b.greatest)).toEqual(bands.map(b => b.greatest).toSorted((a, b) => b - a))
    expect([...bands[1].lower]).toEqual([...bands[0].upper])
  })

  it('has no share where the total is zero or missing', () => {
    const input = membraneInput()
    const total = input.total.slice()
    total[3] = 0
    total[4] = Number.NaN
    for (const { upper, lower } of stackShares({ ...input, total })) {
      expect(upper[3] - lower[3]).toBe(0)
      expect(upper[4] - lower[4]).toBe(0)
    }
  })
})

describe('shareScene', () => {
  it.each([
    { width: 1100, height: 300 },
    { width: 390, height: 260 },
  ])('names every band that matters (%j)', size => {
    const scene = shareScene(membraneInput(), size)
    for (const name of ['shot noise', 'back-action', 'thermal', 'correlation']) expect(labelsOf(scene)).toContain(name)
    expectTextsApart(scene, 'shares')
    expectPathsSound(scene, 'shares')
  })

  it('holds for any budget', () => {
    for (let seed = 0; seed < 60; seed++) {
      const scene = shareScene(randomBudget(seed), { width: 900, height: 420 })
      expectTextsApart(scene, `shares ${seed}`)
      expectPathsSound(scene, `shares ${seed}`)
      expect(renderSvg(scene, 's')).not.toMatch(/NaN|Infinity|undefined|null/)
    }
  })
})
