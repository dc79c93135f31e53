import { describe, expect, it } from 'vitest'
import { textWidth, wrapText } from '../../src/figure/text-width.js'

describe('text width', () => {
  it('is proportional to the size and additive', () => {
    expect(textWidth('', 14)).toBe(0)
    expect(textWidth('thermal', 28)).toBeCloseTo(2 * textWidth('thermal', 14), 10)
    expect(textWidth('ab', 10)).toBeCloseTo(textWidth('a', 10) + textWidth('b', 10), 10)
  })

  it('counts an unknown character as a full square, never as nothing', () => {
    expect(textWidth('漢', 10)).toBeGreaterThanOrEqual(10)
  })
})

describe('wrapText', () => {
  it('breaks at spaces and ends what is too long in an ellipsis', () => {
    expect(wrapText('shot noise', 14, 200, 2)).toEqual(['shot noise'])
    expect(wrapText('gas damping of the fundamental mode', 14, 150, 2)).toEqual([
      'gas damping of the',
      'fundamental mode',
    ])
    const cut = wrapText('one two three four five six seven eight', 14, 80, 2)
    expect(cut).toHaveLength(2)
    expect(cut[1].endsWith('…')).toBe(true)
  })

  it('keeps every line within the width, even of one long word', () => {
    for (const text of ['Donaudampfschifffahrtsgesellschaft', 'a b c d e f g h i j k l m n o p', 'WWWWWWWWWW WWWW'])
      for (const line of wrapText(text, 14, 90, 2)) expect(textWidth(line, 14)).toBeLessThanOrEqual(90)
  })
})
