import { describe, expect, it } from 'vitest'
import { starterText } from '../../src/budget/starter-text.js'
import type { Starter } from '../../src/budget/starter.js'
import { starters } from '../../src/budget/starters.js'
import { declarations } from '../../src/catalogue/declarations.js'
import { assess } from '../../src/engine/assess.js'
import { good, read } from './read.js'

const all = [...starters.values()]
const membrane = starters.get('membrane') as Starter

describe.each(all)('the starter $name', starter => {
  const text = starterText(starter, 'tern')

  it('is a budget without errors or warnings that can be computed', () => {
    expect(read(text).problems).toEqual([])
    const { headlines, modes, warnings } = assess(good(text))
    expect(headlines.best.asd).toBeGreaterThan(0)
    expect(headlines.reference?.frequency).toBeGreaterThan(0)
    expect(modes.every(mode => mode.effectiveLinewidth > 0)).toBe(true)
    expect(warnings.map(({ code }) => code).filter(code => code !== 'no-back-action')).toEqual([])
  })

  it('rests on nothing, and says so of every number but weights', () => {
    const roots = good(text).roots.filter(root => !/\.modes\./.test(root.id))
    expect(roots.length).toBeGreaterThan(5)
    expect(roots.filter(root => root.evidence !== 'assumed').map(root => root.id)).toEqual([])
  })

  it('names all noises in its lines', () => {
    const lines = assess(good(text)).evaluation.lines.filter(line => !line.signed)
    expect(lines.map(line => line.id)).toEqual(Object.keys(starter.contributions))
  })

  it('keeps its lines narrow, and without blanks at their ends', () => {
    const bad = text.split('\n').filter(line => [...line].length > 120 || /\s$/.test(line))
    expect(bad).toEqual([])
  })
})

describe('a starter’s text', () => {
  const plain = starterText(membrane, 'tern').replace(/\n *# */g, ' ')

  it('explains every key that a kind can have, in the words of the catalogue', () => {
    const fields = Object.values(declarations.get('cavity')?.fields ?? {})
    expect(fields.length).toBeGreaterThan(5)
    for (const { meaning } of fields) expect(plain).toContain(meaning)
    expect(plain).toContain('g0 (instead of coupling): single-quantum coupling rate')
  })

  it.each([
    ['a kind', { kind: 'spoon', fields: {} }, 'a starter names the kind spoon, which the catalogue lacks'],
    ['a field', { kind: 'loss', fields: { colour: '1' } }, 'a starter states x.loss.colour, which the catalogue lacks'],
  ])('is refused where the catalogue no longer has %s', (_what, x, message) => {
    expect(() => starterText({ ...membrane, components: { x } }, 'tern')).toThrow(message)
  })
})
