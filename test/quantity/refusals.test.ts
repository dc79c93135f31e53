import { describe, expect, test } from 'vitest'
import { QuantityError } from '../../src/quantity/error.js'
import { parseQuantity } from '../../src/quantity/parse.js'

const likeThis = 'write a quantity like `3.1(2) ng`, `5.2 MHz ± 1 %` or `0.8 aN/√Hz`'

/** Text, the piece that is at fault, and the whole message. */
const refusals: readonly (readonly [string, string, string])[] = [
  [
    '3 N/√Hz m',
    'N/√Hz m',
    '`N/√Hz m` may be read in two ways, as a product stands behind a division; write `N/(√Hz m)` or `N m/√Hz`',
  ],
  [
    '3 /Hz·m',
    '/Hz·m',
    '`/Hz·m` may be read in two ways, as a product stands behind a division; write `/(Hz m)` or `m/Hz`',
  ],
  ['3,1 ng', '3,1', '`3,1`: a decimal comma is not read; write `3.1`'],
  ['1,000,000 Hz', '1,000,000', '`1,000,000`: digits are not grouped by commas; write `1000000`'],
  ['1 000 Hz', '1 000', '`1 000`: digits stand together; write `1000`'],
  ['1_000 Hz', '1_000', '`1_000`: digits stand together; write `1000`'],
  ['.5 K', '.5', '`.5`: a number begins with a digit; write `0.5`'],
  ['5. K', '5.', '`5.`: a digit is missing after the point; write `5` or `5.0`'],
  ['1e400 Hz', '1e400', '`1e400` is too large a number; at most 1.7e308 in SI units is read'],
  ['1e300 km^5', '1e300', '`1e300` is too large a number; at most 1.7e308 in SI units is read'],
  ['1e-400 kg', '1e-400', '`1e-400` is too small a number; at least 2.3e-308 in SI units is read, or 0'],
  ['1e-300 qm', '1e-300', '`1e-300` is too small a number; at least 2.3e-308 in SI units is read, or 0'],
  ['1.0(1)e-308 K', '1.0(1)e-308', '`1.0(1)e-308` is too small a number; at least 2.3e-308 in SI units is read, or 0'],
  ['2π × 1e308', '2π × 1e308', '`2π × 1e308` is beyond the numbers that are read, 1.7e308 in SI units'],
  ['0 Qm^99', 'Qm^99', '`Qm^99` is beyond the numbers that are read; write a smaller power or another prefix'],
  ['.inf', '.inf', '`.inf` is not a finite number; write digits, such as `3.1 ng`'],
  ['-Infinity', '-Infinity', '`-Infinity` is not a finite number; write digits, such as `3.1 ng`'],
  ['NaN', 'NaN', '`NaN` is not a finite number; write digits, such as `3.1 ng`'],
  ['.nan', '.nan', '`.nan` is not a finite number; write digits, such as `3.1 ng`'],
  ['3 \u041ag', '\u041a', 'the character U+041A only looks like `K`; write `K`'],
  ['3 \u039dm', '\u039d', 'the character U+039D only looks like `N`; write `N`'],
  [
    '3 k\u043c',
    '\u043c',
    'the character U+043C (м) has no place in a quantity; write it like `3.1(2) ng` or `0.8 aN/√Hz`',
  ],
  ['\u20133 K', '\u2013', 'the character U+2013 only looks like `-`; write `-`'],
  ['3\u200b K', '\u200b', 'the character U+200B has no place in a quantity; write it like `3.1(2) ng` or `0.8 aN/√Hz`'],
  ['3\t K', '\t', 'the character U+0009 has no place in a quantity; write it like `3.1(2) ng` or `0.8 aN/√Hz`'],
  [
    '5 \u{1f600}',
    '\u{1f600}',
    'the character U+1F600 (\u{1f600}) has no place in a quantity; write it like `3.1(2) ng` or `0.8 aN/√Hz`',
  ],
  ['3 Khz', 'Khz', '`Khz` is not a known unit; write `kHz`'],
  ['3 mhz', 'mhz', '`mhz` is not a known unit; write `MHz` or `mHz`'],
  ['3 MHs', 'MHs', '`MHs` is not a known unit; write `MHz`'],
  ['3 hertz', 'hertz', '`hertz` is not a known unit; write `Hz`'],
  ['3 um', 'um', '`um` is not a known unit; write `µm`'],
  ['3 aN/√Hy', 'Hy', '`Hy` is not a known unit; write `Hz`'],
  ['4 k', 'k', '`k` is not a known unit; write `K`'],
  ['3 foo', 'foo', '`foo` is not a known unit; write SI units, such as `ng` or `aN/√Hz`'],
  ['3 constructor', 'constructor', '`constructor` is not a known unit; write SI units, such as `ng` or `aN/√Hz`'],
  ['68 °F', '°F', '`°F` has a zero point of its own; write the temperature in `K` or `°C`'],
  ['-300 °C', '-300 °C', '`-300 °C` lies below absolute zero, −273.15 °C, or beyond all numbers'],
  ['20 °C ± 1 %', '1', '`1` is the uncertainty of a temperature; write `± 1 K`'],
  ['20.0(1) °C ± 1 K', '20.0(1)', '`20.0(1)` states a second uncertainty; keep one of the two'],
  [
    '2π × 20 °C',
    '2π × 20 °C',
    '`2π × 20 °C` has a factor π, which a temperature cannot have; write its number, such as `20 °C`',
  ],
  ['3 W/dBm', 'dBm', '`dBm` stands first in its unit, right behind its number, such as `-60 dBm`'],
  [
    '-120 dBV/Hz',
    'dBV/Hz',
    '`dBV/Hz` mixes an amplitude with a power density; write `dBV/√Hz` or `dBV²/Hz`, which have the same number',
  ],
  ['-120 dBm/√Hz', 'dBm/√Hz', '`dBm/√Hz` mixes a power with an amplitude density; write `dBm/Hz`'],
  ['3 dBm²', 'dBm²', '`dBm²` is no level that is read; write it like `dBm` or `dBm/Hz`'],
  ['-60 dBm ± 1 %', '1', '`1` is the uncertainty of a level; write `± 1 dB`'],
  [
    '2π × 3 dBm',
    '2π × 3 dBm',
    '`2π × 3 dBm` has a factor π, which a level cannot have; write its number, such as `-60 dBm`',
  ],
  ['-9999 dBm', '-9999 dBm', '`-9999 dBm` is beyond the numbers that are read; write a level such as `-60 dBm`'],
  ['5 e', 'e', '`e` is no unit, as it would be read as a power of ten; the elementary charge is written `qe`'],
  ['5 ppt', 'ppt', '`ppt` means 1e-12 to some and 1e-3 to others; write the number itself'],
  [
    '5 W pk',
    'W pk',
    '`W pk` is not a known unit; `pk` stands right behind the unit of an oscillation, such as `mV pk` or `nm pk`',
  ],
  ["5'", "5'", "`5'`: minutes and seconds of arc are written `′` and `″`, or `arcmin` and `arcsec`"],
  ['5 Φ', '5 Φ', '`5 Φ` ends too early; write a quantity like `3.1(2) ng` or `0.8 aN/√Hz`'],
  ['3 m/sqrt Hz', 'sqrt', '`sqrt` wants brackets; write `sqrt(Hz)` or `√Hz`'],
  ['3 m s-2', 's-2', '`s-2`: an exponent needs its sign of power; write `s^-2`'],
  ['3 m2', 'm2', '`m2`: an exponent needs its sign of power; write `m^2`'],
  [
    '3 m^0.33',
    '^0.33',
    '`^0.33` is no exponent that is read; write a small whole number or a fraction, such as `^2` or `^(-1/2)`',
  ],
  [
    '3 m^(1/0)',
    '^(1/0)',
    '`^(1/0)` is no exponent that is read; write a small whole number or a fraction, such as `^2` or `^(-1/2)`',
  ],
  [
    '3 m^1000',
    '^1000',
    '`^1000` is no exponent that is read; write a small whole number or a fraction, such as `^2` or `^(-1/2)`',
  ],
  [
    '0.72 ± 3 %',
    '0.72 ± 3 %',
    '`0.72 ± 3 %` may be read in two ways; write `(0.72 ± 3) %` for both in %, or both as plain numbers',
  ],
  [
    '72 % ± 3 %',
    '3 %',
    '`3 %` may be a part of the value or be added to it; write `(72 ± 3) %` for both in %, or both as plain numbers',
  ],
  ['5 MHz ± 3', '3', '`3` has no unit; write `± 3 MHz` or a part in %'],
  ['5 MHz ± 3 kg', '3 kg', '`3 kg` is of another kind than the value; write it in `MHz` or in %'],
  ['5 MHz ± 3 rad/s', '3 rad/s', '`3 rad/s` is of another kind than the value; write it in `MHz` or in %'],
  ['3.1(2) ± 0.2 ng', '3.1(2)', '`3.1(2)` states a second uncertainty; keep one of the two'],
  [
    '2π × 3 MHz ± 1 kHz',
    '1 kHz',
    '`1 kHz` may stand inside or outside the factor π; write it like `2π × (3.0 ± 0.1) MHz` or in %',
  ],
  ['2π × 3.1 ± 0.2 MHz', '3.1 ± 0.2 MHz', '`3.1 ± 0.2 MHz` wants brackets behind a factor π; write `(3.1 ± 0.2) MHz`'],
  [
    '3 ± 0.2 × 10^-12 kg',
    '3 ± 0.2 × 10^-12 kg',
    '`3 ± 0.2 × 10^-12 kg` wants brackets before its power of ten; write it like `(3.1 ± 0.2) × 10^-12 kg`',
  ],
  ['3 ng)', ')', `\`)\` is not understood here; ${likeThis}`],
  ['3.1(2 ng', ' ng', `\`ng\` is not understood here; ${likeThis}`],
  ['kg', 'kg', `\`kg\` is not understood here; ${likeThis}`],
  ['3 N.m', '.m', `\`.m\` is not understood here; ${likeThis}`],
  ['2π ×', '2π ×', '`2π ×` ends too early; write a quantity like `3.1(2) ng` or `0.8 aN/√Hz`'],
  ['3 N/', '3 N/', '`3 N/` ends too early; write a quantity like `3.1(2) ng` or `0.8 aN/√Hz`'],
  ['', '', 'nothing stands here; write a quantity, such as `3.1(2) ng`'],
  ['1'.repeat(201), '1', 'a quantity of 201 characters is too long; at most 200 are read'],
]

function refusalOf(text: string): QuantityError {
  try {
    parseQuantity(text)
  } catch (error) {
    if (error instanceof QuantityError) return error
    throw error
  }
  throw new Error(`${text} was read`)
}

describe('refusals name the piece, its place and the remedy', () => {
  test.each(refusals)('%s', (text, piece, message) => {
    const error = refusalOf(text)
    expect(error.message).toBe(message)
    expect(text.slice(error.offset, error.offset + error.length)).toBe(piece)
  })

  test('the quantities that a remedy writes out are themselves read', () => {
    const remedies = refusals.map(([, , message]) => message.slice(message.lastIndexOf('; write')))
    const written = remedies.flatMap(remedy =>
      [...remedy.matchAll(/`([-(]?\d[^`]*)`/g)].map(([, quantity]) => quantity),
    )
    expect(written.length).toBeGreaterThan(20)
    for (const quantity of written) expect(() => parseQuantity(quantity)).not.toThrow()
  })

  test.each([
    '('.repeat(200),
    `3 ${'('.repeat(198)}`,
    `3 ${'√'.repeat(198)}`,
    `3 ${'foo '.repeat(49)}`,
    `3${' '.repeat(198)}x`,
    '9'.repeat(201),
    '1 000'.repeat(40),
  ])('%s is refused at once', text => {
    const start = performance.now()
    expect(() => parseQuantity(text)).toThrow(QuantityError)
    expect(performance.now() - start).toBeLessThan(100)
  })
})
