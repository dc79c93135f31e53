import fc from 'fast-check'
import type { ModeOf, PortOf, ReadoutOf } from './readout-of.js'

const logarithmic = (low: number, high: number): fc.Arbitrary<number> =>
  fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp)

const between = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true })

const mode = (temperatures: fc.Arbitrary<number>): fc.Arbitrary<ModeOf> =>
  fc.record({
    mass: logarithmic(1e-14, 1e-9),
    frequency: logarithmic(3e5, 3e6),
    quality: logarithmic(1e3, 1e8),
    law: fc.constantFrom<'viscous' | 'structural'>('viscous', 'structural'),
    temperature: temperatures,
    weight: between(0.2, 1),
  })

const port = (occupancies: fc.Arbitrary<number>): fc.Arbitrary<PortOf> =>
  fc.record({ rate: logarithmic(1e5, 1e8), occupancy: occupancies })

/** What random readouts are made of; without `cold`, baths and ports may be warm. */
export interface Range {
  readonly modes: readonly [least: number, most: number]
  readonly cold?: boolean
}

/**
 * Random cavity readouts of one to four modes: one to three ports, any detuning and angle, squeezed input, lossy detection,
 * amplifier, weak to strong coupling. About one in four is an unstable working point.
 */
export function randomReadout({ modes: [least, most], cold = false }: Range): fc.Arbitrary<ReadoutOf> {
  const temperatures = cold ? fc.constant(0) : fc.oneof(fc.constant(0), logarithmic(0.01, 300))
  const occupancies = cold ? fc.constant(0) : fc.oneof(fc.constant(0), logarithmic(1e-3, 3))
  const names = ['first', 'second', 'third', 'fourth']
  return fc
    .record({
      list: fc.array(mode(temperatures), { minLength: least, maxLength: most }),
      ports: fc.array(port(occupancies), { minLength: 1, maxLength: 3 }),
      squeezing: fc.option(fc.tuple(between(0, 15), between(0, Math.PI)), { nil: undefined }),
      read: fc.nat({ max: 2 }),
      cooperation: logarithmic(1e-3, 1e4),
      detuning: fc.oneof(fc.constant(0), between(-2, -0.01), between(0.01, 2)),
      record: fc.oneof<fc.Arbitrary<number | 'upper' | 'lower'>[]>(
        between(0.05, Math.PI - 0.05),
        fc.constant(Math.PI / 2),
        fc.constantFrom('upper', 'lower'),
      ),
      efficiency: fc.oneof(fc.constant(1), between(0.1, 1)),
      added: fc.option(between(0.5, 5), { nil: undefined }),
    })
    .map(({ list, ports, squeezing, read, cooperation, detuning, ...rest }) => {
      const kappa = ports.reduce((sum, p) => sum + p.rate, 0)
      const [{ mass, frequency, quality = 1 }] = list
      const omega = 2 * Math.PI * frequency
      // 4 g₀²n̄/κΓ = cooperation sets G for a million quanta.
      const zeroPoint = Math.sqrt(1.054571817e-34 / (2 * mass * omega))
      const coupling = Math.sqrt((cooperation * kappa * (omega / quality)) / 4e6) / zeroPoint
      const { added, ...others } = rest
      return {
        modes: Object.fromEntries(list.map((m, i) => [names[i], m])),
        ports: Object.fromEntries(
          ports.map((p, i) => [`port_${i + 1}`, i === 0 && squeezing !== undefined ? { ...p, squeezing } : p]),
        ),
        coupling,
        quanta: 1e6,
        detuning: detuning * Math.max(kappa / 2, omega),
        reads: `port_${Math.min(read, ports.length - 1) + 1}`,
        ...others,
        // An amplifier of unstated gain stands last in the chain, so that its detector loses nothing.
        ...(added !== undefined && { added, efficiency: 1 }),
      }
    })
}
