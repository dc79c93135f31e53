import fc from 'fast-check'
import { expect, test } from 'vitest'
import { adjoint, transfer } from '../../src/engine/adjoint.js'
import { assemble } from '../../src/engine/assemble.js'
import { denseAt, injectionColumn, solveDense, type ComplexFrequency } from '../../src/engine/dense.js'
import { constantForm } from '../../src/engine/form.js'
import { gridArrays } from '../../src/engine/grid-arrays.js'
import { memory } from '../../src/engine/loops.js'
import { makePoints } from '../../src/engine/points.js'
import { Tape } from '../../src/engine/tape.js'
import type { Complex, Injection, Network } from '../../src/model/network.js'
import type { Points } from '../../src/model/points.js'
import { add, complex, magnitude, multiply, subtract } from '../../src/physics/complex.js'
import { randomReadout } from './random-readout.js'
import { readoutOf } from './readout-of.js'

/*
 * Road: second derivation. Transfers from one adjoint solution on the tape, fields eliminated first, against elimination of the whole
 * matrix with row exchanges at each frequency for each source.
 */

/** Transfers of injections to the record from the tape, with the motion free or clamped. */
function fromTape(network: Network, injections: readonly Injection[], points: Points, clamped = false): Complex[][] {
  const tape = new Tape()
  const rows = adjoint(tape, network)
  const row = clamped ? rows.clamped : rows.full
  const one = constantForm(complex(1))
  const addresses = injections.flatMap(injection => {
    const a = transfer(row, injection, true)
    return [complex(1), complex(0, -1)].map(c => tape.written([tape.cross([{ a, b: one, c }])]))
  })
  const values: number[][] = addresses.map(() => [])
  tape.run(gridArrays(points), ({ n }) => {
    for (const [i, address] of addresses.entries()) values[i].push(...memory.subarray(address / 8, address / 8 + n))
  })
  return injections.map((_, k) => values[2 * k].map((re, i) => complex(re, values[2 * k + 1][i])))
}

/** The same network with springs so stiff that nothing moves: light alone. */
const stilled = (network: Network): Network => ({
  ...network,
  entries: network.entries.filter(({ row, column }) => {
    const [a, b] = [network.unknowns[row].nature, network.unknowns[column].nature]
    return a === b
  }),
})

const pointsOf = (network: Network): Points => {
  const anchors = network.modes.map(({ id, frequency }) => ({ id, nature: 'mode', frequency, halfWidth: 1 }) as const)
  return makePoints(
    anchors,
    network.modes.flatMap(({ frequency, gamma, phi }, anchor) => {
      const width = gamma / (2 * Math.PI) + frequency * phi
      return [-0.6 * frequency, -width, 0, 0.3 * width, 1e-3 * frequency, frequency].map(offset => ({ anchor, offset }))
    }),
  )
}

/** Transfer to the record by dense elimination, and the size of the terms that it is the sum of: what cancels in them no method can keep. */
function solve(network: Network, injection: Injection, at: ComplexFrequency): { value: Complex; size: number } {
  const right = injectionColumn(network, injection).map(value => [value])
  const z = solveDense(denseAt(network, at).matrix, right)
  const terms = [injection.direct, ...network.readout.map(({ column, value }) => multiply(value, z[column][0]))]
  return { value: terms.reduce(add), size: terms.reduce((sum, term) => sum + magnitude(term), 0) }
}

/** Largest difference over the size of what is compared. */
function compare(actual: readonly Complex[], expected: readonly Complex[], sizes: readonly number[]): number {
  return Math.max(
    ...actual.map((a, i) => {
      const off = magnitude(subtract(a, expected[i]))
      return off === 0 ? 0 : off / sizes[i]
    }),
  )
}

test('one adjoint solution gives the transfer of every source and of the measurand', () => {
  fc.assert(
    fc.property(randomReadout({ modes: [1, 4] }), readout => {
      const network = assemble(readoutOf(readout))
      const points = pointsOf(network)
      const injections = [network.measurand, network.sensing.injection, ...network.sources.flatMap(s => s.nodes)]
      const tape = fromTape(network, injections, points)
      for (const [k, injection] of injections.entries()) {
        const solved = [...points.frequency.keys()].map(i =>
          solve(network, injection, {
            anchor: points.anchors[points.anchor[i]].frequency,
            shift: complex(2 * Math.PI * points.offset[i]),
          }),
        )
        const [expected, sizes] = [solved.map(s => s.value), solved.map(s => s.size)]
        // Modes that cancel each other between resonances, and light against springs, cost both methods a few digits.
        expect(compare(tape[k], expected, sizes), `injection ${k}`).toBeLessThan(1e-9)
      }
    }),
    { numRuns: 200, seed: 20266, endOnFailure: true },
  )
})

test('clamped rows are those of a network whose light does not meet the motion', () => {
  fc.assert(
    fc.property(randomReadout({ modes: [1, 3] }), readout => {
      const network = assemble(readoutOf(readout))
      const points = pointsOf(network)
      const fields = network.sources.filter(s => s.parted).flatMap(s => s.nodes)
      const clamped = fromTape(network, fields, points, true)
      const without = fromTape(stilled(network), fields, points)
      for (const [k, values] of clamped.entries()) {
        const sizes = without[k].map(value => Math.max(magnitude(value), magnitude(fields[k].direct)))
        expect(compare(values, without[k], sizes)).toBeLessThan(1e-12)
      }
    }),
    { numRuns: 100, seed: 20267, endOnFailure: true },
  )
})
