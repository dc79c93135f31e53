// Times the evaluation of a cavity budget with twelve contributions on 10,000 points on the network, against the same
// budget derived by hand for numpy (hand_derived.py) where Python with numpy is installed: in turn, in one run, as a ratio.
// Both give amplitude densities of every line and of the total, and both are checked to have computed the same.
import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { createInterface } from 'node:readline'
import { fileURLToPath } from 'node:url'

const at = name => new URL(`../../dist/engine/${name}.js`, import.meta.url).href
const { assemble } = await import(at('assemble'))
const { Arena } = await import(at('arena'))
const { Amplitudes } = await import(at('evaluate'))
const { absolutePoints } = await import(at('points'))

const points = 10_000
const evaluations = 40
const rounds = 15

const numbers = {
  points,
  low: 1,
  high: 1e5,
  mass: 5e-3,
  frequency: 4.5,
  gas: 1e5,
  wire: 1e4,
  temperature: 300,
  rates: [4.8e6, 8e5, 4e5],
  kappa: 6e6,
  detuning: -1.8e6,
  coupling: 1e19,
  quanta: 1e6,
  angle: 1.1,
  powers: [
    [1e-30, -1],
    [3e-31, -2.5],
    [2e-32, 2],
    [1e-31, -4.5],
    [1e-30, -14],
  ],
  white: 1e-31,
  table: Array.from({ length: 1000 }, (_, i) => {
    const f = 0.5 * 4e5 ** (i / 999)
    return [f, 1e-29 * f ** -0.4 * (1 + 0.3 * Math.sin(40 * i))]
  }),
}

const place = { file: 'bench', line: 1, column: 1 }
const slot = constant => ({ constant })
const component = (id, kind, parameters) => ({ id, kind, parameters, place, places: new Map() })
const line = (id, claims) => ({ id, title: null, about: null, evidence: null, place, claims })
const claim = (id, of) => line(id, { of: [of], part: null })
const noise = (id, density) =>
  line(id, { kind: 'force-noise', parameters: { into: 'mode', density }, places: new Map() })
const level = (psd, exponent) => ({
  density: 'level',
  level: slot(psd),
  power: true,
  exponent: slot(exponent),
  reference: slot(100),
})

const budget = {
  readout: 'detector',
  measurand: { quantity: 'force', weights: null, at: null, place },
  roots: [],
  tables: [
    {
      file: 'bench',
      place,
      frequency: Float64Array.from(numbers.table, row => row[0]),
      psd: Float64Array.from(numbers.table, row => row[1]),
    },
  ],
  components: [
    component('mode', 'resonator', {
      mass: slot(numbers.mass),
      frequency: slot(numbers.frequency),
      losses: new Map([
        ['gas', { quality: slot(numbers.gas), law: 'viscous', temperature: slot(numbers.temperature) }],
        ['wire', { quality: slot(numbers.wire), law: 'structural', temperature: slot(numbers.temperature) }],
      ]),
    }),
    component('cavity', 'cavity', {
      frequency: slot(2.8e14),
      modes: new Map([['mode', slot(1)]]),
      coupling: slot(numbers.coupling),
      ports: new Map(['front', 'back', 'inner'].map((name, i) => [name, { rate: slot(numbers.rates[i]) }])),
      pump: { port: 'front', quanta: slot(numbers.quanta), detuning: slot(numbers.detuning) },
    }),
    component('detector', 'homodyne', { reads: 'cavity.front', angle: slot(numbers.angle), efficiency: slot(1) }),
  ],
  lines: [
    claim('gas', 'mode.gas'),
    claim('wire', 'mode.wire'),
    claim('front', 'cavity.front'),
    claim('back', 'cavity.back'),
    claim('inner', 'cavity.inner'),
    ...numbers.powers.map(([psd, exponent], i) => noise(`power_${i}`, level(psd, exponent))),
    noise('table', { density: 'table', table: 0 }),
    noise('white', level(numbers.white, 0)),
  ],
}

const grid = absolutePoints(
  Float64Array.from({ length: points }, (_, i) => numbers.low * (numbers.high / numbers.low) ** (i / (points - 1))),
)
const arena = new Arena()

/** One evaluation from the budget's numbers: the network, its tape, all curves, their amplitude densities. */
function evaluate() {
  return new Amplitudes(budget, assemble(budget)).at(grid, arena)
}

function timed() {
  const start = process.hrtime.bigint()
  for (let i = 0; i < evaluations; i++) evaluate()
  return Number(process.hrtime.bigint() - start) / evaluations
}

const median = values => values.toSorted((a, b) => a - b)[(values.length - 1) >> 1]

/** Python with numpy as a conversation of lines; null where there is none. */
async function numpy() {
  const child = spawn('python3', [fileURLToPath(new URL('./hand_derived.py', import.meta.url))], {
    stdio: ['pipe', 'pipe', 'ignore'],
  })
  child.stdin.on('error', () => undefined)
  const lines = createInterface({ input: child.stdout })[Symbol.asyncIterator]()
  const started = await Promise.race([once(child, 'spawn').then(() => true), once(child, 'error').then(() => false)])
  if (!started) return null
  child.stdin.write(`${JSON.stringify(numbers)}\n`)
  const ask = async () => {
    child.stdin.write(`${evaluations}\n`)
    const { value, done } = await lines.next()
    if (done) return null
    const [nanoseconds, checksum] = value.split(' ').map(Number)
    return { nanoseconds, checksum }
  }
  return (await ask()) === null ? null : { ask, end: () => child.stdin.end() }
}

for (let i = 0; i < 5; i++) timed()
const checksum = evaluate().reduce((sum, asd) => sum + asd.reduce((s, a) => s + Math.log(a), 0), 0) / points
const other = await numpy()
const ours = []
const theirs = []
for (let round = 0; round < rounds; round++) {
  ours.push(timed())
  const answer = await other?.ask()
  if (answer === undefined || answer === null) continue
  theirs.push(answer.nanoseconds)
  if (Math.abs(answer.checksum - checksum) > 1e-6)
    throw new Error(`checksums differ: ${checksum} and ${answer.checksum}`)
}
other?.end()
const per = ns => `${(ns / points).toFixed(1)} ns a point`
console.log(`twelve contributions, ${points} points, on the network`.padEnd(54), per(median(ours)))
if (theirs.length === 0) console.log('the same by hand in numpy'.padEnd(54), 'not measured: no Python with numpy here')
else {
  console.log('the same by hand in numpy'.padEnd(54), per(median(theirs)))
  console.log('ratio, pair by pair'.padEnd(54), median(ours.map((ns, i) => ns / theirs[i])).toFixed(2))
}
