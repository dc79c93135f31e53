import { FAMILIES } from '../../src/figure/palette.js'
import type { FigureInput, FigureLimit, FigureLine, FigureVariant } from '../../src/figure/input.js'
import type { Points } from '../../src/model/points.js'

/** Numbers from 0 to 1 that follow from a seed (Mulberry32). */
export function randomNumbers(seed: number): () => number {
  let state = seed >>> 0
  return () => {
    state = (state + 0x6d2b79f5) >>> 0
    let t = Math.imul(state ^ (state >>> 15), 1 | state)
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296
  }
}

const WORDS = [
  'thermal',
  'bath of the second mode',
  'shot noise',
  'ground motion',
  'ß',
  'gas damping & recoil',
  'amplifier',
]
const UNITS = ['N/√Hz', 'm/√Hz', '1/√Hz', 'm/s²/√Hz']

/** A figure's input that nobody would draw by hand: any number of curves of any shape and size, with holes. */
export function randomBudget(seed: number): FigureInput {
  const random = randomNumbers(seed)
  const pick = <T>(list: readonly T[]): T => list[Math.floor(random() * list.length)]
  const low = 10 ** (random() * 8 - 1)
  const high = low * (1 + 10 ** (random() * 8 - 5))
  const frequency = Float64Array.from(
    { length: 60 + Math.floor(random() * 300) },
    (_, k, n = 359) => low * (high / low) ** (k / n),
  )
  const scale = 10 ** (random() * 40 - 44)
  const shape = () => randomShape(random, frequency, scale)
  const lines = Array.from({ length: 1 + Math.floor(random() * 18) }, (_, k): FigureLine => {
    const signed = random() < 0.15
    const psd = shape()
    const flip = signed ? random() * psd.length : Infinity
    return {
      id: `line_${k}`,
      title: `${pick(WORDS)} ${k}`,
      family: pick(FAMILIES),
      tone: Math.floor(random() * 6),
      signed,
      psd: psd.map((v, n) => (n > flip ? -v : v)),
    }
  })
  const limits = Array.from({ length: Math.floor(random() * 4) }, (_, k): FigureLimit => {
    return {
      id: `limit_${k}`,
      title: k === 0 ? 'standard quantum limit' : `limit number ${k}`,
      prominent: k === 0,
      psd: shape(),
    }
  })
  const total = frequency.map((_, k) => lines.reduce((sum, l) => sum + (l.psd[k] > 0 ? l.psd[k] : 0), 0))
  const variants = randomVariants(random, total, frequency)
  const doubt = random() < 0.5 ? null : total.map(psd => Math.sqrt(psd) * 10 ** (random() * 3 - 2.5))
  return {
    ...frame(frequency, low, high),
    uncertainty: doubt,
    variants,
    comparable: random() < 0.8,
    unit: pick(UNITS),
    total,
    lines,
    limits,
    ...marks(random, frequency, total),
  }
}

function frame(frequency: Float64Array, low: number, high: number) {
  const points: Points = {
    anchors: [],
    frequency,
    anchor: new Int32Array(frequency.length).fill(-1),
    offset: frequency,
  }
  return { title: 'Any <sensor> & "more"', quantity: 'force', band: { low, high }, points }
}

function marks(random: () => number, frequency: Float64Array, total: Float64Array) {
  const best = total.reduce((a, v, k) => (v > 0 && (a < 0 || v < total[a]) ? k : a), -1)
  return {
    reference: random() < 0.7 ? frequency[Math.floor(random() * frequency.length)] : null,
    best:
      best < 0
        ? null
        : { frequency: frequency[best], asd: Math.sqrt(total[best]), uncertainty: random() * Math.sqrt(total[best]) },
  }
}

function randomShape(random: () => number, frequency: Float64Array, scale: number): Float64Array {
  const level = scale * 10 ** (random() * 8 - 4)
  const slope = random() < 0.4 ? 0 : random() * 8 - 4
  const centre = frequency[Math.floor(random() * frequency.length)]
  const width = centre * 10 ** (-1 - 5 * random())
  const depth = random() < 0.5 ? 0 : (random() < 0.5 ? 1 : -1) * (1 + 6 * random())
  const hole = random() < 0.2 ? Math.floor(random() * frequency.length) : -100
  const missing = random() < 0.5 ? 0 : Number.NaN
  return frequency.map((f, k) => {
    if (Math.abs(k - hole) < 12) return missing
    const peak = 10 ** (depth / (1 + ((f - centre) / width) ** 2))
    return level * (f / frequency[0]) ** slope * peak
  })
}

/** Totals beside the total, some far from it, on fewer points. */
function randomVariants(random: () => number, total: Float64Array, frequency: Float64Array): FigureVariant[] {
  return Array.from({ length: Math.floor(random() * 4) }, (_, k) => {
    const factor = 10 ** (random() * 6 - 3)
    const kept = frequency.filter((_f, n) => n % 2 === 0)
    return {
      id: `variant_${k}`,
      title: k === 0 ? 'cold: quality ten times higher, at 20 mK' : `variant ${k}`,
      total: total.filter((_v, n) => n % 2 === 0).map(v => v * factor),
      points: { anchors: [], frequency: kept, anchor: new Int32Array(kept.length).fill(-1), offset: kept },
    }
  })
}
