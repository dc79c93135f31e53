import { describe, expect, it } from 'vitest'
import { spokenFrequency, spokenRange } from '../../src/report/landmarks.js'
import { fixtureAssessment } from './fixture.js'

const plain = (text: string): string => text.replaceAll('\u00a0', ' ')
/** The reference is 1.2435 MHz, the mode 1.243 MHz. */
const assessment = fixtureAssessment()

describe('frequencies near one that the reader knows', () => {
  it.each([
    [1.24312e6, 3e3, '1.2431 MHz'],
    [1.243e6, 0.01, '1.243 MHz'],
    [1.243e6 - 0.1432, 12, '1.243 MHz − 140 mHz'],
    [1.243e6 + 0.0432, 12, '1.243 MHz + 40 mHz'],
    [1.2435e6 + 2.37, 5, '1.2435 MHz + 2.4 Hz'],
    [1.27e6 + 0.1432, 0.5, '1.27000014 MHz'],
  ])('%s Hz, known to a hundredth of %s Hz, is %s', (frequency, width, text) =>
    expect(plain(spokenFrequency(assessment, frequency, width))).toBe(text),
  )

  it.each([
    [1.2e6, 1.24131e6, '1.200 to 1.241 MHz'],
    [1.243e6 - 0.31, 1.243e6 + 0.42, '−310 to 420 mHz from 1.243 MHz'],
    [1.243e6 - 0.31, 1.243e6 + 4.2, '−310 mHz to 4.2 Hz from 1.243 MHz'],
    [1.243e6, 1.243e6 + 4.2, '0 to 4.2 Hz from 1.243 MHz'],
    [1.27e6, 1.27e6 + 0.25, '1.27000000 to 1.27000025 MHz'],
  ])('%s to %s Hz is %s', (from, to, text) => expect(plain(spokenRange(assessment, { from, to }))).toBe(text))

  it('stand at the ends of wide ranges too, when a table wants many digits', () => {
    const range = (from: number, to: number) => plain(spokenRange(assessment, { from, to }, 9))
    expect(range(1.2e6, 1.243e6 - 0.31)).toBe('1.2 MHz to 1.243 MHz − 310 mHz')
    expect(range(1.243e6 + 0.42, 1.3e6)).toBe('1.243 MHz + 420 mHz to 1.3 MHz')
  })
})
