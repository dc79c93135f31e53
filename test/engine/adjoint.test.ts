import fc from 'fast-check'
import type { BigNumber } from 'mathjs'
import { expect, test } from 'vitest'
import { adjoint, transfer } from '../../src/engine/adjoint.js'
import { assemble } from '../../src/engine/assemble.js'
import { injectionColumn } from '../../src/engine/dense.js'
import { constantForm } from '../../src/engine/form.js'
import { gridArrays } from '../../src/engine/grid-arrays.js'
import { memory } from '../../src/engine/loops.js'
import { makePoints } from '../../src/engine/points.js'
import { Tape } from '../../src/engine/tape.js'
import type { Complex, Entry, Injection, Network } from '../../src/model/network.js'
import type { Points } from '../../src/model/points.js'
import { add, complex, magnitude, multiply, subtract } from '../../src/physics/complex.js'
import { bignumber, eliminate } from './forty-digits.js'
import { randomReadout } from './random-readout.js'
import { readoutOf } from './readout-of.js'

/*
 * Road: second derivation. Transfers from one adjoint solution on the tape, fields eliminated first, against elimination of the whole
 * matrix in 40 digits at each frequency for each source.
 */

/** Transfers of injections to the record from the tape, with the motion free or clamped. */
function fromTape(network: Network, injections: readonly Injection[], points: Points, clamped = false): Complex[][] {
  const tape = new Tape()
  const rows = adjoint(tape, network)
  const row = clamped ? rows.clamped : rows.full
  const one = constantForm(complex(1))
  const addresses = injections.flatMap(injection => {
    const a = transfer(tape, row, injection, true)
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

/** An element at an anchor and an offset in Hz, with the 2π of double precision taken as exact. */
function entryAt(entry: Entry, anchor: number, offset: number): [BigNumber, BigNumber] {
  const turn = bignumber(2 * Math.PI)
  if (entry.form === 'constant') return [bignumber(entry.value.re), bignumber(entry.value.im)]
  const omega = turn.times(bignumber(anchor).plus(offset))
  if (entry.form === 'decay') return [bignumber(entry.half), omega.plus(entry.detuning).neg()]
  const omega0 = turn.times(entry.frequency)
  const loss = omega.times(entry.gamma).plus(omega0.times(omega0).times(entry.phi))
  return [omega0.minus(omega).times(omega0.plus(omega)).times(entry.mass), loss.neg().times(entry.mass)]
}

/** Transfers to the record, and for each the size of the terms that it is the sum of: what cancels in them no method can keep. */
function solve(network: Network, injections: readonly Injection[], anchor: number, offset: number): Solved[] {
  const n = network.unknowns.length
  // Real and imaginary parts as 2n real unknowns.
  const rows = Array.from({ length: 2 * n }, () => Array.from({ length: 2 * n }, () => bignumber(0)))
  for (const { row, column, entry } of network.entries) {
    const [re, im] = entryAt(entry, anchor, offset)
    for (const [i, j, value] of [
      [row, column, re],
      [row, n + column, im.neg()],
      [n + row, column, im],
      [n + row, n + column, re],
    ] as const)
      rows[i][j] = rows[i][j].plus(value)
  }
  for (const injection of injections) {
    for (const [i, value] of injectionColumn(network, injection).entries()) {
      rows[i].push(bignumber(value.re))
      rows[n + i].push(bignumber(value.im))
    }
  }
  const x = eliminate(rows)
  return injections.map((injection, r) => {
    const terms = network.readout.map(({ column, value }) =>
      multiply(value, complex(x[column][r].toNumber(), x[n + column][r].toNumber())),
    )
    const all = [injection.direct, ...terms]
    return { value: all.reduce(add), size: all.reduce((sum, term) => sum + magnitude(term), 0) }
  })
}

interface Solved {
  readonly value: Complex
  readonly size: number
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
      const injections = [network.measurand, ...network.sources.flatMap(s => s.nodes)]
      const tape = fromTape(network, injections, points)
      const solved = [...points.frequency.keys()].map(i =>
        solve(network, injections, points.anchors[points.anchor[i]].frequency, points.offset[i]),
      )
      // 1 − k_opt χ_s: how many times stiffer light and springs together are than the springs at this frequency. Light that holds a mode at
      // its resonance pins the others too, and elimination finds what little they move as a difference of that size. Modes that cancel each
      // other between resonances cost another three digits of 1e-14.
      const sensing = [network.sensing.injection]
      const [still] = fromTape(network, sensing, points, true)
      const gain = [...points.frequency.keys()].map(i => {
        const [{ value }] = solve(network, sensing, points.anchors[points.anchor[i]].frequency, points.offset[i])
        return Math.max(1, magnitude(still[i]) / magnitude(value))
      })
      for (const k of injections.keys()) {
        const sizes = solved.map((s, i) => s[k].size * gain[i])
        const expected = solved.map(s => s[k].value)
        expect(compare(tape[k], expected, sizes), `injection ${k}`).toBeLessThan(1e-11)
      }
    }),
    { numRuns: 30, seed: 20266, endOnFailure: true },
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
