import fc from 'fast-check'
import katex from 'katex'
import { describe, expect, test } from 'vitest'
import { formatPlain, formatQuantity, formatTex, type FormatOptions } from '../../src/quantity/format.js'
import { parseQuantity, parseUnit } from '../../src/quantity/parse.js'
import { factorOf } from '../../src/quantity/unit-meaning.js'

/** Value, unit, options, what is printed (with plain spaces), and its TeX. */
const printed: readonly (readonly [number, string, FormatOptions, string, string])[] = [
  [3.2e-18, 'N/√Hz', { uncertainty: 2e-19 }, '3.2(2) aN/√Hz', '3.2(2)\\,\\mathrm{aN}/\\sqrt{\\mathrm{Hz}}'],
  [3.1e-12, 'kg', {}, '3.10 ng', '3.10\\,\\mathrm{ng}'],
  [40, 'kg', {}, '40.0 kg', '40.0\\,\\mathrm{kg}'],
  [0.05, 'kg', {}, '50.0 g', '50.0\\,\\mathrm{g}'],
  [4000, 'kg', {}, '4000 kg', '4000\\,\\mathrm{kg}'],
  [1.243e6, 'Hz', { digits: 4 }, '1.243 MHz', '1.243\\,\\mathrm{MHz}'],
  [999.96e3, 'Hz', {}, '1.00 MHz', '1.00\\,\\mathrm{MHz}'],
  [6.4e-37, 'N²/Hz', {}, '6.40 × 10⁻³⁷ N²/Hz', '6.40\\times 10^{-37}\\,\\mathrm{N}^{2}/\\mathrm{Hz}'],
  [-5e-36, 'N²/Hz', {}, '−5.00 aN²/Hz', '-5.00\\,\\mathrm{aN}^{2}/\\mathrm{Hz}'],
  [2.4e7, '', { digits: 2 }, '2.4 × 10⁷', '2.4\\times 10^{7}'],
  [0.72, '1', { digits: 2 }, '0.72', '0.72'],
  [0.0123, '', {}, '0.0123', '0.0123'],
  [300, 'K', {}, '300 K', '300\\,\\mathrm{K}'],
  [0.0095, 'K', { uncertainty: 0.0003 }, '9.5(3) mK', '9.5(3)\\,\\mathrm{mK}'],
  [12.34, 'K', { uncertainty: 0.14 }, '12.34(14) K', '12.34(14)\\,\\mathrm{K}'],
  [320, 'Hz', { uncertainty: 20 }, '320(20) Hz', '320(20)\\,\\mathrm{Hz}'],
  [12345, 'Hz', { uncertainty: 1200 }, '12.3(12) kHz', '12.3(12)\\,\\mathrm{kHz}'],
  [0.01, 'N', { uncertainty: 0.3 }, '0(300) mN', '0(300)\\,\\mathrm{mN}'],
  [0, 'Hz', {}, '0 Hz', '0\\,\\mathrm{Hz}'],
  [5e8, 'rad/(s m)', {}, '500 Mrad/(s m)', '500\\,\\mathrm{Mrad}/(\\mathrm{s}\\,\\mathrm{m})'],
  [90, '°', {}, '90.0°', '90.0{}^{\\circ}'],
  [1e-40, 'm', {}, '1.00 × 10⁻⁴⁰ m', '1.00\\times 10^{-40}\\,\\mathrm{m}'],
  [3e-6, 'W', {}, '3.00 µW', '3.00\\,\\mu \\mathrm{W}'],
  [5e4, 'Ω', {}, '50.0 kΩ', '50.0\\,\\mathrm{k}\\Omega'],
  [0.3, '1/√Hz', {}, '0.300 1/√Hz', '0.300\\,1/\\sqrt{\\mathrm{Hz}}'],
  [4.7e-8, 'm/s²/√Hz', {}, '47.0 nm/s²/√Hz', '47.0\\,\\mathrm{nm}/\\mathrm{s}^{2}/\\sqrt{\\mathrm{Hz}}'],
  [2e4, 's', {}, '2.00 × 10⁴ s', '2.00\\times 10^{4}\\,\\mathrm{s}'],
  [-3.25, 'dB', {}, '−3.25 dB', '-3.25\\,\\mathrm{dB}'],
  [20, '°C', {}, '20.0 °C', '20.0\\,{}^{\\circ}\\mathrm{C}'],
  [2e-6, 'Φ₀/√Hz', {}, '2.00 µΦ₀/√Hz', '2.00\\,\\mu \\Phi_0/\\sqrt{\\mathrm{Hz}}'],
  [3, 'µΦ₀', {}, '3.00 µΦ₀', '3.00\\,\\mu \\Phi_0'],
  [3, 'V rms', {}, '3.00 V rms', '3.00\\,\\mathrm{V\\,rms}'],
  [3, '″', {}, '3.00″', "3.00{}''"],
  [5, '%', { digits: 1 }, '5 %', '5\\,\\%'],
]

describe('printed quantities', () => {
  test.each(printed)('%d %s', (...row) => {
    const [value, unit, options, text, tex] = row
    expect(formatQuantity(value, unit, options)).toBe(
      text.replaceAll(' ', '\u00a0').replace('s\u00a0m', 's m').replace('V\u00a0rms', 'V rms'),
    )
    expect(formatPlain(value, unit, options)).toBe(text.replace('−', '-'))
    expect(formatTex(value, unit, options)).toBe(tex)
    expect(katex.renderToString(tex, { strict: 'error', trust: false })).toContain('katex')
  })

  test('what is not finite is said in words', () => {
    expect(formatQuantity(Infinity, 'N')).toBe('∞\u00a0N')
    expect(formatQuantity(-Infinity, '')).toBe('−∞')
    expect(formatQuantity(NaN, '')).toBe('not a number')
    expect(formatTex(Infinity, 'N')).toBe('\\text{infinite}')
  })
})

const units = fc.constantFrom(
  'N/√Hz',
  'kg',
  'Hz',
  'm',
  'W',
  'N²/Hz',
  'm²/Hz',
  'K',
  's',
  '',
  'rad/s',
  'm/s²/√Hz',
  '1/√Hz',
  'dB',
  'Ω',
  '%',
)
const numbers = fc
  .tuple(fc.double({ min: 1, max: 9.999, noNaN: true }), fc.integer({ min: -60, max: 60 }), fc.boolean())
  .map(([mantissa, power, negative]) => (negative ? -1 : 1) * Number(`${mantissa}e${power}`))

describe('what is printed is read back', () => {
  test('to half of the last digit, and printed again the same', () => {
    fc.assert(
      fc.property(numbers, units, fc.integer({ min: 1, max: 15 }), (value, unit, digits) => {
        const factor = factorOf(parseUnit(unit))
        const text = formatQuantity(value, unit, { digits })
        const back = parseQuantity(text).value / factor
        const step = 10 ** (Math.floor(Math.log10(Math.abs(value))) - digits + 1)
        expect(Math.abs(back - value)).toBeLessThanOrEqual(step * 0.5 + 1e-14 * Math.abs(value))
        expect(formatQuantity(back, unit, { digits })).toBe(text)
      }),
      { numRuns: 500 },
    )
  })

  test('to the last bit in 17 digits of a unit without a factor', () => {
    fc.assert(
      fc.property(numbers, fc.constantFrom('N/√Hz', 'Hz', 'm', 'N²/Hz', '', 'rad/s'), (value, unit) => {
        expect(parseQuantity(formatQuantity(value, unit, { digits: 17 })).value).toBe(value)
      }),
      { numRuns: 500 },
    )
  })

  test('with an uncertainty in one or two honest digits', () => {
    const relative = fc.double({ min: 1e-9, max: 3, noNaN: true })
    fc.assert(
      fc.property(numbers, relative, units, (value, part, unit) => {
        const factor = factorOf(parseUnit(unit))
        const uncertainty = Math.abs(value) * part
        const back = parseQuantity(formatQuantity(value, unit, { uncertainty }))
        expect(Math.abs(back.uncertainty / factor / uncertainty - 1)).toBeLessThanOrEqual(0.2)
        expect(Math.abs(back.value / factor - value)).toBeLessThanOrEqual(0.5 * uncertainty + 1e-14 * Math.abs(value))
      }),
      { numRuns: 500 },
    )
  })
})
