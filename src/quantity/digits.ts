/** A number in decimal digits: ±d.ddd… × 10^exponent. */
export interface Digits {
  readonly negative: boolean
  /** At least one digit; the first is not 0 unless all are. */
  readonly digits: string
  /** Power of ten of the first digit. */
  readonly exponent: number
}

/** The value rounded to so many significant digits (1 to 100). */
export function toSignificant(value: number, count: number): Digits {
  const [mantissa, exponent] = Math.abs(value)
    .toExponential(count - 1)
    .split('e')
  return { negative: value < 0, digits: mantissa.replace('.', ''), exponent: Number(exponent) }
}

/** The value rounded at the digit of 10^place; a value below half of it is zero, written to that place. */
export function toPlace(value: number, place: number): Digits {
  const lead = value === 0 ? place - 1 : toSignificant(value, 17).exponent
  if (lead >= place) return toPlaceOf(value, lead, place)
  const up = lead === place - 1 && Math.abs(value) >= 5 * 10 ** lead
  return { negative: value < 0 && up, digits: up ? '1' : '0', exponent: place }
}

function toPlaceOf(value: number, lead: number, place: number): Digits {
  const rounded = toSignificant(value, Math.min(lead - place + 1, 100))
  // 9.99 rounds up to 10.0: the first digit moves up, and a digit is missing at the place.
  const missing = '0'.repeat(rounded.exponent - lead)
  return { ...rounded, digits: rounded.digits + missing }
}

/** One digit of an uncertainty, two when it leads with 1, as it is honest to print. */
export function uncertaintyDigits(uncertainty: number): Digits {
  const full = toSignificant(uncertainty, 17)
  const rounded = toSignificant(uncertainty, 1)
  return full.digits.startsWith('1') || rounded.digits === '1' ? toSignificant(uncertainty, 2) : rounded
}

/** Writes digits · 10^−shift without an exponent: `0.0123`, `320`. */
export function plainDecimal({ digits, exponent }: Digits, shift: number): string {
  const position = exponent - shift
  if (position < 0) return `0.${'0'.repeat(-position - 1)}${digits}`
  const whole = digits.slice(0, position + 1).padEnd(position + 1, '0')
  const decimals = digits.slice(position + 1)
  return decimals === '' ? whole : `${whole}.${decimals}`
}
