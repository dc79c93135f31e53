import { closeSync, fstatSync, openSync, readFileSync } from 'node:fs'
import { relative, resolve } from 'node:path'
import { Refusal, type Problem } from '../model/problem.js'
import { equalDimensions, isDimensionless, dimensionOf } from '../quantity/dimension.js'
import { QuantityError } from '../quantity/error.js'
import { parseQuantity } from '../quantity/parse.js'
import { CallError } from './call-error.js'

const perTime = dimensionOf({ time: -1 })
const largestFile = 32 * 1024 * 1024
const mostFrequencies = 1_000_000

/**
 * A frequency in hertz: a plain number (`9e5`) or a quantity (`1.243 MHz`). Throws a QuantityError for everything
 * else, an angular frequency among it: that a number is meant per radian is too easily wrong to be guessed.
 */
export function frequencyOf(text: string): number {
  const quantity = parseQuantity(text)
  const plain = isDimensionless(quantity.dimension) && quantity.unitText === ''
  const cycles = quantity.cycles.numerator === 1 && quantity.cycles.denominator === 1
  const refuse = (why: string): never => {
    throw new QuantityError(`\`${text.trim()}\` ${why}`, 0, text.length)
  }
  if (!plain && !(cycles && equalDimensions(quantity.dimension, perTime))) {
    refuse('is not a frequency; write one in hertz, such as `1.243 MHz` or `9e5`')
  }
  if (quantity.uncertainty !== 0) refuse('has an uncertainty; a point to evaluate at is exact')
  if (!(quantity.value > 0)) refuse('is not above 0; write a frequency such as `1.243 MHz` or `9e5`')
  return quantity.value
}

/** Of the words behind `--at`. */
export function frequenciesOf(words: readonly string[]): number[] {
  return words.map(word => {
    try {
      return frequencyOf(word)
    } catch (error) {
      if (error instanceof QuantityError) throw new CallError(`--at: ${error.message}`)
      throw error
    }
  })
}

/** Of a file with one frequency a line; blank lines and those that begin with `#` say nothing. */
export function frequenciesIn(name: string, cwd: string): number[] {
  const lines = textOf(resolve(cwd, name), name).split(/\r\n|\n|\r/)
  const found: number[] = []
  const problems: Problem[] = []
  const file = relative(cwd, resolve(cwd, name)).replaceAll('\\', '/')
  for (const [index, line] of lines.entries()) {
    const text = line.trim()
    if (text === '' || text.startsWith('#')) continue
    try {
      found.push(frequencyOf(text))
    } catch (error) {
      if (!(error instanceof QuantityError)) throw error
      const place = { file, line: index + 1, column: line.indexOf(text) + error.offset + 1 }
      problems.push({ severity: 'error', code: 'frequency', place, message: error.message })
    }
    if (problems.length === 20) break
  }
  if (problems.length > 0) throw new Refusal(problems)
  if (found.length === 0) throw new CallError(`--at-file: ${name} holds no frequency; write one a line`)
  return found
}

/** Opened once and read by its descriptor, so that what was measured is what is read. */
function textOf(path: string, name: string): string {
  let descriptor: number
  try {
    descriptor = openSync(path, 'r')
  } catch (error) {
    const code = error instanceof Error && 'code' in error ? String(error.code) : 'unknown reason'
    throw new CallError(`--at-file: ${name} ${code === 'ENOENT' ? 'does not exist' : `cannot be read (${code})`}`)
  }
  try {
    const status = fstatSync(descriptor)
    if (status.isDirectory())
      throw new CallError(`--at-file: ${name} is a folder; name a file with one frequency a line`)
    if (status.size > largestFile) throw new CallError(`--at-file: ${name} is larger than 32 MB`)
    return readFileSync(descriptor, 'utf8').replace(/^\uFEFF/, '')
  } finally {
    closeSync(descriptor)
  }
}

/** What the engine is asked for: ascending, each once. */
export function pointsOf(frequencies: readonly number[]): Float64Array {
  if (frequencies.length > mostFrequencies) {
    throw new CallError(`${frequencies.length} frequencies are too many; at most ${mostFrequencies} are evaluated`)
  }
  return Float64Array.from(new Set(frequencies)).sort()
}
