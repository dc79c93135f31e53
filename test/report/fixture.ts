import type { Assessment, At, CavityState, Dominance, ModeState } from '../../src/model/assessment.js'
import type { Budget, ComponentSpec, LineSpec, Parameters, Root } from '../../src/model/budget.js'
import type { Evaluation, LimitCurve, LineCurve, SourceCurve } from '../../src/model/evaluation.js'
import type { Points } from '../../src/model/points.js'
import type { Place } from '../../src/model/problem.js'

const hbar = 1.054571817e-34
const kB = 1.380649e-23
const file = 'budgets/fixture/budget.yaml'
const place = (line: number, column = 3): Place => ({ file, line, column })

const rootTable: readonly (readonly [string, number, number, string, string, string | null, string | null])[] = [
  ['mass', 3.1e-12, 0.2e-12, 'mass', '3.1(2) ng', 'effective mass of the fundamental mode', 'finite elements'],
  ['fundamental.frequency', 1.243e6, 0, 'frequency', '1.243 MHz', null, null],
  ['fundamental.quality', 2.4e7, 0, 'number', '2.4e7', 'from a ring-down', 'lab book 12'],
  ['fundamental.temperature', 4.1, 0.1, 'temperature', '4.1(1) K', null, 'assumed'],
  ['cavity.frequency', 282e12, 0, 'frequency', '282 THz', null, null],
  ['cavity.coupling', 2 * Math.PI * 21e15, 0, 'rate-per-length', '21 GHz/µm', null, 'assumed'],
  ['cavity.ports.front.rate', 2 * Math.PI * 600e3, 0, 'rate', '600 kHz', null, null],
  ['cavity.ports.back.rate', 2 * Math.PI * 90e3, 0, 'rate', '90 kHz', null, null],
  ['cavity.pump.power', 3e-6, 0, 'power', '3 µW', '<b>power</b> & more at the window', 'assumed'],
  ['detector.efficiency', 0.72, 0.03, 'power-ratio', '0.72(3)', null, null],
  ['stray.density', 2e-18, 0, 'force-amplitude-density', '2 aN/√Hz', null, 'assumed'],
]

export const roots: readonly Root[] = rootTable.map(
  ([id, value, uncertainty, dimension, text, about, evidence], index) => ({
    id,
    value,
    uncertainty,
    dimension,
    text,
    about,
    evidence,
    measured: index === 2 ? '2026-03-14' : null,
    distribution: 'normal',
    effect: 'systematic',
    place: place(10 + index),
  }),
)

const slot = (id: string) => ({ root: roots.findIndex(root => root.id === id) })

function component(id: string, kind: string, parameters: Parameters, line: number): ComponentSpec {
  return { id, kind, parameters, place: place(line), places: new Map() }
}

const components: readonly ComponentSpec[] = [
  component(
    'fundamental',
    'resonator',
    {
      mass: slot('mass'),
      frequency: slot('fundamental.frequency'),
      quality: slot('fundamental.quality'),
      law: 'viscous',
      temperature: slot('fundamental.temperature'),
    },
    30,
  ),
  component(
    'cavity',
    'cavity',
    {
      frequency: slot('cavity.frequency'),
      coupling: slot('cavity.coupling'),
      ports: new Map([
        ['front', { rate: slot('cavity.ports.front.rate') }],
        ['back', { rate: slot('cavity.ports.back.rate') }],
      ]),
      pump: { port: 'front', power: slot('cavity.pump.power'), detuning: { constant: 0 } },
    },
    31,
  ),
  component(
    'detector',
    'homodyne',
    { reads: 'cavity.back', angle: { constant: Math.PI / 2 }, efficiency: slot('detector.efficiency') },
    40,
  ),
]

function line(id: string, of: readonly string[], part: 'imprecision' | 'back-action' | null, at: number): LineSpec {
  return { id, title: null, about: null, evidence: null, place: place(at), claims: { of, part } }
}

const lineSpecs: readonly LineSpec[] = [
  line('thermal', ['fundamental.bath'], null, 45),
  line('shot', ['cavity', 'detector.loss'], 'imprecision', 46),
  line('back_action', ['cavity'], 'back-action', 47),
  {
    id: 'stray',
    title: null,
    about: 'charges on the window',
    evidence: 'assumed',
    place: place(48),
    claims: {
      kind: 'force-noise',
      parameters: {
        into: 'fundamental',
        density: {
          density: 'level',
          level: slot('stray.density'),
          power: false,
          exponent: { constant: 0 },
          reference: null,
        },
      },
      places: new Map(),
    },
  },
]

/** A budget as the border would hand it over; its title tries to be markup. */
export function fixtureBudget(sensor = 'fixture'): Budget {
  return {
    sensor,
    file: file.replace('fixture', sensor),
    format: 1,
    title: 'Membrane <force> sensor & window',
    summary: 'A membrane in a cavity. See [the note](https://example.org/note), not [this](javascript:alert(1)).',
    about: null,
    revision: '2.1',
    measurand: { quantity: 'force', weights: new Map([['fundamental', 1]]), at: null, place: place(4) },
    readout: 'detector',
    readoutPlace: place(5),
    band: { low: 1.2e6, high: 1.3e6, place: place(6) },
    reference: 1.2435e6,
    roots: roots.map(root => ({ ...root, place: { ...root.place, file: file.replace('fixture', sensor) } })),
    derived: [],
    correlations: [],
    requirements: [],
    variants: [],
    citations: [],
    tables: [],
    components,
    lines: lineSpecs,
    warnings: [],
  }
}

const f0 = 1.243e6
const mass = 3.1e-12
const Q = 2.4e7
const anchors = [{ id: 'fundamental', nature: 'mode', frequency: f0, halfWidth: f0 / Q / 2 }] as const

/** Points around one anchor, from an offset list in hertz. */
function pointsOf(offsets: readonly number[]): Points {
  return {
    anchors,
    frequency: Float64Array.from(offsets, offset => f0 + offset),
    anchor: new Int32Array(offsets.length),
    offset: Float64Array.from(offsets),
  }
}

function offsetsOfBand(): readonly number[] {
  const width = f0 / Q / 2
  const from = Math.asinh((1.2e6 - f0) / width)
  const to = Math.asinh((1.3e6 - f0) / width)
  const count = 301
  return Array.from({ length: count }, (_, i) =>
    i === 0 ? 1.2e6 - f0 : i === count - 1 ? 1.3e6 - f0 : width * Math.sinh(from + ((to - from) * i) / (count - 1)),
  )
}

/** |χ⁻¹| in N/m with the difference of squares formed from the offset. */
function stiffness(points: Points): Float64Array {
  const w0 = 2 * Math.PI * f0
  return points.frequency.map((f, i) => {
    const w = 2 * Math.PI * f
    return mass * Math.hypot(-2 * Math.PI * points.offset[i] * (w0 + w), (w0 * w) / Q)
  })
}

const zeros = (length: number) => new Float64Array(length)
const sum = (...rows: readonly Float64Array[]) => rows[0].map((_, i) => rows.reduce((all, row) => all + row[i], 0))

interface Densities {
  readonly thermal: Float64Array
  readonly shot: Float64Array
  readonly loss: Float64Array
  readonly back: Float64Array
  readonly cross: Float64Array
  readonly stray: Float64Array
  readonly limit: Float64Array
}

function densities(points: Points): Densities {
  const chi = stiffness(points)
  const Sx = 1e-33
  return {
    thermal: points.frequency.map(f => {
      const w = 2 * Math.PI * f
      const n = 1 / Math.expm1((hbar * w) / (kB * 4.1))
      return (4 * hbar * w * (n + 0.5) * mass * 2 * Math.PI * f0) / Q
    }),
    shot: chi.map(c => 0.8 * Sx * c * c),
    loss: chi.map(c => 0.2 * Sx * c * c),
    back: chi.map(() => (1.6 * hbar * hbar) / Sx),
    cross: chi.map((c, i) => (points.offset[i] < 0 ? 1 : -1) * 0.4 * hbar * c),
    stray: chi.map(() => 4e-36),
    limit: chi.map(c => 2 * hbar * c),
  }
}

function sourceCurves(points: Points, d: Densities): readonly SourceCurve[] {
  const n = points.frequency.length
  const half = () => new Float64Array(n).fill(0.5)
  const base = { family: 'imprecision', readout: true, own: half(), ownUnit: 'quanta' } as const
  const none = { imprecision: zeros(n), backAction: zeros(n), correlation: zeros(n) }
  return [
    {
      ...{ id: 'fundamental.bath', title: 'Bath of fundamental', psd: d.thermal, family: 'thermal', readout: false },
      ...{ owner: 'fundamental', channel: 'bath', own: d.thermal, ownUnit: 'N²/Hz' },
    },
    {
      ...base,
      ...{ id: 'cavity.front', title: 'Front port of cavity', owner: 'cavity', channel: 'front' },
      psd: sum(d.shot, d.back, d.cross),
      vacuum: { imprecision: d.shot, backAction: d.back, correlation: d.cross },
      heating: none,
    },
    {
      ...base,
      ...{ id: 'detector.loss', title: 'Loss in front of detector', owner: 'detector', channel: 'loss', psd: d.loss },
      vacuum: { imprecision: d.loss, backAction: zeros(n), correlation: zeros(n) },
      heating: none,
    },
    {
      ...{ id: 'stray', title: 'Stray forces', psd: d.stray, family: 'stray', readout: false, owner: 'stray' },
      ...{ channel: null, own: d.stray, ownUnit: 'N²/Hz' },
    },
  ]
}

function lineCurves(d: Densities): readonly LineCurve[] {
  const shot = ['cavity.front imprecision', 'detector.loss imprecision']
  return [
    { id: 'thermal', title: 'Thermal', psd: d.thermal, family: 'thermal', signed: false, of: ['fundamental.bath'] },
    { id: 'shot', title: 'Shot', psd: sum(d.shot, d.loss), family: 'imprecision', signed: false, of: shot },
    {
      ...{ id: 'back_action', title: 'Back-action', psd: d.back, family: 'back-action', signed: false },
      of: ['cavity.front back-action'],
    },
    {
      ...{ id: 'shot_back_action', title: 'Shot–back-action correlation', psd: d.cross, family: 'correlation' },
      ...{ signed: true, of: ['cavity.front imprecision', 'cavity.front back-action'] },
    },
    { id: 'stray', title: 'Stray forces', psd: d.stray, family: 'stray', signed: false, of: ['stray'] },
  ]
}

function limitCurves(d: Densities): readonly LimitCurve[] {
  const about = 'Least added noise of a detector without correlations.'
  return [
    { id: 'sql', title: 'Standard quantum limit', psd: d.limit, bounds: 'added', about },
    {
      ...{ id: 'zero_point', title: 'Zero-point noise', psd: d.limit.map(value => value / 3), bounds: 'total' },
      about: 'The bath at zero temperature.',
    },
  ]
}

function evaluation(points: Points): Evaluation {
  const d = densities(points)
  const lines = lineCurves(d)
  return {
    points,
    total: sum(...lines.map(each => each.psd)),
    added: sum(d.shot, d.loss, d.back, d.cross),
    lines,
    sources: sourceCurves(points, d),
    limits: limitCurves(d),
    response: new Float64Array(points.frequency.length).fill(1e36),
  }
}

const spread = { statistical: 0, systematic: 0, combined: 0 }

function headlineAt(e: Evaluation, i: number): At {
  const limit = e.limits[0].psd[i]
  return {
    frequency: e.points.frequency[i],
    asd: Math.sqrt(e.total[i]),
    asdSpread: spread,
    totalMargin: 10 * Math.log10(e.total[i] / limit),
    totalMarginSpread: spread,
    addedMarginSpread: spread,
    addedMargin: 10 * Math.log10(e.added[i] / limit),
    shares: e.lines
      .map(each => ({ line: each.id, share: each.psd[i] / e.total[i] }))
      .toSorted((a, b) => b.share - a.share),
  }
}

function dominanceOf(e: Evaluation): readonly Dominance[] {
  const stretches: { line: string; from: number; to: number; least: number; greatest: number }[] = []
  e.points.frequency.forEach((frequency, i) => {
    const top = headlineAt(e, i).shares[0]
    const last = stretches.at(-1)
    if (last?.line === top.line) {
      last.to = frequency
      last.least = Math.min(last.least, top.share)
      last.greatest = Math.max(last.greatest, top.share)
    } else
      stretches.push({
        line: top.line,
        from: last?.to ?? frequency,
        to: frequency,
        least: top.share,
        greatest: top.share,
      })
  })
  return stretches
}

const mode: ModeState = {
  id: 'fundamental',
  frequency: f0,
  effectiveFrequency: f0 - 1200,
  linewidth: f0 / Q,
  effectiveLinewidth: 130,
  thermalOccupancy: 68720,
  finalOccupancy: 26.4,
  finalOccupancySpread: spread,
  zeroPoint: 1.475e-15,
  cooperativity: 2500,
  measurementRate: 129,
  decoherenceRate: 3560,
}

const cavity: CavityState = {
  id: 'cavity',
  linewidth: 690e3,
  quanta: 1.93e7,
  pumpPower: 3e-6,
  detuning: 0,
  linearity: 0.0012,
  ports: [
    { id: 'front', rate: 600e3, occupancy: 0 },
    { id: 'back', rate: 90e3, occupancy: 0 },
  ],
}

/** A whole assessment made of textbook formulas, for pages, files and texts; the engine has no part in it. */
export function fixtureAssessment(sensor = 'fixture'): Assessment {
  const budget = fixtureBudget(sensor)
  const whole = evaluation(pointsOf(offsetsOfBand()))
  const atReference = evaluation(pointsOf([500]))
  const best = whole.total.indexOf(Math.min(...whole.total))
  const within = [...whole.points.frequency].filter((_, i) => whole.total[i] <= 2 * whole.total[best])
  return {
    budget,
    evaluation: whole,
    atReference,
    bands: null,
    rootShares: [],
    lineSpreads: atReference.lines.map(() => spread),
    requirements: [],
    variants: [],
    headlines: {
      best: headlineAt(whole, best),
      reference: headlineAt(atReference, 0),
      halfPowerBand: { from: within[0], to: within.at(-1) ?? within[0] },
      dominance: dominanceOf(whole),
    },
    modes: [mode],
    cavities: [cavity],
    pumpRange: null,
    unit: 'N/√Hz',
    warnings: [
      { severity: 'warning', code: 'fixture', place: place(31), message: 'the detuning is left out; 0 Hz is taken' },
    ],
  }
}
