import { describe, expect, test } from 'vitest'
import { boltzmannConstant, planckConstant, speedOfLight } from '../../src/physics/constants.js'
import { toDensity } from '../../src/quantity/declared.js'
import { formatPlain } from '../../src/quantity/format.js'
import { parseQuantity } from '../../src/quantity/parse.js'
import { deviation, type Check } from './check.js'

const value = (text: string): number => parseQuantity(text).value
const codata = 'CODATA 2022 adjustment (Mohr, Newell, Taylor, Tiesinga 2024)'

/** Tolerances: 1e-12 for definitions, 1e-9 for what the source prints in ten digits, 1e-6 for values that were recomputed. */
const checks: readonly Check[] = [
  {
    quantity: 'one torr in pascal',
    computed: () => value('1 Torr'),
    expected: 133.32236842105263,
    tolerance: 1e-12,
    source: 'definition, 1 atm/760',
  },
  {
    quantity: 'one millibar in pascal',
    computed: () => value('1 mbar'),
    expected: 100,
    tolerance: 1e-12,
    source: 'definition',
  },
  {
    quantity: 'frequency of one kelvin, k/h',
    computed: () => boltzmannConstant / planckConstant,
    expected: 20836619123.327576,
    tolerance: 1e-9,
    source: codata,
  },
  {
    quantity: 'frequency of one electronvolt',
    computed: () => value('1 eV') / planckConstant,
    expected: 241798924208491.8,
    tolerance: 1e-9,
    source: codata,
  },
  {
    quantity: 'a millionth of standard gravity per root hertz',
    computed: () => toDensity(parseQuantity('1 µgn/√Hz'), 'acceleration').value,
    expected: 9.80665e-6,
    tolerance: 1e-12,
    source: 'definition of standard gravity, 3rd CGPM (1901)',
  },
  { quantity: '0 dBm in watt', computed: () => value('0 dBm'), expected: 1e-3, tolerance: 1e-12, source: 'definition' },
  {
    quantity: '-100 dBm in watt',
    computed: () => value('-100 dBm'),
    expected: 1e-13,
    tolerance: 1e-12,
    source: 'definition',
  },
  {
    quantity: 'force of one watt of reflected light',
    computed: () => (2 * value('1 W')) / speedOfLight,
    expected: 6.671281903963041e-9,
    tolerance: 1e-9,
    source: '2P/c',
  },
  {
    quantity: 'energy of one quantum of 1064 nm',
    computed: () => (planckConstant * speedOfLight) / value('1064 nm'),
    expected: 1.8669603920572636e-19,
    tolerance: 1e-9,
    source: 'hc/λ',
  },
  {
    quantity: 'weight of a picogram',
    computed: () => value('1 pg') * value('1 gn'),
    expected: 9.80665e-15,
    tolerance: 1e-12,
    source: 'mg with standard gravity',
  },
  {
    quantity: 'a strain of 1e-21 over 4 km',
    computed: () => value('1e-21') * value('4 km'),
    expected: 4e-18,
    tolerance: 1e-12,
    source: 'hL',
  },
  {
    quantity: 'thermal motion of a spring of 1 N/m at 300 K',
    computed: () => Math.sqrt((boltzmannConstant * value('300 K')) / value('1 N/m')),
    expected: 6.435795988065501e-11,
    tolerance: 1e-6,
    source: 'equipartition, √(kT/k); printed as 64 pm',
  },
  {
    quantity: 'wavelength of first sound in helium-4 at 1 kHz',
    computed: () => value('238 m/s') / value('1 kHz'),
    expected: 0.238,
    tolerance: 1e-9,
    source: 'c/f',
  },
  {
    quantity: 'quality factor of 7.54 GHz with a linewidth of 200 kHz',
    computed: () => value('7.54 GHz') / value('200 kHz'),
    expected: 37700,
    tolerance: 1e-9,
    source: 'definition, f over the full width at half maximum',
  },
  {
    quantity: 'quality factor of 10.56 MHz with a linewidth of 32 Hz',
    computed: () => value('10.56 MHz') / value('32 Hz'),
    expected: 3.3e5,
    tolerance: 0.01,
    source: 'Teufel et al., Nature 475, 359 (2011), from memory',
  },
  {
    quantity: 'oscillations of 305 kHz in a coherence time of 7.6 µs, counted in radians',
    computed: () => value('2π × 305 kHz') * value('7.6 µs'),
    expected: 15,
    tolerance: 0.05,
    source: 'Delić et al., Science 367, 892 (2020), abstract: 15',
  },
  {
    quantity: 'cavity linewidth of cooperativity 5, g/2π 71 kHz and Γ/2π 21 kHz',
    computed: () => (4 * value('71 kHz') ** 2) / (5 * value('21 kHz')),
    expected: 193e3,
    tolerance: 0.01,
    source: 'Delić et al., Science 367, 892 (2020): g and C from the abstract, 193 kHz from memory; C = 4g²/κΓ',
  },
]

describe('units against definitions and published numbers', () => {
  test.each(checks)('$quantity', check => {
    expect(deviation(check), check.source).toBeLessThanOrEqual(check.tolerance)
  })
})

describe('notation of uncertainty', () => {
  test('50.000838(32) mm [JCGM 100:2008 (GUM), form of 7.2.2 with the numbers of H.1]', () => {
    const { uncertainty, value: length } = parseQuantity('50.000838(32) mm')
    expect(Math.abs(uncertainty / 3.2e-8 - 1)).toBeLessThan(1e-12)
    expect(length).toBe(50.000838e-3)
  })

  test('100.021 47 g with 0.35 mg in the four forms of the GUM [JCGM 100:2008, 7.2.2]', () => {
    for (const text of [
      '100.02147(35) g',
      '100.02147(0.00035) g',
      '(100.02147 ± 0.00035) g',
      '100.02147 g ± 0.35 mg',
    ]) {
      const read = parseQuantity(text)
      expect(read.value).toBe(0.10002147)
      expect(Math.abs(read.uncertainty / 3.5e-7 - 1)).toBeLessThan(1e-12)
    }
  })

  test('the same is printed as it was read, but for the honest number of digits', () => {
    expect(formatPlain(50.000838e-3, 'm', { uncertainty: 3.2e-8 })).toBe('50.00084(3) mm')
    expect(formatPlain(50.000838e-3, 'm', { uncertainty: 1.2e-8 })).toBe('50.000838(12) mm')
  })
})
