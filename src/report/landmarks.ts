import type { Assessment } from '../model/assessment.js'
import { frequencyDigits, frequencyText, rangeDigits, rangeText } from './numbers.js'

const space = '\u00a0'

/** A frequency with more digits than this is better told as a distance from one that the reader knows. */
const readable = 7
/** A known frequency is near when it is closer than this part of the frequency. */
const near = 1e-5
/** Two frequencies this close, as a part of them, are the same. */
const nothing = 1e-13

/**
 * A frequency told to a hundredth or so of a width in Hz: `1.2431 MHz`; where that takes many digits and the reference
 * or a mode is near, the distance from it: `1.486 MHz − 0.14 Hz`.
 */
export function spokenFrequency(assessment: Assessment, frequency: number, width: number): string {
  const digits = frequencyDigits(frequency, width)
  const landmark = digits > readable ? landmarkNear(assessment, frequency) : null
  if (landmark === null) return frequencyText(frequency, digits)
  const offset = frequency - landmark
  const name = frequencyText(landmark, 12)
  // Close to a sharp mode a limit changes a lot over a small part of the width: only its very place is told by its name.
  if (Math.abs(offset) < nothing * frequency) return name
  const kept = Math.abs(offset) < width / 100 ? 1 : 2
  return `${name}${space}${offset < 0 ? '−' : '+'}${space}${frequencyText(Math.abs(offset), kept)}`
}

/** `1.2000 to 1.2413 MHz`; of a narrow range near a known frequency `−0.31 to 0.42 Hz from 1.486 MHz`. */
export function spokenRange(
  assessment: Assessment,
  { from, to }: { readonly from: number; readonly to: number },
  digits = rangeDigits(from, to),
): string {
  const [low, high] = [from, to].map(end => (digits > readable ? landmarkNear(assessment, end) : null))
  if (low === null && high === null) return rangeText(from, to, digits)
  if (low === high && low !== null) return `${offsetRange(from - low, to - low)} from ${frequencyText(low, 12)}`
  const width = Math.max(to - from, to / 10 ** (readable - 2))
  return `${endText(assessment, from, width)} to ${endText(assessment, to, width)}`
}

/** An end of a range: from a landmark to two digits, else as many digits as the range wants. */
function endText(assessment: Assessment, end: number, width: number): string {
  const landmark = landmarkNear(assessment, end)
  return landmark === null
    ? frequencyText(end, frequencyDigits(end, width))
    : spokenFrequency(assessment, end, Math.abs(end - landmark))
}

function offsetRange(from: number, to: number): string {
  const digits = (offset: number): number => Math.max(2, Math.ceil(Math.log10(Math.abs(offset) / (to - from))) + 2)
  const say = (offset: number): string => (offset === 0 ? `0${space}Hz` : frequencyText(offset, digits(offset)))
  const [low, high] = [say(from).split(space), say(to).split(space)]
  return low[1] === high[1] ? `${low[0]} to ${high.join(space)}` : `${low.join(space)} to ${high.join(space)}`
}

/** The reference or a bare mode, whichever is nearer, where one is near. */
function landmarkNear({ budget, modes }: Assessment, frequency: number): number | null {
  const known = [...(budget.reference === null ? [] : [budget.reference]), ...modes.map(mode => mode.frequency)]
  const close = known.filter(each => each > 0 && Math.abs(each - frequency) < near * frequency)
  return close.toSorted((a, b) => Math.abs(a - frequency) - Math.abs(b - frequency))[0] ?? null
}
