import { QuantityError } from './error.js'

/** A slip that people make, found before the grammar is asked, so that the message can say what was meant. */
interface Slip {
  readonly pattern: RegExp
  readonly message: (piece: string) => string
}

const slips: readonly Slip[] = [
  {
    pattern: /\d\s*(?:''|['"])/,
    message: piece =>
      `\`${piece}\`: minutes and seconds of arc are written \`′\` and \`″\`, or \`arcmin\` and \`arcsec\``,
  },
  {
    pattern: /\d+(?:,\d{3}){2,}(?!\d)/,
    message: piece => `\`${piece}\`: digits are not grouped by commas; write \`${piece.replaceAll(',', '')}\``,
  },
  {
    pattern: /\d+,\d+/,
    message: piece => `\`${piece}\`: a decimal comma is not read; write \`${piece.replace(',', '.')}\``,
  },
  {
    pattern: /^\s*[-+−]?\.?(?:nan|inf(?:inity)?)(?![a-z])/i,
    message: piece => `\`${piece.trim()}\` is not a finite number; write digits, such as \`3.1 ng\``,
  },
  {
    pattern: /\d+_[\d_]*/,
    message: piece => `\`${piece}\`: digits stand together; write \`${piece.replaceAll('_', '')}\``,
  },
  {
    pattern: /(?<![\d.])\.\d+/,
    message: piece => `\`${piece}\`: a number begins with a digit; write \`0${piece}\``,
  },
  {
    pattern: /\d+\.(?!\d)/,
    message: piece =>
      `\`${piece}\`: a digit is missing after the point; write \`${piece.slice(0, -1)}\` or \`${piece}0\``,
  },
  {
    pattern: /(?<![\d.)^])\d+(?:[ \u00a0\u2000-\u200a\u202f]+\d{3})+(?![\d/])/,
    message: piece => `\`${piece}\`: digits stand together; write \`${piece.replace(/[^\d]/g, '')}\``,
  },
]

/** Refuses the slips that have a clear remedy. */
export function checkSlips(text: string): void {
  for (const { pattern, message } of slips) {
    const found = pattern.exec(text)
    if (found !== null) throw new QuantityError(message(found[0]), found.index, found[0].length)
  }
}
