import type { FigureInput } from './input.js'
import { plainNumber, withUnit } from './prefix.js'

/** Sentences on what the curves do between two frequencies, for those who do not see the figure. */
export function describe(input: FigureInput, low: number, high: number): string {
  const shown = indicesBetween(input.points.frequency, low, high)
  const sentences = [
    `Amplitude density of ${input.quantity} against frequency from ${hertz(low)} to ${hertz(high)}.`,
    totalSentence(input, shown),
    ...largestSentences(input, shown),
    limitSentence(input, shown),
    `Curves: total; ${[...input.lines, ...input.limits].map(curve => curve.title).join('; ')}.`,
  ]
  return sentences.filter(s => s !== '').join(' ')
}

export function indicesBetween(frequency: Float64Array, low: number, high: number): number[] {
  const found: number[] = []
  for (let k = 0; k < frequency.length; k++) if (frequency[k] >= low && frequency[k] <= high) found.push(k)
  return found
}

function hertz(frequency: number): string {
  return withUnit(frequency, 'Hz', 4)
}

function totalSentence({ total, points, unit }: FigureInput, shown: readonly number[]): string {
  const valid = shown.filter(k => total[k] > 0 && Number.isFinite(total[k]))
  if (valid.length === 0) return 'The total is nowhere above zero.'
  const least = valid.reduce((a, b) => (total[b] < total[a] ? b : a))
  const most = valid.reduce((a, b) => (total[b] > total[a] ? b : a))
  const at = (k: number) => `${withUnit(Math.sqrt(total[k]), unit)} at ${hertz(points.frequency[k])}`
  return `The total is least, ${at(least)}, and greatest, ${at(most)}.`
}

/** Stretches narrower than this part of the points are not worth a sentence; nor are more than so many of them. */
const LEAST_PART = 0.02
const MOST_STRETCHES = 6

function largestSentences(input: FigureInput, shown: readonly number[]): string[] {
  const { lines, points } = input
  const stretches = largestStretches(input, shown).filter(s => s.count >= LEAST_PART * shown.length)
  if (stretches.length === 0) return []
  const parts = stretches
    .slice(0, MOST_STRETCHES)
    .map(s => `${lines[s.line].title} from ${hertz(points.frequency[s.from])} to ${hertz(points.frequency[s.to])}`)
  return [`The largest contribution is ${parts.join(', then ')}.`]
}

interface Stretch {
  readonly line: number
  readonly from: number
  to: number
  count: number
}

/** Runs of points in which one line is the largest. */
function largestStretches({ lines }: FigureInput, shown: readonly number[]): Stretch[] {
  const stretches: Stretch[] = []
  for (const k of shown) {
    const line = lines.reduce((a, curve, n) => (curve.psd[k] > (a < 0 ? 0 : lines[a].psd[k]) ? n : a), -1)
    if (line < 0) continue
    const last = stretches.at(-1)
    if (last !== undefined && last.line === line) {
      last.to = k
      last.count++
    } else stretches.push({ line, from: k, to: k, count: 1 })
  }
  return stretches
}

function limitSentence({ limits, total, points }: FigureInput, shown: readonly number[]): string {
  const limit = limits.find(l => l.prominent)
  if (limit === undefined) return ''
  const valid = shown.filter(k => total[k] > 0 && limit.psd[k] > 0 && Number.isFinite(total[k] / limit.psd[k]))
  if (valid.length === 0) return ''
  const ratio = (k: number) => total[k] / limit.psd[k]
  const nearest = valid.reduce((a, b) => (ratio(b) < ratio(a) ? b : a))
  const decibels = 10 * Math.log10(ratio(nearest))
  const side = decibels >= 0 ? 'above' : 'below'
  const distance = `${plainNumber(Math.abs(decibels), Math.abs(decibels) < 10 ? 2 : 3)} dB`
  return `With respect to the ${limit.title} the total is lowest at ${hertz(points.frequency[nearest])}, ${distance} ${side} it.`
}
