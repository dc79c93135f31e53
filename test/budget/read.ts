import { readFileSync } from 'node:fs'
import type { Budget } from '../../src/model/budget.js'
import { formatProblem } from '../../src/budget/format-problem.js'
import { readBudgetFile, type BudgetRead } from '../../src/budget/read-budget.js'
import { MemoryFiles } from './memory-files.js'

/** A small good budget; tests replace pieces of it. */
export const small = `format: 1
title: Membrane
revision: 2.10
measurand: { quantity: force, mode: drum }
readout: detector
band: 1.2 MHz to 1.3 MHz
components:
  drum: { kind: resonator, mass: 3.1(2) ng, frequency: 1.243 MHz, quality: 2.4e7, temperature: 4.1 K }
  cavity:
    kind: cavity
    frequency: 282 THz
    modes: { drum: 1 }
    coupling: 21 GHz/µm
    ports: { front: { rate: 600 kHz }, back: { rate: 90 kHz } }
    pump: { port: front, power: 3 µW }
  detector: { kind: homodyne, reads: cavity.back }
`

export const example = readFileSync(new URL('good/membrane.yaml', import.meta.url), 'utf8')
/** Every way to state, derive, correlate and require a value. */
export const spring = readFileSync(new URL('good/spring.yaml', import.meta.url), 'utf8')

export function read(text: string | Uint8Array, data: Readonly<Record<string, string>> = {}): BudgetRead {
  return readBudgetFile(new MemoryFiles({ 'budget.yaml': text, ...data }), {
    sensor: 'tern',
    folder: '',
    name: 'budget.yaml',
  })
}

/** `small` with pieces replaced; a piece that does not occur is a mistake of the test. */
export function changed(...pieces: readonly (readonly [string, string])[]): string {
  let text = small
  for (const [from, to] of pieces) {
    if (!text.includes(from)) throw new Error(`the small budget does not hold ${from}`)
    text = text.replace(from, to)
  }
  return text
}

/** The budget of a text that must be good. */
export function good(text: string, data: Readonly<Record<string, string>> = {}): Budget {
  const { budget, problems } = read(text, data)
  if (budget === null) throw new Error(problems.map(formatProblem).join('\n'))
  return budget
}

export function lines(result: BudgetRead): string[] {
  return result.problems.map(formatProblem)
}
