import { expect, test } from 'vitest'
import { toDeclared, toDensity } from '../../src/quantity/declared.js'
import { QuantityError } from '../../src/quantity/error.js'
import { parseQuantity } from '../../src/quantity/parse.js'
import { parseScale } from '../../src/quantity/scale.js'

test.each(['kHz', 'aN/√Hz', 'dBm', 'dBm/Hz', 'dBV/√Hz', 'dBV²/Hz', 'dBc/Hz', '°C', 'V pk', '%', 'µΦ₀/√Hz', '1', ''])(
  'a column in %s reads each number as the quantity that it is',
  unit => {
    const scale = parseScale(unit)
    for (const number of [-3.5, 0, 12, 40]) {
      const wanted = parseQuantity(`${number} ${unit === '1' ? '' : unit}`).value
      expect(Math.abs(scale.toSi(number) - wanted)).toBeLessThanOrEqual(4e-16 * Math.abs(wanted))
    }
  },
)

test('one of the unit says what the column may be used as', () => {
  const { unit, toSi } = parseScale('dBc/Hz')
  const phase = (toSi(-120) * toDensity(unit, 'phase').value) / unit.value
  expect(phase / 2e-12).toBeCloseTo(1, 14)
  const frequency = parseScale('kHz')
  expect(toDeclared(frequency.unit, 'frequency').value).toBe(1000)
})

test.each([
  ['Hz ± 1 Hz', 0, '`Hz ± 1 Hz` is no unit alone; write one such as `Hz` or `dBm`'],
  ['  foo', 0, '`foo` is not a known unit; write SI units, such as `ng` or `aN/√Hz`'],
  ['aN/√Hy', 4, '`Hy` is not a known unit; write `Hz`'],
])('%s is refused', (text, offset, message) => {
  try {
    parseScale(text)
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error
    expect(error.message).toBe(message)
    expect(error.offset).toBe(offset)
    return
  }
  throw new Error(`${text} was read`)
})
