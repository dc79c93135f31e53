import { describe, expect, test } from 'vitest'
import { baseUnitText } from '../../../src/quantity/dimension.js'
import { QuantityError } from '../../../src/quantity/error.js'
import { checkExpression } from '../../../src/quantity/expression/check-expression.js'
import { parseExpression } from '../../../src/quantity/expression/parse-expression.js'
import { toText } from '../../../src/quantity/rational.js'
import { scope } from './scope.js'

/** Expression, dimension in base units, cycles. */
const kinds: readonly (readonly [string, string, string])[] = [
  ['sqrt(k/m)', 's^-1', '0'],
  ['sqrt(k/m)/(2*pi)', 's^-1', '1'],
  ['1/2π*sqrt(k/m)', 's^-1', '1'],
  ['sqrt(k/m)/2/pi', 's^-1', '1'],
  ['1/(2*pi*r*cap)', 's^-1', '1'],
  ['1/(r*cap)', 's^-1', '0'],
  ['2*pi*frequency', 's^-1', '0'],
  ['frequency*2*pi/quality', 's^-1', '0'],
  ['(2*pi*frequency)^2', 's^-2', '0'],
  ['4*pi^2*frequency^2*mass', 'kg s^-2', '0'],
  ['mass*(2π*frequency)²', 'kg s^-2', '0'],
  ['pi*frequency/quality', 's^-1', '0'],
  ['k_B*temperature/h', 's^-1', '1'],
  ['k_B*temperature/hbar', 's^-1', '0'],
  ['h*frequency', 'm^2 kg s^-2', '0'],
  ['2*h*frequency*power', 'm^4 kg^2 s^-5', '0'],
  ['4*k_B*temperature*mass*rate', 'm^2 kg^2 s^-3', '0'],
  ['4*k_B*temperature*mass*2*pi*frequency/quality', 'm^2 kg^2 s^-3', '0'],
  ['density^2*(1 + (3 kHz)/f)', 'm^2 kg^2 s^-3', '-1'],
  ['1e-18*(f/(1 kHz))^-2', '1', '0'],
  ['(2 aN/√Hz)*√(f/(1 kHz))', 'm kg s^(-3/2)', '-1/2'],
  ['1/(1 + (2*pi*f*tau)^2)', '1', '0'],
  ['1/(1 + (f/(1 kHz))^1.7)', '1', '0'],
  ['exp(-2*pi*f*tau)', '1', '0'],
  ['exp(-f*(2 1/Hz))', '1', '0'],
  ['cos(pi/4)', '1', '0'],
  ['sin(90°)', '1', '0'],
  ['pi^2*hbar*c/(240*length^4)', 'm^-1 kg s^-2', '0'],
  ['e^2/(4*pi*epsilon_0*length^2)', 'm kg s^-2', '0'],
  ['cycle*c/wavelength', 's^-1', '1'],
  ['2*pi*cycle*c/wavelength', 's^-1', '0'],
  ['c/(2*pi*length)', 's^-1', '1'],
  ['radian*6*pi*viscosity*length/mass', 's^-1', '0'],
  ['radian*2*pi*viscosity*length/mass', 's^-1', '0'],
  ['cycle/(pi*tau)', 's^-1', '1'],
  ['c/length*tau', '1', '0'],
  ['10^(gain/(10 dB))', '1', '0'],
  ['mass^(1/3)', 'kg^(1/3)', '0'],
  ['mass^0.5*mass^-0.5', '1', '0'],
  ['quality^(1/quality)', '1', '0'],
  ['atan2(length, wavelength)', '1', '0'],
  ['hypot(length, wavelength, 3 mm)', 'm', '0'],
  ['max(frequency, 3 kHz)', 's^-1', '1'],
  ['sign(mass)', '1', '0'],
  ['abs(-length)', 'm', '0'],
  ['mass - (1 u)', 'kg', '0'],
]

describe('the kind of an expression', () => {
  test.each(kinds)('%s', (text, dimension, cycles) => {
    const kind = checkExpression(parseExpression(text), scope)
    expect(baseUnitText(kind.dimension)).toBe(dimension)
    expect(toText(kind.cycles)).toBe(cycles)
  })
})

/** Expression, the piece that is at fault, and the whole message. */
const refusals: readonly (readonly [string, string, string])[] = [
  ['2*(mass + k)', 'mass + k', '`mass` is a mass and `k` is a spring constant: they cannot be added'],
  [
    'f - rate',
    'f - rate',
    '`f` is a frequency and `rate` is a rate: they cannot be subtracted; a factor 2*pi makes radians of cycles',
  ],
  ['max(k, 0)', 'k, 0', '`k` is a spring constant and `0` is a plain number: they cannot be compared'],
  ['ln(2*mass)', '2*mass', '`2*mass` is a mass; `ln` takes a plain number, so divide it by one of its kind'],
  [
    'mass^quality',
    'quality',
    '`quality` is no fixed number; a power of a mass must be one, such as `2` or `(-1/2)`, or divide the base by its unit first',
  ],
  ['2^mass', 'mass', '`mass` is a mass; a power is a plain number'],
  [
    'mass^999999^2',
    '999999^2',
    '`999999^2` is no fixed number; a power of a mass must be one, such as `2` or `(-1/2)`, or divide the base by its unit first',
  ],
  [
    'exp(-f*tau)',
    '-f*tau',
    '`-f*tau` counts cycles; multiply by 2*pi for radians, or write the time per cycle in 1/Hz',
  ],
  [
    '1/(1 + (f*tau)^2)',
    '(f*tau)^2',
    '`(f*tau)^2` counts cycles; multiply by 2*pi for radians, or write the time per cycle in 1/Hz',
  ],
  [
    '2*c/wavelength',
    '2*c/wavelength',
    '`2*c/wavelength`, a speed over a length, may be the frequency of a wave or a plain rate; multiply the expression by `cycle` for hertz, or by `radian` for radians per second',
  ],
  [
    '16/pi*viscosity*length/mass',
    'pi',
    '`pi` may turn radians into cycles or be a plain factor; multiply the expression by `cycle` for hertz, or by `radian` for radians per second',
  ],
  ['3*masss', 'masss', '`masss` is not known here; nearest is `mass`'],
  ['3*k_b', 'k_b', '`k_b` is not known here; nearest is `k_B`'],
  ['3*zebra', 'zebra', '`zebra` is not known here; a name is a parameter, a constant of nature or `pi`'],
  ['3*Hz', 'Hz', '`Hz` is no name here; a unit stands behind its number, in brackets, such as `(3 Hz)`'],
  [
    'constructor',
    'constructor',
    '`constructor` is not known here; a name is a parameter, a constant of nature or `pi`',
  ],
  ['__proto__', '__proto__', '`__proto__` is not known here; a name is a parameter, a constant of nature or `pi`'],
  ['(3 m/s)*tau', '(3 m/s)', '`(3 m/s)` holds `s`, which is a unit, but also the name of a time; rename the parameter'],
]

function refusalOf(text: string, names = scope): QuantityError {
  try {
    checkExpression(parseExpression(text), names)
  } catch (error) {
    if (error instanceof QuantityError) return error
    throw error
  }
  throw new Error(`${text} was accepted`)
}

describe('what an expression must not do', () => {
  test.each(refusals)('%s', (text, piece, message) => {
    const error = refusalOf(text)
    expect(error.message).toBe(message)
    expect(text.slice(error.offset, error.offset + error.length)).toBe(piece)
  })

  test('the frequency stands only where it is known', () => {
    const without = new Map([...scope].filter(([name]) => name !== 'f'))
    expect(refusalOf('2*f', without).message).toBe('`f` is the frequency, which stands in noises alone')
  })

  test('a spring constant in N/m stands beside a mass of the name m', () => {
    expect(baseUnitText(checkExpression(parseExpression('(2 N/m)/m'), scope).dimension)).toBe('s^-2')
  })
})
