import { describe, expect, it } from 'vitest'
import { decibelText, marginText } from '../../src/report/margins.js'
import { frequencyText, numberText, percentText, rangeText } from '../../src/report/numbers.js'

const plain = (text: string): string => text.replaceAll('\u00a0', ' ')

describe('texts of numbers', () => {
  it.each([
    [1.243e6, '1.243 MHz'],
    [9.31e6, '9.31 MHz'],
    [100, '100 Hz'],
    [0, '0 Hz'],
    [0.0518, '51.8 mHz'],
    [1_000_000.5, '1 MHz'],
  ])('frequency %s is %s', (value, text) => expect(plain(frequencyText(value))).toBe(text))

  it.each([
    [0, '0 %'],
    [1, '100 %'],
    [0.9996, '100 %'],
    [0.9994, '99.9 %'],
    [0.5, '50.0 %'],
    [0.0153, '1.5 %'],
    [0.00012, '0.012 %'],
    [0.00001, '< 0.01 %'],
    [-0.00001, '> −0.01 %'],
    [-0.024, '−2.4 %'],
  ])('share %s is %s', (value, text) => expect(plain(percentText(value))).toBe(text))

  it.each([
    [4.06, '4.1 dB', '4.1 dB above'],
    [-0.3, '−0.3 dB', '0.3 dB below'],
    [-0.02, '0.0 dB', 'at'],
    [0, '0.0 dB', 'at'],
  ])('margin %s is %s, in words %s', (value, number, words) => {
    expect(plain(decibelText(value))).toBe(number)
    expect(plain(marginText(value))).toBe(words)
  })

  it.each([
    [1.2e6, 1.3e6, '1.2 to 1.3 MHz'],
    [1.2e6, 1.24131e6, '1.200 to 1.241 MHz'],
    [900e3, 1.1e6, '900 kHz to 1.1 MHz'],
    [1e6, 1e6 + 0.25, '1.00000000 to 1.00000025 MHz'],
    [1, 28.087, '1.0 to 28.1 Hz'],
  ])('range %s to %s is %s', (from, to, text) => expect(plain(rangeText(from, to))).toBe(text))

  it.each([
    [2.4e7, '2.4 × 10⁷'],
    [2500, '2500'],
    [1, '1'],
    [100, '100'],
  ])('number %s is %s', (value, text) => expect(plain(numberText(value))).toBe(text))
})
