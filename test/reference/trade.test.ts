import { expect, test } from 'vitest'
import { standardGravity } from '../../src/physics/constants.js'
import { groundStateProbability } from '../../src/physics/quanta.js'
import { toDeclared } from '../../src/quantity/declared.js'
import { parseQuantity } from '../../src/quantity/parse.js'

test('a mode with a third of a quantum is in its ground state three quarters of the time (common practice, no source; quoted as about 70 %)', () => {
  expect(groundStateProbability(1 / 3)).toBeCloseTo(0.75, 14)
  expect(Math.abs(groundStateProbability(1 / 3) / 0.7 - 1)).toBeLessThan(0.1)
})

function peakAcceleration(frequency: string, amplitude: string): number {
  const omega = toDeclared(parseQuantity(frequency), 'rate').value
  return omega ** 2 * toDeclared(parseQuantity(amplitude), 'length').value
}

test('1 GHz at an amplitude of 1 nm is 4.03e9 times standard gravity (common practice, no source; quoted as about 1e9)', () => {
  expect(peakAcceleration('1 GHz', '1 nm') / standardGravity / 4.03e9).toBeCloseTo(1, 2)
  // Kinematics, ω²A.
  expect(peakAcceleration('1 GHz', '1 nm') / 39478417604.35744).toBeCloseTo(1, 6)
})
