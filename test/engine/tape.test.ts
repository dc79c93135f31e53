import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { addForms, constantForm, isZeroForm, negateForm, scaleForm, type Form } from '../../src/engine/form.js'
import { gridArrays } from '../../src/engine/grid-arrays.js'
import { memory } from '../../src/engine/loops.js'
import { oscillator } from '../../src/engine/oscillator.js'
import { absolutePoints, makePoints } from '../../src/engine/points.js'
import { constantReal, realZero, scaleReal, type Real } from '../../src/engine/real.js'
import { Tape } from '../../src/engine/tape.js'
import type { Complex } from '../../src/model/network.js'
import type { Points } from '../../src/model/points.js'
import { add, complex, conjugate, divide, magnitude, multiply, reciprocal } from '../../src/physics/complex.js'

/*
 * Road: second derivation. What the tape writes down symbolically and computes in blocks equals complex arithmetic point by point.
 */

const frequencies = [0, 0.01, 0.1, 0.3, 1, 2.5]
const points = absolutePoints(frequencies)

/** A value by direct arithmetic, and the size of all terms that went into it: what rounding is measured by. */
interface Direct {
  readonly value: Complex
  readonly size: number
}

/** The same expression on a tape and at one frequency. */
interface Expression {
  readonly form: (tape: Tape) => Form
  readonly at: (frequency: number) => Direct
}

const leaf = fc.oneof(
  fc.tuple(fc.constantFrom(0.5, 1, 3), fc.constantFrom(-2, -1, 0, 1, 2)).map(([half, detuning]): Expression => ({
    form: tape => tape.decayReciprocal({ half, detuning }),
    at: f => {
      const value = reciprocal(complex(half, -(detuning + 2 * Math.PI * f)))
      return { value, size: magnitude(value) }
    },
  })),
  fc.tuple(fc.integer({ min: -3, max: 3 }), fc.integer({ min: -3, max: 3 })).map(([re, im]): Expression => ({
    form: () => constantForm({ re, im }),
    at: () => ({ value: complex(re, im), size: Math.hypot(re, im) }),
  })),
)

const sum = (a: Expression, b: Expression): Expression => ({
  form: tape => addForms(a.form(tape), b.form(tape)),
  at: f => {
    const [x, y] = [a.at(f), b.at(f)]
    return { value: add(x.value, y.value), size: x.size + y.size }
  },
})

const product = (a: Expression, b: Expression): Expression => ({
  form: tape => tape.multiply(a.form(tape), b.form(tape)),
  at: f => {
    const [x, y] = [a.at(f), b.at(f)]
    return { value: multiply(x.value, y.value), size: x.size * y.size }
  },
})

const inverse = (a: Expression): Expression => ({
  form: tape => tape.reciprocal(a.form(tape)),
  at: f => {
    const x = a.at(f)
    const value = reciprocal(x.value)
    return { value, size: magnitude(value) ** 2 * x.size }
  },
})

const quotient = (a: Expression, b: Expression): Expression => ({
  form: tape => tape.divide(a.form(tape), b.form(tape)),
  at: f => {
    const [x, y] = [a.at(f), b.at(f)]
    const size = (x.size * y.size) / magnitude(y.value) ** 2
    return { value: divide(x.value, y.value), size }
  },
})

const expression: fc.Arbitrary<Expression> = fc.letrec<{ tree: Expression }>(tie => ({
  tree: fc.oneof(
    { maxDepth: 4, withCrossShrink: true },
    leaf,
    fc.tuple(tie('tree'), tie('tree')).map(([a, b]) => sum(a, b)),
    fc.tuple(tie('tree'), tie('tree')).map(([a, b]) => product(a, b)),
    tie('tree').map(inverse),
    fc.tuple(tie('tree'), tie('tree')).map(([a, b]) => quotient(a, b)),
  ),
})).tree

/** Runs a tape over points and reads one array of reals each. */
function read(tape: Tape, wanted: readonly Real[], over: Points = points): number[][] {
  const addresses = wanted.map(real => tape.written([real]))
  const out: number[][] = wanted.map(() => [])
  tape.run(gridArrays(over), ({ n }) => {
    for (const [i, address] of addresses.entries()) out[i].push(...memory.subarray(address / 8, address / 8 + n))
  })
  return out
}

const one = constantForm(complex(1))

/** Real and imaginary part of a form: Re(c·a·1*). */
function complexOf(form: Form, tape: Tape, over: Points = points): Complex[] {
  const part = (c: Complex): Real => tape.cross([{ a: form, b: one, c }])
  const [re, im] = read(tape, [part(complex(1)), part(complex(0, -1))], over)
  return re.map((value, i) => complex(value, im[i]))
}

/** Some fifty roundings of every term. */
const rounding = 1e-14

const finite = (direct: readonly Direct[]): boolean =>
  direct.every(({ value, size }) => Number.isFinite(size) && size < 1e8 && magnitude(value) > 1e-8 * size)

describe('expressions of forms', () => {
  test('equal complex arithmetic', () => {
    let compared = 0
    fc.assert(
      fc.property(expression, each => {
        const direct = frequencies.map(each.at)
        fc.pre(finite(direct))
        const tape = new Tape()
        const written = complexOf(each.form(tape), tape)
        for (const [i, { value, size }] of direct.entries()) {
          expect(Math.abs(written[i].re - value.re)).toBeLessThan(rounding * size + 1e-300)
          expect(Math.abs(written[i].im - value.im)).toBeLessThan(rounding * size + 1e-300)
        }
        compared++
      }),
      { numRuns: 1000, seed: 20264 },
    )
    expect(compared).toBe(1000)
  })

  test('equal expressions are written once', () => {
    const tape = new Tape()
    const a = tape.decayReciprocal({ half: 1, detuning: 2 })
    const b = tape.decayReciprocal({ half: 1, detuning: -2 })
    expect(tape.multiply(a, b)).toEqual(tape.multiply(b, a))
    expect(tape.divide(a, b)).toEqual(tape.divide(a, b))
    expect(tape.decayReciprocal({ half: 1, detuning: -0 })).toEqual(tape.decayReciprocal({ half: 1, detuning: 0 }))
    expect(tape.product(tape.abs2(a), tape.inverseAbs2(a))).toEqual(constantReal(1))
    expect(tape.ratio(tape.abs2(a), tape.abs2(a))).toEqual(constantReal(1))
  })

  test('zero and one cost nothing', () => {
    const tape = new Tape()
    const a = tape.decayReciprocal({ half: 1, detuning: 2 })
    expect(isZeroForm(tape.multiply(a, constantForm(complex(0))))).toBe(true)
    expect(isZeroForm(addForms(a, negateForm(a)))).toBe(true)
    expect(scaleForm(a, complex(1))).toBe(a)
    expect(tape.cross([{ a, b: constantForm(complex(0)), c: complex(1) }])).toEqual(realZero)
    expect(tape.sum([])).toEqual(realZero)
  })
})

describe('reals', () => {
  test('moduli, imaginary parts, pairs, cross products and sums equal arithmetic', () => {
    fc.assert(
      fc.property(expression, expression, fc.double({ min: 0.1, max: 5, noNaN: true }), (x, y, weight) => {
        const [left, right] = [x, y].map(each => frequencies.map(each.at))
        fc.pre(finite(left) && finite(right))
        const tape = new Tape()
        const [a, b] = [x.form(tape), y.form(tape)]
        const c = complex(0.3, -1.2)
        const [abs2, inverse2, modulus, imaginary, pair, cross, total, ratio] = read(tape, [
          tape.abs2(a),
          tape.inverseAbs2(a),
          tape.modulus(a),
          tape.absImaginary(a),
          tape.pair(a, 2, b, weight),
          tape.cross([
            { a, b, c },
            { a: b, b: a, c: complex(weight) },
          ]),
          tape.sum([scaleReal(tape.abs2(a), 3), constantReal(weight), tape.abs2(b), scaleReal(tape.abs2(a), -1)]),
          tape.ratio(tape.abs2(a), tape.abs2(b)),
        ])
        for (const [i, { value: u, size: s }] of left.entries()) {
          const { value: v, size: t } = right[i]
          const [p, q] = [magnitude(u) ** 2, magnitude(v) ** 2]
          const close = (actual: number, expected: number, scale: number): void =>
            expect(Math.abs(actual - expected)).toBeLessThan(10 * rounding * scale + 1e-300)
          close(abs2[i], p, s * s)
          close(inverse2[i], 1 / p, (s * s) / p ** 2)
          close(modulus[i], Math.sqrt(p), (s * s) / Math.sqrt(p))
          close(imaginary[i], Math.abs(u.im), s)
          close(pair[i], 2 * p + weight * q, 2 * s * s + weight * t * t)
          const crossed = multiply(c, multiply(u, conjugate(v))).re + weight * multiply(v, conjugate(u)).re
          close(cross[i], crossed, (2 + weight) * s * t)
          close(total[i], 2 * p + q + weight, 4 * s * s + t * t + weight)
          close(ratio[i], p / q, (s * s) / q + (p * t * t) / q ** 2)
        }
      }),
      { numRuns: 300, seed: 20265 },
    )
  })

  test('long sums take any number of arrays', () => {
    for (let n = 1; n <= 12; n++) {
      const tape = new Tape()
      const terms = Array.from({ length: n }, (_, k) =>
        scaleReal(tape.abs2(tape.decayReciprocal({ half: 1, detuning: k })), k + 1),
      )
      const [total] = read(tape, [tape.sum(terms)])
      for (const [i, f] of frequencies.entries()) {
        const expected = terms.reduce((s, _, k) => s + (k + 1) / (1 + (k + 2 * Math.PI * f) ** 2), 0)
        expect(total[i] / expected).toBeCloseTo(1, 13)
      }
    }
  })
})

describe('without cancellation', () => {
  // s(A − B) far inside the linewidth: the difference is a part in 1e12 of either.
  test('the stiffness of light far inside the linewidth keeps its digits', () => {
    const [half, detuning] = [1e9, 1e-3]
    const tape = new Tape()
    const [a, b] = [detuning, -detuning].map(d => tape.decayReciprocal({ half, detuning: d }))
    const difference = tape.multiply(addForms(a, negateForm(b)), one)
    const written = complexOf(tape.divide(difference, one), tape, absolutePoints([1]))
    // i·2Δ/[(h − iω)² + Δ²].
    const omega = 2 * Math.PI
    const expected = divide(
      complex(0, 2 * detuning),
      complex(half ** 2 - omega ** 2 + detuning ** 2, -2 * half * omega),
    )
    const [abs2] = read(tape, [tape.abs2(addForms(a, negateForm(b)))], absolutePoints([1]))
    expect(abs2[0] / magnitude(expected) ** 2).toBeCloseTo(1, 13)
    expect(written.length).toBe(1)
  })
})

describe('oscillator next to its resonance', () => {
  // Q = 1e10: half a linewidth is 5e-11 of the frequency, and one rounding of the absolute frequency would be 2e-6 of it.
  test.each([0, 1e-4, -3e-5, 5e-4])('offset %s Hz from a megahertz', offset => {
    const values = { mass: 2, frequency: 1e6, gamma: 2 * Math.PI * 1e-4, phi: 3e-11 }
    const anchored = makePoints([{ id: 'a', nature: 'mode', frequency: 1e6, halfWidth: 1e-4 }], [{ anchor: 0, offset }])
    const tape = new Tape()
    const [written] = complexOf(oscillator(tape, values), tape, anchored)
    const turn = 2 * Math.PI
    const expected = complex(
      -2 * turn ** 2 * offset * (2e6 + offset),
      -2 * (turn * (1e6 + offset) * values.gamma + (turn * 1e6) ** 2 * values.phi),
    )
    const close = (actual: number, value: number): void =>
      expect(Math.abs(actual - value)).toBeLessThanOrEqual(1e-15 * 8 * Math.abs(value))
    close(written.re, expected.re)
    close(written.im, expected.im)
  })
})
