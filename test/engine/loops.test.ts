import { describe, expect, test } from 'vitest'
import type { Loops } from '../../src/engine/array-loops.js'
import { blockBytes, blockCapacity, blockLength, loops, memory } from '../../src/engine/loops.js'
import { plainLoops } from '../../src/engine/plain-loops.js'
import { seeded } from './promise.js'

/* Road: second derivation. The vector loops and those in TypeScript do the same operations in the same order: equal bit by bit. */

const registers = 14
const plainMemory = new Float64Array(registers * blockLength)
const plain = plainLoops(plainMemory)

/** Values of all sizes and signs, zeros and infinities among them, in both memories. */
function fillBoth(seed: number): void {
  const random = seeded(seed)
  for (let i = 0; i < plainMemory.length; i++) {
    const kind = random()
    const size = kind < 0.02 ? 0 : kind < 0.03 ? Infinity : 10 ** (40 * random() - 20)
    plainMemory[i] = random() < 0.5 ? -size : size
  }
  memory.set(plainMemory, 0)
}

/** Both halves of a complex register are two neighbouring blocks. */
const at = (register: number): number => register * blockBytes
const [out, a, b, c, d] = [0, 2, 4, 6, 8].map(at)

/** Every loop, called the same way on both memories. */
const calls: Record<keyof Loops, (each: Loops, n: number) => void> = {
  multiply: (l, n) => l.multiply(out, a, b, n),
  reciprocal: (l, n) => l.reciprocal(out, a, n),
  divide: (l, n) => l.divide(out, a, b, n),
  affine: (l, n) => l.affine(out, a, n, 0.3, -1.7, 2.5, 1e3),
  combine: (l, n) => l.combine(out, a, b, n, 0.3, -1.7, 11, 0.01, 2.5, 1e3),
  addScaled: (l, n) => l.addScaled(out, a, n, 0.3, -1.7),
  abs2: (l, n) => l.abs2(out, a, n),
  inverseAbs2: (l, n) => l.inverseAbs2(out, a, n),
  absImaginary: (l, n) => l.absImaginary(out, a, n),
  pair: (l, n) => l.pair(out, a, b, n, 0.37),
  cross: (l, n) => l.cross(out, a, b, n, 0.3, -1.7),
  addCross: (l, n) => l.addCross(out, a, b, n, 0.3, -1.7),
  product: (l, n) => l.product(out, a, b, n),
  ratio: (l, n) => l.ratio(out, a, b, n),
  root: (l, n) => l.root(out, a, n),
  sum1: (l, n) => l.sum1(out, a, n, 0.1),
  sum2: (l, n) => l.sum2(out, a, b, n, 0.1, -7),
  sum4: (l, n) => l.sum4(out, a, b, c, d, n, 0.1, -7, 1e5, 3),
  constant: (l, n) => l.constant(out, n, 0.1),
  oscillator: (l, n) => l.oscillator(out, a, b, c, n, 3.1e-12, 1e6, -0.3, -7),
  decayReciprocal: (l, n) => l.decayReciprocal(out, a, n, 3e6, -1e7),
  warmBath: (l, n) => l.warmBath(out, a, n, 2e-22, 1e-12),
}

const bits = (values: Float64Array): BigInt64Array => new BigInt64Array(values.slice().buffer)

/** Bits of the first n values of both blocks of the result, with one bit pattern for every NaN. */
function resultOf(of: Float64Array, n: number): bigint[] {
  const canonical = of.slice(0, 2 * blockLength).map(v => (Number.isNaN(v) ? NaN : v))
  return [...bits(canonical.slice(0, n)), ...bits(canonical.slice(blockLength, blockLength + n))]
}

test('every loop is called', () => {
  expect(Object.keys(calls).sort()).toEqual(Object.keys(plain).sort())
})

test('the loops in use are the vector loops, not the plain ones', () => {
  expect(memory.buffer.byteLength).toBe(blockCapacity * blockBytes)
  expect(String(loops.multiply)).toContain('native code')
})

describe.each(Object.entries(calls))('%s', (_, call) => {
  test.each([1, 2, 7, 255, 512])('plain and vector give the same bits over %s points', n => {
    fillBoth(n)
    call(loops, n)
    call(plain, n)
    expect(resultOf(memory, n)).toEqual(resultOf(plainMemory, n))
  })
})

/** Alias of out and input, where the interface allows it: the result is that of separate registers. */
describe('out on top of an input', () => {
  const aliased: [string, (l: Loops, to: number) => void][] = [
    ['multiply', (l, to) => l.multiply(to, a, b, 9)],
    ['reciprocal', (l, to) => l.reciprocal(to, a, 9)],
    ['divide', (l, to) => l.divide(to, a, b, 9)],
    ['affine', (l, to) => l.affine(to, a, 9, 2, 3, 4, 5)],
    ['combine', (l, to) => l.combine(to, a, b, 9, 1, 2, 3, 4, 5, 6)],
    ['abs2', (l, to) => l.abs2(to, a, 9)],
    ['root', (l, to) => l.root(to, a, 9)],
    ['sum2', (l, to) => l.sum2(to, a, b, 9, 2, 3)],
  ]
  test.each(aliased)('%s', (_, call) => {
    for (const [each, values] of [
      [loops, memory],
      [plain, plainMemory],
    ] as const) {
      fillBoth(5)
      call(each, out)
      const apart = values.slice(0, 9)
      fillBoth(5)
      call(each, a)
      const first = a / 8
      expect(bits(values.slice(first, first + 9))).toEqual(bits(apart))
    }
  })
})
