import { describe, expect, it } from 'vitest'
import { sparkScene } from '../../src/figure/spark-scene.js'
import { renderSvg } from '../../src/figure/svg.js'
import { membraneInput } from './membrane.js'
import { randomBudget } from './random-budget.js'
import { expectPathsSound, expectTextsApart, labelsOf, pathsOf } from './scene-checks.js'

const SIZE = { width: 260, height: 84 }

describe('sparkScene', () => {
  it('shows the total and the standard quantum limit alone, named at their ends', () => {
    const scene = sparkScene(membraneInput(), SIZE)
    expect(labelsOf(scene).toSorted()).toEqual(['SQL', 'Total'])
    expect(pathsOf(scene).map(p => p.of)).toEqual([undefined, 'limit-standard-quantum-limit', 'total'])
    expect(scene.description).not.toContain('thermal')
  })

  it('is small', () => {
    expect(renderSvg(sparkScene(membraneInput(), SIZE), 's').length).toBeLessThan(2500)
  })

  it('holds for any budget', () => {
    for (let seed = 0; seed < 100; seed++) {
      const scene = sparkScene(randomBudget(seed), SIZE)
      expectTextsApart(scene, `spark ${seed}`)
      expectPathsSound(scene, `spark ${seed}`)
    }
  })
})
