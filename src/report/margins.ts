import type { Assessment } from '../model/assessment.js'
import { uncertaintyDigits } from '../quantity/digits.js'
import { formatQuantity } from '../quantity/format.js'

const space = '\u00a0'

/** Uncertainties of a margin below this are not worth a digit, in dB. */
const leastTold = 5e-4

/** `4.1 dB`, `10.62(21) dB`, with a true minus sign. */
export function decibelText(value: number, uncertainty = 0): string {
  return `${decibels(value, uncertainty)}${space}dB`
}

function decibels(value: number, uncertainty: number): string {
  if (uncertainty >= leastTold) return formatQuantity(value, '', { uncertainty })
  return value
    .toFixed(1)
    .replace(/^-0\.0$/, '0.0')
    .replace('-', '−')
}

/** `4.1 dB above`, `0.3(1) dB below`, `at`, `within 0.2 dB of`: where something stands relative to a limit. */
export function marginText(value: number, uncertainty = 0): string {
  const size = decibels(Math.abs(value), uncertainty)
  const zero = /^0(\.0*)?(\(|$)/.test(size)
  if (!zero) return `${size}${space}dB ${value > 0 ? 'above' : 'below'}`
  if (uncertainty < leastTold) return 'at'
  const { length } = uncertaintyDigits(uncertainty).digits
  return `within ${formatQuantity(uncertainty, '', { digits: length })}${space}dB of`
}

/**
 * Whether margins to quantum limits mean anything: a readout that states its noise but not how it disturbs the motion
 * can seem to pass every limit.
 */
export function hasBackAction({ warnings }: Assessment): boolean {
  return warnings.every(({ code }) => code !== 'no-back-action')
}

export const noMarginReason = 'the file does not say how the readout disturbs the motion'
