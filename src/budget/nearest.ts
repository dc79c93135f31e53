import { distance } from 'fastest-levenshtein'

/** The allowed word that a person most likely meant: at most a third of its letters differ; null where none is near. */
export function nearest(word: string, allowed: Iterable<string>): string | null {
  const wanted = word.slice(0, 80).toLowerCase()
  let best: string | null = null
  let least = Infinity
  for (const candidate of allowed) {
    const far =
      candidate.toLowerCase().startsWith(wanted) && wanted.length > 2 ? 1 : distance(wanted, candidate.toLowerCase())
    if (far < least) [best, least] = [candidate, far]
  }
  return best !== null && least <= Math.max(1, Math.ceil(best.length / 3)) ? best : null
}

/** ` (did you mean `cavity`?)`, or nothing where no allowed word is near. */
export function suggestion(word: string, allowed: Iterable<string>): string {
  const near = nearest(word, allowed)
  return near === null ? '' : `; did you mean \`${near}\`?`
}
