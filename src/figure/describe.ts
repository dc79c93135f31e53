import type { FigureInput } from './input.js'
import { indicesBetween } from './indices-between.js'
import { withUnit } from './prefix.js'

/** What a description speaks of: points of the evaluation and how a place on the axis is said. */
export interface Span {
  readonly shown: readonly number[]
  /** `from 1.2 MHz to 1.3 MHz`, behind "against frequency". */
  readonly range: string
  at(k: number): string
}

/** The whole band, in as many digits as tell its parts from each other. */
export function bandSpan({ band, points }: FigureInput): Span {
  const { low, high } = band
  const digits = Math.min(12, Math.max(3, 3 + Math.ceil(Math.log10(high / (high - low)))))
  const say = (frequency: number) => withUnit(frequency, 'Hz', digits)
  return {
    shown: indicesBetween(points.frequency, low, high),
    range: `against frequency from ${say(low)} to ${say(high)}`,
    at: k => say(points.frequency[k]),
  }
}

/** Sentences on what the curves do, for those who do not see the figure. */
export function describe(input: FigureInput, span: Span): string {
  const sentences = [
    `Amplitude density of ${input.quantity} ${span.range}.`,
    totalSentence(input, span),
    ...largestSentences(input, span),
    spreadSentence(input, span),
    limitSentence(input, span),
    variantSentence(input),
    `Curves: total; ${[...input.lines, ...input.limits].map(curve => curve.title).join('; ')}.`,
  ]
  return sentences.filter(s => s !== '').join(' ')
}

function totalSentence({ total, unit }: FigureInput, { shown, at }: Span): string {
  const valid = shown.filter(k => total[k] > 0 && Number.isFinite(total[k]))
  if (valid.length === 0) return 'The total is nowhere above zero.'
  const least = valid.reduce((a, b) => (total[b] < total[a] ? b : a))
  const most = valid.reduce((a, b) => (total[b] > total[a] ? b : a))
  const say = (k: number) => `${withUnit(Math.sqrt(total[k]), unit)} at ${at(k)}`
  return `The total is least, ${say(least)}, and greatest, ${say(most)}.`
}

/** Stretches narrower than this part of the points are not worth a sentence; nor are more than so many of them. */
const LEAST_PART = 0.02
const MOST_STRETCHES = 6

function largestSentences(input: FigureInput, { shown, at }: Span): string[] {
  const { lines } = input
  const stretches = largestStretches(input, shown).filter(s => s.count >= LEAST_PART * shown.length)
  if (stretches.length === 0) return []
  const parts = stretches.slice(0, MOST_STRETCHES).map(s => `${lines[s.line].title} from ${at(s.from)} to ${at(s.to)}`)
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

/** What the surface around the total is, with the least and the greatest of it. */
function spreadSentence({ total, uncertainty }: FigureInput, { shown }: Span): string {
  if (uncertainty === null) return ''
  const parts = shown.map(k => uncertainty[k] / Math.sqrt(total[k])).filter(part => Number.isFinite(part))
  if (parts.length === 0) return ''
  const say = (part: number) => `${Number((100 * part).toPrecision(2))}`
  const [least, most] = [say(parts.reduce((a, b) => Math.min(a, b))), say(parts.reduce((a, b) => Math.max(a, b)))]
  const range = least === most ? `${least} %` : `${least} to ${most} %`
  return `The surface around the total reaches one standard uncertainty to each side, ${range} of the total.`
}

function variantSentence({ variants }: FigureInput): string {
  if (variants.length === 0) return ''
  return `Beside it stand the totals of ${variants.length === 1 ? 'a variant' : 'variants'}: ${variants.map(each => each.title).join('; ')}.`
}

function limitSentence({ limits, total, comparable }: FigureInput, { shown, at }: Span): string {
  const limit = limits.find(l => l.prominent)
  if (limit === undefined || !comparable) return ''
  const valid = shown.filter(k => total[k] > 0 && limit.psd[k] > 0 && Number.isFinite(total[k] / limit.psd[k]))
  if (valid.length === 0) return ''
  const ratio = (k: number) => total[k] / limit.psd[k]
  const nearest = valid.reduce((a, b) => (ratio(b) < ratio(a) ? b : a))
  const decibels = 10 * Math.log10(ratio(nearest))
  const side = decibels >= 0 ? 'above' : 'below'
  const distance = `${Math.abs(decibels).toFixed(1)} dB`
  return `With respect to the ${limit.title} the total is lowest at ${at(nearest)}, ${distance} ${side} it.`
}
