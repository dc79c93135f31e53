import { expect, test } from 'vitest'
import { assemble } from '../../src/engine/assemble.js'
import { Amplitudes, evaluateAt } from '../../src/engine/evaluate.js'
import { absolutePoints } from '../../src/engine/points.js'
import { readoutOf } from './readout-of.js'

// Road: identity. The amplitude densities are the roots of the power densities of the same network.
test('amplitudes are the roots of the powers, and NaN where a correlation is negative', () => {
  const budget = readoutOf({
    modes: { drum: { mass: 1e-12, frequency: 1e6, quality: 1e4, temperature: 1 } },
    coupling: 1e17,
    ports: { front: { rate: 1e6, occupancy: 0.3 }, back: { rate: 3e6 } },
    quanta: 1e4,
    detuning: -1e6,
    record: 1,
    efficiency: 0.7,
  })
  const network = assemble(budget)
  const points = absolutePoints(Float64Array.from({ length: 3000 }, (_, i) => 1e4 * 1.003 ** i))
  const { total, lines } = evaluateAt(budget, network, points, { sources: false, limits: false })
  const [all, ...each] = new Amplitudes(budget, network).at(points)
  const off = (root: Float64Array, power: Float64Array): number =>
    Math.max(
      ...root.map((r, i) => (power[i] < 0 ? (Number.isNaN(r) ? 0 : Infinity) : Math.abs(r * r - power[i]) / power[i])),
    )
  expect(off(all, total)).toBeLessThan(1e-14)
  expect(each.length).toBe(lines.length)
  for (const [k, line] of lines.entries()) expect(off(each[k], line.psd), line.id).toBeLessThan(1e-14)
})
