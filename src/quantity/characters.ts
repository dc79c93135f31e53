import { QuantityError } from './error.js'

const allowed = /^[\x20-\x7eµμΩ\u2126Å\u212b°·⋅∙×±−√πΦ₀′″ᐟ⁄½⁰¹²³⁴-⁹⁺⁻\u00a0\u2000-\u200a\u202f]$/u

/** Letters and signs of other scripts that look like the right ones, with what they are taken for. */
const lookAlikes: ReadonlyMap<string, string> = new Map([
  ...pairs('АВСЕНІЈКМОРЅТХасеіјорѕухһԛԝ', 'ABCEHIJKMOPSTXaceijopsyxhqw'),
  ...pairs('ΑΒΕΖΗΙΚΜΝΟΡΤΥΧονυω', 'ABEZHIKMNOPTYXovuw'),
  ...pairs('‐‑‒–—―﹣-', '--------'),
  ...pairs('º˚∘○', '°°°°'),
  ...pairs('∗✕✖', '*××'),
  ...pairs('∕', '/'),
  ...pairs('ϖΠ∏', 'πππ'),
])

function pairs(strange: string, plain: string): [string, string][] {
  const plainLetters = [...plain]
  return [...strange].map((letter, index) => [letter, plainLetters[index]])
}

/** Refuses every character that the grammar does not know, and names its code point. */
export function checkCharacters(text: string): void {
  let offset = 0
  for (const character of text) {
    if (!allowed.test(character)) throw strangeCharacter(character, offset)
    offset += character.length
  }
}

/** `place` goes on from `has no place in`, with a remedy. */
export function strangeCharacter(
  character: string,
  offset: number,
  place = 'a quantity; write it like `3.1(2) ng` or `0.8 aN/√Hz`',
): QuantityError {
  const code = `U+${(character.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0')}`
  const plain = lookAlikes.get(character)
  if (plain !== undefined) {
    return new QuantityError(
      `the character ${code} only looks like \`${plain}\`; write \`${plain}\``,
      offset,
      character.length,
    )
  }
  const shown = /^[\p{L}\p{N}\p{P}\p{S}]$/u.test(character) ? ` (${character})` : ''
  return new QuantityError(`the character ${code}${shown} has no place in ${place}`, offset, character.length)
}
