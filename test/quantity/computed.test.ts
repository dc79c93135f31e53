import { describe, expect, test } from 'vitest'
import { computedQuantity } from '../../src/quantity/computed.js'
import { toDeclared, toDensity, type DeclaredName, type DensityOf } from '../../src/quantity/declared.js'
import { QuantityError } from '../../src/quantity/error.js'
import { checkExpression } from '../../src/quantity/expression/check-expression.js'
import { evaluateExpression } from '../../src/quantity/expression/evaluate-expression.js'
import { namesIn, reservedNames } from '../../src/quantity/expression/names-in.js'
import { parseExpression } from '../../src/quantity/expression/parse-expression.js'
import type { Quantity } from '../../src/quantity/parse.js'
import { scope, valueIn } from './expression/scope.js'

function computed(text: string): Quantity {
  const expression = parseExpression(text)
  return computedQuantity(text, checkExpression(expression, scope), evaluateExpression(expression, valueIn))
}

const turn = 2 * Math.PI
const [k, m] = [2, 3e-12]

const uses: readonly (readonly [string, DeclaredName, number])[] = [
  ['sqrt(k/m)', 'rate', Math.sqrt(k / m)],
  ['sqrt(k/m)', 'frequency', Math.sqrt(k / m) / turn],
  ['sqrt(k/m)/(2*pi)', 'frequency', Math.sqrt(k / m) / turn],
  ['sqrt(k/m)/(2*pi)', 'rate', Math.sqrt(k / m)],
  ['1/(2*pi*r*cap)', 'frequency', 1 / (turn * 5e4 * 1e-12)],
  ['1/(2*pi*r*cap)', 'rate', 1 / (5e4 * 1e-12)],
  ['k_B*temperature/h', 'frequency', (1.380649e-23 * 4) / 6.62607015e-34],
  ['k_B*temperature/h', 'rate', (turn * 1.380649e-23 * 4) / 6.62607015e-34],
  ['k_B*temperature/hbar', 'rate', (turn * 1.380649e-23 * 4) / 6.62607015e-34],
  ['cycle*c/wavelength', 'frequency', 299792458 / 1064e-9],
  ['h/e^2', 'resistance', 25812.807459304513],
  ['h/(2*e)', 'flux', 2.067833848461929e-15],
  ['2*pi/wavelength*length', 'number', (turn / 1064e-9) * 2e-3],
  ['mass*(2*pi*frequency)^2', 'stiffness', 3e-12 * (turn * 1.2e6) ** 2],
  ['pi*length^2', 'area', Math.PI * 4e-6],
  ['pi/3', 'angle', Math.PI / 3],
]

describe('results of expressions in use', () => {
  test.each(uses)('%s as %s', (text, name, value) => {
    expect(toDeclared(computed(text), name).value / value).toBeCloseTo(1, 13)
  })

  const densities: readonly (readonly [string, DensityOf, number, boolean])[] = [
    ['4*k_B*temperature*mass*rate', 'force', 4 * 1.380649e-23 * 4 * 3e-12 * 2, true],
    ['sqrt(4*k_B*temperature*mass*rate)', 'force', Math.sqrt(4 * 1.380649e-23 * 4 * 3e-12 * 2), false],
    ['4*k_B*temperature*r', 'voltage', 4 * 1.380649e-23 * 4 * 5e4, true],
    ['2*e*(3 mA)', 'current', 2 * 1.602176634e-19 * 3e-3, true],
    ['density*(f/(1 kHz))^-1', 'force', 2e-18, false],
    ['(1e-8 1/√Hz)*sqrt((1 kHz)/f)', 'relative-intensity', 1e-8, false],
  ]

  test.each(densities)('%s as a density of %s', (text, of, value, power) => {
    const density = toDensity(computed(text), of)
    expect(density.value / value).toBeCloseTo(1, 13)
    expect(density.power).toBe(power)
  })

  test('a law that lacks 2π is refused', () => {
    const refusal = (): unknown => toDensity(computed('4*k_B*temperature*mass*linewidth'), 'force')
    expect(refusal).toThrow(QuantityError)
    expect(refusal).toThrow('is not per hertz, so that a factor 2π stays open')
    expect(() => toDeclared(computed('mass*frequency^2'), 'stiffness')).toThrow('does not tell cycles from radians')
  })
})

test('names that parameters must not have', () => {
  for (const name of ['pi', 'cycle', 'radian', 'f', 'k_B', 'c', 'sqrt', 'sign'])
    expect(reservedNames.has(name)).toBe(true)
  expect(reservedNames.has('mass')).toBe(false)
  expect(namesIn(parseExpression('cycle*c')).every(name => reservedNames.has(name))).toBe(true)
})
