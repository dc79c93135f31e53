import { expect, test } from 'vitest'
import { filterAt, filterForm } from '../../src/engine/filter.js'
import { constantForm } from '../../src/engine/form.js'
import { gridArrays } from '../../src/engine/grid-arrays.js'
import { memory } from '../../src/engine/loops.js'
import { absolutePoints } from '../../src/engine/points.js'
import { Tape } from '../../src/engine/tape.js'
import type { Complex, Filter } from '../../src/model/network.js'
import { complex } from '../../src/physics/complex.js'

const frequencies = [0.3, 17, 1234.5, 4e6]

function onTape(filter: Filter): Complex[] {
  const tape = new Tape()
  const form = filterForm(tape, filter)
  const addresses = [complex(1), complex(0, -1)].map(c =>
    tape.written([tape.cross([{ a: form, b: constantForm(complex(1)), c }])]),
  )
  const values: number[][] = [[], []]
  tape.run(gridArrays(absolutePoints(frequencies)), ({ n }) => {
    for (const [i, address] of addresses.entries()) values[i].push(...memory.subarray(address / 8, address / 8 + n))
  })
  return values[0].map((re, i) => complex(re, values[1][i]))
}

const turn = 2 * Math.PI

// Road: identity. Each factor has a closed form at real frequencies.
test.each([
  ['velocity of a displacement', { order: 1, constant: complex(2) }, (w: number) => complex(0, -2 * w)],
  ['strain to force', { order: 2, constant: complex(1) }, (w: number) => complex(-w * w)],
  ['charge of a current', { order: -1, constant: complex(1) }, (w: number) => complex(0, 1 / w)],
  ['twice integrated', { order: -2, constant: complex(3) }, (w: number) => complex(-3 / (w * w))],
  ['delay', { delay: 1e-3, constant: complex(1) }, (w: number) => complex(Math.cos(w * 1e-3), Math.sin(w * 1e-3))],
] as const)('%s', (_, filter, expected) => {
  for (const [i, value] of onTape(filter).entries()) {
    const { re, im } = expected(turn * frequencies[i])
    expect(Math.hypot(value.re - re, value.im - im) / Math.hypot(re, im)).toBeLessThan(1e-12)
  }
})

test('a lossless cavity turns a field without changing its size', () => {
  // Reflection κ/(κ/2 − i(Δ+ω)) − 1 of a cavity with one port has modulus 1.
  const filter = { constant: complex(-1), decays: [{ coefficient: complex(500), half: 250, detuning: -300 }] }
  for (const value of onTape(filter)) expect(Math.hypot(value.re, value.im)).toBeCloseTo(1, 12)
})

test('the tape and the complex plane agree on the real axis', () => {
  const filter: Filter = {
    order: -1,
    delay: 2e-4,
    constant: complex(0.3, -0.4),
    decays: [{ coefficient: complex(20, 3), half: 90, detuning: 40 }],
  }
  for (const [i, value] of onTape(filter).entries()) {
    const other = filterAt(filter, { anchor: frequencies[i], shift: complex(0) })
    expect(Math.hypot(value.re - other.re, value.im - other.im)).toBeLessThan(1e-12 * Math.hypot(other.re, other.im))
  }
})
