import { describe, expect, test } from 'vitest'
import { columnOf, harmonicDensities, twoPumpForce, type TwoPumpCavity } from '../../src/physics/two-pump.js'
import type { TwoPumpReadout } from '../../src/physics/two-pump.js'
import { complex, polar, scale } from '../../src/physics/complex.js'
import { distance, within } from './agreement.js'
import { discretisePeriodic, type Langevin } from './discretise.js'
import { expected, fine, points, type Expected } from './expected.js'
import { langevin } from './langevin.js'
import { simulate } from './simulate.js'
import { welch } from './welch.js'

/*
 * Road: simulation. With two pumps the light's force and the motion's mark on the light turn with the pumps; here they do so in time, without
 * harmonics, truncation or averaging. One sample is one period of Ω_p, over which all copies of the record at multiples of Ω_p average out, so
 * that only offsets far below Ω_p are compared.
 */
const turn = 2 * Math.PI
const mass = 1e-12
const samples = 1 << 20

/**
 * Bins up to a sixteenth of Ω_p: the mean over the period holds what is folded down by (1/16)² and less, and the cross term with the next
 * copy that correlates, two Ω_p away where the cavity answers little, by 1/32.
 */
const last = 128

interface Case extends TwoPumpReadout {
  readonly name: string
  readonly cavity: TwoPumpCavity
}

const balanced: TwoPumpCavity = {
  mass,
  omega: turn * 1e6,
  gamma: turn * 4e3,
  temperature: 2e-3,
  coupling: turn * 20,
  ports: [
    { id: 'read', rate: turn * 2.5e5, occupancy: 0 },
    { id: 'inner', rate: turn * 1e5, occupancy: 0.8 },
  ],
  red: 1e6,
  blue: 1e6,
  halfSpacing: turn * 1e6,
  spacingError: 0,
  detuning: 0,
}

const read = { port: 0, efficiency: 0.8, added: 0.5 }

/** Every noise is a fair part of this record, so that none can hide behind the others. */
const quiet: Case = {
  name: 'equal pumps, weak light, half of it lost',
  cavity: {
    ...balanced,
    temperature: 1e-3,
    coupling: turn * 10,
    ports: [
      { id: 'read', rate: turn * 3e5, occupancy: 0 },
      { id: 'inner', rate: turn * 5e4, occupancy: 0.8 },
    ],
  },
  port: 0,
  efficiency: 0.5,
  added: 0.3,
  angle: Math.PI / 2,
}

const cases: readonly Case[] = [
  { name: 'equal pumps, evading quadrature', cavity: balanced, ...read, angle: Math.PI / 2 },
  { name: 'equal pumps, turned quadrature', cavity: { ...balanced, coupling: turn * 30 }, ...read, angle: 1.1 },
  {
    name: 'unequal pumps off centre, spacing off the mode',
    cavity: {
      ...balanced,
      red: 1.4e6,
      blue: 8e5,
      halfSpacing: turn * 0.997e6,
      spacingError: turn * 3e3,
      detuning: turn * 4e4,
    },
    ...read,
    angle: 1.3,
  },
  quiet,
]

/** The system at a phase of the pumps: ā = √n₋e^{iφ} + √n₊e^{−iφ} joins q to (X, Y), force g₀(ā*a + āa†). */
function atPhase(free: Langevin, { coupling, red, blue }: TwoPumpCavity, phase: number): Langevin {
  const real = 2 * coupling * (Math.sqrt(red) + Math.sqrt(blue)) * Math.cos(phase)
  const imaginary = 2 * coupling * (Math.sqrt(red) - Math.sqrt(blue)) * Math.sin(phase)
  const joined = [
    [0, 0, 0, 0],
    [0, 0, real, imaginary],
    [-imaginary, 0, 0, 0],
    [real, 0, 0, 0],
  ]
  return { ...free, A: free.A.map((row, i) => row.map((value, j) => value + joined[i][j])) }
}

/** Averaged spectrum of the record; the densities of `wrong` are doubled. */
function simulated({ cavity, angle, efficiency, added }: Case, seed: number, wrong: string | null): Float64Array {
  const [readPort, inner] = cavity.ports
  const free = langevin(
    {
      modes: {
        drum: {
          mass,
          frequency: cavity.omega / turn,
          quality: cavity.omega / cavity.gamma,
          temperature: cavity.temperature,
        },
      },
      coupling: 0,
      quanta: 0,
      // A port that is not pumped leaves the angle to count from the pumps' common phase.
      ports: { inner, read: readPort },
      detuning: cavity.detuning,
      reads: 'read',
      record: angle,
      efficiency,
      added,
    },
    wrong,
  )
  const period = turn / cavity.halfSpacing
  const parts = 512
  const steps = Array.from({ length: parts }, (_, i) => atPhase(free, cavity, (turn * (i + 0.5)) / parts))
  return welch(simulate(discretisePeriodic(steps, period), samples, 1 << 13, seed), 1 / period)
}

/** One-sided density of the record by harmonic balance: the bath's own, times total over bath. */
function recordDensity({ cavity, ...readout }: Case, offset: number): number {
  const [u, v] = [-1, 1].map(sign => polar(Math.sqrt(readout.efficiency), sign * readout.angle))
  const outward = Math.sqrt(cavity.ports[0].rate)
  const { bath } = harmonicDensities(cavity, offset, {
    terms: [
      { column: columnOf.field(0), value: scale(u, outward) },
      { column: columnOf.conjugate(0), value: scale(v, outward) },
    ],
    direct: { port: 0, u: complex(0), v: complex(0) },
  })
  const force = twoPumpForce(cavity, readout, offset)
  return (2 * bath * force.total) / force.bath
}

/** What the averaged spectrum has to be by harmonic balance. */
function balance(c: Case): Expected {
  const white = 2 + 4 * c.added
  const rate = c.cavity.halfSpacing / turn
  // Beyond an eighth of Ω_p the density only leaks through the window, by less than a part in 10¹⁰: any number will do.
  const reach = fine / 8
  const positive = new Float64Array(points).fill(white)
  for (let k = 0; k < reach; k++) positive[k] = recordDensity(c, (turn * Math.max(k, 1e-3) * rate) / fine)
  return expected({ positive, negative: positive }, white, samples)
}

test.each(cases.map((c, i) => ({ name: c.name, c, seed: 200 + i })))('$name', ({ c, seed }) => {
  expect(distance(simulated(c, seed, null), balance(c), last)).toSatisfy(within)
})

describe('a factor of two in any one noise is seen', () => {
  const right = balance(quiet)
  test.each(['drum.bath', 'cavity.read', 'cavity.inner', 'amplifier.added', 'detector.loss'])('%s', wrong => {
    expect(distance(simulated(quiet, 203, wrong), right, last).lean).toBeGreaterThan(8)
  })
})
