import { describe, expect, it } from 'vitest'
import type { Mark, Scene } from '../../src/figure/scene.js'
import { pathData, renderStandaloneSvg, renderSvg } from '../../src/figure/svg.js'
import { textMark } from '../../src/figure/text-box.js'

function scene(...marks: Mark[]): Scene {
  return { width: 700, height: 300, title: 'A <b> & "c"', description: 'Falls from 2 to 1.', marks }
}

describe('pathData', () => {
  it.each<[number[], string]>([
    [[0, 0, 10, 10], 'M0 0l10 10'],
    [[1.04, 2.06, 1.54, 1.96, 3, 2], 'M1 2.1l.5 -.1 1.5 0'],
    [[0, 0, 0.01, 0.02, 5, 5], 'M0 0l5 5'],
    [[-0.04, 0, 1, 0], 'M0 0l1 0'],
  ])('%j is %s', (line, expected) => {
    expect(pathData(line)).toBe(expected)
  })

  it('does not add up rounding: the last point is within half a tenth', () => {
    const line = Array.from({ length: 2000 }, (_, k) => [k * 0.333, Math.sin(k) * 3.337]).flat()
    const numbers = pathData(line)
      .match(/-?\d*\.?\d+/g)!
      .map(Number)
    let [x, y] = numbers
    for (let k = 2; k < numbers.length; k += 2) {
      x += numbers[k]
      y += numbers[k + 1]
    }
    expect(Math.abs(x - line.at(-2)!)).toBeLessThan(0.0501)
    expect(Math.abs(y - line.at(-1)!)).toBeLessThan(0.0501)
  })

  it.each([Number.NaN, Infinity, null as unknown as number, undefined as unknown as number])('refuses %s', bad => {
    if (bad === null) expect(pathData([1, 1, 2, 2])).toBe('M1 1l1 1')
    else expect(() => pathData([0, 0, bad, 1])).toThrow(RangeError)
  })
})

describe('renderSvg', () => {
  it('names and describes itself with ids of its own', () => {
    const text = renderSvg(scene(), 'first')
    expect(text).toContain('viewBox="0 0 700 300"')
    expect(text).toContain('role="img" aria-labelledby="first-title first-description"')
    expect(text).toContain('<title id="first-title">A &#60;b&#62; &#38; &#34;c&#34;</title>')
    expect(text).toContain('<desc id="first-description">Falls from 2 to 1.</desc>')
  })

  it('writes marks with classes, never with styles', () => {
    const ink = { as: 'line', family: 'back-action', tone: 1 } as const
    const text = renderSvg(
      scene(
        { mark: 'path', ink, of: 'line-x', dash: [4, 3], pieces: [[0, 0, 1, 1]] },
        { mark: 'ring', ink: { as: 'best' }, x: 5, y: 6, radius: 4.5 },
        textMark({ ink: { as: 'tick' }, role: 'tick', x: 10, y: 20, anchor: 'end', lines: ['10'], raised: '−18' }, 13),
        textMark({ ink, role: 'label', x: 10, y: 20, anchor: 'start', lines: ['a', '<b>'] }, 14),
      ),
      'f',
    )
    expect(text).toContain(
      '<path id="f-line-x" class="figure-line figure-stroke figure-back-action" stroke-dasharray="4 3" d="M0 0l1 1"/>',
    )
    expect(text).toContain('<circle class="figure-best figure-stroke" cx="5" cy="6" r="4.5"/>')
    expect(text).toContain('text-anchor="end">10<tspan class="figure-raised" dy="-5.5">−18</tspan></text>')
    expect(text).toContain('a<tspan x="10" dy="16.5">&#60;b&#62;</tspan>')
    expect(text).not.toMatch(/\sstyle=|<style/)
  })

  it('marks a narrow figure as compact', () => {
    expect(renderSvg({ ...scene(), width: 390 }, 'f')).toContain('class="figure figure-compact"')
    expect(renderSvg(scene(), 'f')).toContain('class="figure"')
  })

  it('carries its style sheet as a file of its own', () => {
    const text = renderStandaloneSvg(scene(), 'f')
    expect(text).toMatch(/^<\?xml version="1.0" encoding="UTF-8"\?>\n<svg /)
    expect(text).toContain('--figure-thermal: #')
    expect(text.match(/<style>/g)).toHaveLength(1)
  })
})
