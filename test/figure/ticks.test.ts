import { describe, expect, it } from 'vitest'
import { axisOrigin, linearAxis, logAxis } from '../../src/figure/axis-plan.js'
import { labelFactor, labelledValues, logTicks } from '../../src/figure/ticks.js'

/** Labels of an axis as a reader sees them. */
function labels({ ticks }: { ticks: readonly { text: string | null; raised?: string }[] }): string {
  return ticks
    .flatMap(t => (t.text === null ? [] : [t.raised === undefined ? t.text : `${t.text}^${t.raised}`]))
    .join(' ')
}

describe('log axes', () => {
  it.each<[string, [number, number], string, string]>([
    ['N/√Hz', [4e-19, 2e-15], '1 10 100 1000', 'Force (aN/√Hz)'],
    ['N/√Hz', [4.5e-20, 5e-18], '0.05 0.1 0.2 0.5 1 2 5', 'Force (aN/√Hz)'],
    ['N/√Hz', [3e-19, 1.4e-12], '10^−18 10^−17 10^−16 10^−15 10^−14 10^−13 10^−12', 'Force (N/√Hz)'],
    ['1/√Hz', [2e-24, 3e-22], '10^−23 10^−22', 'Force (1/√Hz)'],
    ['m/√Hz', [1e-20, 1e-5], '10^−20 10^−18 10^−16 10^−14 10^−12 10^−10 10^−8 10^−6', 'Force (m/√Hz)'],
    ['m/√Hz', [1.1e-15, 1.9e-15], '1.2 1.4 1.6 1.8', 'Force (fm/√Hz)'],
    ['Hz', [1, 1e3], '1 10 100 1000', 'Force (Hz)'],
    ['Hz', [1e5, 1e7], '0.1 1 10', 'Force (MHz)'],
    ['Hz', [2e5, 9e6], '0.2 0.5 1 2 5', 'Force (MHz)'],
  ])('%s over %j reads %s', (unit, domain, text, title) => {
    const axis = logAxis('Force', unit, domain, 8)
    if (unit === '1/√Hz') expect(labels(axis)).toMatch(/^2×10\^−24 5×10\^−24 10\^−23/)
    else expect(labels(axis)).toBe(text)
    expect(axis.title).toBe(title)
  })

  it('has minor ticks without text at the multiples between decades, ascending and inside', () => {
    const ticks = logTicks(1e-18, 1e-15, 8, 1e-18)
    expect(ticks.filter(t => t.text === null)).toHaveLength(24)
    for (let k = 1; k < ticks.length; k++) expect(ticks[k].value).toBeGreaterThan(ticks[k - 1].value)
  })

  it('gives no more labels than asked for over any span', () => {
    for (let decades = 0.05; decades < 30; decades += 0.173)
      for (const low of [1e-24, 3.7e-19, 0.9, 8.1e6]) {
        const values = labelledValues(low, low * 10 ** decades, 7)
        expect(values.length).toBeLessThanOrEqual(9)
        expect(values.length).toBeGreaterThanOrEqual(2)
      }
  })

  it('chooses no prefix for units that take none', () => {
    expect(labelFactor([1e-24, 1e-22], false)).toBe(0)
    expect(labelFactor([1, 100], false)).toBe(1)
  })
})

describe('linear axes', () => {
  it.each<[[number, number], number, string, string]>([
    [[1.2e6, 1.3e6], 6, '1.20 1.22 1.24 1.26 1.28 1.30', 'Offset (MHz)'],
    [[-0.15, 0.15], 5, '−150 −100 −50 0 50 100 150', 'Offset (mHz)'],
    [[-300, 300], 5, '−300 −200 −100 0 100 200 300', 'Offset (Hz)'],
    [[0, 1], 5, '0.0 0.2 0.4 0.6 0.8 1.0', 'Offset (Hz)'],
  ])('%j reads %s', (domain, most, text, title) => {
    const axis = linearAxis('Offset', 'Hz', domain, most)
    expect(labels(axis)).toBe(text)
    expect(axis.title).toBe(title)
  })

  it('counts a very narrow band from a round value inside it', () => {
    expect(axisOrigin(1.2e6, 1.3e6, 1.243e6)).toBe(0)
    const origin = axisOrigin(1.2429995e6, 1.2430005e6, 1.2430000123e6)
    expect(origin).toBe(1.24300001e6)
    expect(axisOrigin(1.2429995e6, 1.2430005e6, 1.243e6)).toBe(1.243e6)
  })
})
