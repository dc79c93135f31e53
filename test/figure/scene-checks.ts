import { expect } from 'vitest'
import type { PathMark, Scene, TextMark } from '../../src/figure/scene.js'
import { overlaps } from '../../src/figure/text-box.js'

export function textsOf(scene: Scene): TextMark[] {
  return scene.marks.filter(mark => mark.mark === 'text')
}

export function pathsOf(scene: Scene): PathMark[] {
  return scene.marks.filter(mark => mark.mark === 'path')
}

/** The words of a scene's labels, lines joined. */
export function labelsOf(scene: Scene): string[] {
  return textsOf(scene)
    .filter(text => text.role === 'label')
    .map(text => text.lines.join(' '))
}

export function curveOf(scene: Scene, id: string): PathMark {
  const found = pathsOf(scene).find(path => path.of === id)
  expect(found, id).toBeDefined()
  return found!
}

/** No two texts overlap, and all stand inside the figure. */
export function expectTextsApart(scene: Scene, what: string): void {
  const texts = textsOf(scene)
  const name = (text: TextMark) => `${what}: ${text.role} "${text.lines.join(' ')}"`
  texts.forEach((a, k) => {
    const { left, top, right, bottom } = a.box
    expect(left >= 0 && top >= 0 && right <= scene.width && bottom <= scene.height, `${name(a)} inside`).toBe(true)
    for (const b of texts.slice(k + 1)) expect(overlaps(a.box, b.box), `${name(a)} over ${name(b)}`).toBe(false)
  })
}

/** Every coordinate is a number inside the figure, and no piece has more than 800 points. */
export function expectPathsSound(scene: Scene, what: string): void {
  for (const path of pathsOf(scene))
    for (const piece of path.pieces) {
      expect(piece.length % 2, what).toBe(0)
      expect(piece.length, `${what}: points of ${path.of}`).toBeGreaterThanOrEqual(4)
      if (path.ink.as === 'line' || path.ink.as === 'total') expect(piece.length / 2).toBeLessThanOrEqual(800)
      const sound = piece.every(
        (v, k) => Number.isFinite(v) && v >= -1e-6 && v <= (k % 2 ? scene.height : scene.width) + 1e-6,
      )
      expect(sound, `${what}: coordinates of ${path.of ?? path.ink.as}`).toBe(true)
    }
}
