import { strangeCharacter } from '../characters.js'
import { QuantityError } from '../error.js'
import type { Span } from '../tree.js'

export interface Token extends Span {
  readonly type: 'number' | 'name' | 'raised' | 'sign' | 'end'
  /** A sign in its plain spelling: `*` for `·`, `^` for `**`. */
  readonly text: string
}

const rules: readonly { readonly type: Token['type'] | 'space'; readonly pattern: RegExp }[] = [
  { type: 'space', pattern: /[ \t\r\n\u00a0\u2000-\u200a\u202f]+/y },
  { type: 'number', pattern: /\d+(?:\.\d+)?(?:[eE][-+−]?\d+)?/y },
  { type: 'name', pattern: /π|[A-Za-z_µμΩ\u2126Å\u212bħℏεΦ][A-Za-z0-9_₀µμΩ\u2126Å\u212bħℏεΦ]*/y },
  { type: 'raised', pattern: /[⁺⁻]?[⁰¹²³⁴-⁹]+(?:[/⁄ᐟ][⁰¹²³⁴-⁹]+)?/y },
  { type: 'sign', pattern: /\*\*|°C|[-−+*×·⋅∙/^(),√°%′″]/y },
]

const plainSigns: ReadonlyMap<string, string> = new Map([
  ['**', '^'],
  ['−', '-'],
  ['×', '*'],
  ['·', '*'],
  ['⋅', '*'],
  ['∙', '*'],
])

/** Spellings in letters of other scripts, each with the name it stands for. */
const plainNames: ReadonlyMap<string, string> = new Map([
  ['π', 'pi'],
  ['ħ', 'hbar'],
  ['ℏ', 'hbar'],
  ['ε_0', 'epsilon_0'],
  ['µ_0', 'mu_0'],
  ['μ_0', 'mu_0'],
  ['Φ_0', 'Phi_0'],
])

/** Cuts an expression into its tokens; the last is of type `end`. Throws a QuantityError. */
export function tokensOf(text: string): Token[] {
  const tokens: Token[] = []
  let offset = /^\s*=/.exec(text)?.[0].length ?? 0
  while (offset < text.length) {
    const { type, length } = nextPiece(text, offset)
    const [start, end] = [offset, offset + length]
    if (type !== 'space') tokens.push({ type, text: plainText(type, text.slice(start, end)), start, end })
    offset = end
  }
  tokens.push({ type: 'end', text: '', start: text.length, end: text.length })
  return tokens
}

function nextPiece(text: string, offset: number): { type: Token['type'] | 'space'; length: number } {
  for (const { type, pattern } of rules) {
    pattern.lastIndex = offset
    const found = pattern.exec(text)
    if (found !== null) return { type, length: found[0].length }
  }
  throw refused(text, offset)
}

function refused(text: string, offset: number): QuantityError {
  const rest = text.slice(offset)
  const decimal = /^\.\d+/.exec(rest)?.[0]
  if (decimal !== undefined && !/\d$/.test(text.slice(0, offset))) {
    return new QuantityError(
      `\`${decimal}\`: a number begins with a digit; write \`0${decimal}\``,
      offset,
      decimal.length,
    )
  }
  const remedies: readonly (readonly [RegExp, string])[] = [
    [/^±/, 'an uncertainty has no place in an expression; make the uncertain number a parameter'],
    [/^\./, 'a point stands between digits only; write numbers like `0.5`, and names without points'],
    [/^[<>=!&|?:;[\]{}]/, 'an expression is made of numbers, names, `+ - * / ^`, brackets and functions'],
  ]
  for (const [pattern, remedy] of remedies) {
    const found = pattern.exec(rest)
    if (found !== null) return new QuantityError(`\`${found[0]}\`: ${remedy}`, offset, found[0].length)
  }
  const character = String.fromCodePoint(rest.codePointAt(0) ?? 0)
  return strangeCharacter(character, offset, 'an expression; write it like `sqrt(k/m)/(2*pi)`')
}

function plainText(type: Token['type'], written: string): string {
  if (type === 'sign') return plainSigns.get(written) ?? written
  if (type !== 'name') return written
  const name = written.replaceAll('₀', '_0')
  return plainNames.get(name) ?? (name.includes('Φ') || name.includes('ε') ? written : name)
}
