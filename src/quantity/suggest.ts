import { distance } from 'fastest-levenshtein'
import { canonicalSymbol, lookUpUnit, unitSymbols } from './units.js'

/** Words and slips for units, with the symbol that is read. */
const spelledOut: ReadonlyMap<string, string> = new Map([
  ['hertz', 'Hz'],
  ['cps', 'Hz'],
  ['newton', 'N'],
  ['newtons', 'N'],
  ['meter', 'm'],
  ['meters', 'm'],
  ['metre', 'm'],
  ['metres', 'm'],
  ['micron', 'µm'],
  ['microns', 'µm'],
  ['sec', 's'],
  ['second', 's'],
  ['seconds', 's'],
  ['gram', 'g'],
  ['grams', 'g'],
  ['gr', 'g'],
  ['kilogram', 'kg'],
  ['kilograms', 'kg'],
  ['kelvin', 'K'],
  ['watt', 'W'],
  ['watts', 'W'],
  ['volt', 'V'],
  ['volts', 'V'],
  ['pascal', 'Pa'],
  ['joule', 'J'],
  ['ohms', 'Ω'],
  ['degree', '°'],
  ['degrees', '°'],
  ['radian', 'rad'],
  ['radians', 'rad'],
  ['percent', '%'],
  ['hour', 'h'],
  ['hours', 'h'],
  ['day', 'd'],
  ['amu', 'u'],
  ['cc', 'cm^3'],
  ['ae', 'au'],
  ['mmhg', 'Torr'],
  ['vrms', 'V rms'],
  ['vpp', 'V pp'],
  ['vpk', 'V pk'],
  ['vp', 'V pk'],
  ['dbuv', 'dBµV'],
  ['celsius', '°C'],
  ['degc', '°C'],
  ['cts', 'counts'],
])

/** The symbol that somebody may have meant, ready to print: `` `kHz` ``, `` `mHz` or `MHz` ``; null where none is near. */
export function suggestUnits(written: string): string | null {
  const symbol = canonicalSymbol(written)
  const word = spelledOut.get(symbol.toLowerCase())
  if (word !== undefined) return `\`${word}\``
  const micro = symbol.startsWith('u') ? `µ${symbol.slice(1)}` : ''
  if (lookUpUnit(micro) !== null) return `\`${micro}\``
  const known = knownSymbols()
  const sameLetters = known.filter(candidate => candidate.toLowerCase() === symbol.toLowerCase())
  if (sameLetters.length > 0) return joinWords(sameLetters.slice(0, 3))
  return nearest(symbol, known)
}

/** Of equally near words the first of the same length: a wrong letter is a likelier slip than a missing one. */
function nearest(symbol: string, known: readonly string[]): string | null {
  const reach = symbol.length <= 3 ? 1 : 2
  let best: string | null = null
  let least = reach + 1
  for (const candidate of known) {
    const effort = distance(symbol, candidate) + (candidate.length === symbol.length ? 0 : 0.5)
    if (effort < least && Math.floor(effort) < candidate.length) [best, least] = [candidate, effort]
  }
  return best === null ? null : `\`${best}\``
}

/** Bare symbols first, then everyday prefixes, so that the plainest of equally near words is named. */
function knownSymbols(): string[] {
  const everyday = ['k', 'M', 'G', 'm', 'µ', 'n', 'p', 'f', 'a', 'z', 'T', 'P', 'c']
  const units = unitSymbols()
  const prefixable = units.filter(unit => unit.prefixable)
  const prefixed = everyday.flatMap(prefix => prefixable.map(({ symbol }) => prefix + symbol))
  return [...units.map(({ symbol }) => symbol), ...prefixed]
}

function joinWords(words: readonly string[]): string {
  return words.map(word => `\`${word}\``).join(' or ')
}
